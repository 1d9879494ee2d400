import "server-only";
import { AppError } from "@/lib/errors";

const MAX_BYTES = 64 * 1024;
const MAX_DEPTH = 20;

/** Reads at most `limit` bytes of a request's body; a longer one is refused before it has been read. */
export async function readBytes(request: Request, limit = MAX_BYTES): Promise<Uint8Array> {
  if (Number(request.headers.get("content-length") ?? 0) > limit) throw tooLarge(limit);
  const parts: Uint8Array[] = [];
  let size = 0;
  const reader = request.body?.getReader();
  for (;;) {
    const { done, value } = (await reader?.read()) ?? { done: true, value: undefined };
    if (done || !value) break;
    size += value.byteLength;
    if (size > limit) {
      await reader?.cancel();
      throw tooLarge(limit);
    }
    parts.push(value);
  }
  return Buffer.concat(parts);
}

const tooLarge = (limit: number) => new AppError("too_large", `More than ${Math.floor(limit / 1024)} KB can’t be taken here.`);

/** Brackets nested deeper than any form of ours; counted before parsing, since a parser spends seconds on a bomb of them. */
function tooDeep(text: string): boolean {
  let depth = 0;
  let inText = false;
  for (let i = 0; i < text.length; i += 1) {
    const char = text[i];
    if (inText) {
      if (char === "\\") i += 1;
      else if (char === '"') inText = false;
    } else if (char === '"') inText = true;
    else if ((char === "{" || char === "[") && ++depth > MAX_DEPTH) return true;
    else if (char === "}" || char === "]") depth -= 1;
  }
  return false;
}

export type JsonBody = { value: Record<string, unknown>; text: string };

/** A JSON object of at most 64 KB; anything else is refused in words. */
export async function readJson(request: Request): Promise<JsonBody> {
  if (!/^application\/json\s*(;|$)/i.test(request.headers.get("content-type") ?? "")) throw new AppError("not_json", "Send JSON.");
  const bytes = await readBytes(request);
  let text: string;
  let value: unknown;
  try {
    text = new TextDecoder("utf-8", { fatal: true }).decode(bytes);
    value = tooDeep(text) ? null : text === "" ? {} : JSON.parse(text);
  } catch (cause) {
    throw new AppError("bad_input", "This is not JSON that can be read.", { cause });
  }
  if (value === null || typeof value !== "object" || Array.isArray(value)) throw new AppError("bad_input", "Send one JSON object.");
  return { value: value as Record<string, unknown>, text };
}
