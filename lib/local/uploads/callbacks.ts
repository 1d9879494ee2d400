import type { ServerResponse } from "node:http";
import { join } from "node:path";
import type { Faults } from "../faults";
import { pause, Refusal } from "../http";
import { openShelf } from "../shelf";
import { sign } from "./signing";
import type { StoredFile } from "./storage";

/** What the application registered for the files of one upload. */
type Route = { metadata: unknown; isDev: boolean; callbackUrl: string; callbackSlug: string; awaitServerData: boolean; registeredAt: number };

/** What the application gave back for a file. */
export type Outcome = { serverData: unknown } | { error: string };

/** The conversation with the application about files that arrived. */
export type Callbacks = {
  /** POST /route-metadata. In development the application cannot be called, so it keeps this request open and is told there. */
  register(body: Record<string, unknown>, response: ServerResponse): void;
  /** POST /callback-result. */
  settle(body: Record<string, unknown>): void;
  /** Tells the application that a file is here and waits for its answer where it asked for that. */
  report(file: StoredFile, urls: Record<string, string>): Promise<Outcome>;
  /** Tells the application that a file was refused. */
  reportRefused(key: string, reason: string): Promise<void>;
};

// A small file can be here before the application has registered it: its own request runs in the background.
const REGISTRATION_WAIT_MS = 5000;
const RESULT_WAIT_MS = 10_000;
// Outside development the application sends its result before it answers the call, so one that is missing then will not come.
const RESULT_GRACE_MS = 200;
const LATE_MS = 5000;

/** Opens the registrations that an earlier run left in the folder. */
export function openCallbacks(folder: string, apiKey: string, ownUrl: () => string, faults: Faults): Callbacks {
  const routes = openShelf<Route>(join(folder, "routes"));
  const streams = new Map<string, ServerResponse>();
  const waiting = new Map<string, (outcome: Outcome) => void>();

  async function routeOf(key: string): Promise<Route | undefined> {
    for (const end = Date.now() + REGISTRATION_WAIT_MS; !routes.get(key) && Date.now() < end; ) await pause(25);
    return routes.get(key);
  }

  async function tell(key: string, route: Route, hook: "callback" | "error", body: unknown): Promise<boolean> {
    const payload = JSON.stringify(body);
    const signature = sign(payload, apiKey);
    const stream = streams.get(key);
    if (stream && !stream.destroyed) {
      stream.write(`${JSON.stringify({ payload, signature, hook })}\n`);
      return true;
    }
    const url = new URL(route.callbackUrl);
    url.searchParams.set("slug", route.callbackSlug);
    const headers = { "content-type": "application/json", "uploadthing-hook": hook, "x-uploadthing-signature": signature };
    const call = fetch(url, { method: "POST", headers, body: payload, redirect: "manual", signal: AbortSignal.timeout(30_000) });
    return call.then(async (answer) => (await answer.body?.cancel(), answer.ok), () => false);
  }

  async function askFor(file: StoredFile, route: Route, urls: Record<string, string>): Promise<Outcome> {
    const result = new Promise<Outcome>((resolve) => waiting.set(file.key, resolve));
    const late = (outcome: Outcome, ms: number) => pause(ms).then(() => outcome);
    const streamed = streams.has(file.key);
    const told = await tell(file.key, route, "callback", callbackBody(file, route, urls, ownUrl()));
    const failed = { error: told ? "Failed to run onUploadComplete" : "Failed to deliver the callback" };
    const outcome = told ? await Promise.race([result, late(failed, streamed ? RESULT_WAIT_MS : RESULT_GRACE_MS)]) : failed;
    waiting.delete(file.key);
    return outcome;
  }

  return {
    register(body, response) {
      const { keys, route } = readRegistration(body);
      for (const key of keys) routes.put(key, route);
      if (!route.isDev) return void response.writeHead(200, { "content-type": "application/json" }).end('{"ok":true}');
      response.writeHead(200, { "content-type": "application/x-ndjson" }).flushHeaders();
      for (const key of keys) streams.set(key, response);
      response.on("close", () => keys.forEach((key) => streams.get(key) === response && streams.delete(key)));
    },
    settle(body) {
      const { fileKey, callbackData, error } = body;
      if (typeof fileKey !== "string") throw new Refusal(400, "Missing fileKey");
      waiting.get(fileKey)?.(typeof error === "string" ? { error } : { serverData: callbackData ?? null });
    },
    async report(file, urls) {
      const route = await routeOf(file.key);
      if (!route) return { error: "The upload was never registered" };
      if (faults.take("callback-never")) return { serverData: null };
      const late = faults.take("callback-late");
      const twice = faults.take("callback-twice");
      const run = async () => {
        await pause(late ? (late.ms ?? LATE_MS) : 0);
        const outcome = await askFor(file, route, urls);
        if (twice) await askFor(file, route, urls);
        endStream(streams, file.key);
        return outcome;
      };
      const running = run();
      // The answer to the sender does not wait: the page is told that all is well before the application knows.
      return late || !route.awaitServerData ? { serverData: null } : running;
    },
    async reportRefused(key, reason) {
      const route = routes.get(key);
      if (route) await tell(key, route, "error", { fileKey: key, error: reason });
      endStream(streams, key);
    },
  };
}

function callbackBody(file: StoredFile, route: Route, urls: Record<string, string>, origin: string) {
  const { key, name, size, type, customId, uploadedAt } = file;
  return { status: "uploaded", metadata: route.metadata, origin, file: { key, name, size, type, customId, lastModified: uploadedAt, ...urls } };
}

/** The open request of the application ends with the last of its files. */
function endStream(streams: Map<string, ServerResponse>, key: string): void {
  const stream = streams.get(key);
  streams.delete(key);
  if (stream && ![...streams.values()].includes(stream)) stream.end();
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
