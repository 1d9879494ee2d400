import "server-only";
import Stripe from "stripe";
import { env } from "@/lib/env";
import { CURRENCY, type Checkout, type PaymentNotice } from "@/lib/fees/checkout";

let known: Stripe | undefined;

/** Where a stand-in on this machine listens, when one is named. */
function standIn(): Stripe.StripeConfig {
  const base = env().STRIPE_API_BASE;
  if (!base) return {};
  const { hostname, port, protocol } = new URL(base);
  return { host: hostname, port, protocol: protocol === "http:" ? "http" : "https" };
}

const stripe = () => (known ??= new Stripe(env().STRIPE_SECRET_KEY, { maxNetworkRetries: 2, timeout: 5000, telemetry: false, ...standIn() }));

/** A call that came to nothing. `away`: no answer, or not now; the same call may be made again. `refused`: it will never be answered otherwise. */
export class PaymentServiceError extends Error {
  override name = "PaymentServiceError";
  readonly kind: "away" | "refused";
  constructor(kind: "away" | "refused", cause: unknown) {
    super(cause instanceof Error ? cause.message : String(cause), { cause });
    this.kind = kind;
  }
}

const CONFLICT = 409;
const BROKEN = 500;

/** The service keeps the answer to a key, its own failure (500) included; asking again helps only where it did not begin, or is still at it (409). */
function kindOf(error: unknown): "away" | "refused" {
  const { StripeError, StripeIdempotencyError, StripeInvalidRequestError } = Stripe.errors;
  if (!(error instanceof StripeError) || error.statusCode === CONFLICT) return "away";
  return error instanceof StripeInvalidRequestError || error instanceof StripeIdempotencyError || error.statusCode === BROKEN ? "refused" : "away";
}

async function ask<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    throw new PaymentServiceError(kindOf(error), error);
  }
}

export type NewCheckout = {
  paymentId: string; quoteId: string; moveId: string;
  lines: { name: string; amountCents: number }[];
  description: string; email: string;
  /** Account of the payee at the service, where it has one. */
  payeeAccount: string | null;
  expiresAt: Date; successUrl: string; cancelUrl: string;
};

/** Opens the payment page, or finds the one that the same payment opened before. */
export async function createCheckout({ paymentId, quoteId, moveId, ...page }: NewCheckout): Promise<Checkout> {
  const metadata = { paymentId, quoteId, moveId };
  const session = await ask(() =>
    stripe().checkout.sessions.create(
      {
        mode: "payment",
        allowed_payment_method_types: ["card"],
        submit_type: "pay",
        client_reference_id: paymentId,
        customer_email: page.email,
        line_items: page.lines.map(({ name, amountCents }) => ({ quantity: 1, price_data: { currency: CURRENCY, unit_amount: amountCents, product_data: { name } } })),
        metadata,
        payment_intent_data: { description: page.description, metadata, ...(page.payeeAccount && { transfer_data: { destination: page.payeeAccount } }) },
        expires_at: Math.floor(page.expiresAt.getTime() / 1000),
        success_url: page.successUrl,
        cancel_url: page.cancelUrl,
      },
      { idempotencyKey: paymentId },
    ),
  );
  return checkoutOf(session);
}

/** The page as it is now. */
export async function readCheckout(sessionId: string): Promise<Checkout> {
  return checkoutOf(await ask(() => stripe().checkout.sessions.retrieve(sessionId, { expand: ["payment_intent"] })));
}

/** Ends an open page, and tells how it is now: a payer may have been faster. */
export async function endCheckout(sessionId: string): Promise<Checkout> {
  try {
    await ask(() => stripe().checkout.sessions.expire(sessionId));
  } catch (error) {
    if (!(error instanceof PaymentServiceError) || error.kind === "away") throw error;
  }
  return readCheckout(sessionId);
}

const TOLERANCE_SECONDS = 300;

/** Reads a notice whose signature over the very bytes holds and is at most five minutes old; null otherwise. */
export function readNotice(body: Uint8Array, signature: string | null): PaymentNotice | null {
  try {
    return noticeOf(stripe().webhooks.constructEvent(Buffer.from(body), signature ?? "", env().STRIPE_WEBHOOK_SECRET, TOLERANCE_SECONDS));
  } catch {
    return null;
  }
}

const idIn = (value: string | { id: string } | null | undefined) => (typeof value === "string" ? value : (value?.id ?? null));

function noticeOf({ id, type, data: { object } }: Stripe.Event): PaymentNotice {
  const told = "object" in object && object.object === "checkout.session" ? checkoutOf(object) : null;
  const about = object as { object?: string; id?: string; payment_intent?: string | { id: string } | null; metadata?: Record<string, string> | null };
  const intentId = about.object === "payment_intent" ? (about.id ?? null) : idIn(about.payment_intent);
  return { eventId: id, type, sessionId: told?.sessionId ?? null, intentId, paymentId: told?.paymentId ?? about.metadata?.paymentId ?? null, told };
}

const statusOf = (status: string | null): Checkout["status"] => (status === "complete" || status === "expired" ? status : "open");

function checkoutOf(session: Stripe.Checkout.Session): Checkout {
  const intent = session.payment_intent;
  return {
    sessionId: session.id,
    status: statusOf(session.status),
    paid: session.payment_status === "paid",
    amountCents: session.amount_total,
    currency: session.currency,
    paymentId: session.client_reference_id === session.metadata?.paymentId ? session.client_reference_id : null,
    quoteId: session.metadata?.quoteId ?? null,
    moveId: session.metadata?.moveId ?? null,
    intentId: idIn(intent),
    intentDead: typeof intent === "object" && intent !== null && (intent.status === "canceled" || intent.status === "requires_payment_method"),
    url: session.url,
    expiresAt: new Date(session.expires_at * 1000).toISOString(),
  };
}
