import type { Refusal } from "@/lib/errors";
import { REFUSALS } from "@/lib/errors";
import type { Door } from "../rows/doors";
import { isWrite, problemOf, readOf, writeOf, type Answer, type Send } from "./knock";
import type { World } from "./world";

type At = { door: Door; send: Send; world: World; origin: string };
/** One thing that is true of every door it applies to; every sentence that comes back is a fault. */
export type Check = { title: string; applies: (door: Door) => boolean; run: (at: At) => Promise<string[]> };

const isOurs = ({ who }: Door) => who === "signed-in";
const isOursToWrite = (door: Door) => isOurs(door) && isWrite(door);

/** A sentence unless the answer is this refusal, as a problem document. */
function refusedAs(code: Refusal, answer: Answer, what: string): string[] {
  const problem = problemOf(answer);
  const right = answer.status === REFUSALS[code] && problem?.type === `/problems/${code.replaceAll("_", "-")}`;
  return right ? [] : [`${what}: ${answer.status} ${answer.text.slice(0, 160)} instead of ${code}`];
}

const FOREIGN: readonly [string, Record<string, string | null>][] = [
  ["without an origin", { origin: null }],
  ["from another origin", { origin: "https://elsewhere.example" }],
  ["from no origin at all (null)", { origin: "null" }],
  ["from an origin that begins like ours", { origin: "http://localhost.elsewhere.example" }],
  ["from another site, says the browser", { "sec-fetch-site": "cross-site" }],
  ["from a sister site, says the browser", { "sec-fetch-site": "same-site" }],
];

const UNREADABLE: readonly [string, Refusal, { headers?: Record<string, string | null>; body?: string }][] = [
  ["as plain text", "not_json", { headers: { "content-type": "text/plain" } }],
  ["as a form", "not_json", { headers: { "content-type": "application/x-www-form-urlencoded" } }],
  ["as a form in parts", "not_json", { headers: { "content-type": "multipart/form-data; boundary=x" } }],
  ["as nothing in particular", "not_json", { headers: { "content-type": null } }],
  ["of more than 64 KB", "too_large", { body: JSON.stringify({ words: "x".repeat(65 * 1024) }) }],
  ["nested a thousand deep", "bad_input", { body: `{"a":${"[".repeat(1000)}${"]".repeat(1000)}}` }],
  ["that is no JSON", "bad_input", { body: "{words" }],
  ["that is a list", "bad_input", { body: "[]" }],
  ["without a key", "bad_input", { headers: { "idempotency-key": null } }],
  ["with a key that is too short", "bad_input", { headers: { "idempotency-key": "x" } }],
];

/** What somebody might slip in beside the fields of a form. */
const SLIPPED_IN = ["id", "role", "state", "siteAdmin", "viewer", "byUserId", "version_", "constructor", "__proto__"];

async function each<T>(cases: readonly T[], run: (one: T) => Promise<string[]>): Promise<string[]> {
  const faults: string[] = [];
  for (const one of cases) faults.push(...(await run(one)));
  return faults;
}

async function slipsNothingIn({ door, send, world, origin }: At): Promise<string[]> {
  const cookie = await world.stranger();
  const usual = JSON.stringify(door.body?.(world.ids) ?? {}).slice(1, -1);
  const body = `{${[usual, ...SLIPPED_IN.map((key) => `${JSON.stringify(key)}:{"siteAdmin":true}`)].filter(Boolean).join(",")}}`;
  const answer = await send(writeOf(door, world.ids, origin, cookie, { body }));
  const fields = Object.keys(problemOf(answer)?.fields ?? {});
  return [...refusedAs("bad_input", answer, "with more than its fields"), ...SLIPPED_IN.filter((key) => !fields.includes(key)).map((key) => `does not name ${key} as no field of it`)];
}

async function tellsStrangersNothing({ door, send, world, origin }: At): Promise<string[]> {
  const cookie = await world.stranger();
  const ask = (ids: World["ids"]) => send(isWrite(door) ? writeOf(door, ids, origin, cookie) : readOf(door.door, ids, cookie));
  const [theirs, nothing] = [await ask(world.ids), await ask(world.ofNothing)];
  const same = JSON.stringify(problemOf(theirs)) === JSON.stringify(problemOf(nothing));
  return [...refusedAs("not_found", theirs, "for a stranger"), ...(same ? [] : [`tells a stranger's answer (${theirs.text.slice(0, 160)}) from that for nothing (${nothing.text.slice(0, 160)})`])];
}

const BROKEN = ["MOV_%", "..%2F..%2Fetc", "%00", "' or 1=1 --", "1"];

export const CHECKS: readonly Check[] = [
  {
    title: "asks for a session", applies: isOurs,
    run: async ({ door, send, world, origin }) => each([null, "__Host-sid=made-up.c2lnbmF0dXJl", "__Host-sid="], async (cookie) => refusedAs("signed_out", await send(isWrite(door) ? writeOf(door, world.ids, origin, cookie) : readOf(door.door, world.ids, cookie)), `with the cookie ${cookie}`)),
  },
  {
    title: "takes nothing that was not sent from our own pages", applies: isOursToWrite,
    run: async ({ door, send, world, origin }) => {
      const cookie = await world.stranger();
      return each(FOREIGN, async ([what, headers]) => refusedAs("not_from_here", await send(writeOf(door, world.ids, origin, cookie, { headers })), what));
    },
  },
  {
    title: "takes nothing but a JSON object of its size, under a key", applies: isOursToWrite,
    run: async ({ door, send, world, origin }) => {
      const cookie = await world.stranger();
      return each(UNREADABLE, async ([what, code, but]) => refusedAs(code, await send(writeOf(door, world.ids, origin, cookie, but)), what));
    },
  },
  { title: "names what is no field of it", applies: isOursToWrite, run: slipsNothingIn },
  { title: "tells strangers nothing", applies: (door) => isOurs(door) && door.of !== "mine", run: tellsStrangersNothing },
  {
    title: "finds nothing under an id that is none", applies: (door) => isOurs(door) && !isWrite(door) && door.door.includes("["),
    run: async ({ door, send, world }) => {
      const cookie = await world.stranger();
      return each(BROKEN, async (broken) => {
        const path = door.door.replace(/^GET /, "").replaceAll(/\[\w+\]/g, encodeURIComponent(broken));
        return refusedAs("not_found", await send({ method: "GET", path, headers: { cookie } }), `for ${broken}`);
      });
    },
  },
  {
    title: "lets nobody in by a signature that is none", applies: ({ who }) => who !== "signed-in",
    run: async ({ door, send, world, origin }) => each<Record<string, string>>([{}, { "stripe-signature": "t=1,v1=00", "uploadthing-hook": "callback", "x-uploadthing-signature": "hmac-sha256=00" }], async (headers) => {
      const { status, text } = await send(writeOf(door, world.ids, origin, null, { headers }));
      return status >= 400 && status < 500 ? [] : [`${status} ${text.slice(0, 160)} with ${JSON.stringify(headers)}`];
    }),
  },
];
