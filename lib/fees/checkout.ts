import type { PaymentState, QuoteState } from "./vocabulary";

/** Currency of every fee. */
export const CURRENCY = "usd";

/** How long the payment page stays open. The service wants at least 30 minutes from the moment it makes the page; the rest is time to find it again after a lost answer. */
export const PAGE_MINUTES = 60;

/** A payment page as the payment service has it at this moment. */
export type Checkout = {
  sessionId: string;
  status: "open" | "complete" | "expired";
  paid: boolean;
  amountCents: number | null;
  currency: string | null;
  /** Our own ids, as we gave them. */
  paymentId: string | null;
  quoteId: string | null;
  moveId: string | null;
  intentId: string | null;
  /** The payment behind the page can come to nothing any more. */
  intentDead: boolean;
  url: string | null;
  expiresAt: string | null;
};

/** A notice of the payment service whose signature held. What it says is a hint of where to look, never the truth itself. */
export type PaymentNotice = {
  eventId: string;
  type: string;
  sessionId: string | null;
  intentId: string | null;
  paymentId: string | null;
  /** The page as the notice tells it, where it tells of one. */
  told: Checkout | null;
};

export type KnownPayment = { id: string; moveId: string; quoteId: string; amountCents: number; state: PaymentState; sessionId: string | null };

/** What to do with what was learned. `to` null: the payment stays as it is. */
export type Decision = { to: PaymentState | null; outcome: string; flagged: boolean };

const STILL_WAITING: readonly PaymentState[] = ["begun", "open"];
export const isWaiting = (state: PaymentState) => STILL_WAITING.includes(state);

/** How a page differs from the payment that we opened it for; null when it is the very one. */
export function mismatchOf(payment: KnownPayment, page: Checkout): string | null {
  if (payment.sessionId !== null && page.sessionId !== payment.sessionId) return "Another payment page than the one that was opened.";
  if (page.paymentId !== payment.id || page.quoteId !== payment.quoteId || page.moveId !== payment.moveId) return "The page names another payment, quote or move.";
  if (page.currency !== CURRENCY) return "Another currency than the quote’s.";
  return page.amountCents === payment.amountCents ? null : "Another amount than the quote’s.";
}

/** Decides from the page's present state alone, so that the order and number of notices mean nothing. */
export function decide(payment: KnownPayment, quoteState: QuoteState, moveOpen: boolean, page: Checkout): Decision {
  const stays = (outcome: string, flagged = false): Decision => ({ to: null, outcome, flagged });
  if (payment.state === "paid" || payment.state === "late") return stays("Was booked before.");
  if (page.paid) {
    const wrong = mismatchOf(payment, page);
    if (wrong) return stays(`Not booked. ${wrong}`, true);
    if (quoteState === "paid") return { to: "late", outcome: "Paid although another payment had settled the quote.", flagged: true };
    if (quoteState !== "agreed") return { to: "late", outcome: "Paid although the quote was no longer open for payment.", flagged: true };
    return moveOpen ? { to: "paid", outcome: "Paid.", flagged: false } : { to: "paid", outcome: "Paid after work on the move had ended.", flagged: true };
  }
  if (!isWaiting(payment.state)) return stays("Had ended before.");
  if (page.status === "expired") return { to: "expired", outcome: "The payment page ran out unpaid.", flagged: false };
  if (page.status === "complete" && page.intentDead) return { to: "failed", outcome: "The payment came to nothing.", flagged: false };
  return stays("Nothing paid yet.");
}

/** The same for a payment that no page was handed out for, and none will be. */
export function decideWithout(state: PaymentState, refused: boolean): Decision {
  if (!isWaiting(state)) return { to: null, outcome: "Had ended before.", flagged: false };
  return refused ? { to: "failed", outcome: "The payment service would not open a page.", flagged: false } : { to: "expired", outcome: "No payment page was opened in time.", flagged: false };
}

const DECLINED = "payment_intent.payment_failed";
const MONEY_BACK = /^(charge\.refund|charge\.dispute|refund\.)/;

/** A card that was declined leaves the page open for another try. */
export const isDecline = (type: string) => type === DECLINED;

/** Money that went back at the payment service itself, which a clerk has to look at. */
export const isMoneyBack = (type: string) => MONEY_BACK.test(type);
