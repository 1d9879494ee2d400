// First, since it readies what `headers()` of the web server stands on.
import { sessionCookie } from "../../support/asking";
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, expect, it } from "vitest";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { record } from "@/db/schema";
import { lastLines, stopProcess, type Running } from "@/lib/local/processes";
import { startScript } from "@/lib/local/server-program";
import { withDatabase } from "../../support/database";
import { seedMove, type SeededMove } from "../../support/factories";
import { freePort } from "../../support/own-database";
import { aStep, compare, killUnderWrites, type Step } from "./writers";

withDatabase();
const port = await freePort();
const folder = mkdtempSync(join(tmpdir(), "towfolio-door-"));
const log = join(folder, "server.log");
let server: Running | undefined;

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

async function start(die = ""): Promise<void> {
  const begun = await startScript(process.cwd(), "tests/integration/durability/door-server.ts", { ...process.env, PORT: String(port), DIE: die }, log);
  server = begun;
  for (const end = Date.now() + 60_000; ; await pause(20)) {
    const answer = await fetch(`http://127.0.0.1:${port}/`, { method: "POST" }).catch(() => null);
    if (answer) return;
    if (Date.now() > end) throw new Error(`The server does not answer:\n${lastLines(log, 10)}`);
  }
}

async function kill(): Promise<void> {
  if (!server) return;
  process.kill(server.pid, "SIGKILL");
  await server.ended;
  server = undefined;
}

afterAll(async () => {
  if (server) await stopProcess(server.pid, 1000);
  rmSync(folder, { recursive: true, force: true });
});

const cookies = new Map<string, string>();

/** Sends a step as one of our pages does; throws unless it is answered as done. */
const send = ({ owner }: SeededMove) => async ({ key, ...step }: Step): Promise<unknown> => {
  const response = await fetch(`http://127.0.0.1:${port}/api/v1/test`, {
    method: "POST", body: JSON.stringify(step),
    headers: { "content-type": "application/json", origin: process.env.APP_URL ?? "", "idempotency-key": key, cookie: cookies.get(owner.userId) ?? "" },
  });
  const body: unknown = await response.json();
  if (response.status !== 200) throw new Error(`${response.status} ${JSON.stringify(body)}`);
  return body;
};

async function seedSignedIn(): Promise<SeededMove> {
  const move = await seedMove();
  cookies.set(move.owner.userId, await sessionCookie(move.owner.userId));
  return move;
}

const entriesOf = async (moveId: string) => (await db().select({ id: record.id }).from(record).where(eq(record.moveId, moveId))).map((row) => row.id);

it.each([
  ["before the answer", 1],
  ["before the commit", 0],
])("a server killed %s: the same key again gets the one answer, and nothing is written twice", { timeout: 120_000 }, async (moment, written) => {
  const move = await seedSignedIn();
  const step = aStep(move.moveId, 0, 1);
  await start(moment);
  await expect(send(move)(step)).rejects.toThrow("fetch failed");
  await server?.ended;
  const first = await entriesOf(move.moveId);
  expect(first).toHaveLength(written);

  await start();
  const answer = await send(move)(step);
  expect(await send(move)(step)).toEqual(answer);
  const entries = await entriesOf(move.moveId);
  expect(entries).toHaveLength(1);
  expect(answer).toEqual({ entryId: entries[0] });
  if (written === 1) expect(entries).toEqual(first);
  await expect(send(move)({ ...step, seq: 2 })).rejects.toThrow("422");
  await kill();
});

it("a server killed under writes, five times: nothing acknowledged is lost, nothing half there, nothing doubled", { timeout: 180_000 }, async () => {
  const moves = [await seedSignedIn(), await seedSignedIn(), await seedSignedIn()];
  await start();
  const { journal } = await killUnderWrites(moves, 5, send, async () => {
    await kill();
    await start();
  });
  const found = await compare(moves, journal);
  console.log(JSON.stringify({ test: "killed server", ...found }));
  expect(found).toMatchObject({ lost: 0, half: 0, doubled: 0, brokenChains: 0 });
  expect(found.resolved).toBeGreaterThanOrEqual(5);
});
