import { eq } from "drizzle-orm";
import { afterAll, beforeEach, expect, it } from "vitest";
import { db } from "@/db/client";
import { companies, outbox, payments } from "@/db/schema";
import { unsafeCheckOpenPayments, unsafeCheckPayment } from "@/lib/fees/commands/checks";
import { payQuote } from "@/lib/fees/commands/pay";
import { agreeQuote, giveQuote, voidQuote } from "@/lib/fees/commands/quotes";
import { findPaid, getFees } from "@/lib/fees/queries";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { getFacts } from "@/lib/standing/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";
import { aQuote, openBench, seedAgreed, stateOf } from "./bench";

const bench = await openBench();
withDatabase({ STRIPE_API_BASE: bench.url });
afterAll(() => bench.close());

beforeEach(async () => {
  bench.ahead(0);
  bench.statuses.length = 0;
  await bench.fault({ kind: "off" });
});

const MINUTES = 60_000;
const afterMinutes = (minutes: number) => new Date(Date.now() + minutes * MINUTES);
const pagesOf = async (quoteId: string) => (await bench.stripe.checkout.sessions.list({ limit: 100 })).data.filter((one) => one.metadata?.quoteId === quoteId);

it("paid on the page: the webhook settles payment, quote, ledger and billing, and mails the receipt once to each", async () => {
  const move = await seedAgreed();
  const { url, paymentId } = await move.pay();
  expect((await getFacts(move.owner, move.moveId)).legs[0]?.paymentOpen).toBe(true);
  const back = await bench.onPage(url, "pay");
  expect(back.status).toBe(303);
  expect(bench.statuses).toEqual([200, 200]);
  const after = await stateOf(move);
  expect(after).toMatchObject({ quote: "paid", payments: ["paid"], unbalanced: [], cleared: [{ how: "paid", byUserId: null }] });
  expect(after.postings.map((one) => [one.account, one.amountCents]).toSorted()).toEqual([["clearing", -418_500], ["clearing", 418_500], ["payee", 418_500], ["payer", -418_500]]);
  expect(after.receipts.map((mail) => mail.to).toSorted()).toEqual([move.payer.email, move.clerkA.email].toSorted());
  expect(after.entries.map((entry) => entry.kind)).toEqual(["quote.given", "quote.agreed", "payment.begun", "payment.paid", "billing.cleared"]);
  expect((await getFacts(move.owner, move.moveId)).legs[0]).toMatchObject({ billingCleared: true, quote: "paid", paymentOpen: false });
  expect((await unsafeVerifyRecord(move.moveId)).brokenAt).toBeNull();
  const session = new URL(back.headers.get("location") ?? "").searchParams.get("session") ?? "";
  expect(await findPaid(move.payer, move.moveId, session)).toMatchObject({ state: "paid", amountCents: 418_500 });
  expect(await findPaid(move.contractor, move.moveId, session)).toBeNull();
  await expect(move.pay()).rejects.toMatchObject({ code: "not_yet", message: expect.stringContaining("paid already") });
  expect(after.tries[0]?.id).toBe(paymentId);
});

it("the page carries every fee line, the sum and our names, and its address is never in what the screens read", async () => {
  const move = await seedAgreed();
  const { url, paymentId } = await move.pay();
  const [page] = await pagesOf(move.quoteId);
  expect(page).toMatchObject({ amount_total: 418_500, currency: "usd", client_reference_id: paymentId, metadata: { paymentId, quoteId: move.quoteId, moveId: move.moveId }, customer_email: move.payer.email });
  const lines = await bench.stripe.checkout.sessions.listLineItems(page?.id ?? "");
  expect(lines.data.map((line) => [line.description, line.amount_total])).toEqual([["Line haul: Sand Hollow to Ardell", 400_000], ["Inspection: Two visits", 18_500]]);
  expect(JSON.stringify(await getFees(move.owner, move.moveId))).not.toContain(url);
});

it("twenty presses by payer and owner open one page", async () => {
  const move = await seedAgreed();
  const answers = await Promise.all(Array.from({ length: 20 }, (_, n) => payQuote(n % 2 ? move.owner : move.payer, move.step, anAttempt())));
  expect(new Set(answers.map((answer) => answer.url)).size).toBe(1);
  expect((await stateOf(move)).payments).toEqual(["open"]);
  expect(await pagesOf(move.quoteId)).toHaveLength(1);
});

it("the same key again gets the same page, and nothing more is written", async () => {
  const move = await seedAgreed();
  const attempt = anAttempt({ body: "pay" });
  const first = await payQuote(move.payer, move.step, attempt);
  expect(await payQuote(move.payer, move.step, attempt)).toEqual(first);
  expect((await stateOf(move)).entries.filter((entry) => entry.kind === "payment.begun")).toHaveLength(1);
});

it("an answer lost on the way is found again under the payment's key", async () => {
  const move = await seedAgreed();
  await bench.fault({ kind: "cut-response", times: 3 });
  await expect(move.pay()).rejects.toMatchObject({ code: "busy", message: expect.stringContaining("Nothing was charged") });
  expect((await stateOf(move)).payments).toEqual(["begun"]);
  const { url } = await move.pay();
  expect(await pagesOf(move.quoteId)).toMatchObject([{ url }]);
  expect((await stateOf(move)).payments).toEqual(["open"]);
});

it("a payment service that is away costs nothing but the try", async () => {
  const move = await seedAgreed();
  await bench.fault({ kind: "api-down" });
  await expect(move.pay()).rejects.toMatchObject({ code: "busy" });
  await bench.fault({ kind: "off" });
  await bench.onPage((await move.pay()).url, "pay");
  expect(await stateOf(move)).toMatchObject({ quote: "paid", payments: ["paid"] });
});

it("a payee account that the payment service does not know ends the try, and the next one starts anew", async () => {
  const move = await seedAgreed();
  const carrier = move.clerkA.memberships[0]?.companyId ?? "";
  await db().update(companies).set({ payeeAccount: "acct_unknown" }).where(eq(companies.id, carrier));
  await expect(move.pay()).rejects.toMatchObject({ code: "busy", message: expect.stringContaining("would not open a page") });
  expect(await stateOf(move)).toMatchObject({ payments: ["failed"], quote: "agreed" });
  const account = await bench.stripe.accounts.create({ type: "custom" });
  await db().update(companies).set({ payeeAccount: account.id }).where(eq(companies.id, carrier));
  await bench.onPage((await move.pay()).url, "pay");
  const after = await stateOf(move);
  expect(after).toMatchObject({ payments: ["failed", "paid"] });
  const intent = await bench.stripe.paymentIntents.retrieve(after.tries[1]?.intentId ?? "");
  expect(intent.transfer_data?.destination).toBe(account.id);
});

it("a declined card leaves the same page open; the record says so and the next card pays", async () => {
  const move = await seedAgreed();
  const { url } = await move.pay();
  await bench.onPage(url, "decline");
  const declined = await stateOf(move);
  expect(declined).toMatchObject({ quote: "agreed", payments: ["open"], postings: [], receipts: [] });
  expect(declined.entries.at(-1)).toMatchObject({ kind: "payment.failed", detail: { why: "The card was declined." }, byName: "Payment service" });
  expect((await getFees(move.payer, move.moveId)).legs[0]?.quote?.payments[0]).toMatchObject({ declines: 1, flags: [] });
  expect((await move.pay()).url).toBe(url);
  await bench.onPage(url, "pay");
  expect(await stateOf(move)).toMatchObject({ quote: "paid", payments: ["paid"] });
});

it("an abandoned page is found again, by whoever pays", async () => {
  const move = await seedAgreed();
  const { url } = await move.pay();
  expect((await payQuote(move.owner, move.step, anAttempt({ at: afterMinutes(20) }))).url).toBe(url);
  expect((await stateOf(move)).payments).toEqual(["open"]);
});

it("a page that ran out ends its payment, and the next try opens another", async () => {
  const move = await seedAgreed();
  const { url } = await move.pay();
  bench.ahead(61 * MINUTES);
  await bench.events();
  await expect.poll(async () => (await stateOf(move)).payments).toEqual(["expired"]);
  expect((await stateOf(move)).entries.at(-1)).toMatchObject({ kind: "payment.failed", detail: { why: "The payment page ran out unpaid." } });
  expect((await getFacts(move.owner, move.moveId)).legs[0]?.paymentOpen).toBe(false);
  const second = await move.pay(afterMinutes(62));
  expect(second.url).not.toBe(url);
  await bench.onPage(second.url, "pay");
  expect(await stateOf(move)).toMatchObject({ quote: "paid", payments: ["expired", "paid"], unbalanced: [] });
});

it("a page that ran out without notice is asked about before another is opened", async () => {
  const move = await seedAgreed();
  await bench.fault({ kind: "webhook-never" });
  await move.pay();
  bench.ahead(61 * MINUTES);
  await move.pay(afterMinutes(62));
  expect((await stateOf(move)).payments).toEqual(["expired", "open"]);
});

it("paid in its last minute without notice: a later try books it instead of asking for more", async () => {
  const move = await seedAgreed();
  const { url } = await move.pay();
  await bench.fault({ kind: "webhook-never" });
  await bench.onPage(url, "pay");
  await expect(move.pay(afterMinutes(62))).rejects.toMatchObject({ message: expect.stringContaining("paid already") });
  expect(await stateOf(move)).toMatchObject({ quote: "paid", payments: ["paid"], unbalanced: [] });
});

it("a notice that never comes: the worker asks, and books once", async () => {
  const move = await seedAgreed();
  const { url } = await move.pay();
  await bench.fault({ kind: "webhook-never" });
  await bench.onPage(url, "pay");
  await unsafeCheckOpenPayments(new Date());
  expect((await stateOf(move)).payments).toEqual(["open"]);
  for (let n = 0; n < 3; n += 1) await unsafeCheckOpenPayments(afterMinutes(3));
  expect(await stateOf(move)).toMatchObject({ quote: "paid", payments: ["paid"], unbalanced: [], cleared: [{ how: "paid" }] });
  const event = (await bench.events()).find((one) => one.type === "checkout.session.completed" && one.state === "withheld");
  expect(await bench.deliver(event?.id ?? "")).toBe(200);
  const after = await stateOf(move);
  expect(after.postings).toHaveLength(4);
  expect(after.receipts).toHaveLength(2);
});

it("the worker ends dead pages and finds lost ones, and one that fails does not stop the others", async () => {
  const [lost, dead, fine] = [await seedAgreed(), await seedAgreed(), await seedAgreed()];
  await bench.fault({ kind: "cut-response", times: 3 });
  await expect(lost.pay()).rejects.toMatchObject({ code: "busy" });
  await dead.pay();
  await fine.pay();
  await db().update(payments).set({ sessionId: "cs_test_unknown" }).where(eq(payments.quoteId, dead.quoteId));
  const { failed } = await unsafeCheckOpenPayments(afterMinutes(3));
  expect(failed).toBeGreaterThan(0);
  expect((await stateOf(lost)).payments).toEqual(["open"]);
  await bench.fault({ kind: "webhook-never" });
  await unsafeCheckOpenPayments(afterMinutes(61));
  for (const move of [lost, dead, fine]) expect((await stateOf(move)).payments).toEqual(["expired"]);
  expect((await pagesOf(fine.quoteId)).map((page) => page.status)).toEqual(["expired"]);
});

it("voiding ends an open page; a payer who was faster is booked as late, for a clerk", async () => {
  const [slow, fast] = [await seedAgreed(), await seedAgreed()];
  await slow.pay();
  const { url } = await fast.pay();
  await bench.fault({ kind: "webhook-never" });
  await bench.onPage(url, "pay");
  for (const move of [slow, fast]) {
    await voidQuote(move.clerkA, { ...move.step, why: "Wrong route", enteredFor: null }, anAttempt());
    const [payment] = (await stateOf(move)).tries;
    const tasks = await db().select({ kind: outbox.kind }).from(outbox).where(eq(outbox.moveId, move.moveId));
    expect(tasks.filter((task) => task.kind === "check-payment")).toHaveLength(1);
    await unsafeCheckPayment(payment?.id ?? "", new Date());
  }
  expect(await stateOf(slow)).toMatchObject({ quote: "voided", payments: ["expired"], postings: [], cleared: [] });
  const late = await stateOf(fast);
  expect(late).toMatchObject({ quote: "voided", payments: ["late"], unbalanced: [], cleared: [], receipts: [] });
  expect(late.postings.map((one) => one.account).toSorted()).toEqual(["clearing", "payer"]);
  expect(late.entries.at(-1)).toMatchObject({ kind: "payment.flagged" });
  expect((await getFees(fast.clerkA, fast.moveId)).legs[0]?.voided[0]?.payments[0]?.flags).toHaveLength(1);
});

it("a second payment of one quote is late, flagged, and stays in clearing", async () => {
  const move = await seedAgreed();
  const first = await move.pay();
  await db().update(payments).set({ state: "expired" }).where(eq(payments.id, first.paymentId));
  const second = await move.pay();
  expect(second.url).not.toBe(first.url);
  await bench.onPage(second.url, "pay");
  await bench.onPage(first.url, "pay");
  const after = await stateOf(move);
  expect(after).toMatchObject({ quote: "paid", payments: ["late", "paid"], unbalanced: [] });
  expect(after.postings).toHaveLength(6);
  expect(after.receipts).toHaveLength(2);
  expect(after.events.filter((event) => event.flagged).length).toBeGreaterThan(0);
  expect(after.entries.filter((entry) => entry.kind === "payment.flagged")).toHaveLength(1);
});

it("a try that is entered with an earlier date has a page that can still be paid", async () => {
  const move = await seedAgreed();
  const { url, paymentId } = await move.pay(afterMinutes(-11 * 24 * 60));
  await bench.fault({ kind: "webhook-never" });
  await bench.onPage(url, "pay");
  await unsafeCheckPayment(paymentId, afterMinutes(-11 * 24 * 60));
  expect(await stateOf(move)).toMatchObject({ quote: "paid", payments: ["paid"] });
});

it("paying needs an agreed quote, and the payer's or owner's part on that leg", async () => {
  const move = await seedMove();
  const { quoteId } = await giveQuote(move.clerkA, aQuote(move), anAttempt());
  const step = { moveId: move.moveId, quoteId };
  await expect(payQuote(move.payer, step, anAttempt())).rejects.toMatchObject({ message: expect.stringContaining("Agree to the quote") });
  await agreeQuote(move.payer, step, anAttempt());
  for (const who of [move.contractor, move.clerkB, move.outsider]) await expect(payQuote(who, step, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  await expect(payQuote(move.clerkA, step, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  expect(await pagesOf(quoteId)).toEqual([]);
});
