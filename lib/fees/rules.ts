import { AppError, type Denial } from "@/lib/errors";
import { formatDay } from "@/lib/moves/when";
import { LEAST_CENTS, MOST_CENTS, sumCents } from "./money";
import type { FeeLeg, FeesView } from "./types";
import type { QuoteState } from "./vocabulary";

const notYet = (message: string, missing?: string[]): Denial => ({ code: "not_yet", message, ...(missing && { missing }) });

export type QuoteFacts = { number: number; state: QuoteState; goodUntil: string | null };

/** Whether the last day to agree has passed; `today` is the day where the leg begins. */
export const hasLapsed = (goodUntil: string | null, today: string) => goodUntil !== null && goodUntil < today;

type NewQuote = { payerSeated: boolean; payerName: string | null; standing: { number: number } | null; lines: readonly { amountCents: number }[]; goodUntil: string | null; today: string };

/** A quote goes to a payer who is there, one at a time on a leg, in sums that can be paid by card. */
export function denyQuote({ payerSeated, payerName, standing, lines, goodUntil, today }: NewQuote): Denial | null {
  if (!payerSeated) return notYet("Name and invite the payer first.", [payerName ? `${payerName} is named but not invited yet` : "No payer is named for this leg"]);
  if (standing) return notYet(`Quote ${standing.number} stands for this leg. Void it before giving another.`);
  if (hasLapsed(goodUntil, today)) return { code: "bad_input", message: "Some entries need another look.", fields: { goodUntil: ["This day has passed."] } };
  const total = sumCents(lines);
  if (total < LEAST_CENTS) return { code: "bad_input", message: "Some entries need another look.", fields: { lines: ["The total must be at least $0.50."] } };
  if (total > MOST_CENTS) return { code: "bad_input", message: "Some entries need another look.", fields: { lines: ["The total can be at most $999,999.99."] } };
  return null;
}

/** Agreeing needs a quote that was given and has not lapsed. */
export function denyAgree(quote: QuoteFacts, today: string): Denial | null {
  if (quote.state === "voided") return notYet(`Quote ${quote.number} was voided.`);
  if (quote.state !== "given") return notYet(`Quote ${quote.number} is agreed already.`);
  const { goodUntil } = quote;
  return goodUntil !== null && hasLapsed(goodUntil, today) ? notYet(`Quote ${quote.number} was good until ${formatDay(goodUntil)}. Ask the carrier for a new one.`) : null;
}

export function denyVoid(quote: QuoteFacts): Denial | null {
  if (quote.state === "paid") return notYet(`Quote ${quote.number} is paid and can’t be voided.`);
  return quote.state === "voided" ? notYet(`Quote ${quote.number} was voided already.`) : null;
}

/** Paying needs a quote that was agreed; an agreed one does not lapse. */
export function denyPay(quote: QuoteFacts): Denial | null {
  if (quote.state === "voided") return notYet(`Quote ${quote.number} was voided.`);
  if (quote.state === "paid") return notYet(`Quote ${quote.number} is paid already.`);
  return quote.state === "agreed" ? null : notYet("Agree to the quote before paying it.");
}

export const denyClearance = (cleared: boolean): Denial | null => (cleared ? notYet("Billing for this leg is cleared already.") : null);

export const serviceAway = (cause: unknown) =>
  new AppError("busy", "The payment service can’t be reached at the moment. Nothing was charged; try again in a minute.", { cause, retryAfterSeconds: 30 });

/** The leg for which the viewer may give or enter a quote; refuses `not_found` otherwise. */
export function requireLegToQuote(fees: FeesView, legId: string): FeeLeg {
  const leg = fees.legs.find((one) => one.legId === legId && one.may.quote !== null);
  if (!leg) throw new AppError("not_found", "No such leg to quote for.");
  return leg;
}
