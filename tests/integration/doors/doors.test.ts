// First, since it readies what `headers()` of the web server stands on.
import { aRequest, ask, sessionCookie } from "../../support/asking";
import { eq } from "drizzle-orm";
import { beforeAll, expect, it } from "vitest";
import { z } from "zod";
import { db } from "@/db/client";
import { attempts, limitCounters, sessions, siteLog, users } from "@/db/schema";
import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { sending } from "@/lib/entry/sending";
import { newId } from "@/lib/ids";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import { unsafeCountTry } from "@/lib/viewer/commands";
import { LIMITS } from "@/lib/viewer/limits";
import { withDatabase } from "../../support/database";
import { seedUser } from "../../support/factories";
import { expectConsoleError } from "../../support/fail-on-console-error";

const database = withDatabase();
const PATH = "/api/v1/test";

/** A door that writes one line into the site's log, through the one way to write. */
const input = z.strictObject({ word: z.string("Enter a word.").max(20, "At most 20 characters."), moveId: z.string().optional() });
const door = command(input, (viewer, given, attempt) =>
  write(viewer, attempt, async (tx) => {
    await appendSiteLog(tx, { kind: "test", byUserId: viewer.userId, detail: given }, attempt.at);
    return given;
  }));

let userId: string;
let cookie: string;
beforeAll(async () => {
  userId = await seedUser();
  cookie = await sessionCookie(userId);
});

const written = async (by = userId) => (await db().select({ detail: siteLog.detail }).from(siteLog).where(eq(siteLog.byUserId, by))).map((row) => row.detail);

/** Status and problem type of an answer. */
async function told(response: Response): Promise<string> {
  const body = (await response.json()) as { type?: string };
  return [response.status, body.type?.replace("/problems/", "")].filter(Boolean).join(" ");
}

const sent = (given: Parameters<typeof aRequest>[1] = {}) => ask(door, aRequest(PATH, { cookie, body: { word: "x" }, ...given }));

it("answers a sound write, once for each key", async () => {
  const key = crypto.randomUUID();
  const answers = await Promise.all(Array.from({ length: 20 }, () => sent({ key, body: { word: "twenty" } })));
  for (const answer of answers) expect(await answer.json()).toEqual({ word: "twenty" });
  expect(await written()).toEqual([{ word: "twenty" }]);
  expect(await told(await sent({ key, body: { word: "other" } }))).toBe("422 key-reused");
  expect(await told(await ask(door, aRequest(`${PATH}/other`, { cookie, key, body: { word: "twenty" } })))).toBe("422 key-reused");
  expect(await written()).toHaveLength(1);
});

it("a key belongs to one person: another's same key is a write of its own", async () => {
  const key = crypto.randomUUID();
  const otherId = await seedUser();
  const other = await sessionCookie(otherId);
  expect((await sent({ key, body: { word: "mine" } })).status).toBe(200);
  expect((await sent({ key, body: { word: "theirs" }, cookie: other })).status).toBe(200);
  expect(await written(otherId)).toEqual([{ word: "theirs" }]);
});

it.each([
  ["none", null], ["an empty one", ""], ["seven signs", "1234567"], ["81 signs", "a".repeat(81)], ["a space", "12345678 9"], ["a slash", "1234/5678"], ["a quote", "12345678'"], ["a dot", "1234.5678"], ["two keys", "12345678, 87654321"], ["a letter of another script", "12345678\u00e9"],
])("a key that is none is refused: %s", async (_, key) => {
  const response = await sent({ key });
  const body = (await response.json()) as Record<string, unknown>;
  expect(body).toMatchObject({ status: 422, type: "/problems/bad-input", fields: { "idempotency-key": [expect.any(String)] } });
});

it.each(["12345678", "a".repeat(80), "abc_DEF-123", "0b9c3f0e-6a3e-4c8e-9b1a-000000000001"])("a key of 8 to 80 letters, digits and dashes is taken: %s", async (key) => {
  expect((await sent({ key })).status).toBe(200);
});

it.each([
  ["no origin", { headers: { origin: null } }, "403 not-from-here"],
  ["the origin null", { headers: { origin: "null" } }, "403 not-from-here"],
  ["another origin", { headers: { origin: "https://elsewhere.example" } }, "403 not-from-here"],
  ["cross-site", { headers: { "sec-fetch-site": "cross-site" } }, "403 not-from-here"],
  ["same-site", { headers: { "sec-fetch-site": "same-site" } }, "403 not-from-here"],
  ["text/plain", { headers: { "content-type": "text/plain" } }, "415 not-json"],
  ["form fields", { headers: { "content-type": "application/x-www-form-urlencoded" }, text: "word=x" }, "415 not-json"],
  ["a body too large", { text: JSON.stringify({ word: "x".repeat(70_000) }) }, "413 too-large"],
  ["a body too deep", { text: "[".repeat(40_000) }, "422 bad-input"],
  ["half a body", { text: '{"word":' }, "422 bad-input"],
  ["a list", { text: "[]" }, "422 bad-input"],
  ["no word", { body: {} }, "422 bad-input"],
  ["a strange field", { body: { word: "x", siteAdmin: true } }, "422 bad-input"],
  ["a field named constructor", { body: { word: "x", constructor: 1 } }, "422 bad-input"],
  ["an object for a word", { body: { word: { gt: "" } } }, "422 bad-input"],
  ["a stranger's cookie", { cookie: "__Host-sid=forged.c2lnbmF0dXJl" }, "401 signed-out"],
  ["no cookie", { cookie: "" }, "401 signed-out"],
])("with %s nothing is written", async (_, given, answer) => {
  const before = await written();
  expect(await told(await sent(given as Parameters<typeof sent>[0]))).toBe(answer);
  expect(await written()).toEqual(before);
});

it("a key named __proto__ changes nothing but the answer", async () => {
  const text = '{"word":"x","__proto__":{"siteAdmin":true},"__proto__":{"word":"y"}}';
  expect([200, 422]).toContain((await sent({ text })).status);
  expect(({} as Record<string, unknown>).siteAdmin).toBeUndefined();
  expect(JSON.stringify(await written())).not.toContain("siteAdmin");
});

it("what stands in the path wins over the body", async () => {
  const response = await ask(door, aRequest(PATH, { cookie, body: { word: "x", moveId: "mov_body" } }), { moveId: "mov_path" });
  expect(await response.json()).toEqual({ word: "x", moveId: "mov_path" });
});

it("every word of the form that is wrong is named at once", async () => {
  const response = await sent({ body: { word: "x".repeat(21), role: "owner" } });
  expect(await response.json()).toMatchObject({ fields: { word: ["At most 20 characters."], role: ["Not a field of this form."] } });
});

it("ended sessions, disabled people and unchecked addresses are refused at the next request", async () => {
  const id = await seedUser();
  const theirs = await sessionCookie(id);
  const asked = async () => told(await sent({ cookie: theirs }));
  expect(await asked()).toBe("200");
  await db().update(users).set({ emailVerified: false }).where(eq(users.id, id));
  expect(await asked()).toBe("403 address-unchecked");
  await db().update(users).set({ emailVerified: true, disabledAt: new Date() }).where(eq(users.id, id));
  expect(await asked()).toBe("401 signed-out");
  await db().update(users).set({ disabledAt: null }).where(eq(users.id, id));
  expect(await asked()).toBe("200");
  await db().delete(sessions).where(eq(sessions.userId, id));
  expect(await asked()).toBe("401 signed-out");
});

it("the write limit counts exactly, however many come at once, and says how long to wait", async () => {
  const id = await seedUser();
  const theirs = await sessionCookie(id);
  const now = new Date();
  const { max } = LIMITS["write-account"];
  for (let n = 0; n < max - 10; n += 50) await Promise.all(Array.from({ length: Math.min(50, max - 10 - n) }, () => unsafeCountTry("write-account", id, now)));
  const answers = await Promise.all(Array.from({ length: 50 }, () => sent({ cookie: theirs })));
  expect(answers.filter((answer) => answer.status === 200)).toHaveLength(10);
  const refused = answers.filter((answer) => answer.status === 429);
  expect(refused).toHaveLength(40);
  for (const answer of refused) expect(Number(answer.headers.get("retry-after"))).toBeGreaterThan(0);
  expect(await written(id)).toHaveLength(10);
});

it("when the counting fails, the write is refused rather than let through", async () => {
  const root = await database.root();
  await root.query("rename table limit_counters to limit_counters_away");
  expectConsoleError(/^unexpected urn:uuid:/);
  expect(await told(await sent())).toBe("500 unexpected");
  await root.query("rename table limit_counters_away to limit_counters");
  await root.end();
  expect((await sent()).status).toBe(200);
  expect((await db().select({ count: limitCounters.count }).from(limitCounters)).length).toBeGreaterThan(0);
});

it("a fault of ours is told without detail, leaves nothing behind and frees the key", async () => {
  let broken = true;
  const fragile = command(input, (viewer, given, attempt) =>
    write(viewer, attempt, async (tx) => {
      await appendSiteLog(tx, { kind: "test", byUserId: viewer.userId, detail: given }, attempt.at);
      if (broken) throw new Error("secret words of the inside");
      return given;
    }));
  const key = crypto.randomUUID();
  const before = (await written()).length;
  const asked = () => ask(fragile, aRequest(PATH, { cookie, key, body: { word: "again" } }));
  expectConsoleError(/^unexpected urn:uuid:[^]*secret words/);
  const response = await asked();
  expect(response.status).toBe(500);
  expect(await response.text()).not.toContain("secret");
  expect(await written()).toHaveLength(before);
  expect(await db().select().from(attempts).where(eq(attempts.key, key))).toEqual([]);
  broken = false;
  expect((await asked()).status).toBe(200);
  expect(await written()).toHaveLength(before + 1);
});

it("a read answers whoever is signed in, and a path that holds no id of ours is not found", async () => {
  const reading = route((viewer, params: Record<string, string>) => Promise.resolve({ of: viewer.userId, params }));
  const asked = (id: string, given: string | undefined = cookie) => ask(reading, aRequest(PATH, { method: "GET", ...(given && { cookie: given }) }), { moveId: id });
  const id = newId("move");
  const answer = await asked(id);
  expect(answer.headers.get("cache-control")).toBe("private, no-store");
  expect(await answer.json()).toEqual({ of: userId, params: { moveId: id } });
  for (const strange of ["", "1", "../../etc/passwd", `${id}'`, id.toUpperCase(), `${id}\n`, "mov_%00", "__proto__"]) expect(await told(await asked(strange))).toBe("404 not-found");
  expect(await told(await asked(id, "__Host-sid=forged"))).toBe("401 signed-out");
});

it("the door of the upload library asks the same of a page, and tells in its own form", async () => {
  const uploading = sending((_request, viewer) => Promise.resolve(Response.json({ by: viewer?.userId ?? null })));
  const asked = async (given: Parameters<typeof aRequest>[1]) => {
    const response = await ask(uploading, aRequest(PATH, { cookie, ...given }));
    return { status: response.status, body: (await response.json()) as Record<string, unknown> };
  };
  expect(await asked({})).toEqual({ status: 200, body: { by: userId } });
  expect(await asked({ headers: { origin: "https://elsewhere.example" } })).toEqual({ status: 403, body: { message: expect.any(String) } });
  expect((await asked({ cookie: "" })).status).toBe(401);
  expect((await asked({ text: " ".repeat(65 * 1024) })).status).toBe(413);
  const broken = sending(() => Promise.reject(new Error("secret words of the inside")));
  expectConsoleError(/^unexpected urn:uuid:/);
  const failed = await ask(broken, aRequest(PATH, { cookie }));
  expect([failed.status, await failed.text()]).toEqual([500, expect.not.stringContaining("secret")]);
});
