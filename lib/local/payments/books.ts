import { randomBytes } from "node:crypto";
import { join } from "node:path";
import type Stripe from "stripe";
import { openShelf, type Shelf } from "../shelf";
import { missing } from "./api-error";
import type { SessionParams } from "./params";

/** The connected account a thing belongs to; null is the platform itself. */
export type Scope = string | null;

/** A line of a checkout. Its price goes over the wire as text where the library makes a decimal of it. */
export type Line = Omit<Stripe.LineItem, "price"> & { price: Omit<Stripe.Price, "unit_amount_decimal"> & { unit_amount_decimal: string } };

export type SessionRecord = { object: Stripe.Checkout.Session; scope: Scope; lines: Line[]; intentData: SessionParams["payment_intent_data"] };

export type Kept<T> = { object: T; scope: Scope };

/** One try to hand an event over; `status` is null when there was no answer. */
export type Attempt = { at: string; status: number | null; error: string | null };

/** An event as it was sent or is to be sent; `body` is the exact text, so that sending it again repeats it. */
export type EventRecord = {
  object: Stripe.Event;
  scope: Scope;
  /** Sorts by time; several events fall into one second. */
  order: string;
  body: string;
  state: "pending" | "delivered" | "given-up" | "withheld";
  attempts: Attempt[];
};

/** The answer that a repeated call with the same key gets. */
export type KeyRecord = { path: string; body: string; status: number; answer: unknown; requestId: string; at: number };

/** Everything that the service has to remember. */
export type Books = {
  sessions: Shelf<SessionRecord>;
  intents: Shelf<Kept<Stripe.PaymentIntent>>;
  charges: Shelf<Kept<Stripe.Charge>>;
  refunds: Shelf<Kept<Stripe.Refund>>;
  accounts: Shelf<Kept<Stripe.Account>>;
  events: Shelf<EventRecord>;
  keys: Shelf<KeyRecord>;
};

/** Opens what an earlier run left in the folder. */
export function openBooks(folder: string): Books {
  return {
    sessions: openShelf(join(folder, "sessions")),
    intents: openShelf(join(folder, "intents")),
    charges: openShelf(join(folder, "charges")),
    refunds: openShelf(join(folder, "refunds")),
    accounts: openShelf(join(folder, "accounts")),
    events: openShelf(join(folder, "events")),
    keys: openShelf(join(folder, "keys")),
  };
}

export const newestEvents = ({ events }: Books) => events.all().sort((a, b) => (a.order < b.order ? 1 : -1));

/** One thing under the asking account, or the service's 404. */
export function need<T extends { scope: Scope }>(shelf: Shelf<T>, id: string, scope: Scope, kind: string, param?: string): T {
  const found = shelf.get(id);
  if (!found || found.scope !== scope) throw missing(kind, id, param);
  return found;
}

const LETTERS = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789";

/** A random id with the prefix of its kind. */
export const newId = (prefix: string, length = 24) => prefix + [...randomBytes(length)].map((byte) => LETTERS[byte % LETTERS.length]).join("");
