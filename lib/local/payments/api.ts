import type { Faults } from "../faults";
import { type Exchange, pause, readText, sendJson } from "../http";
import { ApiError } from "./api-error";
import { type Books, newId, type Scope } from "./books";
import { answerCall } from "./calls";
import type { Deliveries } from "./deliveries";
import { readForm } from "./form";
import { recall, slotOf } from "./keys";

type Api = { books: Books; faults: Faults; deliveries: Deliveries; secretKey: string; now(): number; pageOf(sessionId: string): string };

type Result = { status: number; answer: unknown; headers?: Record<string, string> };

const SLOW_MS = 5000;
const FORM_TYPE = /^application\/x-www-form-urlencoded\b/i;

/** Answers one call under /v1. */
export async function serveApi(api: Api, { request, response, url }: Exchange): Promise<void> {
  const { faults } = api;
  const requestId = newId("req_", 14);
  const body = await readText(request);
  const headers: Record<string, string> = { "request-id": requestId };
  for (const name of ["stripe-version", "idempotency-key", "stripe-account"]) {
    const value = request.headers[name];
    if (typeof value === "string") headers[name] = value;
  }
  const slow = faults.take("api-slow");
  if (slow) await pause(slow.ms ?? SLOW_MS);
  if (faults.take("api-down")) return sendJson(response, 503, new ApiError(503, { type: "api_error", message: "The service is not available." }).toJson(), headers);
  const result = attempt(api, { request, url, body, requestId });
  // Done, but the caller never hears of it.
  if (faults.take("cut-response")) return void request.socket.destroy();
  sendJson(response, result.status, result.answer, { ...headers, ...result.headers });
}

type Asked = Pick<Exchange, "request" | "url"> & { body: string; requestId: string };

function attempt(api: Api, asked: Asked): Result {
  try {
    checkKey(asked.request.headers.authorization, api.secretKey);
    checkVersion(asked.request.headers["stripe-version"]);
    return once(api, asked, scopeOf(api, asked.request.headers["stripe-account"]));
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    return { status: error.status, answer: error.toJson() };
  }
}

/** A call with a key is done once; its answer is repeated for a day, also when it was an error that came after the checks. */
function once(api: Api, { request, url, body, requestId }: Asked, scope: Scope): Result {
  const { books } = api;
  const method = request.method ?? "GET";
  const key = method === "POST" ? request.headers["idempotency-key"] : undefined;
  const tell = (drafts: Parameters<Deliveries["publish"]>[0]) => void api.deliveries.publish(drafts, { id: requestId, idempotency_key: typeof key === "string" ? key : null });
  const run = () => {
    if (body !== "" && !FORM_TYPE.test(request.headers["content-type"] ?? "")) throw new ApiError(400, { message: "Send application/x-www-form-urlencoded." });
    const form = readForm(method === "GET" ? url.search.slice(1) : body);
    return answerCall({ books, scope, now: Math.floor(api.now() / 1000), form, pageOf: api.pageOf, tell }, method, url.pathname);
  };
  if (typeof key !== "string") return { status: 200, answer: run() };
  const call = { path: url.pathname, body };
  const earlier = recall(books, key, scope, call, api.now());
  if (earlier) return { status: earlier.status, answer: earlier.answer, headers: { "idempotent-replayed": "true", "original-request": earlier.requestId } };
  const keep = (status: number, answer: unknown): Result => {
    books.keys.put(slotOf(key, scope), { ...call, status, answer, requestId, at: api.now() });
    return { status, answer };
  };
  try {
    return keep(200, run());
  } catch (error) {
    if (error instanceof ApiError && error.kept) return keep(error.status, error.toJson());
    throw error;
  }
}

function checkKey(header: string | undefined, secretKey: string): void {
  const [, scheme = "", credentials = ""] = /^(\w+)\s+(\S+)$/.exec(header ?? "") ?? [];
  const given = /^basic$/i.test(scheme) ? (Buffer.from(credentials, "base64").toString("utf8").split(":")[0] ?? "") : /^bearer$/i.test(scheme) ? credentials : "";
  if (given === "") throw new ApiError(401, { message: "You did not provide an API key. You need to provide your API key in the Authorization header, using Bearer auth (e.g. 'Authorization: Bearer YOUR_SECRET_KEY')." });
  if (given !== secretKey) throw new ApiError(401, { message: `Invalid API Key provided: ${given.slice(0, 8)}${"*".repeat(12)}${given.slice(-4)}` });
}

function checkVersion(version: string | string[] | undefined): void {
  if (version !== undefined && !/^\d{4}-\d{2}-\d{2}(?:\.\w+)?$/.test(String(version))) {
    throw new ApiError(400, { message: `Invalid Stripe API version: ${String(version)}` });
  }
}

function scopeOf({ books }: Api, account: string | string[] | undefined): Scope {
  if (account === undefined) return null;
  if (books.accounts.get(String(account))) return String(account);
  throw new ApiError(403, { code: "account_invalid", message: `The provided key does not have access to account '${String(account)}' (or that account does not exist).` });
}
