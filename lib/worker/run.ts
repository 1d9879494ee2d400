import "server-only";
import { setTimeout as sleep } from "node:timers/promises";
import { FinalMailError, sendMail } from "@/lib/mail/send";
import { renderMail } from "@/lib/mail/render";
import { LEASE_MS, unsafeKeepHold, unsafeNoteDone, unsafeNoteFailed, unsafeTakeNext, type Lane, type Taken } from "@/lib/outbox/commands";
import { MAIL_KINDS, type MailKind, type TaskKind } from "@/lib/outbox/vocabulary";
import type { MailPayloads, TaskPayloads } from "@/lib/outbox/types";

export type TaskHandlers = { [K in TaskKind]: (payload: TaskPayloads[K], now: Date) => Promise<void> };

/** Something that is looked at from time to time, whether or not the outbox holds anything. */
export type Round = { name: string; everySeconds: number; run: (now: Date) => Promise<void> };

export type WorkerParts = { tasks: TaskHandlers; rounds: Round[] };

type Clock = () => Date;

const IDLE_MS = 400;
const NOTE_AGAIN_MS = 500;
const realTime: Clock = () => new Date();
const isMail = (kind: string): kind is MailKind => (MAIL_KINDS as readonly string[]).includes(kind);

async function deliver(taken: Taken, tasks: TaskHandlers, now: Date): Promise<void> {
  const { kind, payload } = taken.job;
  if (!isMail(kind)) {
    const handle = tasks[kind] as (payload: unknown, now: Date) => Promise<void>;
    return handle(payload, now);
  }
  if (!taken.to) throw new FinalMailError("no address");
  await sendMail({ to: taken.to, messageId: taken.messageId, ...(await renderMail(kind, payload as MailPayloads[typeof kind])) });
}

/** Takes one due row of the outbox (of one lane, or of any), does it, and notes the outcome. False when nothing is due. */
export async function workOnce(tasks: TaskHandlers, clock: Clock = realTime, lane?: Lane): Promise<boolean> {
  const taken = await unsafeTakeNext(clock(), lane);
  if (!taken) return false;
  const holding = setInterval(() => void unsafeKeepHold(taken, clock()).catch(() => undefined), LEASE_MS / 3);
  try {
    const fault = await deliver(taken, tasks, clock()).then(() => null, (error: unknown) => ({ error }));
    await noteFirmly(() => (fault ? noteFault(taken, fault.error, clock()) : unsafeNoteDone(taken.id, clock())));
  } finally {
    clearInterval(holding);
  }
  return true;
}

const noteFault = (taken: Taken, error: unknown, now: Date) => unsafeNoteFailed(taken, error instanceof Error ? error.message : String(error), error instanceof FinalMailError, now);

/** A mail whose note is lost goes out twice, so a database that is away for a moment is waited for, as long as the row is ours. */
async function noteFirmly(note: () => Promise<void>): Promise<void> {
  for (const end = Date.now() + LEASE_MS; ; ) {
    try {
      return await note();
    } catch (error) {
      if (Date.now() > end) throw error;
      await sleep(NOTE_AGAIN_MS);
    }
  }
}

/** Ends early when told to stop, and leaves nothing hanging on the signal. */
const pause = (ms: number, stop: AbortSignal) => sleep(ms, undefined, { signal: stop }).catch(() => undefined);

async function keepAt(once: () => Promise<boolean>, stop: AbortSignal): Promise<void> {
  while (!stop.aborted) {
    try {
      if (!(await once())) await pause(IDLE_MS, stop);
    } catch (error) {
      console.error("worker", error instanceof Error ? error.message : error);
      await pause(2000, stop);
    }
  }
}

/** Works until told to stop; what is being sent is finished first. A database that is away is waited for. */
export async function runWorker({ tasks, rounds }: WorkerParts, stop: AbortSignal): Promise<void> {
  const due = new Map(rounds.map((round) => [round.name, 0]));
  const lookAround = async () => {
    const now = new Date();
    for (const round of rounds) {
      if (stop.aborted || now.getTime() < (due.get(round.name) ?? 0)) continue;
      due.set(round.name, now.getTime() + round.everySeconds * 1000);
      await round.run(now);
    }
  };
  await Promise.all([
    keepAt(() => workOnce(tasks, realTime, "mail"), stop),
    keepAt(async () => {
      await lookAround();
      return !stop.aborted && workOnce(tasks, realTime, "tasks");
    }, stop),
  ]);
}
