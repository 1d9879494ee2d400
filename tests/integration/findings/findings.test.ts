import { and, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { findingEntries, findings, moveSeats, outbox, record } from "@/db/schema";
import { answerFinding, clearFinding, notClearFinding, postFinding, withdrawFinding } from "@/lib/findings/commands";
import { getFinding, listFindings } from "@/lib/findings/queries";
import { AppError } from "@/lib/errors";
import { verifyRecord } from "@/lib/record/queries";
import { unsafeErrno } from "@/lib/standing/commands";
import { getFacts } from "@/lib/standing/queries";
import type { Viewer } from "@/lib/viewer/types";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove, type SeededMove } from "../../support/factories";
import { aFinding, aVisit, HEARD, seedFinding, seedVisit } from "../../support/inspecting";

withDatabase();

const answer = (by: Viewer, moveId: string, findingId: string, version: number, text = "Turned the wheelset.") =>
  answerFinding(by, { moveId, findingId, version, text, reading: "0 in", photoIds: [] }, anAttempt());
const notCleared = (by: Viewer, moveId: string, findingId: string, version: number) =>
  notClearFinding(by, { moveId, findingId, version, text: "The photo shows another wheel.", wouldSatisfy: "A photo of R4 with its number.", photoIds: [], enteredFor: null }, anAttempt());
const clear = (by: Viewer, moveId: string, findingId: string, version: number) => clearFinding(by, { moveId, findingId, version, text: null, enteredFor: null }, anAttempt());

it("is posted, answered, not cleared, answered again and cleared; every round stays to be read", async () => {
  const move = await seedMove();
  const { moveId, contractor, inspectorA, owner } = move;
  const { findingId, number } = await seedFinding(move);
  expect(number).toBe("F-01");
  expect((await getFacts(owner, moveId)).legs[0]).toMatchObject({ visits: 1, stoppingOpen: 1, openFindings: 1 });
  await answer(contractor, moveId, findingId, 1);
  await notCleared(inspectorA, moveId, findingId, 2);
  expect((await listFindings(owner, moveId)).findings[0]).toMatchObject({ state: "open", sentBack: true, rounds: 1 });
  await answer(contractor, moveId, findingId, 3, "Photo of R4 added.");
  await clear(inspectorA, moveId, findingId, 4);
  const detail = await getFinding(contractor, moveId, findingId);
  expect(detail).toMatchObject({ state: "cleared", rounds: 2, version: 5, where: "Wheel R4, right side", component: "Flat spot", total: 1, may: { answer: null, clear: null, "not-cleared": null, withdraw: null } });
  expect(detail.entries.map(({ kind, round, byName, byCompanyName }) => [kind, round, byName, byCompanyName])).toEqual([
    ["answer", 1, "T. Ibarra", "Ibarra Rail Mechanical"], ["not-cleared", 1, "V. Sorrel", "Quillan & Sandbar"], ["answer", 2, "T. Ibarra", "Ibarra Rail Mechanical"], ["cleared", 2, "V. Sorrel", "Quillan & Sandbar"],
  ]);
  expect(detail.entries[1]?.wouldSatisfy).toBe("A photo of R4 with its number.");
  const kinds = (await db().select({ kind: record.kind }).from(record).where(eq(record.moveId, moveId))).map(({ kind }) => kind);
  expect(kinds).toEqual(["inspection.visited", "finding.posted", "finding.answered", "finding.not-cleared", "finding.answered", "finding.cleared"]);
  expect((await verifyRecord(owner, moveId)).brokenAt).toBeNull();
  const mails = await db().select({ kind: outbox.kind, to: outbox.toAddress }).from(outbox).where(eq(outbox.moveId, moveId));
  expect(mails.map(({ kind, to }) => `${kind} ${to === contractor.email ? "contractor" : to === owner.email ? "owner" : to === inspectorA.email ? "inspector" : to}`).sort()).toEqual([
    "finding-answered inspector", "finding-answered inspector", "finding-posted contractor", "finding-posted owner", "finding-replied contractor", "finding-replied contractor",
  ]);
});

it("what was said can't be changed by the application's account", async () => {
  const move = await seedMove();
  const { findingId } = await seedFinding(move);
  await answer(move.contractor, move.moveId, findingId, 1);
  const denied = async (work: Promise<unknown>) => expect([1142, 1143]).toContain(await work.then(() => null, unsafeErrno));
  await denied(db().update(findings).set({ observed: "Nothing." }).where(eq(findings.id, findingId)));
  await denied(db().update(findingEntries).set({ text: "Nothing." }).where(eq(findingEntries.findingId, findingId)));
});

it("whoever comes second is told what changed, by whom and when", async () => {
  const move = await seedMove();
  const { moveId, contractor, inspectorA } = move;
  const { findingId } = await seedFinding(move);
  await answer(contractor, moveId, findingId, 1);
  await answer(contractor, moveId, findingId, 2, "One more photo.");
  await expect(clear(inspectorA, moveId, findingId, 2)).rejects.toMatchObject({ code: "stale", message: expect.stringMatching(/^F-01 was answered by T\. Ibarra at \d+ \w+ \d\d:\d\d C[SD]T\./) });
  expect((await getFinding(contractor, moveId, findingId)).entries.map(({ round }) => round)).toEqual([1, 1]);
});

it("is cleared only after an answer, and nothing follows a withdrawal", async () => {
  const move = await seedMove();
  const { moveId, contractor, inspectorA } = move;
  const { findingId } = await seedFinding(move);
  await expect(clear(inspectorA, moveId, findingId, 1)).rejects.toMatchObject({ code: "not_yet" });
  await withdrawFinding(inspectorA, { moveId, findingId, version: 1, text: "It was the unit beside it.", enteredFor: null }, anAttempt());
  await expect(answer(contractor, moveId, findingId, 2)).rejects.toMatchObject({ code: "stale" });
  expect((await getFacts(inspectorA, moveId)).legs[0]?.stoppingOpen).toBe(0);
});

it("belongs to the inspector of its leg; the other carrier reads all of it", async () => {
  const move = await seedMove();
  const { moveId, legIds, contractor, owner, inspectorA, inspectorB, clerkA, clerkB, payer, receiver, deskB, outsider } = move;
  const { findingId } = await seedFinding(move);
  await answer(contractor, moveId, findingId, 1);
  for (const viewer of [inspectorB, owner, receiver, contractor]) {
    await expect(clear(viewer, moveId, findingId, 2)).rejects.toMatchObject({ code: "not_your_part" });
    await expect(notCleared(viewer, moveId, findingId, 2)).rejects.toMatchObject({ code: "not_your_part" });
  }
  await expect(answer(inspectorA, moveId, findingId, 2)).rejects.toMatchObject({ code: "not_your_part" });
  const other = await seedVisit(inspectorB, moveId, legIds[1]);
  await expect(postFinding(inspectorA, aFinding(moveId, other), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  for (const viewer of [inspectorB, deskB, receiver]) expect((await getFinding(viewer, moveId, findingId)).entries[0]?.text).toBe("Turned the wheelset.");
  for (const viewer of [payer, clerkA, clerkB]) {
    await expect(listFindings(viewer, moveId)).rejects.toMatchObject({ code: "not_your_part" });
    await expect(getFinding(viewer, moveId, findingId)).rejects.toMatchObject({ code: "not_your_part" });
  }
  await expect(getFinding(outsider, moveId, findingId)).rejects.toMatchObject({ code: "not_found" });
});

it("of another move is not found, neither its visit nor itself", async () => {
  const [one, two] = [await seedMove(), await seedMove()];
  const { findingId, inspectionId } = await seedFinding(one);
  await expect(getFinding(two.owner, two.moveId, findingId)).rejects.toMatchObject({ code: "not_found" });
  await expect(answer(two.contractor, two.moveId, findingId, 1)).rejects.toMatchObject({ code: "not_found" });
  await expect(postFinding(two.inspectorA, aFinding(two.moveId, inspectionId), anAttempt())).rejects.toMatchObject({ code: "not_found" });
});

it("needs a photo or a reason, a component and a place of this unit, all said at once", async () => {
  const { moveId, legIds, inspectorA } = await seedMove();
  const inspectionId = await seedVisit(inspectorA, moveId, legIds[0]);
  await expect(postFinding(inspectorA, { ...aFinding(moveId, inspectionId), noPhotoReason: null, placeId: "wheel-L9", componentId: "keel" }, anAttempt())).rejects.toMatchObject({
    code: "bad_input", fields: { photoIds: [expect.any(String)], placeId: [expect.any(String)], componentId: [expect.any(String)] },
  });
  expect((await listFindings(inspectorA, moveId)).findings).toEqual([]);
});

async function withoutCarrier(): Promise<SeededMove> {
  const move = await seedMove();
  await db().update(moveSeats).set({ removedAt: new Date() }).where(and(eq(moveSeats.moveId, move.moveId), eq(moveSeats.legId, move.legIds[0]), eq(moveSeats.part, "carrier")));
  return move;
}

it("of a carrier by name only is entered for it, round by round, and shown as entered", async () => {
  const { moveId, legIds, contractor, owner } = await withoutCarrier();
  const inspectionId = await seedVisit(contractor, moveId, legIds[0], { enteredFor: HEARD });
  const { findingId } = await postFinding(contractor, aFinding(moveId, inspectionId, { enteredFor: HEARD }), anAttempt());
  await answer(contractor, moveId, findingId, 1);
  await notClearFinding(owner, { moveId, findingId, version: 2, text: "They want a caliper.", wouldSatisfy: "A caliper in the photo.", photoIds: [], enteredFor: HEARD }, anAttempt());
  await answer(contractor, moveId, findingId, 3);
  await clearFinding(owner, { moveId, findingId, version: 4, text: null, enteredFor: HEARD }, anAttempt());
  const detail = await getFinding(owner, moveId, findingId);
  expect(detail.enteredFor).toMatchObject({ carrierName: "Quillan & Sandbar", saidBy: "V. Sorrel" });
  expect(detail.entries.map(({ enteredFor }) => enteredFor?.source ?? null)).toEqual([null, "e-mail", null, "e-mail"]);
  const [posted] = await db().select({ enteredFor: record.enteredFor, part: record.byPart }).from(record).where(and(eq(record.moveId, moveId), eq(record.kind, "finding.posted")));
  expect(posted).toMatchObject({ part: "contractor", enteredFor: { source: "e-mail" } });
});

it("can't be entered for a carrier that is on board", async () => {
  const move = await seedMove();
  const { findingId, inspectionId } = await seedFinding(move);
  await expect(postFinding(move.contractor, aFinding(move.moveId, inspectionId, { enteredFor: HEARD }), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await answer(move.contractor, move.moveId, findingId, 1);
  await expect(clearFinding(move.owner, { moveId: move.moveId, findingId, version: 2, text: null, enteredFor: HEARD }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
});

it("twenty people clearing it at once clear it once", async () => {
  const move = await seedMove();
  const { moveId, contractor, inspectorA } = move;
  const { findingId } = await seedFinding(move);
  await answer(contractor, moveId, findingId, 1);
  const tries = await Promise.all(Array.from({ length: 20 }, () => clear(inspectorA, moveId, findingId, 2).then(() => "cleared", (error: unknown) => (error instanceof AppError ? error.code : String(error)))));
  expect(tries.sort()).toEqual(["cleared", ...Array.from({ length: 19 }, () => "stale")]);
  expect(await db().select({ id: findingEntries.id }).from(findingEntries).where(and(eq(findingEntries.findingId, findingId), eq(findingEntries.kind, "cleared")))).toHaveLength(1);
});

it("twenty posted at once get twenty numbers", async () => {
  const { moveId, legIds, inspectorA } = await seedMove();
  const inspectionId = await seedVisit(inspectorA, moveId, legIds[0]);
  const posted = await Promise.all(Array.from({ length: 20 }, () => postFinding(inspectorA, aFinding(moveId, inspectionId), anAttempt())));
  expect(new Set(posted.map(({ number }) => number)).size).toBe(20);
  expect(aVisit(moveId, legIds[0]).airPsi).toBe(90);
});
