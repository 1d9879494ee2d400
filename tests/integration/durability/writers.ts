import { randomUUID } from "node:crypto";
import { eq, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { attempts, outbox, record } from "@/db/schema";
import { sha256Hex } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { writeOnMove } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { SeededMove } from "../../support/factories";

const WRITERS = 6;

/** One step of one writer: who, the how-manieth, and the key under which it may be tried again. */
export type Step = { moveId: string; writer: number; seq: number; key: string };

export const aStep = (moveId: string, writer: number, seq: number): Step => ({ moveId, writer, seq, key: randomUUID() });

const markOf = ({ writer, seq }: Pick<Step, "writer" | "seq">) => `${writer}:${seq}`;

const attemptOf = (step: Step): Attempt => ({ key: step.key, door: "POST /test", bodyHash: sha256Hex(markOf(step)), at: new Date() });

/** Writes one step through the product's own way: an entry in the record and a letter, in one transaction. The same step again is the same write. */
export function take(viewer: Viewer, step: Omit<Step, "key">, attempt: Attempt, beforeCommit = () => undefined): Promise<{ entryId: string }> {
  const { moveId } = step;
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    const mark = markOf(step);
    const entryId = await ctx.append({ kind: "move.changed", detail: { mark } });
    const news = { unit: "ZVRX 2783", caseNumber: "99-1", headline: mark, lines: [], actionLabel: "Look", url: "http://localhost:4999/" };
    await putMail(ctx.tx, { kind: "movement", to: `${step.writer}.${step.seq}@example.test`, payload: news, dedupe: `${moveId}:${mark}`, moveId }, ctx.at);
    beforeCommit();
    return { entryId };
  });
}

const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

/** Keeps at one step until it is answered, always with the same key. */
export async function takeSurely(step: Step, taking: (step: Step) => Promise<unknown>): Promise<Answered> {
  for (let tries = 1; ; tries += 1) {
    try {
      await taking(step);
      return { ...step, tries };
    } catch {
      await pause(20);
    }
  }
}

/** Takes a step by the product's own code in this process. */
export const takeHere = (viewer: Viewer) => (step: Step) => take(viewer, step, attemptOf(step));

/** A step that was answered; only such stand in a journal. */
export type Answered = Step & { tries: number };

/** Six writers that go on until told to stop, while something is killed under them again and again at random moments. */
export async function killUnderWrites(moves: readonly SeededMove[], rounds: number, takerFor: (move: SeededMove) => (step: Step) => Promise<unknown>, killAndStart: () => Promise<void>) {
  const journal: Answered[] = [];
  const recoveries: number[] = [];
  let stop = false;
  const writers = Array.from({ length: WRITERS }, async (_, writer) => {
    const move = moves[writer % moves.length] as SeededMove;
    for (let seq = 1; !stop; seq += 1) journal.push(await takeSurely(aStep(move.moveId, writer, seq), takerFor(move)));
  });
  const answers = async (more: number) => {
    for (const wanted = journal.length + more; journal.length < wanted; ) await pause(2);
  };
  for (let round = 0; round < rounds; round += 1) {
    await answers(5 + Math.floor(Math.random() * 40));
    await killAndStart();
    const back = Date.now();
    await answers(1);
    recoveries.push(Date.now() - back);
  }
  stop = true;
  await Promise.all(writers);
  return { journal, slowestRecoveryMs: Math.max(...recoveries) };
}

/** What a comparison of journal and database found. */
export type Found = { acknowledged: number; lost: number; half: number; doubled: number; brokenChains: number; resolved: number };

/** Compares what writers were told with what the database holds. `resolved` counts answers that came only when tried again. */
export async function compare(moves: readonly Pick<SeededMove, "moveId">[], journal: readonly Answered[]): Promise<Found> {
  const found: Found = { acknowledged: journal.length, lost: 0, half: 0, doubled: 0, brokenChains: 0, resolved: journal.filter(({ tries }) => tries > 1).length };
  for (const { moveId } of moves) {
    const entries = countOf((await db().select({ detail: record.detail }).from(record).where(eq(record.moveId, moveId))).map((row) => String((row.detail as { mark?: string }).mark)));
    const letters = countOf((await db().select({ to: outbox.toAddress }).from(outbox).where(eq(outbox.moveId, moveId))).map((row) => (row.to ?? "").replace("@example.test", "").replace(".", ":")));
    const keys = new Set((await db().select({ key: attempts.key }).from(attempts).where(sql`${attempts.answer} is not null`)).map((row) => row.key));
    for (const step of journal.filter((one) => one.moveId === moveId)) if (!entries.has(markOf(step)) || !letters.has(markOf(step)) || !keys.has(step.key)) found.lost += 1;
    for (const mark of new Set([...entries.keys(), ...letters.keys()])) if (entries.has(mark) !== letters.has(mark)) found.half += 1;
    found.doubled += [...entries.values(), ...letters.values()].filter((count) => count > 1).length;
    if ((await unsafeVerifyRecord(moveId)).brokenAt !== null) found.brokenChains += 1;
  }
  return found;
}

function countOf(marks: string[]): Map<string, number> {
  const counts = new Map<string, number>();
  for (const mark of marks) counts.set(mark, (counts.get(mark) ?? 0) + 1);
  return counts;
}
