import { createReadStream } from "node:fs";
import { pipeline } from "node:stream/promises";
import { type Exchange, Refusal } from "../http";
import { faultOfSignedUrl, type Token } from "./signing";
import type { Storage, StoredFile } from "./storage";

/** The file host: GET and HEAD of one file. A private one opens only to an address that is signed and in time. */
export async function sendStored({ request, response, url }: Exchange, id: string, token: Token, storage: Storage, cors: Record<string, string>): Promise<void> {
  const file = storage.find(id);
  if (!file) throw new Refusal(404, "File not found");
  const signed = url.searchParams.has("signature");
  const fault = file.acl === "private" || signed ? faultOfSignedUrl(url, token.apiKey) : null;
  if (fault) throw new Refusal(403, fault);
  const part = rangeOf(request.headers.range, file.size);
  const headers = { ...cors, ...headersOf(file), "content-length": part.end - part.start + 1 };
  const partial = part.asked ? { "content-range": `bytes ${part.start}-${part.end}/${file.size}` } : {};
  response.writeHead(part.asked ? 206 : 200, { ...headers, ...partial });
  if (request.method === "HEAD" || file.size === 0) return void response.end();
  // A reader that goes away in the middle is no fault of ours.
  await pipeline(createReadStream(storage.pathOf(file.key), part), response).catch(() => undefined);
}

const headersOf = (file: StoredFile) => ({
  "content-type": file.type.includes("/") ? file.type : "application/octet-stream",
  "content-disposition": `${file.disposition}; filename*=UTF-8''${encodeURIComponent(file.name)}`,
  "cache-control": file.acl === "private" ? "private, no-store" : "public, max-age=31536000, immutable",
  "accept-ranges": "bytes",
  etag: `"${file.hash}"`,
  "x-content-type-options": "nosniff",
});

function rangeOf(header: string | undefined, size: number): { start: number; end: number; asked: boolean } {
  const whole = { start: 0, end: size - 1, asked: false };
  const [, from = "", to = ""] = /^bytes=(\d{0,15})-(\d{0,15})$/.exec(header ?? "") ?? [];
  if (from === "" && to === "") return whole;
  const start = from === "" ? Math.max(0, size - Number(to)) : Number(from);
  const end = from === "" || to === "" ? size - 1 : Math.min(Number(to), size - 1);
  if (start > end) throw new Refusal(416, "Range not satisfiable");
  return { start, end, asked: true };
}
