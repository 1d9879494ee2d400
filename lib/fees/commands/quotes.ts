import "server-only";
import { and, count, eq, inArray, isNull, ne } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { billingClearances, companies, feeLines, type legs, moveSeats, payments, quotes } from "@/db/schema";
import { maySeeFees } from "@/lib/access/policy";
import { env } from "@/lib/env";
import { AppError, refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { dayAt, formatDay } from "@/lib/moves/when";
import { putTask } from "@/lib/outbox/commands";
import { routes } from "@/lib/routes";
import { allowOnLeg, peopleIn, requireLeg, writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { ClearBilling, GiveQuote, QuoteStep, VoidQuote } from "../input";
import { formatMoney, sumCents } from "../money";
import { unsafeCaseHead } from "../queries";
import { denyAgree, denyClearance, denyQuote, denyVoid } from "../rules";
import { FEE_LABELS } from "../vocabulary";

/** Gives a quote for one leg to its named payer. */
export async function giveQuote(viewer: Viewer, input: GiveQuote, attempt: Attempt): Promise<{ quoteId: string }> {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { leg, enteredFor } = await allowOnLeg(ctx, "fee.quote", input.legId, input.enteredFor);
    const payerCompanyId = await seatedPayer(ctx, leg);
    const standing = await standingQuote(ctx.tx, leg.id);
    refuse(denyQuote({ payerSeated: payerCompanyId !== null, payerName: leg.payerName, standing, lines: input.lines, goodUntil: input.goodUntil, today: dayAt(ctx.at.toISOString(), leg.fromZone) }));
    if (payerCompanyId === null) throw new AppError("not_yet", "Name and invite the payer first.");
    const [before] = await ctx.tx.select({ n: count() }).from(quotes).where(eq(quotes.legId, leg.id));
    const quoteId = newId("quote");
    const number = (before?.n ?? 0) + 1;
    const totalCents = sumCents(input.lines);
    await ctx.tx.insert(quotes).values({
      id: quoteId, moveId: ctx.move.id, legId: leg.id, number, payerCompanyId, totalCents, enteredFor,
      reference: input.reference, note: input.note, goodUntil: input.goodUntil, givenBy: viewer.userId, givenAt: ctx.at,
    });
    await ctx.tx.insert(feeLines).values(input.lines.map((line, at) => ({ id: newId("feeLine"), quoteId, order: at + 1, ...line })));
    await ctx.append({ kind: "quote.given", legId: leg.id, enteredFor, detail: { quoteId, number, carrier: leg.carrierName, payer: leg.payerName, totalCents, lines: input.lines.length, goodUntil: input.goodUntil } });
    await tellPayer(ctx, leg, { quoteId, number, totalCents, lines: input.lines, goodUntil: input.goodUntil });
    return { quoteId };
  });
}

/** The payer, or the owner, agrees to a quote. */
export async function agreeQuote(viewer: Viewer, input: QuoteStep, attempt: Attempt): Promise<{ quoteId: string }> {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const quote = await requireQuote(ctx, input.quoteId);
    ctx.allow({ action: "fee.agree", legId: quote.legId });
    const leg = await requireLeg(ctx.tx, ctx.move.id, quote.legId);
    refuse(denyAgree(quote, dayAt(ctx.at.toISOString(), leg.fromZone)));
    const payerCompanyId = await seatedPayer(ctx, leg);
    if (payerCompanyId === null) throw new AppError("not_yet", "Nobody is seated as the payer of this leg any more. The owner names and invites who pays, then this quote can be agreed to.");
    // Until it is agreed another may take the payer's place; whoever pays then is who the receipt names.
    await ctx.tx.update(quotes).set({ ...(payerCompanyId !== quote.payerCompanyId && { payerCompanyId }), state: "agreed", agreedBy: viewer.userId, agreedAt: ctx.at, version: quote.version + 1 }).where(eq(quotes.id, quote.id));
    await ctx.append({ kind: "quote.agreed", legId: leg.id, detail: { quoteId: quote.id, number: quote.number, carrier: leg.carrierName, totalCents: quote.totalCents } });
    return { quoteId: quote.id };
  });
}

/** The carrier takes a quote back. A payment page that is still open for it is ended by the worker. */
export async function voidQuote(viewer: Viewer, input: VoidQuote, attempt: Attempt): Promise<{ quoteId: string }> {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const quote = await requireQuote(ctx, input.quoteId);
    const { leg, enteredFor } = await allowOnLeg(ctx, "fee.quote", quote.legId, input.enteredFor);
    refuse(denyVoid(quote));
    await ctx.tx.update(quotes).set({ state: "voided", voidedAt: ctx.at, voidedWhy: input.why, version: quote.version + 1 }).where(eq(quotes.id, quote.id));
    const open = await ctx.tx.select({ id: payments.id }).from(payments).where(and(eq(payments.quoteId, quote.id), inArray(payments.state, ["begun", "open"])));
    for (const { id } of open) await putTask(ctx.tx, { kind: "check-payment", payload: { paymentId: id }, dedupe: `end-payment:${id}`, moveId: ctx.move.id }, ctx.at);
    await ctx.append({ kind: "quote.voided", legId: leg.id, enteredFor, detail: { quoteId: quote.id, number: quote.number, carrier: leg.carrierName, why: input.why } });
    return { quoteId: quote.id };
  });
}

/** The carrier's clerk says that credit is agreed: billing is cleared without a payment. */
export async function clearBilling(viewer: Viewer, input: ClearBilling, attempt: Attempt): Promise<{ clearanceId: string }> {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { leg, enteredFor } = await allowOnLeg(ctx, "billing.clear", input.legId, input.enteredFor);
    const [before] = await ctx.tx.select({ id: billingClearances.id }).from(billingClearances).where(eq(billingClearances.legId, leg.id));
    refuse(denyClearance(Boolean(before)));
    const clearanceId = newId("billing");
    await ctx.tx.insert(billingClearances).values({ id: clearanceId, moveId: ctx.move.id, legId: leg.id, how: "credit-agreed", note: input.note, byUserId: viewer.userId, enteredFor, at: ctx.at });
    // Everybody seated reads this entry, so neither the note nor a sum is in it.
    await ctx.append({ kind: "billing.cleared", legId: leg.id, enteredFor, detail: { clearanceId, carrier: leg.carrierName, how: "credit-agreed" } });
    return { clearanceId };
  });
}

/** A quote of this move whose fees the viewer may see; refuses `not_found` otherwise. Stands inside a write, with the move's row locked. */
export async function requireQuote(ctx: MoveWrite, quoteId: string) {
  const [quote] = await ctx.tx.select().from(quotes).where(and(eq(quotes.id, quoteId), eq(quotes.moveId, ctx.move.id)));
  if (!quote || !maySeeFees(ctx.parts, quote.legId)) throw new AppError("not_found", "No such quote.");
  return quote;
}

async function standingQuote(tx: Tx, legId: string) {
  const [quote] = await tx.select({ number: quotes.number }).from(quotes).where(and(eq(quotes.legId, legId), ne(quotes.state, "voided")));
  return quote ?? null;
}

type Leg = typeof legs.$inferSelect;

/** The payer's company, once it has a seat: the one that the leg names, or the owner paying by itself. */
async function seatedPayer(ctx: MoveWrite, leg: Leg): Promise<string | null> {
  if (leg.payerCompanyId === null || leg.payerCompanyId === ctx.move.ownerCompanyId) return leg.payerCompanyId;
  const [seat] = await ctx.tx.select({ id: moveSeats.id }).from(moveSeats)
    .where(and(eq(moveSeats.moveId, ctx.move.id), eq(moveSeats.companyId, leg.payerCompanyId), eq(moveSeats.part, "payer"), eq(moveSeats.legId, leg.id), isNull(moveSeats.removedAt)));
  return seat ? leg.payerCompanyId : null;
}

type Given = { quoteId: string; number: number; totalCents: number; lines: GiveQuote["lines"]; goodUntil: string | null };

async function tellPayer(ctx: MoveWrite, leg: Leg, quote: Given) {
  const head = await unsafeCaseHead(ctx.tx, ctx.move.id);
  const [payer] = await ctx.tx.select({ name: companies.name }).from(companies).where(eq(companies.id, leg.payerCompanyId ?? ""));
  const people = await peopleIn(ctx.tx, ctx.move.id, { part: "payer", legId: leg.id });
  const news = {
    ...head,
    headline: `${leg.carrierName} asks ${formatMoney(quote.totalCents)} for its leg`,
    lines: [
      `Leg ${leg.seq}, ${leg.fromPlace} to ${leg.toPlace}, quote ${quote.number}, to be paid by ${payer?.name ?? leg.payerName ?? "the payer"}.`,
      ...quote.lines.map((line) => `${FEE_LABELS[line.kind]}, ${line.description}: ${formatMoney(line.amountCents)}`),
      ...(quote.goodUntil ? [`Good until ${formatDay(quote.goodUntil)}.`] : []),
    ],
    actionLabel: "Look at the quote",
    url: `${env().APP_URL}${routes.fees(ctx.move.id)}`,
  };
  // A payer without people yet is the owner's to look after.
  await ctx.tell(people.length > 0 ? { part: "payer", legId: leg.id } : { part: "owner" }, "quote-given", news, `quote-given:${quote.quoteId}`);
}
