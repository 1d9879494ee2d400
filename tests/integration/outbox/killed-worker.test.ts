import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, it } from "vitest";
import { lastLines, stopProcess, type Running } from "@/lib/local/processes";
import { startScript } from "@/lib/local/server-program";
import { withDatabase } from "../../support/database";
import { copies, openSink, post, rows } from "./post";

const LETTERS = 30;
const PAIRS_AFTER_SENDING = 5;
const PAIRS_ANYWHERE = 1;

const sink = await openSink();
const database = withDatabase({ SMTP_URL: sink.smtpUrl });
const folder = mkdtempSync(join(tmpdir(), "towfolio-worker-"));
const log = join(folder, "worker.log");
const running = new Set<Running>();

async function start(): Promise<Running> {
  const worker = await startScript(process.cwd(), "lib/local/worker.ts", process.env, log);
  running.add(worker);
  void worker.ended.then(() => running.delete(worker));
  return worker;
}
const startPair = () => Promise.all([start(), start()]);
const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

async function until(what: string, isSo: () => Promise<boolean>): Promise<void> {
  for (const end = Date.now() + 60_000; !(await isSo()); await pause(5)) if (Date.now() > end) throw new Error(`Never came: ${what}. The worker says:\n${lastLines(log, 10)}`);
}

async function kill(...workers: Running[]): Promise<void> {
  for (const { pid } of workers) process.kill(pid, "SIGKILL");
  await Promise.all(workers.map(({ ended }) => ended));
}

const arrivals = async () => (await sink.messages()).length;
const takenNow = async () => (await rows()).filter((row) => row.state === "taken").length;

/** The minute for which a killed worker's row is left alone goes by. */
async function leaseRunsOut(): Promise<void> {
  const root = await database.root();
  await root.query("update outbox set lease_until = utc_timestamp(3) where state = 'taken'");
  await root.end();
}

afterAll(async () => {
  for (const { pid } of running) await stopProcess(pid, 1000);
  await sink.close();
  rmSync(folder, { recursive: true, force: true });
});

it("workers killed between sending and noting, again and again, lose no letter and repeat at most one for each kill, under the same Message-ID", { timeout: 300_000 }, async () => {
  for (let n = 0; n < LETTERS; n += 1) await post(n, `person${n % 6}@example.test`);
  const ids = (await rows()).map((row) => row.messageId);

  for (let n = 0; n < PAIRS_AFTER_SENDING; n += 1) {
    const before = await arrivals();
    // The server has the letters; the workers do not know so yet.
    await sink.fault({ kind: "late-answer", times: 2, ms: 60_000 });
    const pair = await startPair();
    await until("two letters", async () => (await arrivals()) === before + 2);
    expect(await takenNow()).toBe(2);
    await kill(...pair);
    await sink.fault({ kind: "off" });
    await leaseRunsOut();
  }
  for (let n = 0; n < PAIRS_ANYWHERE; n += 1) {
    const before = await arrivals();
    const pair = await startPair();
    await until("a letter", async () => (await arrivals()) > before);
    await kill(...pair);
    await leaseRunsOut();
  }
  const last = await start();
  await until("the last letter", async () => (await rows()).every((row) => row.state === "done"));
  await kill(last);

  const arrived = await sink.messages();
  const byId = copies(arrived);
  expect([...byId.keys()].sort()).toEqual([...ids].sort());
  const repeats = arrived.length - LETTERS;
  expect(repeats).toBeGreaterThanOrEqual(2 * PAIRS_AFTER_SENDING);
  expect(repeats).toBeLessThanOrEqual(2 * (PAIRS_AFTER_SENDING + PAIRS_ANYWHERE));
  for (const same of byId.values()) expect(new Set(same.map(({ envelope, subject, text, html }) => JSON.stringify([envelope, subject, text, html]))).size).toBe(1);
  expect((await rows()).every((row) => row.payload === "" && row.leaseUntil === null)).toBe(true);
});

it("asked to stop, it finishes the letter in hand and ends by itself", { timeout: 90_000 }, async () => {
  await sink.clear();
  await sink.fault({ kind: "late-answer", times: 1, ms: 1500 });
  await post(1000, "last@example.test");
  const { pid, ended } = await start();
  await until("the letter", async () => (await arrivals()) > 0);
  process.kill(pid, "SIGTERM");
  expect(await ended).toBe(0);
  expect((await rows()).at(-1)).toMatchObject({ state: "done", attempts: 1 });
  expect(await arrivals()).toBe(1);
});
