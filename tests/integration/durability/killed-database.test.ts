// First, since it readies what `headers()` of the web server stands on.
import { aRequest, ask, sessionCookie } from "../../support/asking";
import { afterAll, beforeAll, expect, it } from "vitest";
import { z } from "zod";
import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { workOnce } from "@/lib/worker/run";
import { seedMove } from "../../support/factories";
import { expectConsoleError } from "../../support/fail-on-console-error";
import { openOwnDatabase, type OwnDatabase } from "../../support/own-database";
import { NO_TASKS, openSink, rows } from "../outbox/post";
import { aStep, compare, killUnderWrites, take, takeHere, takeSurely } from "./writers";

const sink = await openSink();
let database: OwnDatabase;
beforeAll(async () => void (database = await openOwnDatabase({ SMTP_URL: sink.smtpUrl })));
afterAll(async () => {
  await database.close();
  await sink.close();
});

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));
const seedMoves = () => Promise.all([seedMove(), seedMove(), seedMove()]);

it("mariadbd killed under writes, eight times: nothing acknowledged is lost, nothing is half there, nothing doubled, and the application recovers by itself", { timeout: 120_000 }, async () => {
  const moves = await seedMoves();
  const { journal, slowestRecoveryMs } = await killUnderWrites(moves, 8, ({ owner }) => takeHere(owner), async () => {
    await database.kill();
    await database.start();
  });
  const found = await compare(moves, journal);
  console.log(JSON.stringify({ test: "killed database", ...found, slowestRecoveryMs }));
  expect(found).toMatchObject({ lost: 0, half: 0, doubled: 0, brokenChains: 0 });
  // Each kill cut somebody off in the middle; what became of that step was found out by its key.
  expect(found.resolved).toBeGreaterThanOrEqual(8);
  expect(slowestRecoveryMs).toBeLessThan(10_000);
});

it("the same harness sees the losses of a server that does not write through", { timeout: 120_000 }, async () => {
  const moves = await seedMoves();
  const careless = async () => {
    await database.asRoot("set global innodb_flush_log_at_trx_commit = 0");
    await database.asRoot("set global innodb_flush_log_at_timeout = 600");
  };
  await careless();
  const { journal } = await killUnderWrites(moves, 4, ({ owner }) => takeHere(owner), async () => {
    await database.kill();
    await database.start();
    await careless();
  });
  const found = await compare(moves, journal);
  console.log(JSON.stringify({ test: "killed database, control", ...found }));
  expect(found.lost).toBeGreaterThan(0);
  await database.kill();
  await database.start();
});

it("while the database is away every door answers 503 at once, and works again without being restarted", { timeout: 60_000 }, async () => {
  const { owner, moveId } = await seedMove();
  const cookie = await sessionCookie(owner.userId);
  const write = command(z.strictObject({}), (viewer, _input, attempt) => take(viewer, aStep(moveId, 0, 0), attempt));
  const read = route(() => Promise.resolve({ fine: true }));
  const one = (n: number) => (n % 2 ? ask(write, aRequest("/api/v1/test", { cookie })) : ask(read, aRequest("/api/v1/test", { cookie, method: "GET" })));
  const forty = () => Promise.all(Array.from({ length: 40 }, (_, n) => one(n)));
  expect(new Set((await forty()).map((answer) => answer.status))).toEqual(new Set([200]));

  await database.kill();
  // The sign-in library tells the log as well.
  expectConsoleError(/INTERNAL_SERVER_ERROR/);
  for (let round = 0; round < 3; round += 1) {
    const began = Date.now();
    const answers = await forty();
    expect(Date.now() - began).toBeLessThan(3000);
    for (const answer of answers) expect([answer.status, answer.headers.get("retry-after")]).toEqual([503, "3"]);
    expect(await answers[0]?.json()).toMatchObject({ type: "/problems/busy", status: 503, title: expect.stringContaining("Try again") });
  }
  await database.start();
  expect(new Set((await forty()).map((answer) => answer.status))).toEqual(new Set([200]));
});

it("a database that dies in the middle of requests leaves none of them hanging", { timeout: 60_000 }, async () => {
  const { owner, moveId } = await seedMove();
  const settled = Array.from({ length: 60 }, (_, n) => takeHere(owner)(aStep(moveId, 1, n)).then(() => "done", () => "refused"));
  await Promise.any(settled);
  await database.kill();
  const began = Date.now();
  const answers = await Promise.all(settled);
  expect(Date.now() - began).toBeLessThan(3000);
  expect(answers).toContain("refused");
  await database.start();
});

it("the worker waits for a database that is away between sending and noting: the letter goes out once", { timeout: 60_000 }, async () => {
  const { owner, moveId } = await seedMove();
  await database.asRoot("delete from outbox");
  await takeSurely(aStep(moveId, 9, 1), takeHere(owner));
  await sink.fault({ kind: "late-answer", times: 1, ms: 800 });
  const working = workOnce(NO_TASKS);
  while ((await sink.messages()).length === 0) await pause(5);
  await database.kill();
  await pause(1000);
  await database.start();
  expect(await working).toBe(true);
  expect(await workOnce(NO_TASKS)).toBe(false);
  expect(await sink.messages()).toHaveLength(1);
  expect((await rows()).at(-1)).toMatchObject({ state: "done", attempts: 1, payload: "" });
});
