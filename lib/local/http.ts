import { createServer, type IncomingMessage, type OutgoingHttpHeaders, type ServerResponse } from "node:http";
import type { AddressInfo } from "node:net";

/** A stand-in that is running; closing it ends its connections but keeps what it stored. */
export type Running = { url: string; port: number; close(): Promise<void> };

/** One request as a stand-in sees it: the address is parsed once, the body is still to be read. */
export type Exchange = { request: IncomingMessage; response: ServerResponse; url: URL; closeIdle(): void };

/** Says no to a request; the message goes to the caller. */
export class Refusal extends Error {
  constructor(readonly status: number, message: string) {
    super(message);
  }
}

// A page on another site could point its own name at this machine and read the answers; only the machine's own names are served.
const OWN_NAMES = /^(?:localhost|127\.0\.0\.1|\[::1\])(?::\d+)?$/;

/** Listens on the loopback address alone. Port 0 takes a free one. */
export async function listen(port: number, handle: (exchange: Exchange) => Promise<void>): Promise<Running> {
  const server = createServer((request, response) => {
    answer(request, response, (asked) => handle({ ...asked, closeIdle: () => server.closeIdleConnections() })).catch((error: unknown) => fail(response, error));
  });
  // Phones on bad links upload slowly: the stand-in must not cut them off where the service would wait.
  server.requestTimeout = 0;
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, "127.0.0.1", () => resolve());
  });
  const taken = (server.address() as AddressInfo).port;
  const close = () =>
    new Promise<void>((resolve) => {
      server.close(() => resolve());
      server.closeAllConnections();
    });
  return { url: `http://127.0.0.1:${taken}`, port: taken, close };
}

async function answer(request: IncomingMessage, response: ServerResponse, handle: (asked: Omit<Exchange, "closeIdle">) => Promise<void>) {
  const host = request.headers.host ?? "";
  if (!OWN_NAMES.test(host)) return sendJson(response, 421, { error: "Only this machine's own names are served here." });
  const address = `http://${host}${request.url ?? "/"}`;
  if (!URL.canParse(address)) return sendJson(response, 400, { error: "The address cannot be read." });
  await handle({ request, response, url: new URL(address) });
}

function fail(response: ServerResponse, error: unknown) {
  const refused = error instanceof Refusal;
  if (!refused) console.error(error);
  if (response.headersSent || response.destroyed) return void response.destroy();
  const message = error instanceof Error ? error.message : String(error);
  sendJson(response, refused ? error.status : 500, { error: message });
}

/** Answers with JSON. */
export function sendJson(response: ServerResponse, status: number, body: unknown, headers: OutgoingHttpHeaders = {}): void {
  response.writeHead(status, { "content-type": "application/json; charset=utf-8", "cache-control": "no-store", ...headers });
  response.end(JSON.stringify(body, null, 2));
}

/** Reads a whole body; for small bodies only, anything above the limit is refused. */
export async function readText(request: IncomingMessage, limitBytes = 1_000_000): Promise<string> {
  const chunks: Buffer[] = [];
  let size = 0;
  for await (const chunk of request as AsyncIterable<Buffer>) {
    size += chunk.length;
    if (size > limitBytes) throw new Refusal(413, "The body is too large.");
    chunks.push(chunk);
  }
  return Buffer.concat(chunks).toString("utf8");
}

/** Reads a JSON object; the content type is asked for so that a form on another site cannot send one. */
export async function readJson(request: IncomingMessage): Promise<Record<string, unknown>> {
  const text = await readText(request);
  if (!/^application\/json\b/i.test(request.headers["content-type"] ?? "")) throw new Refusal(415, "Send application/json.");
  const value = parse(text);
  if (typeof value !== "object" || value === null || Array.isArray(value)) throw new Refusal(400, "Send a JSON object.");
  return value as Record<string, unknown>;
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text || "{}");
  } catch (cause) {
    throw new Refusal(400, `The body is not JSON: ${cause instanceof Error ? cause.message : String(cause)}`);
  }
}

/** Waits without keeping the process alive. */
export const pause = (ms: number) => new Promise<void>((resolve) => void setTimeout(resolve, ms).unref());
