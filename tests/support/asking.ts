import "next/dist/server/node-environment-baseline";
import { workAsyncStorage, type WorkStore } from "next/dist/server/app-render/work-async-storage.external";
import { workUnitAsyncStorage, type WorkUnitStore } from "next/dist/server/app-render/work-unit-async-storage.external";
import { ResponseCookies } from "next/dist/server/web/spec-extension/cookies";
import { auth } from "@/lib/auth";

type Door = (request: Request, context: { params: Promise<Record<string, string>> }) => Promise<Response>;

/** Calls a door with a request, and lets `headers()` see that request's headers, as the web server does. */
export function ask(door: Door, request: Request, params: Record<string, string> = {}): Promise<Response> {
  const work = { route: "/test" } as WorkStore;
  const cookies = new ResponseCookies(new Headers());
  const unit = { type: "request", phase: "action", headers: request.headers, cookies, mutableCookies: cookies, userspaceMutableCookies: cookies } as unknown as WorkUnitStore;
  return workAsyncStorage.run(work, () => workUnitAsyncStorage.run(unit, () => door(request, { params: Promise.resolve(params) })));
}

/** The cookie of a new session of a person. */
export async function sessionCookie(userId: string): Promise<string> {
  const { headers } = await auth().api.signInProven({ body: { userId }, returnHeaders: true });
  return headers.getSetCookie().map((cookie) => cookie.split(";")[0]).join("; ");
}

type Asked = { cookie?: string; key?: string | null; body?: unknown; text?: string; headers?: Record<string, string | null>; method?: string };

/** A write as our own pages send it; what is given replaces or (null) leaves out. */
export function aRequest(path: string, { cookie, key = crypto.randomUUID(), body = {}, text, headers = {}, method = "POST" }: Asked = {}): Request {
  const all: Record<string, string | null | undefined> = { "content-type": "application/json", origin: process.env.APP_URL, "sec-fetch-site": "same-origin", "idempotency-key": key, cookie, ...headers };
  const sent = Object.entries(all).filter((entry): entry is [string, string] => typeof entry[1] === "string");
  return new Request(`${process.env.APP_URL}${path}`, { method, headers: sent, ...(method !== "GET" && { body: text ?? JSON.stringify(body) }) });
}
