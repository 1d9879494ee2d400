import Stripe from "stripe";
import type { Faults } from "../faults";
import { pause } from "../http";
import { timeId } from "../shelf";
import { type Attempt, type Books, type EventRecord, newId } from "./books";
import type { Draft } from "./money";

/** Who asked for the change that an event tells. */
export type Origin = { id: string | null; idempotency_key: string | null };

/** The way of events to the application. */
export type Deliveries = {
  /** Keeps the events of one change and hands them over; resolves when each was tried once, or at once when that comes later. */
  publish(drafts: readonly Draft[], origin: Origin): Promise<void>;
  /** Hands one event over now, whatever happened to it before; `timestamp` is the second it is signed for. */
  deliver(record: EventRecord, timestamp?: number): Promise<Attempt>;
  close(): void;
};

/** The pauses between the tries of one event. */
export const RETRY_DELAYS_MS: readonly number[] = [1000, 3000, 10_000, 30_000, 120_000];

const LATE_MS = 5000;
const HELD_MS = 3000;
const ANSWER_WAIT_MS = 10_000;

type Setting = { books: Books; faults: Faults; webhookUrl: string; webhookSecret: string; retryDelaysMs: readonly number[]; now(): number };

/** Starts delivering; events that an earlier run did not get rid of are tried again. */
export function openDeliveries(setting: Setting): Deliveries {
  const { books, faults, retryDelaysMs, now } = setting;
  const timers = new Set<NodeJS.Timeout>();
  let held: EventRecord[] = [];

  function later(ms: number, run: () => Promise<unknown>): void {
    const timer = setTimeout(() => {
      timers.delete(timer);
      void run();
    }, ms).unref();
    timers.add(timer);
  }

  async function deliver({ object: { id } }: EventRecord, timestamp?: number): Promise<Attempt> {
    const record = books.events.get(id);
    if (!record) throw new Error(`Event ${id} is gone.`);
    const attempt = await send(setting, record.body, timestamp ?? Math.floor(now() / 1000));
    const latest = books.events.get(id) ?? record;
    const attempts = [...latest.attempts, attempt];
    const arrived = attempt.status !== null && attempt.status >= 200 && attempt.status < 300;
    const delay = retryDelaysMs[attempts.length - 1];
    const state = arrived ? "delivered" : latest.state === "delivered" ? "delivered" : delay === undefined ? "given-up" : "pending";
    books.events.put(id, { ...latest, attempts, state });
    if (state === "pending" && delay !== undefined) later(delay, () => retry(record));
    return attempt;
  }

  async function retry(record: EventRecord): Promise<void> {
    // It may have been sent by hand meanwhile.
    if (books.events.get(record.object.id)?.state === "pending") await deliver(record);
  }

  async function run(records: readonly EventRecord[], times = 1): Promise<void> {
    for (const record of records) for (let n = 0; n < times; n++) await deliver(record);
    const overtaken = held;
    held = [];
    for (const record of overtaken) await deliver(record);
  }

  for (const record of books.events.all()) if (record.state === "pending") later(retryDelaysMs[0] ?? 0, () => retry(record));

  return {
    deliver,
    async publish(drafts, origin) {
      const records = drafts.map((draft) => keep(books, draft, origin, now()));
      if (faults.take("webhook-never")) {
        for (const record of records) books.events.put(record.object.id, { ...record, state: "withheld" });
        return;
      }
      if (faults.take("webhook-out-of-order")) {
        // They wait for the events of the next change to pass them, but not for ever, and go last one first.
        held = [...held, ...records.toReversed()];
        return later(HELD_MS, () => (held.length ? run([]) : Promise.resolve()));
      }
      const times = faults.take("webhook-twice") ? 2 : 1;
      const late = faults.take("webhook-late");
      if (late) return later(late.ms ?? LATE_MS, () => run(records, times));
      await Promise.race([run(records, times), pause(ANSWER_WAIT_MS)]);
    },
    close: () => timers.forEach((timer) => clearTimeout(timer)),
  };
}

function keep(books: Books, { type, object, scope }: Draft, origin: Origin, now: number): EventRecord {
  const event = {
    id: newId("evt_1", 23),
    object: "event",
    ...(scope === null ? {} : { account: scope }),
    api_version: Stripe.API_VERSION,
    created: Math.floor(now / 1000),
    data: { object: structuredClone(object) },
    livemode: false,
    pending_webhooks: 1,
    request: origin,
    type,
  } as Stripe.Event;
  return books.events.put(event.id, { object: event, scope, order: timeId(now), body: JSON.stringify(event, null, 2), state: "pending", attempts: [] });
}

async function send({ webhookUrl, webhookSecret }: Setting, payload: string, timestamp: number): Promise<Attempt> {
  const signature = Stripe.webhooks.generateTestHeaderString({ payload, secret: webhookSecret, timestamp });
  const headers = { "content-type": "application/json; charset=utf-8", "user-agent": "Stripe/1.0 (+https://stripe.com/docs/webhooks)", "stripe-signature": signature };
  const at = new Date().toISOString();
  try {
    const answer = await fetch(webhookUrl, { method: "POST", headers, body: payload, redirect: "manual", signal: AbortSignal.timeout(ANSWER_WAIT_MS) });
    await answer.body?.cancel();
    return { at, status: answer.status, error: null };
  } catch (error) {
    return { at, status: null, error: error instanceof Error ? error.message : String(error) };
  }
}
