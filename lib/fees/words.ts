import { formatDay, formatWhen } from "@/lib/moves/when";
import { formatMoney } from "./money";
import type { FeeLeg, PaymentView } from "./types";

type Tone = "oxide" | "brass" | "verdigris" | "slate" | "neutral";

/** Where the money of a leg stands: a word with its tone, whose turn it is, and what they do. */
export type LegWords = { word: string; tone: Tone; who: string; next: string };

const words = (word: string, tone: Tone, who: string, next: string): LegWords => ({ word, tone, who, next });

const isOpen = ({ state }: PaymentView) => state === "begun" || state === "open";

function beforeQuote({ payerName, payerSeated, carrierName }: FeeLeg): LegWords {
  if (payerName === null) return words("No payer named", "brass", "The owner", `says who pays ${carrierName} and invites them. A quote needs somebody to go to.`);
  if (!payerSeated) return words("Payer not invited", "brass", "The owner", `invites ${payerName}. A quote needs somebody to go to.`);
  return words("Waiting for a quote", "brass", carrierName, "gives a quote for this leg. The owner can enter it for a carrier that is not on board.");
}

/** Puts the leg's billing into words. */
export function legWords(leg: FeeLeg): LegWords {
  const { quote, cleared, carrierName, payerIsOwner } = leg;
  if (quote?.state === "paid") return words("Paid", "verdigris", "By card", `${formatMoney(quote.totalCents)} is paid for quote ${quote.number}. Billing is cleared for this leg.`);
  if (cleared?.how === "credit-agreed") return words("Credit agreed", "verdigris", "On credit", `${carrierName} gives credit. Billing is cleared for this leg.`);
  if (!quote) return beforeQuote(leg);
  const payer = leg.payerName ?? quote.payerName;
  const orOwner = payerIsOwner ? "" : " The owner may do it too.";
  if (quote.lapsed) return words("Quote lapsed", "oxide", carrierName, `voids quote ${quote.number}, which was good until ${formatDay(quote.goodUntil ?? "")}, and gives a new one.`);
  if (quote.state === "given") return words("Waiting for agreement", "brass", payer, `agrees to quote ${quote.number}, then pays it.${orOwner}`);
  if (quote.payments.some(isOpen)) return words("Payment page open", "brass", payer, "pays on the payment service’s page. Billing is cleared when the payment service has confirmed it.");
  return words("Agreed, not paid", "brass", payer, `pays ${formatMoney(quote.totalCents)} by card, or ${carrierName} agrees to credit.${orOwner}`);
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
  if (!leg.payerSeated) return leg.payerName === null ? "Nobody is named yet who pays for this leg. The owner names and invites the payer first." : `${leg.payerName} is named as the payer but not invited yet. The owner invites them first.`;
  return leg.quote ? `Quote ${leg.quote.number} stands for this leg. Void it before giving another.` : null;
}
