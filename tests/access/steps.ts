import { and, eq } from "drizzle-orm";
import { db } from "@/db/client";
import { acceptances, arrivals, billingClearances, feeLines, findingEntries, findings, followLinks, inspections, instructions, invitations, moveDrafts, moveSeats, outbox, photos, prepItems, quotes, releases, sessions, sightings, signatures } from "@/db/schema";
import type { SeatPart } from "@/lib/access/vocabulary";
import type { FeeKind, QuoteState } from "@/lib/fees/vocabulary";
import type { FindingState } from "@/lib/findings/vocabulary";
import { newId, newToken, sha256Hex } from "@/lib/ids";
import type { SightingKind } from "@/lib/movement/vocabulary";
import type { SignatureKind } from "@/lib/record/vocabulary";
import type { Viewer } from "@/lib/viewer/types";
import type { Case } from "./scenario";

/** Steps that a case has gone through, written as rows: the commands that would have written them have tests of their own. */

const at = () => new Date();

async function signed(of: Case, by: Viewer, kind: SignatureKind, subjectId: string): Promise<string> {
  const id = newId("signature");
  await db().insert(signatures).values({ id, moveId: of.moveId, kind, subjectId, userId: by.userId, companyId: by.memberships[0]?.companyId ?? "", name: by.name, statement: "As written above.", rowsHash: sha256Hex(kind), at: at() });
  return id;
}

const prepItem = (of: Case, templateId: string) => and(eq(prepItems.moveId, of.moveId), eq(prepItems.templateId, templateId));

/** The one prep item of a phase with its version. */
export async function itemOf(of: Case, templateId: "P1" | "A9" = "P1") {
  const [item] = await db().select({ itemId: prepItems.id, version: prepItems.version }).from(prepItems).where(prepItem(of, templateId));
  if (!item) throw new Error(`The case has no item ${templateId}.`);
  return item;
}

export async function itemDone(of: Case, templateId: "P1" | "A9" = "P1"): Promise<void> {
  const { contractor } = of.people;
  await db().update(prepItems).set({ state: "done", byUserId: contractor.userId, byName: contractor.name, at: at(), restoreState: templateId === "P1" ? "later" : "none" }).where(prepItem(of, templateId));
}

export async function prepSigned(of: Case): Promise<void> {
  await itemDone(of);
  await signed(of, of.people.contractor, "prep-where-it-stands", of.moveId);
}

export async function visited(of: Case, legId: string): Promise<string> {
  const id = newId("inspection");
  const by = legId === of.legA ? of.people.inspectorA : of.people.inspectorB;
  await db().insert(inspections).values({ id, moveId: of.moveId, legId, number: 1, visitedOn: "2026-11-20", place: "Sand Hollow", zone: "America/Chicago", inspectorName: by.name, air: "on", byUserId: by.userId, at: at() });
  return id;
}

/** A finding under a first visit; answered ones have their answer. */
export async function found(of: Case, legId: string, state: FindingState = "open", observed = "Two flat spots along the tread."): Promise<{ inspectionId: string; findingId: string; version: number }> {
  const inspectionId = await visited(of, legId);
  const findingId = newId("finding");
  const { inspectorA: by, contractor } = of.people;
  const shared = { moveId: of.moveId, at: at() };
  await db().insert(findings).values({ ...shared, id: findingId, legId, inspectionId, number: 1, componentId: "flat-spot", observed, severity: "stops-move", noPhotoReason: "The light was gone.", state, rounds: state === "open" ? 0 : 1, byUserId: by.userId, byName: by.name });
  if (state === "answered") await db().insert(findingEntries).values({ ...shared, id: newId("findingEntry"), findingId, round: 1, kind: "answer", text: observed, byUserId: contractor.userId, byName: contractor.name, byCompanyName: "Ibarra Rail Mechanical" });
  return { inspectionId, findingId, version: 1 };
}

export async function accepted(of: Case, legId: string): Promise<string> {
  const id = newId("acceptance");
  const signatureId = await signed(of, legId === of.legA ? of.people.inspectorA : of.people.inspectorB, "acceptance", id);
  await db().insert(acceptances).values({ id, moveId: of.moveId, legId, number: "QS-118", restrictions: ["mph-25"], signatureId, at: at() });
  return id;
}

type Quoted = { state?: QuoteState; lines?: { kind: FeeKind; description: string; amountCents: number }[]; reference?: string; note?: string };

export async function quoted(of: Case, legId: string, { state = "given", lines = [{ kind: "line-haul", description: "Sand Hollow to Ardell", amountCents: 418_500 }], reference, note }: Quoted = {}): Promise<string> {
  const id = newId("quote");
  const mine = legId === of.legA;
  await db().insert(quotes).values({
    id, moveId: of.moveId, legId, number: 1, state, payerCompanyId: mine ? of.companies.payer : of.companies.owner, totalCents: lines.reduce((sum, line) => sum + line.amountCents, 0), reference, note,
    givenBy: mine ? of.people.clerkA.userId : of.people.clerkB.userId, givenAt: at(),
  });
  await db().insert(feeLines).values(lines.map((line, index) => ({ id: newId("feeLine"), quoteId: id, order: index + 1, ...line })));
  return id;
}

export async function cleared(of: Case, legId: string): Promise<void> {
  const note = `${legId === of.legA ? "zinnober-a" : "zinnober-b"} account`;
  await db().insert(billingClearances).values({ id: newId("billing"), moveId: of.moveId, legId, how: "credit-agreed", note, byUserId: of.people.clerkA.userId, at: at() });
}

export async function instructed(of: Case, legId: string, text = "Block behind the engines."): Promise<string> {
  const id = newId("instruction");
  await db().insert(instructions).values({ id, moveId: of.moveId, legId, billNumber: "B-4410", text, byUserId: of.people.deskA.userId, at: at() });
  return id;
}

/** Accepted and paid for, so that the desk may instruct. */
export async function fit(of: Case, legId: string): Promise<void> {
  await accepted(of, legId);
  await cleared(of, legId);
}

/** Everything that stands before the first carrier pulls the unit; `but` leaves the last step to somebody. */
export async function readyToGo(of: Case, but: "release" | "pull" = "pull"): Promise<void> {
  await prepSigned(of);
  await fit(of, of.legA);
  await instructed(of, of.legA);
  if (but === "release") return;
  const id = newId("release");
  await db().insert(releases).values({ id, moveId: of.moveId, legId: of.legA, signatureId: await signed(of, of.people.owner, "release", id), at: at() });
  await itemDone(of, "A9");
  await signed(of, of.people.contractor, "prep-when-coupled", of.moveId);
}

export async function sighted(of: Case, legId: string, kind: SightingKind, by: Viewer = legId === of.legA ? of.people.deskA : of.people.deskB): Promise<string> {
  const id = newId("sighting");
  await db().insert(sightings).values({ id, moveId: of.moveId, legId, kind, place: "Ardell", zone: "America/Denver", occurredAt: new Date(Date.now() - 3600_000), byUserId: by.userId, byName: by.name, at: at() });
  return id;
}

/** The second carrier has the unit, at its destination. */
export async function atDestination(of: Case): Promise<void> {
  await readyToGo(of);
  await fit(of, of.legB);
  await instructed(of, of.legB);
  for (const [legId, kind] of [[of.legA, "pulled"], [of.legA, "delivered"], [of.legB, "received"], [of.legB, "at-destination"]] as const) await sighted(of, legId, kind);
}

export async function placed(of: Case): Promise<void> {
  await atDestination(of);
  await sighted(of, of.legB, "placed");
}

/** Looked over on arrival; the one prep item waits to be put back, or has been. */
export async function arrived(of: Case, restoreState: "to-restore" | "restored" = "to-restore", condition = "As it left."): Promise<void> {
  await placed(of);
  const { receiver } = of.people;
  const id = newId("arrival");
  await db().insert(arrivals).values({ id, moveId: of.moveId, arrivedOn: "2026-11-28", condition, signatureId: await signed(of, receiver, "arrival", id), byUserId: receiver.userId, at: at() });
  await db().update(prepItems).set({ restoreState }).where(prepItem(of, "P1"));
}

/** A photo that has arrived and been checked. */
export async function photographed(of: Case, by: Viewer, given: Partial<typeof photos.$inferInsert> = {}): Promise<string> {
  const id = newId("photo");
  await db().insert(photos).values({
    id, moveId: of.moveId, clientId: crypto.randomUUID(), takenBy: by.userId, companyId: by.memberships[0]?.companyId ?? "", name: "front.jpg", type: "image/jpeg", sizeBytes: 1000, sha256: sha256Hex(id), widthPx: 800, heightPx: 600,
    state: "kept", proofKey: `proof-${id}`, originalKey: `original-${id}`, previewKey: `preview-${id}`, createdAt: at(), ...given,
  });
  return id;
}

export async function drafted(of: Case, body: Record<string, unknown> = {}): Promise<string> {
  const id = newId("draft");
  await db().insert(moveDrafts).values({ id, companyId: of.companies.owner, createdBy: of.people.owner.userId, body, createdAt: at(), updatedAt: at() });
  return id;
}

export async function sessionOf(viewer: Viewer, token = newToken()): Promise<string> {
  const id = newId("session");
  await db().insert(sessions).values({ id, userId: viewer.userId, token, expiresAt: new Date(Date.now() + 3600_000), createdAt: at(), updatedAt: at() });
  return id;
}

/** A letter that is open: to a seat of the move, or into the company alone. */
export async function invited(of: Case, companyId: string, part: SeatPart | null): Promise<string> {
  const id = newId("invitation");
  const shared = { id, companyId, email: `${id}@example.test`, tokenHash: sha256Hex(id), invitedBy: of.people.owner.userId, createdAt: at(), expiresAt: new Date(Date.now() + 3600_000) };
  const seat = part ? { moveId: of.moveId, seatId: await seatOf(of, part) } : {};
  await db().insert(invitations).values({ ...shared, ...seat });
  return id;
}

export async function seatOf(of: Case, part: SeatPart): Promise<string> {
  const [seat] = await db().select({ id: moveSeats.id }).from(moveSeats).where(and(eq(moveSeats.moveId, of.moveId), eq(moveSeats.part, part)));
  if (!seat) throw new Error(`Nobody is ${part}.`);
  return seat.id;
}

export async function followed(of: Case): Promise<string> {
  const id = newId("follow");
  await db().insert(followLinks).values({ id, moveId: of.moveId, label: "Friends of the museum", tokenHash: sha256Hex(id), createdBy: of.people.owner.userId, createdAt: at(), expiresAt: new Date(Date.now() + 3600_000) });
  return id;
}

/** A letter that was given up. */
export async function mailFailed(): Promise<string> {
  const id = newId("outbox");
  await db().insert(outbox).values({ id, dedupe: id, kind: "movement", toAddress: "lost@example.test", payload: "sealed", messageId: `<${id}@example.test>`, state: "failed", runAt: at(), createdAt: at() });
  return id;
}

/** Takes carrier A's people off the case: it is entered by name only. */
export async function offBoard(of: Case): Promise<void> {
  await db().update(moveSeats).set({ removedAt: at() }).where(and(eq(moveSeats.moveId, of.moveId), eq(moveSeats.part, "carrier"), eq(moveSeats.legId, of.legA)));
}
