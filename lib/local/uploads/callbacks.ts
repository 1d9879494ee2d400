import type { ServerResponse } from "node:http";
import { join } from "node:path";
import type { Faults } from "../faults";
import { pause, Refusal } from "../http";
import { openShelf, type Shelf } from "../shelf";
import { sign } from "./signing";
import type { StoredFile } from "./storage";

/** What the application registered for the files of one upload. */
type Route = { metadata: unknown; isDev: boolean; callbackUrl: string; callbackSlug: string; awaitServerData: boolean; registeredAt: number };

/** What the application gave back for a file. */
export type Outcome = { serverData: unknown } | { error: string };

// A small file can be here before the application has registered it: its own request runs in the background.
const REGISTRATION_WAIT_MS = 5000;
const RESULT_WAIT_MS = 10_000;
// Outside development the application sends its result before it answers the call, so one that is missing then will not come.
const RESULT_GRACE_MS = 200;
const ANSWER_WAIT_MS = 30_000;
const LATE_MS = 5000;

/** The conversation with the application about files that arrived; registrations of an earlier run are still known. */
export class Callbacks {
  readonly #routes: Shelf<Route>;
  /** The open requests of applications in development, by the files they wait for. */
  readonly #streams = new Map<string, ServerResponse>();
  readonly #waiting = new Map<string, (outcome: Outcome) => void>();

  constructor(folder: string, private readonly apiKey: string, private readonly ownUrl: () => string, private readonly faults: Faults) {
    this.#routes = openShelf(join(folder, "routes"));
  }

  /** POST /route-metadata. In development the application cannot be called, so it keeps this request open and is told there. */
  register(body: Record<string, unknown>, response: ServerResponse): void {
    const { keys, route } = readRegistration(body);
    for (const key of keys) this.#routes.put(key, route);
    if (!route.isDev) return void response.writeHead(200, { "content-type": "application/json" }).end('{"ok":true}');
    response.writeHead(200, { "content-type": "application/x-ndjson" }).flushHeaders();
    for (const key of keys) this.#streams.set(key, response);
    response.on("close", () => keys.forEach((key) => this.#streams.get(key) === response && this.#streams.delete(key)));
  }

  /** POST /callback-result. */
  settle({ fileKey, callbackData, error }: Record<string, unknown>): void {
    if (typeof fileKey !== "string") throw new Refusal(400, "Missing fileKey");
    this.#waiting.get(fileKey)?.(typeof error === "string" ? { error } : { serverData: callbackData ?? null });
  }

  /** Tells the application that a file is here and waits for its answer where it asked for that. */
  async report(file: StoredFile, urls: Record<string, string>): Promise<Outcome> {
    const route = await this.#routeOf(file.key);
    if (!route) return { error: "The upload was never registered" };
    if (this.faults.take("callback-never")) return { serverData: null };
    const late = this.faults.take("callback-late");
    const asking = this.#ask(file, route, urls, late ? (late.ms ?? LATE_MS) : 0);
    // The answer to the sender does not wait then: the page is told that all is well before the application knows.
    return late || !route.awaitServerData ? { serverData: null } : asking;
  }

  /** Tells the application that a file was refused. */
  async reportRefused(key: string, reason: string): Promise<void> {
    const route = this.#routes.get(key);
    if (route) await this.#tell(key, route, "error", { fileKey: key, error: reason });
    this.#endStream(key);
  }

  async #routeOf(key: string): Promise<Route | undefined> {
    for (const end = Date.now() + REGISTRATION_WAIT_MS; !this.#routes.get(key) && Date.now() < end; ) await pause(25);
    return this.#routes.get(key);
  }

  async #ask(file: StoredFile, route: Route, urls: Record<string, string>, afterMs: number): Promise<Outcome> {
    const twice = this.faults.take("callback-twice");
    await pause(afterMs);
    const outcome = await this.#askOnce(file, route, urls);
    if (twice) await this.#askOnce(file, route, urls);
    this.#endStream(file.key);
    return outcome;
  }

  async #askOnce(file: StoredFile, route: Route, urls: Record<string, string>): Promise<Outcome> {
    const result = new Promise<Outcome>((resolve) => this.#waiting.set(file.key, resolve));
    const patience = this.#streams.has(file.key) ? RESULT_WAIT_MS : RESULT_GRACE_MS;
    const told = await this.#tell(file.key, route, "callback", callbackBody(file, route, urls, this.ownUrl()));
    const none = { error: told ? "Failed to run onUploadComplete" : "Failed to deliver the callback" };
    const outcome = told ? await Promise.race([result, pause(patience).then(() => none)]) : none;
    this.#waiting.delete(file.key);
    return outcome;
  }

  async #tell(key: string, route: Route, hook: "callback" | "error", body: unknown): Promise<boolean> {
    const payload = JSON.stringify(body);
    const signature = sign(payload, this.apiKey);
    const stream = this.#streams.get(key);
    if (stream && !stream.destroyed) {
      stream.write(`${JSON.stringify({ payload, signature, hook })}\n`);
      return true;
    }
    const url = new URL(route.callbackUrl);
    url.searchParams.set("slug", route.callbackSlug);
    const headers = { "content-type": "application/json", "uploadthing-hook": hook, "x-uploadthing-signature": signature };
    const call = fetch(url, { method: "POST", headers, body: payload, redirect: "manual", signal: AbortSignal.timeout(ANSWER_WAIT_MS) });
    return call.then(async (answer) => (await answer.body?.cancel(), answer.ok), () => false);
  }

  /** The open request of an application ends with the last of its files. */
  #endStream(key: string): void {
    const stream = this.#streams.get(key);
    this.#streams.delete(key);
    if (stream && ![...this.#streams.values()].includes(stream)) stream.end();
  }
}

function callbackBody(file: StoredFile, route: Route, urls: Record<string, string>, origin: string) {
  const { key, name, size, type, customId, uploadedAt } = file;
  return { status: "uploaded", metadata: route.metadata, origin, file: { key, name, size, type, customId, lastModified: uploadedAt, ...urls } };
}

function readRegistration(body: Record<string, unknown>): { keys: string[]; route: Route } {
  const { fileKeys, metadata, isDev, callbackUrl, callbackSlug, awaitServerData } = body;
  if (!Array.isArray(fileKeys) || !fileKeys.every((key): key is string => typeof key === "string" && /^[\w-]{1,128}$/.test(key))) {
    throw new Refusal(400, "Invalid fileKeys");
  }
  if (typeof callbackUrl !== "string" || !URL.canParse(callbackUrl) || typeof callbackSlug !== "string") throw new Refusal(400, "Invalid callback");
  const route = { metadata: metadata ?? {}, isDev: isDev === true, callbackUrl, callbackSlug, awaitServerData: awaitServerData !== false, registeredAt: Date.now() };
  return { keys: fileKeys, route };
}
