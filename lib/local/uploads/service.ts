import { openFaults } from "../faults";
import { type Exchange, listen, pause, readJson, Refusal, type Running, sendJson } from "../http";
import { openApi } from "./api";
import { Callbacks } from "./callbacks";
import { CutOff, openIngest } from "./ingest";
import { sendStored } from "./reads";
import { readToken, same, type Token } from "./signing";
import { openStorage, type Storage, type StoredFile } from "./storage";

/** What the upload service can do wrong on order. */
export const UPLOAD_FAULTS = ["cut-mid-file", "callback-late", "callback-never", "callback-twice", "down", "slow"] as const;

const CORS = {
  "access-control-allow-origin": "*",
  "access-control-allow-methods": "GET, HEAD, PUT, POST, OPTIONS",
  "access-control-allow-headers": "*",
  "access-control-expose-headers": "*",
  "access-control-max-age": "600",
};
const SLOW_MS = 5000;

type Desk = { token: Token; storage: Storage; callbacks: Callbacks; ingest: ReturnType<typeof openIngest>; api: ReturnType<typeof openApi> };

/**
 * The upload stand-in: ingest, API and file host of the service behind the `uploadthing` package, on one port.
 * Its address uses the name localhost, which the library takes as the sign to use plain http.
 */
export async function startUploadService(options: { port: number; folder: string; token: string }): Promise<Running> {
  const token = readToken(options.token);
  const storage = openStorage(options.folder);
  const faults = openFaults(UPLOAD_FAULTS);
  let ownUrl = "";
  const urlOf = (id: string) => `${ownUrl}/a/${token.appId}/${id}`;
  const urlsOf = (file: StoredFile) => ({ url: `${ownUrl}/f/${file.key}`, appUrl: urlOf(file.key), ufsUrl: urlOf(file.key), fileHash: file.hash });
  const callbacks = new Callbacks(options.folder, token.apiKey, () => ownUrl, faults);
  const ingest = openIngest({ token, storage, callbacks, faults, urlsOf });
  const desk = { token, storage, callbacks, ingest, api: openApi(storage, token, urlOf) };

  const running = await listen(options.port, async (exchange) => {
    const { request, response } = exchange;
    // A browser silently sends again what broke off on a used connection, so a cut would go unseen on any but a fresh one.
    if (faults.isOrdered("cut-mid-file")) response.setHeader("connection", "close");
    if (request.method === "OPTIONS") return void response.writeHead(204, CORS).end();
    if (await faults.serve(exchange)) return;
    const slow = faults.take("slow");
    if (slow) await pause(slow.ms ?? SLOW_MS);
    if (faults.take("down")) return refuse(exchange, 503, "Service unavailable");
    await route(desk, exchange).catch((error: unknown) => {
      if (error instanceof Refusal) return refuse(exchange, error.status, error.message);
      // The sender is gone, or was sent away on order; there is nobody to answer.
      if (error instanceof CutOff || (request.destroyed && !request.complete)) return void response.destroy();
      throw error;
    });
  });
  ownUrl = `http://localhost:${running.port}`;
  return { ...running, url: ownUrl };
}

function partsOf(url: URL): string[] {
  try {
    return url.pathname.split("/").slice(1).map((part) => decodeURIComponent(part));
  } catch (cause) {
    throw new Refusal(400, `The address cannot be read: ${String(cause)}`);
  }
}

async function route({ token, storage, callbacks, ingest, api }: Desk, exchange: Exchange): Promise<void> {
  const { request, response, url } = exchange;
  const [first = "", second = "", third, more] = partsOf(url);
  const reads = request.method === "GET" || request.method === "HEAD";
  if (reads && more === undefined && first === "a" && second === token.appId && third) return sendStored(exchange, third, token, storage, CORS);
  if (reads && first === "f" && second && third === undefined) return sendStored(exchange, second, token, storage, CORS);
  if (/^[\w-]{16,128}$/.test(first) && second === "") {
    const answer = await ingest(exchange, first);
    return sendJson(response, answer.status, answer.body, { ...CORS, ...answer.headers });
  }
  if (request.method !== "POST") throw new Refusal(404, "Not found");
  if (!same(String(request.headers["x-uploadthing-api-key"] ?? ""), token.apiKey)) throw new Refusal(401, "Invalid API key");
  const body = await readJson(request);
  if (url.pathname === "/route-metadata") return callbacks.register(body, response);
  if (url.pathname === "/callback-result") {
    callbacks.settle(body);
    return sendJson(response, 200, { ok: true });
  }
  const call = first === "v6" && Object.hasOwn(api, second) ? api[second] : undefined;
  if (!call) throw new Refusal(404, "Not found");
  sendJson(response, 200, call(body));
}

/** A refusal that pages of other origins can read; the rest of a refused file is let run past. */
function refuse({ request, response }: Exchange, status: number, error: string): void {
  request.resume();
  if (!response.headersSent && !response.destroyed) sendJson(response, status, { error }, CORS);
}
