import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { inspections, legs, users } from "@/db/schema";
import { maySee } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import { peopleIn } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Viewer } from "@/lib/viewer/types";
import { mayOnLeg } from "./may";
import type { Inspections, VisitView } from "./types";

/** Every carrier's visits on a move, in the order of the route. A carrier sees the others' too, so that nothing is looked at twice. */
export async function listInspections(viewer: Viewer, moveId: string, now = new Date()): Promise<Inspections> {
  const { move, parts } = await requireMove(viewer, moveId);
  if (!maySee(parts, "findings")) throw new AppError("not_your_part", "Inspections are not part of what you see on this move.");
  const route = await unsafeInspectedLegs(db(), moveId);
  const visits = await unsafeVisits(db(), moveId);
  return {
    moveId, at: now.toISOString(),
    legs: route.map((leg) => ({ ...leg, visits: visits.filter((visit) => visit.legId === leg.legId), mayVisit: move.state === "open" ? mayOnLeg(parts, "inspection.visit", leg) : null })),
  };
}

/** No viewer: the caller has checked. The legs with what the steps of a carrier depend on. */
export async function unsafeInspectedLegs(reader: Reader, moveId: string) {
  const rows = await reader.select({ legId: legs.id, seq: legs.seq, carrierName: legs.carrierName, carrierMark: legs.carrierMark, fromPlace: legs.fromPlace, zone: legs.fromZone })
    .from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq));
  const { legs: facts } = await unsafeGatherFacts(reader, moveId);
  return Promise.all(rows.map(async (row) => ({
    ...row,
    onBoard: (await peopleIn(reader, moveId, { part: "carrier", legId: row.legId })).length > 0,
    takenOver: facts.find((leg) => leg.legId === row.legId)?.takenOver ?? false,
  })));
}

/** No viewer: the caller has checked. All visits of a move, oldest first. */
export async function unsafeVisits(reader: Reader, moveId: string): Promise<VisitView[]> {
  const rows = await reader.select({
    id: inspections.id, legId: inspections.legId, number: inspections.number, visitedOn: inspections.visitedOn, place: inspections.place, zone: inspections.zone, inspectorName: inspections.inspectorName,
    air: inspections.air, airSource: inspections.airSource, airPsi: inspections.airPsi, note: inspections.note, enteredBy: users.name, enteredFor: inspections.enteredFor, at: inspections.at,
  }).from(inspections).innerJoin(users, eq(users.id, inspections.byUserId)).where(eq(inspections.moveId, moveId)).orderBy(asc(inspections.visitedOn), asc(inspections.number));
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}

/** No viewer: a command has checked who asks; takes its transaction. */
export async function unsafeVisit(reader: Reader, moveId: string, inspectionId: string) {
  const [visit] = await reader.select({ id: inspections.id, legId: inspections.legId, number: inspections.number, air: inspections.air, visitedOn: inspections.visitedOn })
    .from(inspections).where(and(eq(inspections.id, inspectionId), eq(inspections.moveId, moveId)));
  return visit ?? null;
}
