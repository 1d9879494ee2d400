import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { arrivals, equipment, instructions, legs, moves, releases, sightings } from "@/db/schema";
import type { EnteredFor } from "@/lib/access/types";
import { AppError, refuse } from "@/lib/errors";
import { env } from "@/lib/env";
import { linkPhotos } from "@/lib/evidence/commands";
import { newId } from "@/lib/ids";
import { dayAt, formatWhen, toUtc } from "@/lib/moves/when";
import { openRestore } from "@/lib/prep/commands";
import { keepSignature } from "@/lib/record/commands";
import { routes } from "@/lib/routes";
import { allowOnLeg, peopleIn, writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import { denyClosing, denyInstruction, denyRelease } from "@/lib/standing/rules";
import type { LegFacts, MoveFacts } from "@/lib/standing/types";
import { EVENT_CODES } from "./event-codes";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { CloseMove, GiveInstruction, MakeSighting, RecordArrival, ReleaseUnit, RetractSighting, WithdrawInstruction } from "./input";
import { arrivalStatement, closingStatement, denyArrivalDay, denyAsReceiver, denyRetraction, denySighting, denyTakingBack, denyTime, releaseStatement } from "./rules";

async function unitOf(ctx: MoveWrite): Promise<string> {
  const [unit] = await ctx.tx.select({ mark: equipment.mark, number: equipment.number }).from(equipment).where(eq(equipment.moveId, ctx.move.id));
  return `${unit?.mark ?? ""} ${unit?.number ?? ""}`.trim();
}

function legOf(facts: MoveFacts, legId: string): LegFacts {
  const leg = facts.legs.find((one) => one.legId === legId);
  if (!leg) throw new AppError("not_found", "No such leg on this move.");
  return leg;
}

const newsOf = (ctx: MoveWrite, unit: string, headline: string, lines: string[]) => ({ unit, caseNumber: ctx.move.caseNumber, headline, lines, actionLabel: "See the movement", url: `${env().APP_URL}${routes.movement(ctx.move.id)}` });

/** The transport desk's instruction, when acceptance and billing stand. A new one takes the place of the one before. */
export async function giveInstruction(viewer: Viewer, input: GiveInstruction, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { leg, enteredFor } = await allowOnLeg(ctx, "movement.instruct", input.legId, input.enteredFor);
    const facts = await unsafeGatherFacts(ctx.tx, ctx.move.id);
    const now = legOf(facts, leg.id);
    if (now.takenOver) throw new AppError("not_yet", `${leg.carrierName} has taken the unit over already.`);
    refuse(denyInstruction(facts, now));
    await ctx.tx.update(instructions).set({ withdrawnAt: ctx.at, withdrawnWhy: "Replaced by a newer instruction" }).where(and(eq(instructions.legId, leg.id), isNull(instructions.withdrawnAt)));
    const id = newId("instruction");
    const { billNumber, clearanceNumber, train, pickupFrom, text } = input;
    await ctx.tx.insert(instructions).values({ id, moveId: ctx.move.id, legId: leg.id, billNumber, clearanceNumber, train, pickupFrom, text, byUserId: viewer.userId, enteredFor, at: ctx.at });
    const entry = await ctx.append({ kind: "instruction.given", legId: leg.id, enteredFor, detail: { instructionId: id, carrier: leg.carrierName, billNumber, clearanceNumber, train, pickupFrom } });
    const unit = await unitOf(ctx);
    const news = newsOf(ctx, unit, `${leg.carrierName} will move it`, [`Bill of lading ${billNumber}.`, leg.seq === 1 ? "The owner releases the unit next." : "The carrier takes it over at the interchange next."]);
    for (const part of ["owner", "contractor"] as const) await ctx.tell({ part }, "movement", news, entry);
    return { instructionId: id };
  });
}

/** Takes an instruction back before the unit has been taken over. */
export async function withdrawInstruction(viewer: Viewer, input: WithdrawInstruction, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const [found] = await ctx.tx.select().from(instructions).where(and(eq(instructions.id, input.instructionId), eq(instructions.moveId, ctx.move.id)));
    if (!found) throw new AppError("not_found", "No such instruction on this move.");
    const { leg, enteredFor } = await allowOnLeg(ctx, "movement.instruct", found.legId, input.enteredFor);
    if (found.withdrawnAt) throw new AppError("stale", "This instruction is withdrawn already.");
    if (legOf(await unsafeGatherFacts(ctx.tx, ctx.move.id), leg.id).takenOver) throw new AppError("not_yet", `${leg.carrierName} has taken the unit over already.`);
    await ctx.tx.update(instructions).set({ withdrawnAt: ctx.at, withdrawnWhy: input.why }).where(eq(instructions.id, found.id));
    const entry = await ctx.append({ kind: "instruction.withdrawn", legId: leg.id, enteredFor, detail: { instructionId: found.id, carrier: leg.carrierName, why: input.why } });
    await ctx.tell({ part: "owner" }, "movement", newsOf(ctx, await unitOf(ctx), `${leg.carrierName} withdrew its movement instruction`, [input.why]), entry);
    return { instructionId: found.id };
  });
}

/** The owner tenders the unit to the first carrier. */
export async function releaseUnit(viewer: Viewer, input: ReleaseUnit, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const held = ctx.allow({ action: "unit.release" });
    const facts = await unsafeGatherFacts(ctx.tx, ctx.move.id);
    const first = facts.legs.find((leg) => leg.seq === 1);
    if (!first) throw new AppError("not_yet", "The move has no leg.");
    if (first.released) throw new AppError("stale", "The unit is released already.");
    refuse(denyRelease(facts, first));
    const unit = await unitOf(ctx);
    const id = newId("release");
    const rows = { unit, carrier: first.carrierName, acceptance: first.acceptanceNumber, from: ctx.move.originName, to: ctx.move.destinationName };
    const statement = releaseStatement(unit, first.carrierName);
    const signatureId = await keepSignature(ctx.tx, { moveId: ctx.move.id, kind: "release", subjectId: id, userId: viewer.userId, companyId: held.companyId, name: input.name, statement, rows }, ctx.at);
    await ctx.tx.insert(releases).values({ id, moveId: ctx.move.id, legId: first.legId, note: input.note, signatureId, at: ctx.at });
    const entry = await ctx.append({ kind: "unit.released", legId: first.legId, detail: { releaseId: id, carrier: first.carrierName, name: input.name } });
    const news = newsOf(ctx, unit, "Released to the carrier", [`${input.name} tendered the unit to ${first.carrierName}.`, "When the carrier’s engine is coupled, the last prep items are done and signed; then it is pulled."]);
    await ctx.tell({ part: "desk", legId: first.legId }, "movement", news, entry);
    await ctx.tell({ part: "contractor" }, "movement", news, entry);
    return { releaseId: id };
  });
}

/** Records where the unit was, with place, time and zone. Pulled and received ask for every condition of the leg. */
export async function makeSighting(viewer: Viewer, input: MakeSighting, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { leg, enteredFor } = await allowOnLeg(ctx, "movement.sight", input.legId, input.enteredFor);
    const occurredAt = momentOf(input);
    refuse(denyTime(occurredAt, ctx.at));
    const replaced = input.corrects ? await retract(ctx, { sightingId: input.corrects, legId: leg.id, why: "Corrected by a newer sighting", replacedBy: input.kind, enteredFor }) : null;
    const facts = await unsafeGatherFacts(ctx.tx, ctx.move.id);
    const now = legOf(facts, leg.id);
    if (!enteredFor) refuse(denyAsReceiver(ctx.parts, facts, now, input.kind));
    if (replaced?.kind !== input.kind) refuse(denySighting(facts, now, input.kind));
    const id = newId("sighting");
    const { kind, place, zone, train, note, corrects } = input;
    await ctx.tx.insert(sightings).values({ id, moveId: ctx.move.id, legId: leg.id, kind, place, zone, occurredAt, train, note, byUserId: viewer.userId, byName: viewer.name, enteredFor, at: ctx.at, corrects });
    await linkPhotos(ctx, input.photoIds, "sighting", id);
    const entry = await ctx.append({ kind: "sighting.made", legId: leg.id, enteredFor, detail: { sightingId: id, sighting: kind, place, zone, occurredAt: occurredAt.toISOString(), carrier: leg.carrierName, train, corrects } });
    await tellSighting(ctx, { kind, place, zone, occurredAt, carrier: leg.carrierName, seq: leg.seq, corrects }, facts, entry);
    return { sightingId: id };
  });
}

function momentOf({ occurredAt, zone }: Pick<MakeSighting, "occurredAt" | "zone">): Date {
  try {
    return toUtc(occurredAt, zone);
  } catch (error) {
    if (error instanceof AppError) throw new AppError("bad_input", "Some entries need another look.", { fields: { occurredAt: [error.message] }, cause: error });
    throw error;
  }
}

type Told = { kind: MakeSighting["kind"]; place: string; zone: string; occurredAt: Date; carrier: string; seq: number; corrects: string | null };

async function tellSighting(ctx: MoveWrite, told: Told, facts: MoveFacts, entry: string) {
  const unit = await unitOf(ctx);
  const label = EVENT_CODES[told.kind].label;
  const news = newsOf(ctx, unit, `${told.corrects ? "Corrected: " : ""}${label} at ${told.place}`, [`${told.carrier}, ${formatWhen(told.occurredAt.toISOString(), told.zone)}.`]);
  await ctx.tell({ part: "owner" }, "movement", news, entry);
  const next = facts.legs.find((leg) => leg.seq === told.seq + 1);
  if (told.kind === "delivered" && next) await ctx.tell({ part: "desk", legId: next.legId }, "movement", news, entry);
  if (["at-destination", "notified", "placed"].includes(told.kind)) await ctx.tell({ part: "receiver" }, "movement", news, entry);
}

type Retraction = { sightingId: string; legId: string; why: string; replacedBy?: MakeSighting["kind"]; enteredFor?: EnteredFor | null };

async function retract(ctx: MoveWrite, { sightingId, legId, why, replacedBy, enteredFor }: Retraction) {
  const all = await ctx.tx.select({ id: sightings.id, legId: sightings.legId, kind: sightings.kind, place: sightings.place, retractedAt: sightings.retractedAt, byUserId: sightings.byUserId, enteredFor: sightings.enteredFor, legSeq: legs.seq }).from(sightings)
    .innerJoin(legs, eq(legs.id, sightings.legId)).where(eq(sightings.moveId, ctx.move.id));
  const said = all.find((one) => one.id === sightingId);
  if (!said || said.legId !== legId) throw new AppError("not_found", "No such sighting on this leg.");
  if (replacedBy && !enteredFor) refuse(denyTakingBack(ctx.parts, legId, await saidByReceiver(ctx, said)));
  const plain = (one: (typeof all)[number]) => ({ kind: one.kind, legSeq: one.legSeq, retracted: one.retractedAt !== null });
  const [arrival] = await ctx.tx.select({ id: arrivals.id }).from(arrivals).where(eq(arrivals.moveId, ctx.move.id));
  refuse(denyRetraction(plain(said), all.filter((one) => one.id !== sightingId).map(plain), Boolean(arrival), replacedBy));
  await ctx.tx.update(sightings).set({ retractedAt: ctx.at, retractedWhy: why }).where(eq(sightings.id, sightingId));
  return said;
}

async function saidByReceiver(ctx: MoveWrite, said: { byUserId: string; enteredFor: EnteredFor | null }): Promise<boolean> {
  return !said.enteredFor && (await peopleIn(ctx.tx, ctx.move.id, { part: "receiver" })).some((person) => person.userId === said.byUserId);
}

/** Takes back a sighting that was wrong; it stays on record as retracted. */
export async function retractSighting(viewer: Viewer, input: RetractSighting, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const [found] = await ctx.tx.select({ legId: sightings.legId, byUserId: sightings.byUserId, enteredFor: sightings.enteredFor }).from(sightings).where(and(eq(sightings.id, input.sightingId), eq(sightings.moveId, ctx.move.id)));
    if (!found) throw new AppError("not_found", "No such sighting on this move.");
    const { leg, enteredFor } = await allowOnLeg(ctx, "movement.sight", found.legId, input.enteredFor);
    if (!enteredFor) refuse(denyTakingBack(ctx.parts, leg.id, await saidByReceiver(ctx, found)));
    const said = await retract(ctx, { sightingId: input.sightingId, legId: leg.id, why: input.why });
    await ctx.append({ kind: "sighting.retracted", legId: leg.id, enteredFor, detail: { sightingId: said.id, sighting: said.kind, place: said.place, why: input.why, carrier: leg.carrierName } });
    return { sightingId: said.id };
  });
}

/** The receiver's look at the unit; from here on what was done for the tow waits to be put back. */
export async function recordArrival(viewer: Viewer, input: RecordArrival, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const held = ctx.allow({ action: "arrival.record" });
    const facts = await unsafeGatherFacts(ctx.tx, ctx.move.id);
    if (facts.arrived) throw new AppError("stale", "The arrival is recorded already.");
    if (!facts.legs.at(-1)?.placed) throw new AppError("not_yet", "The arrival is recorded once the unit has been placed.");
    refuse(denyArrivalDay(input.arrivedOn, dayAt(ctx.at.toISOString(), ctx.move.destinationZone)));
    const unit = await unitOf(ctx);
    const id = newId("arrival");
    const { arrivedOn, condition, missing } = input;
    const rows = { unit, arrivedOn, condition, missing, photos: [...input.photoIds].sort() };
    const statement = arrivalStatement(unit, ctx.move.destinationName);
    const signatureId = await keepSignature(ctx.tx, { moveId: ctx.move.id, kind: "arrival", subjectId: id, userId: viewer.userId, companyId: held.companyId, name: input.name, statement, rows }, ctx.at);
    await ctx.tx.insert(arrivals).values({ id, moveId: ctx.move.id, arrivedOn, condition, missing, signatureId, byUserId: viewer.userId, at: ctx.at });
    await linkPhotos(ctx, input.photoIds, "arrival", id);
    await openRestore(ctx.tx, ctx.move.id);
    const entry = await ctx.append({ kind: "arrival.recorded", detail: { arrivalId: id, arrivedOn, condition, missing, photos: input.photoIds.length } });
    const news = newsOf(ctx, unit, "Looked over on arrival", [condition, ...(missing ? [`Missing or damaged: ${missing}`] : [])]);
    for (const part of ["owner", "contractor", "receiver"] as const) await ctx.tell({ part }, "arrival", news, entry);
    return { arrivalId: id };
  });
}

/** Ends the case; nothing on it changes afterwards. */
export async function closeMove(viewer: Viewer, input: CloseMove, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const held = ctx.allow({ action: "move.close" });
    refuse(denyClosing(await unsafeGatherFacts(ctx.tx, ctx.move.id)));
    const unit = await unitOf(ctx);
    const statement = closingStatement(unit);
    const signatureId = await keepSignature(ctx.tx, { moveId: ctx.move.id, kind: "closing", subjectId: ctx.move.id, userId: viewer.userId, companyId: held.companyId, name: input.name, statement, rows: { unit, caseNumber: ctx.move.caseNumber } }, ctx.at);
    await ctx.tx.update(moves).set({ state: "closed", closedAt: ctx.at, version: ctx.move.version + 1 }).where(eq(moves.id, ctx.move.id));
    const entry = await ctx.append({ kind: "move.closed", detail: { signatureId, name: input.name } });
    const news = newsOf(ctx, unit, "The move is closed", [`Signed by ${input.name}. The case file stays readable for everybody who was part of it.`]);
    for (const part of ["owner", "contractor", "receiver"] as const) await ctx.tell({ part }, "move-closed", news, entry);
    return { signatureId };
  });
}
