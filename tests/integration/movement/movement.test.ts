import { eq } from "drizzle-orm";
import fc from "fast-check";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { legs, moveSeats, outbox, sightings, signatures } from "@/db/schema";
import { clearBilling } from "@/lib/fees/commands/quotes";
import { closeMove, giveInstruction, makeSighting, recordArrival, releaseUnit, retractSighting, withdrawInstruction } from "@/lib/movement/commands";
import { recordArrivalInput } from "@/lib/movement/input";
import { getMovement } from "@/lib/movement/queries";
import { keepItem } from "@/lib/prep/commands";
import { getPrep } from "@/lib/prep/queries";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { getFacts } from "@/lib/standing/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";
import { HEARD, seedAcceptance, seedPrepSignature } from "../../support/inspecting";
import { anInstruction, aSighting, makeReady, seedPhoto, seedPlaced, seedReady, sight, signCoupled } from "../../support/moving";

withDatabase();

const today = () => new Date(Date.now() - 24 * 3600_000).toISOString().slice(0, 10);

it("pulled is refused with everything that is missing, and the list grows shorter by each thing that comes to stand", async () => {
  const move = await seedMove({ prepDone: true });
  const { moveId, legIds: [leg], deskA, inspectorA, clerkA, owner } = move;
  const missing = () => sight(deskA, moveId, leg, "pulled").then(() => [], (refused: { code: string; missing?: string[] }) => {
    expect(refused.code).toBe("not_yet");
    return refused.missing?.map((one) => one.split(":")[0]);
  });
  const all = ["Prep signed, where it stands", "Acceptance", "Billing cleared", "Movement instruction", "Released by the owner", "Prep signed, when coupled"];
  expect(await missing()).toEqual(all);
  await seedPrepSignature(move);
  expect(await missing()).toEqual(all.slice(1));
  await seedAcceptance(inspectorA, moveId, leg);
  expect(await missing()).toEqual(all.slice(2));
  await expect(giveInstruction(deskA, anInstruction(moveId, leg), anAttempt())).rejects.toMatchObject({ code: "not_yet", missing: ["Billing cleared: not met"] });
  await clearBilling(clerkA, { moveId, legId: leg, note: "Account 7", enteredFor: null }, anAttempt());
  expect(await missing()).toEqual(all.slice(3));
  await expect(releaseUnit(owner, { moveId, name: "R. Okafor", note: null }, anAttempt())).rejects.toMatchObject({ code: "not_yet", missing: ["Movement instruction: not given"] });
  await giveInstruction(deskA, anInstruction(moveId, leg), anAttempt());
  expect(await missing()).toEqual(all.slice(4));
  await releaseUnit(owner, { moveId, name: "R. Okafor", note: null }, anAttempt());
  expect(await missing()).toEqual(all.slice(5));
  await signCoupled(move);
  expect(await missing()).toEqual([]);
  expect((await getFacts(owner, moveId)).legs[0]).toMatchObject({ takenOver: true, delivered: false });
});

it("a released unit carries the owner's signature, and is released once", async () => {
  const { moveId, owner } = await seedReady();
  const [signed] = (await db().select().from(signatures).where(eq(signatures.moveId, moveId))).filter((one) => one.kind === "release");
  expect(signed).toMatchObject({ name: "R. Okafor", statement: "The owner tenders ZVRX 2783 to Quillan & Sandbar for movement dead in tow, under its acceptance and movement instruction." });
  await expect(releaseUnit(owner, { moveId, name: "R. Okafor", note: null }, anAttempt())).rejects.toMatchObject({ code: "stale" });
});

it("a newer instruction takes the place of the one before; after take-over neither is given nor withdrawn", async () => {
  const { moveId, legIds: [leg], deskA } = await seedReady();
  const { instructionId } = await giveInstruction(deskA, anInstruction(moveId, leg, { billNumber: "B-4411" }), anAttempt());
  expect((await getMovement(deskA, moveId)).legs[0]?.instruction).toMatchObject({ id: instructionId, billNumber: "B-4411", byName: "D. Sand" });
  await sight(deskA, moveId, leg, "pulled");
  await expect(giveInstruction(deskA, anInstruction(moveId, leg), anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  await expect(withdrawInstruction(deskA, { moveId, instructionId, why: "Annulled", enteredFor: null }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
});

it("a withdrawn instruction no longer counts, and the owner hears why", async () => {
  const { moveId, legIds: [leg], deskA, owner } = await seedReady();
  const id = (await getMovement(deskA, moveId)).legs[0]?.instruction?.id ?? "";
  await withdrawInstruction(deskA, { moveId, instructionId: id, why: "The train was annulled", enteredFor: null }, anAttempt());
  await expect(sight(deskA, moveId, leg, "pulled")).rejects.toMatchObject({ missing: ["Movement instruction: not given"] });
  const mails = await db().select({ to: outbox.toAddress, kind: outbox.kind }).from(outbox).where(eq(outbox.moveId, moveId));
  expect(mails.filter((mail) => mail.to === owner.email && mail.kind === "movement")).toHaveLength(2);
});

it("a receipt without a recorded hand-over is taken: it happens", async () => {
  const move = await seedReady();
  const { moveId, legIds: [a, b], deskA, deskB, owner } = move;
  await sight(deskA, moveId, a, "pulled", { hoursAgo: 30 });
  await makeReady(move, 1);
  await sight(deskB, moveId, b, "received", { hoursAgo: 2 });
  expect((await getFacts(owner, moveId)).legs).toMatchObject([{ takenOver: true, delivered: false }, { takenOver: true }]);
  expect((await getMovement(deskB, moveId)).legs[1]).toMatchObject({ takenOver: true, kinds: expect.arrayContaining(["departed", "placed"]) });
});

it("the next carrier can't receive what the first has not pulled", async () => {
  const move = await seedReady();
  await makeReady(move, 1);
  await expect(sight(move.deskB, move.moveId, move.legIds[1], "received")).rejects.toMatchObject({ code: "not_yet", message: "Quillan & Sandbar has not taken the unit over yet." });
});

it("what lies ahead is refused beside its field; a time the clock skipped too", async () => {
  const { moveId, legIds: [leg], deskA } = await seedReady();
  await expect(sight(deskA, moveId, leg, "pulled", { hoursAgo: -2 })).rejects.toMatchObject({ code: "bad_input", fields: { occurredAt: [expect.stringContaining("lies ahead")] } });
  await expect(sight(deskA, moveId, leg, "pulled", { occurredAt: "2026-03-08T02:30" })).rejects.toMatchObject({ code: "bad_input", fields: { occurredAt: [expect.stringContaining("set forward")] } });
});

it("hand-overs are taken back from the last to the first, once, with the reason kept", async () => {
  const move = await seedReady();
  const { moveId, legIds: [a, b], deskA, deskB } = move;
  const pulled = await sight(deskA, moveId, a, "pulled", { hoursAgo: 40 });
  const given = await sight(deskA, moveId, a, "delivered", { hoursAgo: 30 });
  await makeReady(move, 1);
  const received = await sight(deskB, moveId, b, "received", { hoursAgo: 20 });
  const back = (by: typeof deskA, sightingId: string) => retractSighting(by, { moveId, sightingId, why: "Another unit", enteredFor: null }, anAttempt());
  await expect(back(deskA, given.sightingId)).rejects.toMatchObject({ code: "not_yet", missing: ["Receipt by the next carrier"] });
  await expect(back(deskA, pulled.sightingId)).rejects.toMatchObject({ missing: ["Sightings after it on this or a later leg", "Receipt by the next carrier"] });
  await expect(back(deskA, received.sightingId)).rejects.toMatchObject({ code: "not_your_part" });
  await back(deskB, received.sightingId);
  await back(deskA, given.sightingId);
  await expect(back(deskA, given.sightingId)).rejects.toMatchObject({ code: "stale" });
  await back(deskA, pulled.sightingId);
  expect((await getFacts(deskA, moveId)).legs).toMatchObject([{ takenOver: false, delivered: false }, { takenOver: false }]);
  expect((await getMovement(deskA, moveId)).sightings.map((one) => one.retracted?.why)).toEqual(["Another unit", "Another unit", "Another unit"]);
  expect((await unsafeVerifyRecord(moveId)).brokenAt).toBeNull();
});

it("a correction of the same kind takes the place of the wrong one, whatever was recorded since", async () => {
  const { moveId, legIds: [leg], deskA } = await seedReady();
  const wrong = await sight(deskA, moveId, leg, "pulled", { hoursAgo: 40 });
  await sight(deskA, moveId, leg, "departed", { hoursAgo: 30 });
  const right = await sight(deskA, moveId, leg, "pulled", { hoursAgo: 41, corrects: wrong.sightingId });
  const { sightings: seen, legs: [first] } = await getMovement(deskA, moveId);
  expect(seen.map(({ id, kind, retracted, corrects }) => ({ id, kind, gone: Boolean(retracted), corrects }))).toEqual([
    { id: right.sightingId, kind: "pulled", gone: false, corrects: wrong.sightingId },
    { id: wrong.sightingId, kind: "pulled", gone: true, corrects: null },
    { id: expect.any(String), kind: "departed", gone: false, corrects: null },
  ]);
  expect(first?.takenOver).toBe(true);
  await expect(sight(deskA, moveId, leg, "departed", { corrects: right.sightingId })).rejects.toMatchObject({ code: "not_yet", missing: ["Sightings after it on this or a later leg"] });
});

it("sightings stand in the order in which they happened, however they come in", async () => {
  const { moveId, legIds: [leg], deskA } = await seedReady();
  await sight(deskA, moveId, leg, "pulled", { hoursAgo: 500 });
  await fc.assert(fc.asyncProperty(fc.array(fc.integer({ min: 1, max: 400 }), { minLength: 1, maxLength: 5 }), async (hours) => {
    for (const hoursAgo of hours) await sight(deskA, moveId, leg, "seen", { hoursAgo });
    const moments = (await getMovement(deskA, moveId)).sightings.map((one) => one.occurredAt);
    expect(moments).toEqual([...moments].sort());
  }), { numRuns: 6 });
});

it("the receiver records what happens at arrival and nothing before it, and takes back only its own", async () => {
  const move = await seedPlaced();
  const { moveId, legIds: [a, b], receiver, deskB } = move;
  const placed = (await getMovement(receiver, moveId)).sightings.find((one) => one.kind === "placed");
  expect(placed?.mayRetract).toBe(false);
  await expect(retractSighting(receiver, { moveId, sightingId: placed?.id ?? "", why: "Another track", enteredFor: null }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await retractSighting(deskB, { moveId, sightingId: placed?.id ?? "", why: "Another track", enteredFor: null }, anAttempt());
  expect((await getMovement(receiver, moveId)).legs.map((leg) => leg.kinds)).toEqual([[], ["seen", "at-destination", "notified", "placed"]]);
  await expect(sight(receiver, moveId, b, "departed")).rejects.toMatchObject({ code: "not_your_part" });
  await expect(sight(receiver, moveId, a, "seen")).rejects.toMatchObject({ code: "not_your_part" });
  const own = await sight(receiver, moveId, b, "placed");
  await retractSighting(receiver, { moveId, sightingId: own.sightingId, why: "The wrong track", enteredFor: null }, anAttempt());
});

it("for a carrier that is not on board, the owner enters what it told; its own people then can't be spoken for", async () => {
  const move = await seedReady();
  const { moveId, legIds: [leg], owner } = move;
  await expect(sight(owner, moveId, leg, "pulled", { enteredFor: { ...HEARD } })).rejects.toMatchObject({ code: "not_your_part", message: "This carrier is on board and enters its own steps." });
  await db().update(moveSeats).set({ removedAt: new Date() }).where(eq(moveSeats.legId, leg));
  await db().update(legs).set({ carrierCompanyId: null }).where(eq(legs.id, leg));
  expect((await getMovement(owner, moveId)).legs[0]?.may).toMatchObject({ enterFor: true, sight: true });
  await expect(sight(owner, moveId, leg, "pulled")).rejects.toMatchObject({ code: "not_your_part" });
  await sight(owner, moveId, leg, "pulled", { enteredFor: { ...HEARD } });
  const [seen] = (await getMovement(owner, moveId)).sightings;
  expect(seen).toMatchObject({ kind: "pulled", byName: "R. Okafor", enteredFor: { carrierName: "Quillan & Sandbar", source: "e-mail", saidBy: "V. Sorrel" }, mayRetract: true });
});

it("arrival waits for placed, needs a photo and a day that has come, and is signed once", async () => {
  const early = await seedReady();
  const look = (moveId: string, photoIds: string[], given: Record<string, unknown> = {}) => ({ moveId, arrivedOn: today(), condition: "As it left.", missing: null, name: "M. Alder", photoIds, ...given });
  await expect(recordArrival(early.receiver, look(early.moveId, [await seedPhoto(early.moveId, early.receiver)]), anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  expect(recordArrivalInput.safeParse(look(early.moveId, [])).error?.issues[0]?.message).toContain("at least one photo");
  const { moveId, receiver, inspectorA, clerkA, deskB } = await seedPlaced();
  const photo = await seedPhoto(moveId, receiver);
  await expect(recordArrival(receiver, look(moveId, [photo], { arrivedOn: "2099-01-01" }), anAttempt())).rejects.toMatchObject({ fields: { arrivedOn: [expect.stringContaining("lies ahead")] } });
  await expect(recordArrival(inspectorA, look(moveId, [photo]), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await recordArrival(receiver, look(moveId, [photo], { missing: "Classification light, left front" }), anAttempt());
  await expect(recordArrival(receiver, look(moveId, [photo]), anAttempt())).rejects.toMatchObject({ code: "stale" });
  expect((await getMovement(receiver, moveId)).arrival).toMatchObject({ condition: "As it left.", missing: "Classification light, left front", signedAs: "M. Alder", photos: [{ id: photo }] });
  await expect(getMovement(clerkA, moveId)).rejects.toMatchObject({ code: "not_your_part" });
  const seen = (await getMovement(deskB, moveId)).sightings.find((one) => one.kind === "placed");
  expect(seen?.mayRetract).toBe(false);
  await expect(retractSighting(deskB, { moveId, sightingId: seen?.id ?? "", why: "Too late", enteredFor: null }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
});

it("closing is refused while a restore item is open; closed, nothing changes any more", async () => {
  const { moveId, legIds: [, b], receiver, owner, deskB } = await seedPlaced();
  await expect(closeMove(owner, { moveId, name: "R. Okafor" }, anAttempt())).rejects.toMatchObject({ code: "not_yet", missing: ["The receiver’s look at arrival: not recorded", "1 restore item: not restored and not kept as it is"] });
  await recordArrival(receiver, { moveId, arrivedOn: today(), condition: "As it left.", missing: null, name: "M. Alder", photoIds: [await seedPhoto(moveId, receiver)] }, anAttempt());
  await expect(closeMove(owner, { moveId, name: "R. Okafor" }, anAttempt())).rejects.toMatchObject({ code: "not_yet", missing: ["1 restore item: not restored and not kept as it is"] });
  const item = (await getPrep(receiver, moveId)).items.find((one) => one.restoreAction !== null);
  const { version = 0 } = (item ?? {}) as { version?: number };
  await keepItem(receiver, { moveId, itemId: item?.id ?? "", version, why: "It goes on display." }, anAttempt());
  expect((await getMovement(owner, moveId)).closing).toMatchObject({ may: true, missing: [] });
  await closeMove(owner, { moveId, name: "R. Okafor" }, anAttempt());
  expect(await getMovement(owner, moveId)).toMatchObject({ closing: { may: false, closedAt: expect.any(String) }, legs: [{ may: { sight: false } }, { may: { sight: false } }] });
  await expect(sight(deskB, moveId, b, "seen")).rejects.toMatchObject({ code: "not_yet", message: expect.stringContaining("closed") });
});

it("the same key again records one sighting", async () => {
  const { moveId, legIds: [leg], deskA } = await seedReady();

  const attempt = anAttempt();
  const input = aSighting(moveId, leg, "pulled");
  const first = await makeSighting(deskA, input, attempt);
  expect(await makeSighting(deskA, input, attempt)).toEqual(first);
  expect(await db().select({ id: sightings.id }).from(sightings).where(eq(sightings.moveId, moveId))).toHaveLength(1);
});

it("a payer and a billing clerk don’t see the movement; a desk reads its conditions", async () => {
  const { moveId, payer, clerkB, deskA } = await seedMove({ prepDone: true });
  for (const viewer of [payer, clerkB]) await expect(getMovement(viewer, moveId)).rejects.toMatchObject({ code: "not_your_part" });
  const [leg] = (await getMovement(deskA, moveId)).legs;
  expect(leg?.conditions.filter((one) => one.id === "prep" || one.id === "acceptance").map((one) => one.detail)).toEqual(["Done, not signed", "Not inspected yet"]);
});
