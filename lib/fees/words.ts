import { formatDay, formatWhen } from "@/lib/moves/when";
import { formatMoney } from "./money";
import type { FeeLeg, PaymentView } from "./types";

type Tone = "oxide" | "brass" | "verdigris" | "slate" | "neutral";

/** Where the money of a leg stands: a word, its tone, and who does what next. */
export type LegWords = { word: string; tone: Tone; next: string };

const words = (word: string, tone: Tone, next: string): LegWords => ({ word, tone, next });

const isOpen = ({ state }: PaymentView) => state === "begun" || state === "open";

function beforeQuote({ payerName, payerSeated, carrierName }: FeeLeg): LegWords {
  if (payerName === null) return words("No payer named", "brass", `The owner says who pays ${carrierName}, then invites them. A quote goes to somebody.`);
  if (!payerSeated) return words("Payer not invited", "brass", `The owner invites ${payerName}. A quote goes to somebody.`);
  return words("Waiting for a quote", "brass", `The billing clerk of ${carrierName} gives a quote for this leg; the owner can enter it for a carrier that is not on board.`);
}

/** Puts the leg's billing into words. */
export function legWords(leg: FeeLeg): LegWords {
  const { quote, cleared, carrierName, payerName } = leg;
  if (quote?.state === "paid") return words("Paid", "verdigris", `${formatMoney(quote.totalCents)} for quote ${quote.number}. Billing is cleared for this leg.`);
  if (cleared?.how === "credit-agreed") return words("Credit agreed", "verdigris", `${carrierName} gives credit. Billing is cleared for this leg.`);
  if (!quote) return beforeQuote(leg);
  if (quote.lapsed) return words("Quote lapsed", "oxide", `It was good until ${formatDay(quote.goodUntil ?? "")}. ${carrierName} voids it and gives a new one.`);
  if (quote.state === "given") return words("Waiting for agreement", "brass", `${payerName ?? quote.payerName}, or the owner, agrees to quote ${quote.number}, then pays.`);
  if (quote.payments.some(isOpen)) return words("Payment page open", "brass", `Waiting until ${payerName ?? quote.payerName} has paid on the payment service’s page.`);
  return words("Agreed, not paid", "brass", `${payerName ?? quote.payerName}, or the owner, pays ${formatMoney(quote.totalCents)} by card; or ${carrierName} agrees to credit.`);
}

const declined = (times: number) => (times === 0 ? "" : times === 1 ? " A card was declined." : ` Cards were declined ${times} times.`);

/** One try to pay, in a sentence. */
export function paymentWords({ state, begunBy, begunAt, expiresAt, paidAt, declines }: PaymentView, zone: string): string {
  const begun = `Begun by ${begunBy}, ${formatWhen(begunAt, zone)}.`;
  const until = expiresAt ? ` Its page is open until ${formatWhen(expiresAt, zone)}.` : "";
  const ends: Record<PaymentView["state"], string> = {
    begun: " The payment service has not answered yet; pressing Pay asks again.",
    open: until,
    paid: paidAt ? ` Paid ${formatWhen(paidAt, zone)}.` : " Paid.",
    failed: " It came to nothing; nothing was paid.",
    expired: " The page ran out; nothing was paid.",
    late: " The money came when the quote was no longer open for payment. A billing clerk looks at it and gives it back.",
  };
  return `${begun}${declined(declines)}${ends[state]}`;
}

export const PAYMENT_TONES: Record<PaymentView["state"], Tone> = { begun: "brass", open: "brass", paid: "verdigris", failed: "neutral", expired: "neutral", late: "oxide" };
export const PAYMENT_WORDS: Record<PaymentView["state"], string> = { begun: "Begun", open: "Open", paid: "Paid", failed: "Failed", expired: "Ran out", late: "To be looked at" };

/** What stands against writing a quote for a leg now, in words; null when nothing does. */
export function quoteBar(leg: FeeLeg): string | null {
  if (!leg.payerSeated) return beforeQuote(leg).next;
  return leg.quote ? `Quote ${leg.quote.number} stands for this leg. Void it before giving another.` : null;
}
