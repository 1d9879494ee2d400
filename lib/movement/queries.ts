import "server-only";
import { and, asc, eq, getTableColumns, isNull } from "drizzle-orm";
import { db } from "@/db/client";
import { acceptances, arrivals, equipment, instructions, legs as legTable, moves, releases, sightings, signatures, users } from "@/db/schema";
import { RESTRICTIONS } from "@/lib/acceptance/vocabulary";
import { denyAction, maySee } from "@/lib/access/policy";
import { requireMove, type SeenMove } from "@/lib/access/scope";
import type { HeldPart } from "@/lib/access/types";
import { AppError } from "@/lib/errors";
import { unsafePhotosOf } from "@/lib/evidence/queries";
import { conditionsFor } from "@/lib/moves/case-rules";
import { peopleIn } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import { denyClosing } from "@/lib/standing/rules";
import type { LegFacts, MoveFacts } from "@/lib/standing/types";
import type { Viewer } from "@/lib/viewer/types";
import { denyTakingBack, kindsFor, kindsForReceiver, speaksForCarrier } from "./rules";
import type { ArrivalView, Movement, MovementLeg, SightingView } from "./types";

/** What the transport desks, owner and receiver work with: instruction, release, sightings, arrival, closing. */
export async function getMovement(viewer: Viewer, moveId: string, now = new Date()): Promise<Movement> {
  const { move, parts } = await requireMove(viewer, moveId);
  if (!maySee(parts, "movement")) throw new AppError("not_your_part", "The movement is not part of what you see on this move.");
  const facts = await unsafeGatherFacts(db(), moveId);
  const [unit] = await db().select({ mark: equipment.mark, number: equipment.number }).from(equipment).where(eq(equipment.moveId, moveId));
  const [ended] = await db().select({ closedAt: moves.closedAt }).from(moves).where(eq(moves.id, moveId));
  const open = move.state === "open";
  const denial = denyClosing(facts);
  const legs = await legViews(move, parts, facts);
  return {
    unit: `${unit?.mark ?? ""} ${unit?.number ?? ""}`.trim(),
    legs,
    sightings: await sightingViews(move, parts, legs, facts.arrived),
    arrival: maySee(parts, "findings") ? await arrivalView(moveId) : null,
    arrived: facts.arrived,
    destination: { name: move.destinationName, place: move.destinationPlace, zone: move.destinationZone },
    placed: facts.legs.at(-1)?.placed ?? false,
    restore: { total: facts.restoreTotal, left: facts.restoreLeft },
    closing: { may: open && denyAction(parts, { action: "move.close" }) === null, missing: denial?.missing ?? [], closedAt: ended?.closedAt?.toISOString() ?? null },
    may: { arrive: open && denyAction(parts, { action: "arrival.record" }) === null && !facts.arrived && (facts.legs.at(-1)?.placed ?? false) },
    at: now.toISOString(),
  };
}

async function legViews(move: SeenMove, parts: HeldPart[], facts: MoveFacts): Promise<MovementLeg[]> {
  const rows = await db().select().from(legTable).where(eq(legTable.moveId, move.id)).orderBy(asc(legTable.seq));
  const told = await db().select({ ...getTableColumns(instructions), byName: users.name }).from(instructions).innerJoin(users, eq(users.id, instructions.byUserId)).where(and(eq(instructions.moveId, move.id), isNull(instructions.withdrawnAt)));
  const given = await db().select({ legId: releases.legId, note: releases.note, at: releases.at, name: signatures.name, statement: signatures.statement }).from(releases)
    .innerJoin(signatures, eq(signatures.id, releases.signatureId)).where(eq(releases.moveId, move.id));
  const accepted = await db().select({ legId: acceptances.legId, restrictions: acceptances.restrictions, note: acceptances.restrictionNote, validUntil: acceptances.validUntil }).from(acceptances)
    .where(and(eq(acceptances.moveId, move.id), isNull(acceptances.withdrawnAt)));
  return Promise.all(rows.map(async (row) => {
    const now = facts.legs.find((leg) => leg.legId === row.id);
    if (!now) throw new AppError("not_found", "No such leg.");
    const instruction = told.find((one) => one.legId === row.id);
    const release = given.find((one) => one.legId === row.id);
    const acceptance = accepted.find((one) => one.legId === row.id);
    const onBoard = (await peopleIn(db(), move.id, { part: "carrier", legId: row.id })).length > 0;
    return {
      legId: row.id, seq: row.seq, carrierName: row.carrierName, fromPlace: row.fromPlace, fromZone: row.fromZone, toPlace: row.toPlace, toZone: row.toZone, onBoard,
      conditions: conditionsFor(parts, facts, now), takenOver: now.takenOver, delivered: now.delivered,
      instruction: instruction ? { id: instruction.id, billNumber: instruction.billNumber, clearanceNumber: instruction.clearanceNumber, train: instruction.train, pickupFrom: instruction.pickupFrom, text: instruction.text, byName: instruction.byName, enteredFor: instruction.enteredFor, at: instruction.at.toISOString() } : null,
      release: release ? { name: release.name, statement: release.statement, note: release.note, at: release.at.toISOString() } : null,
      restrictions: [...(acceptance?.restrictions ?? []).map((id) => RESTRICTIONS.find((one) => one.id === id)?.label ?? id), ...(acceptance?.note ? [acceptance.note] : [])],
      validUntil: acceptance?.validUntil ?? null,
      ...mayOnLeg(move, parts, facts, now, onBoard),
    };
  }));
}

/** Stands for "somebody might enter it for the carrier"; what they heard comes with the step itself. */
const HEARD = { carrierName: "", source: "phone", heardOn: "", saidBy: "", reference: null } as const;

function mayOnLeg(move: SeenMove, parts: HeldPart[], facts: MoveFacts, leg: LegFacts, onBoard: boolean): Pick<MovementLeg, "kinds" | "may"> {
  const open = move.state === "open";
  const carrier = open && speaksForCarrier(parts, leg.legId);
  const enterFor = open && !carrier && !onBoard && denyAction(parts, { action: "movement.instruct", legId: leg.legId, enteredFor: HEARD, carrierOnBoard: false }) === null;
  const all = kindsFor(facts, leg);
  const own = open && parts.some((held) => held.part === "receiver") ? kindsForReceiver(all, leg, facts.legs.length) : [];
  const kinds = carrier || enterFor ? all : own;
  return {
    kinds,
    may: {
      instruct: !leg.takenOver && (carrier || enterFor),
      sight: kinds.length > 0,
      release: open && leg.seq === 1 && !leg.released && denyAction(parts, { action: "unit.release" }) === null,
      enterFor,
      asReceiver: !carrier && own.length > 0,
    },
  };
}

async function sightingViews(move: SeenMove, parts: HeldPart[], legs: MovementLeg[], arrived: boolean): Promise<SightingView[]> {
  const rows = await db().select().from(sightings).where(eq(sightings.moveId, move.id)).orderBy(asc(sightings.occurredAt), asc(sightings.id));
  const receivers = new Set((await peopleIn(db(), move.id, { part: "receiver" })).map((person) => person.userId));
  const receives = parts.some((held) => held.part === "receiver");
  const standIn = new Set(legs.filter((leg) => leg.may.enterFor).map((leg) => leg.legId));
  const open = move.state === "open" && !arrived;
  const photos = await unsafePhotosOf(db(), "sighting", rows.map((row) => row.id));
  return rows.map((row) => ({
    id: row.id, legId: row.legId, kind: row.kind, place: row.place, zone: row.zone, occurredAt: row.occurredAt.toISOString(), train: row.train, note: row.note, byName: row.byName,
    enteredFor: row.enteredFor, at: row.at.toISOString(), corrects: row.corrects, retracted: row.retractedAt ? { at: row.retractedAt.toISOString(), why: row.retractedWhy ?? "" } : null,
    photos: maySee(parts, "findings") ? (photos.get(row.id) ?? []) : [],
    mayRetract: open && !row.retractedAt && (standIn.has(row.legId) || denyTakingBack(parts, row.legId, receives && !row.enteredFor && receivers.has(row.byUserId)) === null),
  }));
}

async function arrivalView(moveId: string): Promise<ArrivalView | null> {
  const [row] = await db().select({ id: arrivals.id, arrivedOn: arrivals.arrivedOn, condition: arrivals.condition, missing: arrivals.missing, at: arrivals.at, byName: users.name, signedAs: signatures.name }).from(arrivals)
    .innerJoin(users, eq(users.id, arrivals.byUserId)).innerJoin(signatures, eq(signatures.id, arrivals.signatureId)).where(eq(arrivals.moveId, moveId));
  if (!row) return null;
  const { id, at, ...rest } = row;
  return { ...rest, at: at.toISOString(), photos: (await unsafePhotosOf(db(), "arrival", [id])).get(id) ?? [] };
}
