import { rmSync } from "node:fs";
import { mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, it } from "vitest";
import { lastLines, stopProcess, type Running } from "@/lib/local/processes";
import { startScript } from "@/lib/local/server-program";
import { withDatabase } from "../../support/database";
import { copies, openSink, post, rows } from "./post";

const LETTERS = 30;
const KILLS_AFTER_SENDING = 10;
const KILLS_ANYWHERE = 4;

const sink = await openSink();
const database = withDatabase({ SMTP_URL: sink.smtpUrl });
const folder = mkdtempSync(join(tmpdir(), "towfolio-worker-"));
const log = join(folder, "worker.log");
let worker: Running | undefined;

const start = async () => (worker = await startScript(process.cwd(), "lib/local/worker.ts", process.env, log));
const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

async function until(what: string, isSo: () => Promise<boolean>): Promise<void> {
  for (const end = Date.now() + 30_000; !(await isSo()); await pause(5)) if (Date.now() > end) throw new Error(`Never came: ${what}. The worker says:\n${lastLines(log, 10)}`);
}

async function kill({ pid, ended }: Running): Promise<void> {
  process.kill(pid, "SIGKILL");
  await ended;
}

/** The minute for which a killed worker's row is left alone goes by. */
async function leaseRunsOut(): Promise<void> {
  const root = await database.root();
  await root.query("update outbox set lease_until = utc_timestamp(3) where state = 'taken'");
  await root.end();
}

afterAll(async () => {
  if (worker) await stopProcess(worker.pid, 1000);
  await sink.close();
  rmSync(folder, { recursive: true, force: true });
});

it("a worker killed between sending and noting, again and again, loses no letter and repeats at most one each time, under the same Message-ID", { timeout: 180_000 }, async () => {
  for (let n = 0; n < LETTERS; n += 1) await post(n, `person${n % 6}@example.test`);
  const ids = (await rows()).map((row) => row.messageId);

  for (let n = 0; n < KILLS_AFTER_SENDING; n += 1) {
    const before = (await sink.messages()).length;
    // The server has the letter; the worker does not know so yet.
    await sink.fault({ kind: "late-answer", times: 1, ms: 20_000 });
    const running = await start();
    await until("a letter", async () => (await sink.messages()).length > before);
    expect((await rows()).filter((row) => row.state === "taken")).toHaveLength(1);
    await kill(running);
    await sink.fault({ kind: "off" });
    await leaseRunsOut();
  }
  for (let n = 0; n < KILLS_ANYWHERE; n += 1) {
    const before = (await sink.messages()).length;
    const running = await start();
    await until("a letter", async () => (await sink.messages()).length > before);
    await pause(n * 7);
    await kill(running);
    await leaseRunsOut();
  }
  await start();
  await until("the last letter", async () => (await rows()).every((row) => row.state === "done"));

  const arrived = await sink.messages();
  const byId = copies(arrived);
  expect([...byId.keys()].sort()).toEqual([...ids].sort());
  const repeats = arrived.length - LETTERS;
  expect(repeats).toBeGreaterThanOrEqual(KILLS_AFTER_SENDING);
  expect(repeats).toBeLessThanOrEqual(KILLS_AFTER_SENDING + KILLS_ANYWHERE);
  for (const same of byId.values()) expect(new Set(same.map(({ envelope, subject, text, html }) => JSON.stringify([envelope, subject, text, html]))).size).toBe(1);
  expect((await rows()).every((row) => row.payload === "" && row.leaseUntil === null)).toBe(true);
});

it("asked to stop, it finishes the letter in hand and ends by itself", { timeout: 60_000 }, async () => {
  if (worker) await kill(worker);
  await sink.clear();
  await sink.fault({ kind: "late-answer", times: 1, ms: 1500 });
  await post(1000, "last@example.test");
  const running = await start();
  await until("the letter", async () => (await sink.messages()).length > 0);
  process.kill(running.pid, "SIGTERM");
  expect(await running.ended).toBe(0);
  expect((await rows()).at(-1)).toMatchObject({ state: "done", attempts: 1 });
  expect(await sink.messages()).toHaveLength(1);
});
