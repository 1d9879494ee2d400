import { describe, expect, it } from "vitest";
import type { FeeLeg, PaymentView, QuoteView } from "@/lib/fees/types";
import { PAYMENT_STATES } from "@/lib/fees/vocabulary";
import { legWords, paymentWords, quoteBar } from "@/lib/fees/words";

const zone = "America/Chicago";
const payment: PaymentView = { id: "pay_1", attempt: 1, state: "open", amountCents: 418_500, begunBy: "F. Fenn", begunAt: "2026-11-24T16:05:00.000Z", expiresAt: "2026-11-24T17:05:00.000Z", paidAt: null, declines: 0, flags: [] };
const quote: QuoteView = {
  id: "quo_1", number: 2, reference: null, payerName: "Fenn Valley Fund", state: "given", totalCents: 418_500, note: null, goodUntil: "2026-11-30", lapsed: false,
  enteredFor: null, givenBy: "N. Quade", givenAt: "2026-11-20T16:00:00.000Z", agreedBy: null, agreedAt: null, voidedAt: null, voidedWhy: null, lines: [], payments: [],
};
const leg: FeeLeg = {
  legId: "leg_1", seq: 1, carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", fromPlace: "Sand Hollow", toPlace: "Ardell", fromZone: zone, payerName: "Fenn Valley Fund", payerSeated: true, payerIsOwner: false,
  cleared: null, quote: null, voided: [], may: { quote: null, clear: null, agree: false, pay: false },
};

describe("where the money of a leg stands, and whose turn it is", () => {
  it.each<[string, Partial<FeeLeg>, string, string]>([
    ["nobody named", { payerName: null, payerSeated: false }, "No payer named", "The owner"],
    ["named, not invited", { payerSeated: false }, "Payer not invited", "The owner"],
    ["no quote", {}, "Waiting for a quote", "Quillan & Sandbar"],
    ["given", { quote }, "Waiting for agreement", "Fenn Valley Fund"],
    ["lapsed", { quote: { ...quote, lapsed: true } }, "Quote lapsed", "Quillan & Sandbar"],
    ["agreed", { quote: { ...quote, state: "agreed" } }, "Agreed, not paid", "Fenn Valley Fund"],
    ["a page that is open", { quote: { ...quote, state: "agreed", payments: [payment] } }, "Payment page open", "Fenn Valley Fund"],
    ["a page that ran out", { quote: { ...quote, state: "agreed", payments: [{ ...payment, state: "expired" }] } }, "Agreed, not paid", "Fenn Valley Fund"],
    ["paid", { quote: { ...quote, state: "paid" } }, "Paid", "By card"],
    ["credit", { cleared: { how: "credit-agreed", note: "Account 4410", by: "N. Quade", enteredFor: null, at: "2026-11-24T16:00:00.000Z" } }, "Credit agreed", "On credit"],
  ])("%s", (_, change, word, who) => {
    expect(legWords({ ...leg, ...change })).toMatchObject({ word, who });
  });

  it("names the owner's help only where the payer is somebody else", () => {
    expect(legWords({ ...leg, quote }).next).toContain("The owner may do it too.");
    expect(legWords({ ...leg, quote, payerIsOwner: true }).next).not.toContain("owner");
  });
});

it("a quote is barred in words while nobody can get it or another stands", () => {
  expect(quoteBar(leg)).toBeNull();
  expect(quoteBar({ ...leg, payerSeated: false })).toContain("not invited yet");
  expect(quoteBar({ ...leg, payerSeated: false, payerName: null })).toContain("Nobody is named");
  expect(quoteBar({ ...leg, quote })).toContain("Quote 2 stands");
});

it("every try to pay reads as a sentence with the place's clock", () => {
  const said = Object.fromEntries(PAYMENT_STATES.map((state) => [state, paymentWords({ ...payment, state, declines: 2, paidAt: state === "paid" ? "2026-11-24T16:10:00.000Z" : null }, zone)]));
  for (const words of Object.values(said)) expect(words).toMatch(/^Begun by F\. Fenn, 24 Nov 10:05 CST\. Cards were declined 2 times\. .+\.$/);
  expect(said.open).toContain("open until 24 Nov 11:05 CST");
  expect(said.paid).toContain("Paid 24 Nov 10:10 CST");
  expect(said.late).toContain("gives it back");
});
