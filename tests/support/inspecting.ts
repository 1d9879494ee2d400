import { db } from "@/db/client";
import { sightings } from "@/db/schema";
import { signAcceptance } from "@/lib/acceptance/commands";
import { signAcceptanceInput } from "@/lib/acceptance/input";
import { listAcceptances } from "@/lib/acceptance/queries";
import { postFinding } from "@/lib/findings/commands";
import { postFindingInput } from "@/lib/findings/input";
import { newId } from "@/lib/ids";
import { recordVisit } from "@/lib/inspections/commands";
import { recordVisitInput } from "@/lib/inspections/input";
import { keepSignature } from "@/lib/record/commands";
import type { Viewer } from "@/lib/viewer/types";
import { anAttempt, type SeededMove } from "./factories";

/** How news of an absent carrier came in, as a form sends it. */
export const HEARD = { source: "e-mail", heardOn: "2026-11-18", saidBy: "V. Sorrel", reference: "Letter of 18 November" } as const;

/** A visit of yesterday with air on the unit. */
export const aVisit = (moveId: string, legId: string, given: Record<string, unknown> = {}) =>
  recordVisitInput.parse({ moveId, legId, visitedOn: new Date(Date.now() - 36 * 3600_000).toISOString().slice(0, 10), place: "Sand Hollow elevator", zone: "America/Chicago", inspectorName: "V. Sorrel", air: "on", airSource: "Contractor’s compressor", airPsi: "90", note: "", ...given });

/** A finding that stops the move, without a photo and with the reason. */
export const aFinding = (moveId: string, inspectionId: string, given: Record<string, unknown> = {}) =>
  postFindingInput.parse({ moveId, inspectionId, componentId: "flat-spot", placeId: "wheel-R4", placeNote: "", observed: "Two flat spots along the tread.", reading: "2 5/8 in", condition: "", severity: "stops-move", photoIds: [], noPhotoReason: "The light was gone.", ...given });

export const seedVisit = async (by: Viewer, moveId: string, legId: string, given: Record<string, unknown> = {}) => (await recordVisit(by, aVisit(moveId, legId, given), anAttempt())).inspectionId;

/** A visit on the first leg and a finding under it. */
export async function seedFinding({ moveId, legIds, inspectorA }: SeededMove, given: Record<string, unknown> = {}) {
  const inspectionId = await seedVisit(inspectorA, moveId, legIds[0]);
  return { inspectionId, ...(await postFinding(inspectorA, aFinding(moveId, inspectionId, given), anAttempt())) };
}

/** The contractor's name under the first phase; with `seedMove({ prepDone: true })` an acceptance needs no more. */
export const seedPrepSignature = ({ moveId, contractor }: SeededMove) =>
  db().transaction((tx) => keepSignature(tx, { moveId, kind: "prep-where-it-stands", subjectId: moveId, userId: contractor.userId, companyId: contractor.memberships[0]?.companyId ?? "", name: "T. Ibarra", statement: "Prepared", rows: ["P1"] }, new Date()));

/** What the viewer would sign on a leg now. */
export async function anAcceptance(viewer: Viewer, moveId: string, legId: string, given: Record<string, unknown> = {}) {
  const leg = (await listAcceptances(viewer, moveId)).legs.find((one) => one.legId === legId);
  return signAcceptanceInput.parse({ moveId, legId, restrictions: ["mph-25", "do-not-hump"], restrictionNote: "", number: "QS-118", validUntil: "", name: viewer.name, rowsHash: leg?.rowsHash, ...given });
}

export const seedAcceptance = async (viewer: Viewer, moveId: string, legId: string) => (await signAcceptance(viewer, await anAcceptance(viewer, moveId, legId), anAttempt())).acceptanceId;

/** The carrier of the first leg has the unit. */
export async function seedPulled({ moveId, legIds, deskA }: SeededMove): Promise<void> {
  const at = new Date();
  await db().insert(sightings).values({ id: newId("sighting"), moveId, legId: legIds[0], kind: "pulled", place: "Sand Hollow", zone: "America/Chicago", occurredAt: at, byUserId: deskA.userId, byName: deskA.name, at });
}
