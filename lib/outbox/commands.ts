import "server-only";
import { and, asc, eq, inArray, isNotNull, isNull, lte, min, or } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { db, type Tx } from "@/db/client";
import { outbox } from "@/db/schema";
import { env } from "@/lib/env";
import { newId, sha256Hex } from "@/lib/ids";
import { givenUp, nextTry } from "./backoff";
import { seal, unseal } from "./seal";
import type { MailPayloads, Payloads, TaskPayloads } from "./types";
import type { MailKind, OutboxKind, TaskKind } from "./vocabulary";

/** How long a worker may hold a row before another takes it over. One that still works on it renews the hold; a killed one can't. */
export const LEASE_MS = 60_000;

type Letter<K extends MailKind> = { kind: K; to: string; payload: MailPayloads[K]; dedupe: string; moveId?: string | null };

/** Puts a message into the outbox of this transaction; the same `dedupe` twice stays one message. */
export async function putMail<K extends MailKind>(tx: Pick<Tx, "insert">, letter: Letter<K>, at: Date): Promise<void> {
  await put(tx, letter.kind, letter.to, letter.payload, letter.dedupe, letter.moveId ?? null, at, at);
}

/** Puts work for the worker into the outbox, to be done from `runAt` on. */
export async function putTask<K extends TaskKind>(tx: Pick<Tx, "insert">, task: { kind: K; payload: TaskPayloads[K]; dedupe: string; moveId?: string | null; runAt?: Date }, at: Date): Promise<void> {
  await put(tx, task.kind, null, task.payload, task.dedupe, task.moveId ?? null, task.runAt ?? at, at);
}

async function put(tx: Pick<Tx, "insert">, kind: OutboxKind, to: string | null, payload: unknown, dedupe: string, moveId: string | null, runAt: Date, at: Date) {
  const id = newId("outbox");
  const host = new URL(env().APP_URL).hostname;
  const row = { id, dedupe: sha256Hex(dedupe), kind, moveId, toAddress: to, payload: seal(JSON.stringify(payload)), messageId: `<${id}@${host}>`, runAt, createdAt: at };
  await tx.insert(outbox).values(row).onDuplicateKeyUpdate({ set: { dedupe: row.dedupe } });
}

/** Mail and tasks are taken apart, so that neither a slow mail server nor a long task holds the other up. */
export type Lane = "mail" | "tasks";

type Row = typeof outbox.$inferSelect;
type Job = { [K in OutboxKind]: { kind: K; payload: Payloads[K] } }[OutboxKind];
export type Taken = { id: string; attempts: number; createdAt: Date; messageId: string; to: string | null; job: Job };

/** No viewer: the worker's own. Takes the next due row (of one lane, or of any), one per transaction, or null. What can't be opened is noted as failed and passed over. */
export async function unsafeTakeNext(now: Date, lane?: Lane): Promise<Taken | null> {
  for (;;) {
    const row = await take(now, lane);
    if (!row) return null;
    const taken = { id: row.id, attempts: row.attempts, createdAt: row.createdAt, messageId: row.messageId, to: row.toAddress };
    const job = opened(row);
    if (job) return { ...taken, job };
    await unsafeNoteFailed(taken, "It can’t be opened: sealed under another AUTH_SECRET, or changed.", true, now);
  }
}

async function take(now: Date, lane: Lane | undefined): Promise<Row | null> {
  return db().transaction(async (tx) => {
    // A row whose lease ran out was a killed worker's and counts as due.
    const due = or(and(eq(outbox.state, "ready"), lte(outbox.runAt, now)), and(eq(outbox.state, "taken"), lte(outbox.leaseUntil, now)));
    const ofLane = lane && (lane === "mail" ? isNotNull(outbox.toAddress) : isNull(outbox.toAddress));
    const [row] = await tx.select().from(outbox).where(and(due, ofLane, firstOfItsRecipient())).orderBy(asc(outbox.runAt), asc(outbox.id)).limit(1).for("update", { skipLocked: true });
    if (!row) return null;
    const attempts = row.attempts + 1;
    await tx.update(outbox).set({ state: "taken", leaseUntil: new Date(now.getTime() + LEASE_MS), attempts }).where(eq(outbox.id, row.id));
    return { ...row, attempts };
  });
}

/** Whoever is written to gets their messages in the order in which things happened, also when the first had to be tried again. */
function firstOfItsRecipient() {
  const open = alias(outbox, "open_mail");
  const firsts = db().select({ id: min(open.id) }).from(open).where(and(inArray(open.state, ["ready", "taken"]), isNotNull(open.toAddress))).groupBy(open.toAddress);
  return or(isNull(outbox.toAddress), inArray(outbox.id, firsts));
}

function opened(row: Row): Job | null {
  try {
    return { kind: row.kind, payload: JSON.parse(unseal(row.payload)) } as Job;
  } catch {
    return null;
  }
}

/** Still ours: neither noted by us nor taken over by another after our lease ran out. */
const held = ({ id, attempts }: Pick<Taken, "id" | "attempts">) => and(eq(outbox.id, id), eq(outbox.state, "taken"), eq(outbox.attempts, attempts));

/** No viewer: the worker still works on it, so that no other takes it over. */
export async function unsafeKeepHold(taken: Pick<Taken, "id" | "attempts">, now: Date): Promise<void> {
  await db().update(outbox).set({ leaseUntil: new Date(now.getTime() + LEASE_MS) }).where(held(taken));
}

/** No viewer: the worker's note that it went out. The payload goes with it, since it may hold links. */
export async function unsafeNoteDone(id: string, now: Date): Promise<void> {
  await db().update(outbox).set({ state: "done", doneAt: now, leaseUntil: null, payload: "", lastError: null }).where(eq(outbox.id, id));
}

/** No viewer: the worker's note that it failed; tried again later unless `final` or tried for days. Says nothing about a row that another has taken over. */
export async function unsafeNoteFailed(taken: Pick<Taken, "id" | "attempts" | "createdAt">, reason: string, final: boolean, now: Date): Promise<void> {
  const over = final || givenUp(taken.createdAt, now);
  await db().update(outbox)
    .set({ state: over ? "failed" : "ready", leaseUntil: null, lastError: reason.slice(0, 500), runAt: nextTry(taken.attempts, now) })
    .where(held(taken));
}

/** No viewer: marks all waiting mail as done without sending it. Only for the demo scenario, whose news are old when it is loaded. */
export async function unsafeHoldMail(now: Date): Promise<void> {
  await db().update(outbox).set({ state: "done", doneAt: now, payload: "", lastError: "Not sent: part of the demo scenario" }).where(and(eq(outbox.state, "ready"), isNotNull(outbox.toAddress)));
}
