import "server-only";
import { FinalMailError, sendMail } from "@/lib/mail/send";
import { renderMail } from "@/lib/mail/render";
import { unsafeNoteDone, unsafeNoteFailed, unsafeTakeNext, type Taken } from "@/lib/outbox/commands";
import { MAIL_KINDS, type MailKind, type TaskKind } from "@/lib/outbox/vocabulary";
import type { MailPayloads, TaskPayloads } from "@/lib/outbox/types";

export type TaskHandlers = { [K in TaskKind]: (payload: TaskPayloads[K], now: Date) => Promise<void> };

/** Something that is looked at from time to time, whether or not the outbox holds anything. */
export type Round = { name: string; everySeconds: number; run: (now: Date) => Promise<void> };

export type WorkerParts = { tasks: TaskHandlers; rounds: Round[] };

const IDLE_MS = 400;
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

/** Takes one due row of the outbox, does it, and notes the outcome. False when nothing is due. */
export async function workOnce(tasks: TaskHandlers, now = new Date()): Promise<boolean> {
  const taken = await unsafeTakeNext(now);
  if (!taken) return false;
  try {
    await deliver(taken, tasks, now);
  } catch (error) {
    await unsafeNoteFailed(taken, error instanceof Error ? error.message : String(error), error instanceof FinalMailError, new Date());
    return true;
  }
  await unsafeNoteDone(taken.id, new Date());
  return true;
}

const pause = (ms: number, stop: AbortSignal) =>
  new Promise<void>((resolve) => {
    const timer = setTimeout(resolve, ms);
    stop.addEventListener("abort", () => { clearTimeout(timer); resolve(); }, { once: true });
  });

/** Works until told to stop; what is being sent is finished first. A database that is away is waited for. */
export async function runWorker({ tasks, rounds }: WorkerParts, stop: AbortSignal): Promise<void> {
  const due = new Map(rounds.map((round) => [round.name, 0]));
  while (!stop.aborted) {
    try {
      const now = new Date();
      for (const round of rounds) {
        if (stop.aborted || now.getTime() < (due.get(round.name) ?? 0)) continue;
        due.set(round.name, now.getTime() + round.everySeconds * 1000);
        await round.run(now);
      }
      if (!stop.aborted && !(await workOnce(tasks))) await pause(IDLE_MS, stop);
    } catch (error) {
      console.error("worker", error instanceof Error ? error.message : error);
      await pause(2000, stop);
    }
  }
}
