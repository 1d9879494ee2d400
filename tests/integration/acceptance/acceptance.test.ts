import { and, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { moves, moveSeats, outbox, record, signatures } from "@/db/schema";
import { signAcceptance, withdrawAcceptance } from "@/lib/acceptance/commands";
import { listAcceptances } from "@/lib/acceptance/queries";
import { answerFinding, clearFinding, postFinding } from "@/lib/findings/commands";
import { unsafeRefreshLapsed } from "@/lib/standing/commands";
import { getFacts } from "@/lib/standing/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove, type SeededMove } from "../../support/factories";
import { aFinding, anAcceptance, HEARD, seedAcceptance, seedFinding, seedPrepSignature, seedPulled, seedVisit } from "../../support/inspecting";

withDatabase();

const legOf = async ({ moveId, owner, legIds }: SeededMove, at = 0) => (await listAcceptances(owner, moveId)).legs.find((leg) => leg.legId === legIds[at]);

async function clearIt({ moveId, contractor, inspectorA }: SeededMove, findingId: string) {
  await answerFinding(contractor, { moveId, findingId, version: 1, text: "Turned.", reading: null, photoIds: [] }, anAttempt());
  await clearFinding(inspectorA, { moveId, findingId, version: 2, text: null, enteredFor: null }, anAttempt());
}

it("is refused with the list of what is missing, and signed when nothing is", async () => {
  const move = await seedMove({ prepDone: true });
  const { moveId, legIds, inspectorA, owner, contractor, deskA } = move;
  const { findingId } = await seedFinding(move);
  const early = await anAcceptance(inspectorA, moveId, legIds[0]);
  await expect(signAcceptance(inspectorA, early, anAttempt())).rejects.toMatchObject({ code: "not_yet", missing: [expect.stringContaining("Prep signed"), expect.stringContaining("1 finding that stops the move")] });
  await seedPrepSignature(move);
  await clearIt(move, findingId);
  await expect(signAcceptance(inspectorA, early, anAttempt())).rejects.toMatchObject({ code: "stale", message: expect.stringContaining("have changed") });
  await seedAcceptance(inspectorA, moveId, legIds[0]);
  expect((await getFacts(owner, moveId)).legs[0]).toMatchObject({ accepted: true, acceptanceNumber: "QS-118" });
  const leg = await legOf(move);
  expect(leg?.standing).toMatchObject({ restrictions: ["mph-25", "do-not-hump"], name: "V. Sorrel", enteredFor: null, changed: false, expired: false });
  expect(leg?.standing?.statement).toContain("25 mph at most; Do not hump");
  expect(leg).toMatchObject({ maySign: null, missing: [] });
  const told = (await db().select({ kind: outbox.kind, to: outbox.toAddress }).from(outbox).where(eq(outbox.moveId, moveId))).filter(({ kind }) => kind === "acceptance-signed").map(({ to }) => to);
  expect(told.sort()).toEqual([owner.email, contractor.email, deskA.email].sort());
  await expect(signAcceptance(inspectorA, await anAcceptance(inspectorA, moveId, legIds[0]), anAttempt())).rejects.toMatchObject({ code: "stale" });
});

it("money has no say: nothing is quoted or paid, and it is signed", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  await seedAcceptance(move.inspectorA, move.moveId, move.legIds[0]);
  expect((await getFacts(move.owner, move.moveId)).legs[0]).toMatchObject({ accepted: true, quote: "none", billingCleared: false });
});

it("two speeds and a day that has passed are refused beside their fields", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  const wrong = await anAcceptance(move.inspectorA, move.moveId, move.legIds[0], { restrictions: ["mph-15", "mph-25"], validUntil: "2020-01-01" });
  await expect(signAcceptance(move.inspectorA, wrong, anAttempt())).rejects.toMatchObject({ code: "bad_input", fields: { restrictions: [expect.any(String)], validUntil: [expect.any(String)] } });
});

it("is the inspector's of that leg alone", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  const { moveId, legIds, owner, contractor, inspectorB, clerkA, deskA, payer, outsider } = move;
  const input = await anAcceptance(owner, moveId, legIds[0]);
  for (const viewer of [owner, contractor, inspectorB, clerkA, deskA, payer]) await expect(signAcceptance(viewer, input, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await expect(signAcceptance(outsider, input, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  for (const viewer of [clerkA, payer]) await expect(listAcceptances(viewer, moveId)).rejects.toMatchObject({ code: "not_your_part" });
});

it("a stopping finding posted afterwards withdraws it in the same step and says why; a note does not", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  const { moveId, legIds, inspectorA, owner, deskA } = move;
  await seedAcceptance(inspectorA, moveId, legIds[0]);
  const inspectionId = await seedVisit(inspectorA, moveId, legIds[0]);
  expect(await postFinding(inspectorA, aFinding(moveId, inspectionId, { severity: "note" }), anAttempt())).toMatchObject({ acceptanceWithdrawn: false });
  expect((await legOf(move))?.standing?.changed).toBe(true);
  expect(await postFinding(inspectorA, aFinding(moveId, inspectionId), anAttempt())).toMatchObject({ number: "F-02", acceptanceWithdrawn: true });
  expect((await getFacts(owner, moveId)).legs[0]?.accepted).toBe(false);
  const leg = await legOf(move);
  expect(leg?.standing).toBeNull();
  expect(leg?.withdrawn[0]?.withdrawnWhy).toBe("F-02 posted after");
  const [signature] = await db().select({ lifted: signatures.liftedWhy }).from(signatures).where(and(eq(signatures.moveId, moveId), eq(signatures.kind, "acceptance")));
  expect(signature?.lifted).toBe("F-02 posted after");
  const kinds = (await db().select({ kind: record.kind }).from(record).where(eq(record.moveId, moveId))).map(({ kind }) => kind);
  expect(kinds.slice(-2)).toEqual(["finding.posted", "acceptance.withdrawn"]);
  const told = await db().select({ kind: outbox.kind }).from(outbox).where(and(eq(outbox.moveId, moveId), eq(outbox.toAddress, deskA.email)));
  expect(told.map(({ kind }) => kind)).toContain("finding-posted");
});

it("what it covers has a hash of its own for each state of the rows", async () => {
  const move = await seedMove({ prepDone: true });
  const hashes = [(await legOf(move))?.rowsHash];
  await seedPrepSignature(move);
  hashes.push((await legOf(move))?.rowsHash);
  const { findingId } = await seedFinding(move, { severity: "note" });
  hashes.push((await legOf(move))?.rowsHash);
  await seedAcceptance(move.inspectorA, move.moveId, move.legIds[0]);
  expect((await legOf(move))?.standing?.changed).toBe(false);
  await answerFinding(move.contractor, { moveId: move.moveId, findingId, version: 1, text: "Seen.", reading: null, photoIds: [] }, anAttempt());
  const after = await legOf(move);
  hashes.push(after?.rowsHash);
  expect(new Set(hashes).size).toBe(4);
  expect(after?.standing?.changed).toBe(true);
  expect((await legOf(move, 1))?.standing).toBeNull();
});

it("is withdrawn with a reason until the carrier has the unit", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  const { moveId, legIds, inspectorA, inspectorB } = move;
  const first = await seedAcceptance(inspectorA, moveId, legIds[0]);
  const withdraw = (by: typeof inspectorA, acceptanceId: string) => withdrawAcceptance(by, { moveId, acceptanceId, why: "Wrong unit", enteredFor: null }, anAttempt());
  await expect(withdraw(inspectorB, first)).rejects.toMatchObject({ code: "not_your_part" });
  await withdraw(inspectorA, first);
  await expect(withdraw(inspectorA, first)).rejects.toMatchObject({ code: "stale" });
  const second = await seedAcceptance(inspectorA, moveId, legIds[0]);
  await seedPulled(move);
  await expect(withdraw(inspectorA, second)).rejects.toMatchObject({ code: "not_yet" });
  const inspectionId = await seedVisit(inspectorA, moveId, legIds[0]);
  expect(await postFinding(inspectorA, aFinding(moveId, inspectionId), anAttempt())).toMatchObject({ acceptanceWithdrawn: false });
  expect((await legOf(move))?.standing?.id).toBe(second);
});

it("entered for a carrier by name only it is a report, never the carrier's signature", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  const { moveId, legIds, owner } = move;
  await expect(signAcceptance(owner, await anAcceptance(owner, moveId, legIds[0], { enteredFor: HEARD }), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await db().update(moveSeats).set({ removedAt: new Date() }).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.legId, legIds[0]), eq(moveSeats.part, "carrier")));
  await signAcceptance(owner, await anAcceptance(owner, moveId, legIds[0], { enteredFor: HEARD }), anAttempt());
  const standing = (await legOf(move))?.standing;
  expect(standing).toMatchObject({ name: "R. Okafor", enteredFor: { saidBy: "V. Sorrel", source: "e-mail" } });
  expect(standing?.statement).toContain("not the carrier’s signature");
});

it("twenty signatures at once leave one acceptance", async () => {
  const move = await seedMove({ prepDone: true });
  await seedPrepSignature(move);
  const input = await anAcceptance(move.inspectorA, move.moveId, move.legIds[0]);
  const tries = await Promise.allSettled(Array.from({ length: 20 }, () => signAcceptance(move.inspectorA, input, anAttempt())));
  expect(tries.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  const leg = await legOf(move);
  expect([leg?.standing !== null, leg?.withdrawn.length]).toEqual([true, 0]);
});

it("ran out before the carrier came, it stands no more and is signed again; once the unit is taken over its day does not matter", async () => {
  const seeded = await seedMove({ prepDone: true });
  const { moveId, legIds, inspectorA, owner } = seeded;
  await seedPrepSignature(seeded);
  const first = anAttempt({ at: new Date(Date.now() - 10 * 86_400_000) });
  const tomorrowThen = new Date(first.at.getTime() + 2 * 86_400_000).toISOString().slice(0, 10);
  await signAcceptance(inspectorA, await anAcceptance(inspectorA, moveId, legIds[0], { validUntil: tomorrowThen }), first);
  expect((await getFacts(owner, moveId)).legs[0]).toMatchObject({ accepted: false, acceptanceLapsedOn: tomorrowThen });
  await unsafeRefreshLapsed(new Date());
  expect((await db().select({ what: moves.waitingFor }).from(moves).where(eq(moves.id, moveId)))[0]?.what).toBe("inspect");
  await signAcceptance(inspectorA, await anAcceptance(inspectorA, moveId, legIds[0]), anAttempt());
  expect((await getFacts(owner, moveId)).legs[0]).toMatchObject({ accepted: true, acceptanceLapsedOn: null });
  const [leg] = (await listAcceptances(owner, moveId)).legs;
  expect(leg?.withdrawn.map((one) => one.withdrawnWhy)).toEqual(["Ran out; signed again"]);
});
