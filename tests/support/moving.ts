import { randomUUID } from "node:crypto";
import { db } from "@/db/client";
import { photos } from "@/db/schema";
import { clearBilling } from "@/lib/fees/commands/quotes";
import { newId, sha256Hex } from "@/lib/ids";
import { toWall } from "@/lib/moves/when";
import { giveInstruction, makeSighting, releaseUnit } from "@/lib/movement/commands";
import { giveInstructionInput, makeSightingInput } from "@/lib/movement/input";
import type { SightingKind } from "@/lib/movement/vocabulary";
import { keepSignature } from "@/lib/record/commands";
import type { Viewer } from "@/lib/viewer/types";
import { anAttempt, seedMove, type SeededMove } from "./factories";
import { seedAcceptance, seedPrepSignature } from "./inspecting";

const ZONE = "America/Denver";
const HOUR = 3600_000;

/** A sighting as a form sends it; `hoursAgo` is when it happened. */
export const aSighting = (moveId: string, legId: string, kind: SightingKind, { hoursAgo = 1, ...given }: { hoursAgo?: number } & Record<string, unknown> = {}) =>
  makeSightingInput.parse({ moveId, legId, kind, place: "Ardell", zone: ZONE, occurredAt: toWall(new Date(Date.now() - hoursAgo * HOUR).toISOString(), ZONE), train: "", note: "", photoIds: [], corrects: null, enteredFor: null, ...given });

export const sight = (by: Viewer, moveId: string, legId: string, kind: SightingKind, given: { hoursAgo?: number } & Record<string, unknown> = {}) => makeSighting(by, aSighting(moveId, legId, kind, given), anAttempt());

export const anInstruction = (moveId: string, legId: string, given: Record<string, unknown> = {}) =>
  giveInstructionInput.parse({ moveId, legId, billNumber: "B-4410", clearanceNumber: "C-77", train: "", pickupFrom: "", text: "", enteredFor: null, ...given });

/** The name under the second phase of the prep. */
export const signCoupled = ({ moveId, contractor }: SeededMove) =>
  db().transaction((tx) => keepSignature(tx, { moveId, kind: "prep-when-coupled", subjectId: moveId, userId: contractor.userId, companyId: contractor.memberships[0]?.companyId ?? "", name: "T. Ibarra", statement: "Prepared", rows: ["A9"] }, new Date()));

/** Accepted, billing cleared and instructed on one leg; the prep has to be signed. */
export async function makeReady(move: SeededMove, leg: 0 | 1): Promise<void> {
  const { moveId, legIds } = move;
  const [inspector, clerk, desk] = leg === 0 ? [move.inspectorA, move.clerkA, move.deskA] : [move.inspectorB, move.clerkB, move.deskB];
  await seedAcceptance(inspector, moveId, legIds[leg]);
  await clearBilling(clerk, { moveId, legId: legIds[leg], note: "Account 7", enteredFor: null }, anAttempt());
  await giveInstruction(desk, anInstruction(moveId, legIds[leg]), anAttempt());
}

type Before = (move: SeededMove) => Promise<unknown>;

/** Everything stands that the first carrier asks for; `before` happens first. */
export async function seedReady(before?: Before): Promise<SeededMove> {
  const move = await seedMove({ prepDone: true });
  await before?.(move);
  await seedPrepSignature(move);
  await makeReady(move, 0);
  await releaseUnit(move.owner, { moveId: move.moveId, name: "R. Okafor", note: null }, anAttempt());
  await signCoupled(move);
  return move;
}

/** The second carrier has placed the unit; the hours say when. */
export async function seedPlaced(before?: Before): Promise<SeededMove> {
  const move = await seedReady(before);
  const { moveId, legIds: [a, b], deskA, deskB } = move;
  await sight(deskA, moveId, a, "pulled", { hoursAgo: 90 });
  await sight(deskA, moveId, a, "delivered", { hoursAgo: 60 });
  await makeReady(move, 1);
  await sight(deskB, moveId, b, "received", { hoursAgo: 50 });
  await sight(deskB, moveId, b, "at-destination", { hoursAgo: 20 });
  await sight(deskB, moveId, b, "placed", { hoursAgo: 10 });
  return move;
}

/** A photo of somebody's that has arrived and been checked. */
export async function seedPhoto(moveId: string, by: Viewer): Promise<string> {
  const id = newId("photo");
  await db().insert(photos).values({
    id, moveId, clientId: randomUUID(), takenBy: by.userId, companyId: by.memberships[0]?.companyId ?? "", name: "front.jpg", type: "image/jpeg", sizeBytes: 1000, sha256: sha256Hex(id), widthPx: 800, heightPx: 600,
    state: "kept", proofKey: `proof-${id}`, originalKey: `original-${id}`, previewKey: `preview-${id}`, createdAt: new Date(),
  });
  return id;
}
