import { describe, expect, it } from "vitest";
import { decide, mismatchOf, type Checkout, type KnownPayment } from "@/lib/fees/checkout";
import { postingsOfLate, postingsOfPaid } from "@/lib/fees/ledger";
import { denyAgree, denyPay, denyQuote, denyVoid } from "@/lib/fees/rules";
import { PAYMENT_STATES, QUOTE_STATES } from "@/lib/fees/vocabulary";

const payment: KnownPayment = { id: "pay_1", moveId: "mov_1", quoteId: "quo_1", amountCents: 418_500, state: "open", sessionId: "cs_1" };
const page: Checkout = { sessionId: "cs_1", status: "open", paid: false, amountCents: 418_500, currency: "usd", paymentId: "pay_1", quoteId: "quo_1", moveId: "mov_1", intentId: null, intentDead: false, url: null, expiresAt: null };
const paid: Checkout = { ...page, status: "complete", paid: true, intentId: "pi_1" };

describe("what is learned of a payment page", () => {
  it("paid settles a payment that waits, or had ended, once", () => {
    for (const state of ["begun", "open", "failed", "expired"] as const) expect(decide({ ...payment, state }, "agreed", true, paid)).toMatchObject({ to: "paid", flagged: false });
    for (const state of ["paid", "late"] as const) expect(decide({ ...payment, state }, "paid", true, paid)).toMatchObject({ to: null, flagged: false });
  });

  it("paid a second time, or after the quote was voided, is late and flagged", () => {
    for (const quote of ["paid", "voided", "given"] as const) expect(decide(payment, quote, true, paid)).toMatchObject({ to: "late", flagged: true });
  });

  it("paid after the move ended is booked and flagged", () => {
    expect(decide(payment, "agreed", false, paid)).toMatchObject({ to: "paid", flagged: true });
  });

  it("nothing undoes a paid payment", () => {
    const pages = [page, { ...page, status: "expired" as const }, { ...page, status: "complete" as const, intentDead: true }];
    for (const seen of pages) for (const quote of QUOTE_STATES) expect(decide({ ...payment, state: "paid" }, quote, true, seen).to).toBeNull();
  });

  it("an expired page ends a payment that waits, an open one leaves every state alone", () => {
    expect(decide(payment, "agreed", true, { ...page, status: "expired" }).to).toBe("expired");
    expect(decide({ ...payment, state: "failed" }, "agreed", true, { ...page, status: "expired" }).to).toBeNull();
    for (const state of PAYMENT_STATES) expect(decide({ ...payment, state }, "agreed", true, page).to).toBeNull();
    expect(decide(payment, "agreed", true, { ...page, status: "complete", intentDead: true }).to).toBe("failed");
    expect(decide(payment, "agreed", true, { ...page, status: "complete" }).to).toBeNull();
  });

  it.each([
    ["amount", { amountCents: 418_499 }], ["no amount", { amountCents: null }], ["currency", { currency: "cad" }], ["payment", { paymentId: "pay_2" }], ["no payment", { paymentId: null }],
    ["quote", { quoteId: "quo_2" }], ["move", { moveId: "mov_2" }], ["page", { sessionId: "cs_2" }],
  ])("another %s is flagged and not booked", (_, change) => {
    expect(mismatchOf(payment, { ...paid, ...change })).not.toBeNull();
    expect(decide(payment, "agreed", true, { ...paid, ...change })).toMatchObject({ to: null, flagged: true });
  });
});

it("every group of postings sums to zero, and none has an account twice", () => {
  for (const postings of [postingsOfPaid("pay_1", 418_500), postingsOfLate("pay_1", 1)]) {
    for (const group of new Set(postings.map((one) => one.groupId))) {
      const own = postings.filter((one) => one.groupId === group);
      expect(own.reduce((sum, one) => sum + one.amountCents, 0)).toBe(0);
      expect(new Set(own.map((one) => one.account)).size).toBe(own.length);
    }
  }
  const sumOf = (account: string) => postingsOfPaid("pay_1", 100).filter((one) => one.account === account).reduce((sum, one) => sum + one.amountCents, 0);
  expect([sumOf("payer"), sumOf("clearing"), sumOf("payee")]).toEqual([-100, 0, 100]);
});

describe("steps of a quote", () => {
  const quote = { number: 1, goodUntil: "2026-11-24" };

  it("is agreed until its last day, that day included", () => {
    expect(denyAgree({ ...quote, state: "given" }, "2026-11-24")).toBeNull();
    expect(denyAgree({ ...quote, state: "given" }, "2026-11-25")?.message).toContain("good until 24 Nov 2026");
    expect(denyAgree({ ...quote, goodUntil: null, state: "given" }, "2099-01-01")).toBeNull();
    for (const state of ["agreed", "paid", "voided"] as const) expect(denyAgree({ ...quote, state }, "2026-11-24")).not.toBeNull();
  });

  it("is paid only when agreed, however late, and voided only when not paid", () => {
    expect(QUOTE_STATES.filter((state) => denyPay({ ...quote, state }) === null)).toEqual(["agreed"]);
    expect(QUOTE_STATES.filter((state) => denyVoid({ ...quote, state }) === null)).toEqual(["given", "agreed"]);
  });

  it("is given to a payer who is there, one at a time, for a sum that a card can pay", () => {
    const given = { payerSeated: true, payerName: "Fenn Valley Fund", standing: null, lines: [{ amountCents: 100 }], goodUntil: null, today: "2026-11-24" };
    expect(denyQuote(given)).toBeNull();
    expect(denyQuote({ ...given, payerSeated: false })?.message).toBe("Name and invite the payer first.");
    expect(denyQuote({ ...given, standing: { number: 3 } })?.message).toContain("Quote 3 stands");
    expect(denyQuote({ ...given, goodUntil: "2026-11-23" })?.fields).toHaveProperty("goodUntil");
    expect(denyQuote({ ...given, lines: [{ amountCents: 49 }] })?.fields).toHaveProperty("lines");
    expect(denyQuote({ ...given, lines: [{ amountCents: 99_999_999 }, { amountCents: 1 }] })?.fields).toHaveProperty("lines");
  });
});
