import { eq, sql } from "drizzle-orm";
import { afterEach, beforeEach, expect, it } from "vitest";
import { db } from "@/db/client";
import { outbox } from "@/db/schema";
import { putTask, unsafeKeepHold, unsafeNoteDone, unsafeNoteFailed, unsafeTakeNext } from "@/lib/outbox/commands";
import { workOnce, type TaskHandlers } from "@/lib/worker/run";
import { withDatabase } from "../../support/database";
import { freePort } from "../../support/own-database";
import { copies, NO_TASKS, openSink, post, rows, SECRET } from "./post";

const smtpPort = await freePort();
const database = withDatabase({ SMTP_URL: `smtp://127.0.0.1:${smtpPort}` });
let sink: Awaited<ReturnType<typeof openSink>> | undefined;

beforeEach(async () => {
  const root = await database.root();
  await root.query("delete from outbox");
  await root.end();
});
afterEach(async () => {
  await sink?.close();
  sink = undefined;
});

const START = Date.UTC(2026, 10, 24, 12);
const at = (seconds: number) => new Date(START + seconds * 1000);

/** Does whatever is due at a moment. */
async function workAt(seconds: number, tasks = NO_TASKS): Promise<number> {
  for (let done = 0; ; done += 1) if (!(await workOnce(tasks, () => at(seconds)))) return done;
}

it("a mail server that is away for an hour loses nothing: all goes out once, in order for each recipient, soon after it is back", async () => {
  const people = ["a@example.test", "b@example.test", "c@example.test"];
  const HOUR = 3600;
  for (let n = 0; n < 24; n += 1) await post(n, people[n % people.length], at((n * HOUR) / 24));
  let tries = 0;
  for (let now = 0; now <= HOUR; now += 15) tries += await workAt(now);
  const waiting = await rows();
  expect(waiting.map((row) => row.state)).toEqual(Array(24).fill("ready"));
  // Shown to whoever looks after the site; only the first of each recipient is tried.
  expect(waiting[0]).toMatchObject({ lastError: expect.stringMatching(/ECONNREFUSED/), attempts: expect.any(Number) });
  expect(waiting[0]?.attempts).toBeGreaterThan(10);
  expect(waiting.reduce((sum, row) => sum + row.attempts, 0)).toBe(tries);

  sink = await openSink(smtpPort);
  // The longest pause between two tries is five minutes.
  for (let now = HOUR; now <= HOUR + 300; now += 15) await workAt(now);
  const arrived = await sink.messages();
  expect(arrived).toHaveLength(24);
  expect(copies(arrived).size).toBe(24);
  for (const person of people) {
    const numbers = (await sink.messages(person)).map((message) => Number(/ZVRX (\d+)/.exec(message.subject)?.[1]));
    expect(numbers).toEqual([...numbers].sort((one, other) => one - other));
    expect(numbers).toHaveLength(8);
  }
  expect((await rows()).every((row) => row.state === "done")).toBe(true);
});

it("gives up after five days of trying, not after a number of tries", async () => {
  await post(1, undefined, at(0));
  const day = 24 * 3600;
  for (const when of [0, 100, day, 4 * day, 5 * day]) await workAt(when);
  expect((await rows())[0]).toMatchObject({ state: "ready", attempts: 5 });
  await workAt(5 * day + 600);
  expect((await rows())[0]).toMatchObject({ state: "failed", attempts: 6, lastError: expect.stringMatching(/ECONNREFUSED/) });
  expect(await workAt(9 * day)).toBe(0);
});

it("an address that the server refuses for good is failed at once and shown so; the next letters go out", async () => {
  sink = await openSink(smtpPort);
  await sink.fault({ kind: "reject", to: "gone@example.test", times: 1 });
  await post(1, "gone@example.test", at(0));
  await post(2, "gone@example.test", at(0));
  await post(3, "here@example.test", at(0));
  await workAt(0);
  expect((await rows()).map(({ state, attempts, lastError }) => ({ state, attempts, lastError }))).toEqual([
    { state: "failed", attempts: 1, lastError: expect.stringContaining("550") },
    { state: "done", attempts: 1, lastError: null },
    { state: "done", attempts: 1, lastError: null },
  ]);
  expect(await sink.messages()).toHaveLength(2);
});

it("a server that cannot take it now is asked again", async () => {
  sink = await openSink(smtpPort);
  await sink.fault({ kind: "refuse", to: "full@example.test", times: 2 });
  await post(1, "full@example.test", at(0));
  await workAt(0);
  expect((await rows())[0]).toMatchObject({ state: "ready", attempts: 1, lastError: expect.stringContaining("450") });
  expect(await workAt(4)).toBe(0);
  await workAt(5);
  await workAt(20);
  expect((await rows())[0]).toMatchObject({ state: "done", attempts: 3, lastError: null });
  expect(await sink.messages()).toHaveLength(1);
});

it("an answer that is lost after the message was taken makes one more copy, under the same Message-ID", async () => {
  sink = await openSink(smtpPort);
  await sink.fault({ kind: "drop-after-data", times: 1 });
  await post(1, undefined, at(0));
  await workAt(0);
  await workAt(5);
  const arrived = await sink.messages();
  expect(arrived).toHaveLength(2);
  expect(copies(arrived).size).toBe(1);
  expect(arrived[0]?.text).toBe(arrived[1]?.text);
});

it("what waits is sealed, and what went out is empty: the secret of a link is never in the table", async () => {
  sink = await openSink(smtpPort);
  await post(1, undefined, at(0));
  await post(2, "gone@example.test", at(0));
  await sink.fault({ kind: "reject", to: "gone@example.test" });
  const readable = async () => JSON.stringify(await db().execute(sql`select * from outbox`));
  expect(await readable()).not.toContain(SECRET);
  await workAt(0);
  expect(await readable()).not.toContain(SECRET);
  const [sent, failed] = await rows();
  expect(sent).toMatchObject({ state: "done", payload: "" });
  expect(failed?.state).toBe("failed");
  expect((await sink.messages())[0]?.text).toContain(SECRET);
});

it("a row that can't be opened fails alone and holds nobody up", async () => {
  sink = await openSink(smtpPort);
  await post(1, undefined, at(0));
  await post(2, undefined, at(0));
  const [first] = await rows();
  await db().update(outbox).set({ payload: Buffer.from("sealed under another secret, as it were").toString("base64") }).where(eq(outbox.id, first?.id ?? ""));
  await workAt(0);
  expect((await rows()).map((row) => row.state)).toEqual(["failed", "done"]);
  expect(await sink.messages()).toHaveLength(1);
});

it("the same news twice is one letter", async () => {
  await post(1, "a@example.test");
  await post(1, "a@example.test");
  await post(1, "b@example.test");
  expect(await rows()).toHaveLength(2);
});

it("four workers at once send each letter once, and each recipient's in order", async () => {
  sink = await openSink(smtpPort);
  for (let n = 0; n < 30; n += 1) await post(n, `person${n % 5}@example.test`, at(0));
  await Promise.all(Array.from({ length: 4 }, async () => {
    for (let idle = 0; idle < 20; ) {
      if (await workOnce(NO_TASKS, () => at(0))) idle = 0;
      else {
        idle += 1;
        await new Promise((resolve) => setTimeout(resolve, 10));
      }
    }
  }));
  expect(copies(await sink.messages()).size).toBe(30);
  expect(await sink.messages()).toHaveLength(30);
  for (let person = 0; person < 5; person += 1) {
    const numbers = (await sink.messages(`person${person}@example.test`)).map((message) => Number(/ZVRX (\d+)/.exec(message.subject)?.[1]));
    expect(numbers).toEqual([0, 1, 2, 3, 4, 5].map((round) => round * 5 + person));
  }
});

it("a worker that was taken for dead has no say any more: its late failure does not send the letter again", async () => {
  await post(1, undefined, at(0));
  const slow = await unsafeTakeNext(at(0));
  expect(await unsafeTakeNext(at(59))).toBeNull();
  const next = await unsafeTakeNext(at(60));
  if (!slow || !next) throw new Error("nothing taken");
  expect(next).toMatchObject({ id: slow.id, messageId: slow.messageId, attempts: 2 });
  await unsafeNoteFailed(slow, "Timeout", false, at(61));
  expect((await rows())[0]).toMatchObject({ state: "taken", attempts: 2 });
  await unsafeNoteDone(next.id, at(62));
  await unsafeNoteFailed(slow, "Timeout", false, at(63));
  expect((await rows())[0]).toMatchObject({ state: "done", payload: "" });
});

it("a worker that still works on it keeps it", async () => {
  await post(1, undefined, at(0));
  const taken = await unsafeTakeNext(at(0));
  if (!taken) throw new Error("nothing taken");
  await unsafeKeepHold(taken, at(40));
  expect(await unsafeTakeNext(at(90))).toBeNull();
  expect(await unsafeTakeNext(at(100))).toMatchObject({ id: taken.id });
});

it("a task that takes long or fails holds up no mail, and is tried again", async () => {
  sink = await openSink(smtpPort);
  const seen: string[] = [];
  const tasks: TaskHandlers = { ...NO_TASKS, "check-photo": async ({ photoId }) => {
    seen.push(photoId);
    if (seen.length === 1) throw new Error("The file service is away");
  } };
  await putTask(db(), { kind: "check-photo", payload: { photoId: "pho_1" }, dedupe: "photo:1" }, at(0));
  await post(1, undefined, at(1));
  expect(await workOnce(tasks, () => at(2), "mail")).toBe(true);
  expect(await workOnce(tasks, () => at(2), "mail")).toBe(false);
  expect(seen).toEqual([]);
  expect(await workOnce(tasks, () => at(2), "tasks")).toBe(true);
  expect(await workOnce(tasks, () => at(8), "tasks")).toBe(true);
  expect(seen).toEqual(["pho_1", "pho_1"]);
  expect((await db().select({ state: outbox.state }).from(outbox)).map((row) => row.state)).toEqual(["done", "done"]);
});
