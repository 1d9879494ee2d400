import "server-only";
import { and, asc, eq, isNotNull, lte, or } from "drizzle-orm";
import { db, type Tx } from "@/db/client";
import { outbox } from "@/db/schema";
import { env } from "@/lib/env";
import { newId, sha256Hex } from "@/lib/ids";
import { nextTry } from "./backoff";
import { seal, unseal } from "./seal";
import type { MailPayloads, Payloads, TaskPayloads } from "./types";
import type { MailKind, OutboxKind, TaskKind } from "./vocabulary";

/** How long a worker may hold a row before another takes it over. */
const LEASE_MS = 60_000;
const MAX_ATTEMPTS = 12;

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

export type Taken = { id: string; attempts: number; messageId: string; to: string | null; job: { [K in OutboxKind]: { kind: K; payload: Payloads[K] } }[OutboxKind] };

/** No viewer: the worker's own. Takes the next due row, one per transaction, or null; a row whose lease ran out counts as due. */
export async function unsafeTakeNext(now: Date): Promise<Taken | null> {
  return db().transaction(async (tx) => {
    const due = or(and(eq(outbox.state, "ready"), lte(outbox.runAt, now)), and(eq(outbox.state, "taken"), lte(outbox.leaseUntil, now)));
    const [row] = await tx.select().from(outbox).where(due).orderBy(asc(outbox.runAt), asc(outbox.id)).limit(1).for("update", { skipLocked: true });
    if (!row) return null;
    await tx.update(outbox).set({ state: "taken", leaseUntil: new Date(now.getTime() + LEASE_MS), attempts: row.attempts + 1 }).where(eq(outbox.id, row.id));
    const job = { kind: row.kind, payload: JSON.parse(unseal(row.payload)) } as Taken["job"];
    return { id: row.id, attempts: row.attempts + 1, messageId: row.messageId, to: row.toAddress, job };
  });
}

/** No viewer: the worker's note that it went out. The payload goes with it, since it may hold links. */
export async function unsafeNoteDone(id: string, now: Date): Promise<void> {
  await db().update(outbox).set({ state: "done", doneAt: now, leaseUntil: null, payload: "", lastError: null }).where(eq(outbox.id, id));
}

/** No viewer: the worker's note that it failed; tried again later unless `final`. */
export async function unsafeNoteFailed(taken: Pick<Taken, "id" | "attempts">, reason: string, final: boolean, now: Date): Promise<void> {
  const over = final || taken.attempts >= MAX_ATTEMPTS;
  await db().update(outbox)
    .set({ state: over ? "failed" : "ready", leaseUntil: null, lastError: reason.slice(0, 500), runAt: nextTry(taken.attempts, now) })
    .where(eq(outbox.id, taken.id));
}

/** No viewer: marks all waiting mail as done without sending it. Only for the demo scenario, whose news are old when it is loaded. */
export async function unsafeHoldMail(now: Date): Promise<void> {
  await db().update(outbox).set({ state: "done", doneAt: now, payload: "", lastError: "Not sent: part of the demo scenario" }).where(and(eq(outbox.state, "ready"), isNotNull(outbox.toAddress)));
}
