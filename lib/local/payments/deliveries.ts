import Stripe from "stripe";
import type { Faults } from "../faults";
import { pause } from "../http";
import { timeId } from "../shelf";
import { type Attempt, type Books, type EventRecord, newId } from "./books";
import type { Draft } from "./money";

/** Who asked for the change that an event tells. */
export type Origin = { id: string | null; idempotency_key: string | null };

/** The pauses between the tries of one event. */
export const RETRY_DELAYS_MS: readonly number[] = [1000, 3000, 10_000, 30_000, 120_000];

const LATE_MS = 5000;
const HELD_MS = 3000;
const ANSWER_WAIT_MS = 10_000;

type Setting = { books: Books; faults: Faults; webhookUrl: string; webhookSecret: string; retryDelaysMs: readonly number[]; now(): number };

/** The way of events to the application; those that an earlier run did not get rid of are tried again. */
export class Deliveries {
  readonly #timers = new Set<NodeJS.Timeout>();
  /** Events that wait to be overtaken. */
  #held: EventRecord[] = [];
  #closed = false;

  constructor(private readonly setting: Setting) {
    const { books, retryDelaysMs } = setting;
    for (const record of books.events.all()) if (record.state === "pending") this.#later(retryDelaysMs[0] ?? 0, () => this.#retry(record));
  }

  /** Keeps the events of one change and hands them over; resolves when each was tried once, or at once when that comes later. */
  async publish(drafts: readonly Draft[], origin: Origin): Promise<void> {
    const { books, faults, now } = this.setting;
    const records = drafts.map((draft) => keep(books, draft, origin, now()));
    if (faults.take("webhook-never")) {
      for (const record of records) books.events.put(record.object.id, { ...record, state: "withheld" });
      return;
    }
    if (faults.take("webhook-out-of-order")) {
      // They wait for the events of the next change to pass them, but not for ever, and go last one first.
      this.#held = [...this.#held, ...records.toReversed()];
      return this.#later(HELD_MS, () => this.#run([]));
    }
    const times = faults.take("webhook-twice") ? 2 : 1;
    const late = faults.take("webhook-late");
    if (late) return this.#later(late.ms ?? LATE_MS, () => this.#run(records, times));
    await Promise.race([this.#run(records, times), pause(ANSWER_WAIT_MS)]);
  }

  /** Hands one event over now, whatever happened to it before; `timestamp` is the second it is signed for. */
  async deliver({ object: { id }, body }: EventRecord, timestamp?: number): Promise<Attempt> {
    const { books, retryDelaysMs, now } = this.setting;
    const attempt = await send(this.setting, body, timestamp ?? Math.floor(now() / 1000));
    const record = books.events.get(id);
    // What was under way when the service stopped is tried again at its next start.
    if (!record || this.#closed) return attempt;
    const attempts = [...record.attempts, attempt];
    const arrived = record.state === "delivered" || (attempt.status !== null && attempt.status >= 200 && attempt.status < 300);
    const delay = retryDelaysMs[attempts.length - 1];
    const state = arrived ? "delivered" : delay === undefined ? "given-up" : "pending";
    books.events.put(id, { ...record, attempts, state });
    if (state === "pending" && delay !== undefined) this.#later(delay, () => this.#retry(record));
    return attempt;
  }

  close(): void {
    this.#closed = true;
    for (const timer of this.#timers) clearTimeout(timer);
  }

  async #run(records: readonly EventRecord[], times = 1): Promise<void> {
    for (const record of records) for (let n = 0; n < times; n++) await this.deliver(record);
    const overtaken = this.#held;
    this.#held = [];
    for (const record of overtaken) await this.deliver(record);
  }

  async #retry(record: EventRecord): Promise<void> {
    // It may have been sent by hand meanwhile.
    if (this.setting.books.events.get(record.object.id)?.state === "pending") await this.deliver(record);
  }

  #later(ms: number, run: () => Promise<unknown>): void {
    const timer = setTimeout(() => {
      this.#timers.delete(timer);
      void run();
    }, ms).unref();
    this.#timers.add(timer);
  }
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
