import type { IncomingMessage } from "node:http";
import { Refusal } from "../http";

const HEAD_END = Buffer.from("\r\n\r\n");
const LONGEST_HEAD_BYTES = 16_384;

/**
 * The content of the form field "file", piece by piece as it arrives; `onHead` hears the type it was sent with.
 * Ends with an error when the form breaks off. What follows the file is read and dropped.
 */
export async function* readFilePart(request: IncomingMessage, onHead: (contentType: string) => void): AsyncGenerator<Buffer> {
  const delimiter = Buffer.from(`\r\n--${boundaryOf(request)}`);
  // The first delimiter of a form lacks the line break that the others have.
  let held: Buffer = Buffer.from("\r\n");
  let state: "between" | "head" | "file" | "after" = "between";
  for await (const chunk of request.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
    if (state === "after") continue;
    held = Buffer.concat([held, chunk]);
    for (let moved = true; moved; ) {
      moved = false;
      if (state === "between") {
        const at = held.indexOf(delimiter);
        moved = at >= 0;
        held = held.subarray(moved ? at + delimiter.length : Math.max(0, held.length - delimiter.length));
        if (moved) state = "head";
      } else if (state === "head") {
        const at = held.indexOf(HEAD_END);
        if (held.subarray(0, 2).toString() === "--") throw new Refusal(400, "The form holds no field named file");
        if (at < 0 && held.length > LONGEST_HEAD_BYTES) throw new Refusal(400, "The form cannot be read");
        moved = at >= 0;
        if (moved) {
          const contentType = typeOfFile(held.subarray(0, at).toString("utf8"));
          held = held.subarray(at + HEAD_END.length);
          state = contentType === null ? "between" : "file";
          if (contentType !== null) onHead(contentType);
          // An empty field is followed by its delimiter at once.
        }
      } else if (state === "file") {
        const at = held.indexOf(delimiter);
        const length = at >= 0 ? at : Math.max(0, held.length - delimiter.length);
        if (length > 0) yield held.subarray(0, length);
        held = held.subarray(length);
        if (at >= 0) state = "after";
      }
    }
  }
  if (state !== "after") throw new Refusal(400, "The form broke off");
}

function boundaryOf(request: IncomingMessage): string {
  const type = request.headers["content-type"] ?? "";
  const found = /^multipart\/form-data\b.*\bboundary=(?:"([^"]{1,70})"|([^\s;]{1,70}))/i.exec(type);
  const boundary = found?.[1] ?? found?.[2];
  if (!boundary) throw new Refusal(400, "Send multipart/form-data");
  return boundary;
}

/** The type of the field when it is the file, else null. */
function typeOfFile(head: string): string | null {
  if (!/^content-disposition:[^\r\n]*[;\s]name="?file"?(?:[;\s]|$)/im.test(head)) return null;
  return /^content-type:\s*([^\r\n]+)/im.exec(head)?.[1] ?? "";
}
