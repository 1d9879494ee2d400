import { CLEARED_HOW, type ClearedHow } from "@/lib/fees/vocabulary";
import { formatMoney } from "@/lib/fees/money";
import type { RecordKind } from "@/lib/record/vocabulary";
import { numberOf, oneOf, textOf, type Detail } from "../detail";
import { say, sentence, strong } from "../words";
import type { Told } from "./told";

const amount = (detail: Detail, ...keys: string[]) => {
  const cents = numberOf(detail, ...keys);
  return cents === null ? null : formatMoney(cents);
};

const quote = (detail: Detail) => {
  const [number, carrier] = [numberOf(detail, "number"), textOf(detail, "carrier", "carrierName")];
  return strong(`${number === null ? "the quote" : `quote ${number}`}${carrier ? ` of ${carrier}` : ""}`);
};

const paid = (detail: Detail) => amount(detail, "amountCents", "totalCents", "paidCents");

const HOW_WORDS: Record<ClearedHow, string> = { paid: "The charges are paid.", "credit-agreed": "The charges are settled, or credit is agreed." };

const told = (plain: string, tell: Told["tell"]): Told => ({ area: "money", place: "fees", plain, tell });

const payment = (words: string, state: NonNullable<ReturnType<Told["tell"]>["state"]>) => (d: Detail) =>
  sentence(say(words, paid(d) && ` of ${paid(d)}`, " for ", quote(d)), { note: textOf(d, "why", "outcome", "reason"), state });

/** Sentences of charges and payments. The amounts never leave the circle of owner, payer and payee. */
export const MONEY_SENTENCES = {
  "quote.given": told("Quoted the charges", (d) => sentence(say("Gave ", quote(d), amount(d, "totalCents") && `: ${amount(d, "totalCents")}`, textOf(d, "payer") && `, to be paid by ${textOf(d, "payer")}`))),
  "quote.agreed": told("Agreed to the charges", (d) => sentence(say("Agreed to ", quote(d), amount(d, "totalCents") && `: ${amount(d, "totalCents")}`), { state: { tone: "slate", word: "Agreed" } })),
  "quote.voided": told("Voided a quote", (d) => sentence(say("Voided ", quote(d)), { note: textOf(d, "why", "reason"), state: { tone: "oxide", word: "Voided" } })),
  "payment.begun": told("Began a payment", payment("Began a payment", { tone: "slate", word: "Begun" })),
  "payment.paid": told("Paid", payment("Payment", { tone: "verdigris", word: "Paid" })),
  "payment.failed": told("A payment did not go through", payment("A payment did not go through:", { tone: "oxide", word: "Not paid" })),
  "payment.flagged": told("A payment needs a clerk’s look", payment("A clerk should look at a payment", { tone: "oxide", word: "Look at it" })),
  "billing.cleared": {
    plain: "Billing cleared",
    place: "fees",
    // Everybody reads that it is met; how is between owner, payer and payee.
    aside: {
      area: "money",
      note: (d) => {
        const how = oneOf(CLEARED_HOW, d.how);
        return how && HOW_WORDS[how];
      },
    },
    tell: (d) => sentence(say(strong("Billing cleared"), textOf(d, "carrier", "carrierName") && `, ${textOf(d, "carrier", "carrierName")}`), { state: { tone: "verdigris", word: "Cleared" } }),
  },
} as const satisfies Partial<Record<RecordKind, Told>>;
