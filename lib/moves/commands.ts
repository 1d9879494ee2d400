import "server-only";
import { and, asc, desc, eq, inArray, isNull, sql } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { caseCounters, equipment, equipmentAliases, invitations, legs, moveDrafts, moves, moveSeats, record } from "@/db/schema";
import { requireMember } from "@/lib/access/scope";
import { env } from "@/lib/env";
import { AppError, refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { appendRecord } from "@/lib/record/commands";
import type { RecordKind } from "@/lib/record/vocabulary";
import { routes } from "@/lib/routes";
import { refreshStanding, requireLeg, write, writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { LegFacts } from "@/lib/standing/types";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { joinAnswers, splitAnswers } from "./answers";
import { caseNumberOf } from "./case-number";
import { changeLine, fieldChanges, unitChanges, type Change } from "./changes";
import type { BeginDraft, CancelMove, DiscardDraft, EditEquipment, EditLeg, EditMove, OpenMove, SaveDraft } from "./input";
import { denyCarrierChange, denyLegEdit, denyPayerChange } from "./leg-rules";
import { chainLegs, payerOf } from "./legs-of-input";
import { getDraft, unsafeEquipmentOf } from "./queries";
import { searchTextOf } from "./search";
import type { SavedDraft } from "./types";

const matched = ([header]: readonly [{ affectedRows: number }, ...unknown[]]) => header.affectedRows > 0;
const companyIds = (viewer: Viewer) => viewer.memberships.map((one) => one.companyId);

/** Begins a draft for a company of the viewer's. */
export async function beginDraft(viewer: Viewer, { companyId, body }: BeginDraft, attempt: Attempt): Promise<SavedDraft> {
  requireMember(viewer, companyId);
  return write(viewer, attempt, async (tx) => {
    const draftId = newId("draft");
    await tx.insert(moveDrafts).values({ id: draftId, companyId, createdBy: viewer.userId, body, createdAt: attempt.at, updatedAt: attempt.at });
    return { draftId, version: 1, updatedAt: attempt.at.toISOString() };
  });
}

/** Keeps a draft as typed; refused when somebody else saved it since it was read. */
export async function saveDraft(viewer: Viewer, { draftId, companyId, body, version }: SaveDraft, attempt: Attempt): Promise<SavedDraft> {
  requireMember(viewer, companyId);
  return write(viewer, attempt, async (tx) => {
    const mine = and(eq(moveDrafts.id, draftId), inArray(moveDrafts.companyId, companyIds(viewer)), eq(moveDrafts.version, version));
    if (!matched(await tx.update(moveDrafts).set({ body, companyId, updatedAt: attempt.at, version: version + 1 }).where(mine))) {
      await getDraft(viewer, draftId, tx);
      throw new AppError("stale", "This draft was saved from somewhere else meanwhile. Nothing of yours was lost; choose what shall stand.");
    }
    return { draftId, version: version + 1, updatedAt: attempt.at.toISOString() };
  });
}

export async function discardDraft(viewer: Viewer, { draftId }: DiscardDraft, attempt: Attempt): Promise<{ draftId: string }> {
  return write(viewer, attempt, async (tx) => {
    await endDraft(tx, viewer, draftId);
    return { draftId };
  });
}

async function endDraft(tx: Tx, viewer: Viewer, draftId: string) {
  const mine = and(eq(moveDrafts.id, draftId), inArray(moveDrafts.companyId, companyIds(viewer)));
  if (!matched(await tx.delete(moveDrafts).where(mine))) throw new AppError("not_found", "No such draft. Somebody of your company may have opened or discarded it.");
}

/** One case number per opening; the counter's row stays locked until the transaction ends. */
async function nextCaseNumber(tx: Tx, at: Date): Promise<string> {
  const year = at.getUTCFullYear();
  await tx.insert(caseCounters).values({ year, last: 1 }).onDuplicateKeyUpdate({ set: { last: sql`${caseCounters.last} + 1` } });
  const [row] = await tx.select({ last: caseCounters.last }).from(caseCounters).where(eq(caseCounters.year, year));
  return caseNumberOf(year, row?.last ?? 1);
}

/** The unit of a move just opened, for rooms that fill themselves from it. */
export type OpenedUnit = { brakeSchedule: string; bearings: string; facts: Record<string, string> };

/** Opens a move with its unit, route and payers, for a company of the viewer's; ends the draft it came from. `after` lets later rooms add their rows in the same transaction. */
export async function openMove(viewer: Viewer, input: OpenMove, attempt: Attempt, after?: (tx: Tx, moveId: string, unit: OpenedUnit, at: Date) => Promise<unknown>): Promise<{ moveId: string; caseNumber: string }> {
  const member = viewer.memberships.find((one) => one.companyId === input.companyId);
  if (!member) throw new AppError("bad_input", "Some entries need another look.", { fields: { companyId: ["Choose a company of yours."] } });
  const { at } = attempt;
  return write(viewer, attempt, async (tx) => {
    if (input.draftId) await endDraft(tx, viewer, input.draftId);
    const moveId = newId("move");
    const caseNumber = await nextCaseNumber(tx, at);
    const { columns, facts } = splitAnswers(input.answers);
    const route = chainLegs(input.legs, input.origin, input.destination, member);
    await insertMove(tx, { moveId, caseNumber, viewer, input, columns, route, at });
    await tx.insert(equipment).values({ moveId, ...columns, facts });
    await keepAliases(tx, moveId, input.aliases);
    await insertRoute(tx, moveId, route, at);
    await tx.insert(moveSeats).values({ id: newId("seat"), moveId, companyId: member.companyId, part: "owner", createdAt: at });
    await after?.(tx, moveId, { brakeSchedule: columns.brakeSchedule, bearings: columns.bearings, facts }, at);
    const by = { userId: viewer.userId, name: viewer.name, companyId: member.companyId, companyName: member.companyName, part: "owner" as const };
    const detail = { caseNumber, unit: `${columns.mark} ${columns.number}`, from: input.origin.name, to: input.destination.name, carriers: route.map((leg) => leg.carrierName) };
    await appendRecord(tx, moveId, by, { kind: "move.opened", detail }, at);
    await refreshStanding(tx, moveId, at);
    return { moveId, caseNumber };
  });
}

type Route = ReturnType<typeof chainLegs>;
type Opening = { moveId: string; caseNumber: string; viewer: Viewer; input: OpenMove; columns: { mark: string; number: string }; route: Route; at: Date };

async function insertMove(tx: Tx, { moveId, caseNumber, viewer, input, columns, route, at }: Opening) {
  const { origin, destination, aliases, wantedFrom, wantedTo, note } = input;
  await tx.insert(moves).values({
    id: moveId, caseNumber, ownerCompanyId: input.companyId, wantedFrom, wantedTo, note,
    originName: origin.name, originPlace: origin.place, originZone: origin.zone,
    destinationName: destination.name, destinationPlace: destination.place, destinationZone: destination.zone,
    searchText: searchTextOf({ caseNumber, ...columns, aliases, places: placesOf(origin, destination, route) }),
    openedBy: viewer.userId, openedAt: at,
  });
}

const placesOf = (origin: { name: string; place: string }, destination: { name: string; place: string }, route: readonly { carrierName: string; carrierMark: string | null; toPlace: string }[]) =>
  [origin.name, origin.place, destination.name, destination.place, ...route.flatMap((leg) => [leg.toPlace, leg.carrierName, leg.carrierMark ?? ""])].filter((place) => place !== "");

async function insertRoute(tx: Tx, moveId: string, route: Route, at: Date) {
  for (const leg of route) {
    const legId = newId("leg");
    await tx.insert(legs).values({ id: legId, moveId, ...leg });
    if (leg.payerCompanyId) await seatPayer(tx, moveId, legId, leg.payerCompanyId, at);
  }
}

/** A payer who held this seat before gets it back. */
async function seatPayer(tx: Tx, moveId: string, legId: string, companyId: string, at: Date) {
  await tx.insert(moveSeats).values({ id: newId("seat"), moveId, companyId, part: "payer", legId, legKey: legId, createdAt: at }).onDuplicateKeyUpdate({ set: { removedAt: null } });
}

async function keepAliases(tx: Tx, moveId: string, aliases: readonly string[]) {
  await tx.delete(equipmentAliases).where(eq(equipmentAliases.moveId, moveId));
  if (aliases.length > 0) await tx.insert(equipmentAliases).values(aliases.map((alias) => ({ id: newId("alias"), moveId, alias })));
}

/** The list must find the move under its new names. */
async function keepSearchText(tx: Tx, moveId: string) {
  const [move] = await tx.select().from(moves).where(eq(moves.id, moveId));
  if (!move) return;
  const { columns, aliases } = await unsafeEquipmentOf(tx, moveId);
  const route = await tx.select().from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq));
  const ends = [{ name: move.originName, place: move.originPlace }, { name: move.destinationName, place: move.destinationPlace }] as const;
  await tx.update(moves).set({ searchText: searchTextOf({ caseNumber: move.caseNumber, ...columns, aliases, places: placesOf(ends[0], ends[1], route) }) }).where(eq(moves.id, moveId));
}

/** Refuses because somebody else wrote first, and tells who changed what since the version that was read. */
async function refuseStale(ctx: MoveWrite, kinds: RecordKind[], version: number, legId: string | null): Promise<never> {
  const rows = await ctx.tx.select({ by: record.byName, detail: record.detail, legId: record.legId }).from(record)
    .where(and(eq(record.moveId, ctx.move.id), inArray(record.kind, kinds))).orderBy(desc(record.seq)).limit(20);
  const since = rows.filter((row) => row.legId === legId && Number((row.detail as { version?: number }).version ?? 0) > version);
  const missing = since.flatMap(({ by, detail }) => ((detail as { changes?: Change[] }).changes ?? []).map((change) => changeLine(by, change)));
  const who = [...new Set(since.map((row) => row.by))].join(" and ") || "Somebody else";
  throw new AppError("stale", `${who} changed this while you were writing. Nothing was overwritten; what you typed is still here.`, { missing });
}

/** Keeps changed facts of the unit; the record tells each before and after. */
export async function editEquipment(viewer: Viewer, { moveId, version, answers, aliases }: EditEquipment, attempt: Attempt): Promise<{ version: number }> {
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "equipment.edit" });
    const kept = await unsafeEquipmentOf(ctx.tx, moveId);
    if (kept.version !== version) return refuseStale(ctx, ["equipment.changed"], version, null);
    const { columns, facts } = splitAnswers(answers);
    const changes = unitChanges({ answers: joinAnswers(kept.columns, kept.facts), aliases: kept.aliases }, { answers: joinAnswers(columns, facts), aliases });
    if (changes.length === 0) return { version };
    await ctx.tx.update(equipment).set({ ...columns, facts, version: version + 1 }).where(and(eq(equipment.moveId, moveId), eq(equipment.version, version)));
    await keepAliases(ctx.tx, moveId, aliases);
    await keepSearchText(ctx.tx, moveId);
    await ctx.append({ kind: "equipment.changed", detail: { version: version + 1, changes } });
    return { version: version + 1 };
  });
}

const LEG_LABELS = { carrierName: "Carrier", carrierMark: "Carrier code", toPlace: "Interchange", toZone: "Time zone", miles: "Miles", payerName: "Payer" };

/** Changes a leg that has not begun. Another carrier than before leaves the seat of the first. */
export async function editLeg(viewer: Viewer, input: EditLeg, attempt: Attempt): Promise<{ version: number }> {
  const { moveId, legId, version } = input;
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "leg.edit" });
    const leg = await requireLeg(ctx.tx, moveId, legId);
    if (leg.version !== version) return refuseStale(ctx, ["leg.changed", "carrier.named"], version, legId);
    const facts = await unsafeGatherFacts(ctx.tx, moveId);
    const own = facts.legs.find((one) => one.legId === legId);
    const next = facts.legs.find((one) => one.seq === leg.seq + 1);
    if (!own) throw new AppError("not_found", "No such leg on this move.");
    const owner = { companyId: facts.ownerCompanyId, companyName: facts.ownerName };
    const end = next ? { toPlace: input.toPlace, toZone: input.toZone } : { toPlace: leg.toPlace, toZone: leg.toZone };
    if (!end.toPlace || !end.toZone) throw new AppError("bad_input", "Some entries need another look.", { fields: { ...(!end.toPlace && { toPlace: ["Enter where the next carrier takes over."] }), ...(!end.toZone && { toZone: ["Choose the time zone."] }) } });
    const after = { carrierName: input.carrierName, carrierMark: input.carrierMark, miles: input.miles, toPlace: end.toPlace, toZone: end.toZone, ...payerAfter(input, leg, owner) };
    const changes = fieldChanges(LEG_LABELS, leg, after);
    if (changes.length === 0) return { version };
    denyLegChanges(changes, own, next ?? null);
    const carrierChanged = changes.some((change) => change.key === "carrierName");
    if (carrierChanged && leg.carrierCompanyId) await leaveSeat(ctx, legId, "carrier", leg.carrierCompanyId);
    if (leg.payerCompanyId && leg.payerCompanyId !== after.payerCompanyId) await leaveSeat(ctx, legId, "payer", leg.payerCompanyId);
    if (after.payerCompanyId) await seatPayer(ctx.tx, moveId, legId, after.payerCompanyId, ctx.at);
    await ctx.tx.update(legs).set({ ...after, version: version + 1, ...(carrierChanged && { carrierCompanyId: null }) }).where(and(eq(legs.id, legId), eq(legs.version, version)));
    if (next) await ctx.tx.update(legs).set({ fromPlace: end.toPlace, fromZone: end.toZone }).where(eq(legs.id, next.legId));
    await keepSearchText(ctx.tx, moveId);
    await ctx.append({ kind: carrierChanged ? "carrier.named" : "leg.changed", legId, detail: { seq: leg.seq, carrier: after.carrierName, before: leg.carrierName, version: version + 1, changes } });
    return { version: version + 1 };
  });
}

/** The same name again leaves an invited payer in its seat. */
function payerAfter(input: Pick<EditLeg, "payer" | "payerName">, leg: { payerName: string | null; payerCompanyId: string | null }, owner: { companyId: string; companyName: string }) {
  const wanted = payerOf(input, owner);
  return wanted.payerName === leg.payerName ? { payerName: leg.payerName, payerCompanyId: leg.payerCompanyId ?? wanted.payerCompanyId } : wanted;
}

function denyLegChanges(changes: readonly Change[], own: LegFacts, next: LegFacts | null) {
  const changed = (...keys: string[]) => changes.some((change) => keys.includes(change.key));
  if (changed("carrierName")) refuse(denyCarrierChange(own));
  if (changed("carrierMark", "miles", "toPlace", "toZone")) refuse(denyLegEdit(own));
  if (next && changed("toPlace", "toZone")) refuse(denyLegEdit(next));
  if (changed("payerName")) refuse(denyPayerChange(own));
}

async function leaveSeat(ctx: MoveWrite, legId: string, part: "carrier" | "payer", companyId: string) {
  const seat = and(eq(moveSeats.moveId, ctx.move.id), eq(moveSeats.companyId, companyId), eq(moveSeats.part, part), eq(moveSeats.legId, legId), isNull(moveSeats.removedAt));
  const [held] = await ctx.tx.select({ id: moveSeats.id }).from(moveSeats).where(seat);
  if (!held) return;
  await ctx.tx.update(moveSeats).set({ removedAt: ctx.at }).where(eq(moveSeats.id, held.id));
  await ctx.tx.update(invitations).set({ revokedAt: ctx.at }).where(and(eq(invitations.seatId, held.id), isNull(invitations.acceptedAt), isNull(invitations.revokedAt)));
}

const MOVE_LABELS = { originName: "From", originPlace: "From, town", originZone: "From, time zone", destinationName: "To", destinationPlace: "To, town", destinationZone: "To, time zone", wantedFrom: "Wanted from", wantedTo: "Wanted until", note: "Note" };

/** Changes where the move begins and ends, its wanted days and its note. Ends that a carrier has accepted stay. */
export async function editMove(viewer: Viewer, { moveId, version, origin, destination, ...rest }: EditMove, attempt: Attempt): Promise<{ version: number }> {
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "move.edit" });
    const [kept] = await ctx.tx.select().from(moves).where(eq(moves.id, moveId));
    if (!kept || kept.version !== version) return refuseStale(ctx, ["move.changed"], version, null);
    const after = { originName: origin.name, originPlace: origin.place, originZone: origin.zone, destinationName: destination.name, destinationPlace: destination.place, destinationZone: destination.zone, ...rest };
    const changes = fieldChanges(MOVE_LABELS, kept, after);
    if (changes.length === 0) return { version };
    const route = (await unsafeGatherFacts(ctx.tx, moveId)).legs;
    const [first, last] = [route[0], route.at(-1)];
    if (first && changes.some(({ key }) => key.startsWith("origin"))) refuse(denyLegEdit(first));
    if (last && changes.some(({ key }) => key.startsWith("destination"))) refuse(denyLegEdit(last));
    await ctx.tx.update(moves).set({ ...after, version: version + 1 }).where(and(eq(moves.id, moveId), eq(moves.version, version)));
    if (first) await ctx.tx.update(legs).set({ fromPlace: origin.place, fromZone: origin.zone }).where(eq(legs.id, first.legId));
    if (last) await ctx.tx.update(legs).set({ toPlace: destination.place, toZone: destination.zone }).where(eq(legs.id, last.legId));
    await keepSearchText(ctx.tx, moveId);
    await ctx.append({ kind: "move.changed", detail: { version: version + 1, changes } });
    return { version: version + 1 };
  });
}

const TOLD = ["contractor", "inspector", "billing", "desk", "receiver", "payer"] as const;

/** Ends a case without the move having been made. Everybody on it is told; no carrier is told to stop by this. */
export async function cancelMove(viewer: Viewer, { moveId, reason }: CancelMove, attempt: Attempt): Promise<{ moveId: string }> {
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "move.cancel" });
    await ctx.tx.update(moves).set({ state: "cancelled", cancelledAt: ctx.at }).where(eq(moves.id, moveId));
    await ctx.append({ kind: "move.cancelled", detail: { reason } });
    const { columns } = await unsafeEquipmentOf(ctx.tx, moveId);
    const news = { unit: `${columns.mark} ${columns.number}`, caseNumber: ctx.move.caseNumber, headline: "The owner cancelled the move", lines: [reason], actionLabel: "See the case", url: new URL(routes.move(moveId), env().APP_URL).href };
    for (const part of TOLD) await ctx.tell({ part }, "move-closed", news, `cancelled:${moveId}`);
    return { moveId };
  });
}
