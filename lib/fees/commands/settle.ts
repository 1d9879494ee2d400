import "server-only";
import { and, count, eq } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { billingClearances, companies, feeLines, ledgerPostings, legs, moves, paymentEvents, payments, quotes, users } from "@/db/schema";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { newId, sha256Hex } from "@/lib/ids";
import { formatFullWhen } from "@/lib/moves/when";
import { putMail } from "@/lib/outbox/commands";
import type { Receipt } from "@/lib/outbox/types";
import { appendRecord, type NewEntry, type Speaker } from "@/lib/record/commands";
import { routes } from "@/lib/routes";
import { peopleIn, refreshStanding, write } from "@/lib/standing/commands";
import { decide, decideWithout, isDecline, isMoneyBack, isWaiting, mismatchOf, type Checkout, type Decision, type PaymentNotice } from "../checkout";
import { postingsOfLate, postingsOfPaid, type Posting } from "../ledger";
import { formatMoney } from "../money";
import { unsafeCaseHead } from "../queries";
import { FEE_LABELS, type PaymentState } from "../vocabulary";

const SERVICE: Speaker = { userId: null, name: "Payment service", companyId: null, companyName: null, part: null };

/** What was learned of a payment, and by what: a notice, or our own asking. `page` null: no page was ever handed out, and none will be. */
export type Learned = { eventId: string; type: string; page: Checkout | null; told: Checkout | null };

type Found = { payment: typeof payments.$inferSelect; quote: typeof quotes.$inferSelect; leg: typeof legs.$inferSelect };

/** No viewer: the payment service speaks, and its word was read from itself. Takes one thing that was learned into the books, once, in one transaction with the move's row locked. */
export async function unsafeSettle(payment: { id: string; moveId: string }, learned: Learned, at: Date): Promise<void> {
  const attempt = { key: `settle-${sha256Hex(learned.eventId).slice(0, 40)}`, door: "payment service", bodyHash: sha256Hex(learned.eventId), at };
  await write({ userId: "payment-service" }, attempt, async (tx) => {
    const [move] = await tx.select({ id: moves.id, state: moves.state }).from(moves).where(eq(moves.id, payment.moveId)).for("update");
    const [known] = await tx.select({ id: paymentEvents.eventId }).from(paymentEvents).where(eq(paymentEvents.eventId, learned.eventId));
    if (!move || known) return;
    const found = await findRows(tx, payment.id);
    const decision = judge(found, move.state === "open", learned);
    await flagOnce(tx, found, decision, at);
    await tx.insert(paymentEvents).values({ eventId: learned.eventId, type: learned.type, paymentId: payment.id, outcome: decision.outcome, flagged: decision.flagged, at });
    if (isDecline(learned.type) && isWaiting(found.payment.state)) await note(tx, found, "payment.failed", { why: decision.outcome }, at);
    if (decision.to === null) return;
    await apply(tx, found, decision.to, decision.outcome, learned.page, at);
    await refreshStanding(tx, payment.moveId, at);
  });
}

async function findRows(tx: Tx, paymentId: string): Promise<Found> {
  const [row] = await tx.select({ payment: payments, quote: quotes, leg: legs }).from(payments)
    .innerJoin(quotes, eq(quotes.id, payments.quoteId)).innerJoin(legs, eq(legs.id, quotes.legId)).where(eq(payments.id, paymentId));
  if (!row) throw new AppError("not_found", "No such payment.");
  return row;
}

function judge({ payment, quote }: Found, moveOpen: boolean, { type, page, told }: Learned): Decision {
  if (page === null) return decideWithout(payment.state, type === "refused");
  const lie = told && mismatchOf(payment, told);
  if (lie) return { to: null, outcome: `Not booked: the notice does not fit. ${lie}`, flagged: true };
  const decision = decide(payment, quote.state, moveOpen, page);
  if (isMoneyBack(type)) return { ...decision, outcome: "Money went back at the payment service.", flagged: true };
  return isDecline(type) && decision.to === null && isWaiting(payment.state) ? { ...decision, outcome: "The card was declined." } : decision;
}

/** One entry in the record for one kind of trouble with a payment, however many notices tell of it. */
async function flagOnce(tx: Tx, found: Found, { flagged, outcome }: Decision, at: Date) {
  if (!flagged) return;
  const [before] = await tx.select({ n: count() }).from(paymentEvents).where(and(eq(paymentEvents.paymentId, found.payment.id), eq(paymentEvents.flagged, true), eq(paymentEvents.outcome, outcome)));
  if (before && before.n === 0) await note(tx, found, "payment.flagged", { why: outcome }, at);
}

async function note(tx: Tx, { payment, quote, leg }: Found, kind: NewEntry["kind"], more: Record<string, unknown>, at: Date) {
  const detail = { paymentId: payment.id, quoteId: quote.id, number: quote.number, attempt: payment.attempt, carrier: leg.carrierName, amountCents: payment.amountCents, ...more };
  await appendRecord(tx, payment.moveId, SERVICE, { kind, legId: leg.id, detail }, at);
}

async function apply(tx: Tx, found: Found, to: PaymentState, why: string, page: Checkout | null, at: Date) {
  const { payment } = found;
  const settled = to === "paid" || to === "late";
  await tx.update(payments).set({ state: to, sessionUrl: null, ...(page && { sessionId: page.sessionId, intentId: page.intentId }), ...(settled && { paidAt: at }) }).where(eq(payments.id, payment.id));
  if (to === "paid") return bookPaid(tx, found, at);
  if (to === "late") return post(tx, found, postingsOfLate(payment.id, payment.amountCents), at);
  await note(tx, found, "payment.failed", { why }, at);
}

async function bookPaid(tx: Tx, found: Found, at: Date) {
  const { payment, quote, leg } = found;
  await tx.update(quotes).set({ state: "paid", version: quote.version + 1 }).where(eq(quotes.id, quote.id));
  await post(tx, found, postingsOfPaid(payment.id, payment.amountCents), at);
  await note(tx, found, "payment.paid", {}, at);
  const [cleared] = await tx.select({ id: billingClearances.id }).from(billingClearances).where(eq(billingClearances.legId, leg.id));
  if (!cleared) {
    const clearanceId = newId("billing");
    await tx.insert(billingClearances).values({ id: clearanceId, moveId: payment.moveId, legId: leg.id, how: "paid", at });
    await appendRecord(tx, payment.moveId, SERVICE, { kind: "billing.cleared", legId: leg.id, detail: { clearanceId, carrier: leg.carrierName, how: "paid" } }, at);
  }
  await mailReceipt(tx, found, at);
}

async function post(tx: Tx, { payment, leg }: Found, postings: Posting[], at: Date) {
  await tx.insert(ledgerPostings).values(postings.map((one) => ({ id: newId("posting"), moveId: payment.moveId, legId: leg.id, at, ...one })));
}

/** To the payer's people, the carrier's billing clerks, and whoever paid. */
async function mailReceipt(tx: Tx, { payment, quote, leg }: Found, at: Date) {
  const lines = await tx.select().from(feeLines).where(eq(feeLines.quoteId, quote.id)).orderBy(feeLines.order);
  const [payer] = await tx.select({ name: companies.name }).from(companies).where(eq(companies.id, quote.payerCompanyId));
  const receipt: Receipt = {
    ...(await unsafeCaseHead(tx, payment.moveId)),
    payer: payer?.name ?? leg.payerName ?? "", payee: leg.carrierName,
    lines: lines.map((line) => ({ label: `${FEE_LABELS[line.kind]}, ${line.description}`, amount: formatMoney(line.amountCents) })),
    total: formatMoney(payment.amountCents), paidOn: formatFullWhen(at.toISOString(), leg.fromZone),
    reference: [quote.reference ?? `Quote ${quote.number}`, payment.id].join(", "),
    url: `${env().APP_URL}${routes.fees(payment.moveId)}`,
  };
  const begunBy = await tx.select({ userId: users.id, email: users.email }).from(users).where(eq(users.id, payment.begunBy));
  const people = [...(await peopleIn(tx, payment.moveId, { part: "payer", legId: leg.id })), ...(await peopleIn(tx, payment.moveId, { part: "billing", legId: leg.id })), ...begunBy];
  for (const { userId, email } of new Map(people.map((person) => [person.userId, person])).values()) {
    await putMail(tx, { kind: "receipt", to: email, payload: receipt, dedupe: `receipt:${payment.id}:${userId}`, moveId: payment.moveId }, at);
  }
}

/** No viewer: keeps a notice that is about no payment of ours, so that its repeats are known. */
export async function unsafeKeepStranger(tx: Pick<Tx, "insert">, notice: PaymentNotice, at: Date): Promise<void> {
  const paid = notice.told?.paid ?? false;
  await tx.insert(paymentEvents).ignore().values({ eventId: notice.eventId, type: notice.type, outcome: "About no payment of ours.", flagged: paid, at });
}
