import "server-only";
import { and, asc, desc, eq, inArray, isNull, or } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { billingClearances, companies, equipment, feeLines, legs, moveSeats, moves, paymentEvents, payments, quotes, users } from "@/db/schema";
import { maySeeFees, partFor, type Action } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import type { EnteredFor, HeldPart } from "@/lib/access/types";
import { AppError } from "@/lib/errors";
import { dayAt } from "@/lib/moves/when";
import { peopleIn } from "@/lib/standing/commands";
import type { Viewer } from "@/lib/viewer/types";
import { isDecline } from "./checkout";
import { hasLapsed } from "./rules";
import type { ClearanceView, ClerkStep, FeeLeg, FeesView, PaidView, PaymentView, QuoteView } from "./types";

/** The fees that the viewer may see on a move; refuses `not_found` where there are none for them. */
export async function getFees(viewer: Viewer, moveId: string, now = new Date()): Promise<FeesView> {
  const { move, parts } = await requireMove(viewer, moveId);
  const rows = await db().select().from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq));
  const seen = rows.filter((leg) => maySeeFees(parts, leg.id));
  if (seen.length === 0) throw new AppError("not_found", "No fees to see on this move.");
  const legIds = seen.map((leg) => leg.id);
  const given = await quotesOf(legIds, (legId) => dayAt(now.toISOString(), seen.find((leg) => leg.id === legId)?.fromZone ?? "UTC"));
  const cleared = await clearancesOf(legIds);
  const payerSeats = await db().select({ legId: moveSeats.legId, companyId: moveSeats.companyId }).from(moveSeats)
    .where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, "payer"), isNull(moveSeats.removedAt)));
  const open = move.state === "open";
  const shown = seen.map(async (leg): Promise<FeeLeg> => {
    const own = given.filter((row) => row.legId === leg.id).map((row) => row.view);
    const quote = own.find((one) => one.state !== "voided") ?? null;
    const onBoard = (await peopleIn(db(), moveId, { part: "carrier", legId: leg.id })).length > 0;
    const { id, seq, carrierName, carrierMark, fromPlace, toPlace, fromZone, payerName, payerCompanyId } = leg;
    const may = (action: Action) => open && partFor(parts, { action, legId: id }) !== null;
    return {
      legId: id, seq, carrierName, carrierMark, fromPlace, toPlace, fromZone, payerName,
      payerIsOwner: payerCompanyId === move.ownerCompanyId,
      payerSeated: payerCompanyId === move.ownerCompanyId || payerSeats.some((seat) => seat.legId === id && seat.companyId === payerCompanyId),
      cleared: cleared.find((row) => row.legId === id)?.view ?? null,
      quote, voided: own.filter((one) => one.state === "voided"),
      may: {
        quote: open ? clerkStep(parts, "fee.quote", id, onBoard) : null, clear: open ? clerkStep(parts, "billing.clear", id, onBoard) : null,
        agree: may("fee.agree"), pay: may("fee.pay"),
      },
    };
  });
  return { moveId, open, legs: await Promise.all(shown) };
}

const ANY_ENTRY: EnteredFor = { carrierName: "", source: "paper", heardOn: "", saidBy: "", reference: null };

function clerkStep(parts: readonly HeldPart[], action: Action, legId: string, carrierOnBoard: boolean): ClerkStep {
  if (partFor(parts, { action, legId })) return "own";
  return partFor(parts, { action, legId, enteredFor: ANY_ENTRY, carrierOnBoard }) ? "entered" : null;
}

const iso = (at: Date | null) => at?.toISOString() ?? null;

async function quotesOf(legIds: string[], todayOf: (legId: string) => string): Promise<{ legId: string; view: QuoteView }[]> {
  const rows = await db().select({ quote: quotes, payerName: companies.name }).from(quotes).innerJoin(companies, eq(companies.id, quotes.payerCompanyId))
    .where(inArray(quotes.legId, legIds)).orderBy(desc(quotes.number));
  if (rows.length === 0) return [];
  const ids = rows.map(({ quote }) => quote.id);
  const lines = await db().select().from(feeLines).where(inArray(feeLines.quoteId, ids)).orderBy(asc(feeLines.order));
  const tries = await paymentsOf(ids);
  const nameOf = await namesOf(rows.flatMap(({ quote }) => [quote.givenBy, quote.agreedBy]));
  return rows.map(({ quote, payerName }) => {
    const { id, number, reference, state, totalCents, note, goodUntil, enteredFor, voidedWhy } = quote;
    return {
      legId: quote.legId,
      view: {
        id, number, reference, payerName, state, totalCents, note, goodUntil, enteredFor: enteredFor ?? null, voidedWhy,
        lapsed: state === "given" && hasLapsed(goodUntil, todayOf(quote.legId)),
        givenBy: nameOf(quote.givenBy), givenAt: quote.givenAt.toISOString(),
        agreedBy: quote.agreedBy && nameOf(quote.agreedBy), agreedAt: iso(quote.agreedAt), voidedAt: iso(quote.voidedAt),
        lines: lines.filter((line) => line.quoteId === id).map(({ id: lineId, kind, description, amountCents }) => ({ id: lineId, kind, description, amountCents })),
        payments: tries.filter((one) => one.quoteId === id).map((one) => one.view),
      },
    };
  });
}

async function paymentsOf(quoteIds: string[]): Promise<{ quoteId: string; view: PaymentView }[]> {
  const rows = await db().select().from(payments).where(inArray(payments.quoteId, quoteIds)).orderBy(asc(payments.attempt));
  if (rows.length === 0) return [];
  const events = await db().select({ paymentId: paymentEvents.paymentId, type: paymentEvents.type, outcome: paymentEvents.outcome, flagged: paymentEvents.flagged }).from(paymentEvents)
    .where(inArray(paymentEvents.paymentId, rows.map((row) => row.id))).orderBy(asc(paymentEvents.at));
  const nameOf = await namesOf(rows.map((row) => row.begunBy));
  return rows.map(({ id, quoteId, attempt, state, amountCents, begunBy, begunAt, expiresAt, paidAt }) => {
    const own = events.filter((event) => event.paymentId === id);
    const flags = [...new Set(own.filter((event) => event.flagged).map((event) => event.outcome))];
    const declines = own.filter((event) => isDecline(event.type)).length;
    return { quoteId, view: { id, attempt, state, amountCents, begunBy: nameOf(begunBy), begunAt: begunAt.toISOString(), expiresAt: iso(expiresAt), paidAt: iso(paidAt), declines, flags } };
  });
}

async function clearancesOf(legIds: string[]): Promise<{ legId: string; view: ClearanceView }[]> {
  const rows = await db().select().from(billingClearances).where(inArray(billingClearances.legId, legIds));
  const nameOf = await namesOf(rows.map((row) => row.byUserId));
  return rows.map(({ legId, how, note, byUserId, enteredFor, at }) => ({ legId, view: { how, note, by: byUserId && nameOf(byUserId), enteredFor: enteredFor ?? null, at: at.toISOString() } }));
}

async function namesOf(userIds: (string | null)[]): Promise<(userId: string) => string> {
  const wanted = [...new Set(userIds.filter((id) => id !== null))];
  const rows = wanted.length > 0 ? await db().select({ id: users.id, name: users.name }).from(users).where(inArray(users.id, wanted)) : [];
  return (userId) => rows.find((row) => row.id === userId)?.name ?? "Somebody";
}

/** What an id of ours or of the payment service can look like; the columns hold plain ascii and refuse to be compared with more. */
const isName = (text: string | null): text is string => text !== null && /^\w{1,120}$/.test(text);

/** Where the payment behind a page stands, for who comes back from it; null when it is none that the viewer may see. */
export async function findPaid(viewer: Viewer, moveId: string, sessionId: string): Promise<PaidView | null> {
  const { parts } = await requireMove(viewer, moveId);
  if (!isName(sessionId)) return null;
  const [row] = await db()
    .select({ state: payments.state, amountCents: payments.amountCents, paidAt: payments.paidAt, quoteNumber: quotes.number, legId: quotes.legId, carrierName: legs.carrierName, zone: legs.fromZone })
    .from(payments).innerJoin(quotes, eq(quotes.id, payments.quoteId)).innerJoin(legs, eq(legs.id, quotes.legId))
    .where(and(eq(payments.moveId, moveId), eq(payments.sessionId, sessionId)));
  if (!row || !maySeeFees(parts, row.legId)) return null;
  const { legId: _seen, paidAt, ...rest } = row;
  return { ...rest, paidAt: iso(paidAt) };
}

/** No viewer: the words that head a mail about a case, for writes that have checked whom they tell. */
export async function unsafeCaseHead(reader: Reader, moveId: string): Promise<{ unit: string; caseNumber: string }> {
  const [row] = await reader.select({ mark: equipment.mark, number: equipment.number, caseNumber: moves.caseNumber }).from(moves)
    .leftJoin(equipment, eq(equipment.moveId, moves.id)).where(eq(moves.id, moveId));
  return { unit: [row?.mark, row?.number].filter(Boolean).join(" "), caseNumber: row?.caseNumber ?? "" };
}

/** No viewer: the payment that a notice of the payment service is about, found by any of its names; null when it is none of ours. */
export async function unsafeFindPayment({ paymentId, sessionId, intentId }: { paymentId: string | null; sessionId: string | null; intentId: string | null }) {
  const names = [isName(paymentId) && eq(payments.id, paymentId), isName(sessionId) && eq(payments.sessionId, sessionId), isName(intentId) && eq(payments.intentId, intentId)].filter((one) => one !== false);
  if (names.length === 0) return null;
  const [row] = await db().select().from(payments).where(or(...names)).limit(1);
  return row ?? null;
}
