import { and, desc, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { legs, moveSeats, outbox, record } from "@/db/schema";
import { cancelMove, editEquipment, editLeg, editMove, openMove } from "@/lib/moves/commands";
import { editLegInput, type EditLeg } from "@/lib/moves/input";
import { DEFAULT_FILTER } from "@/lib/moves/list-filter";
import { getCaseFile, getEquipment, listMoves } from "@/lib/moves/queries";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import type { Viewer } from "@/lib/viewer/types";
import { withDatabase } from "../../support/database";
import { anAttempt, seedCompany, seedMove, seedPerson } from "../../support/factories";
import { anOpening } from "./support";

const database = withDatabase();

async function anOpenMove() {
  const companyId = await seedCompany("Vellum Ridge Heritage Line");
  const owner = await seedPerson("R. Okafor", companyId, { manager: true });
  const { moveId } = await openMove(owner, anOpening(companyId), anAttempt());
  const file = await getCaseFile(owner, moveId);
  return { companyId, owner, moveId, file };
}

const lastEntry = async (moveId: string) => (await db().select().from(record).where(eq(record.moveId, moveId)).orderBy(desc(record.seq)).limit(1))[0];

const legChange = async (viewer: Viewer, moveId: string, seq: number, given: Partial<Record<keyof EditLeg, unknown>>): Promise<EditLeg> => {
  const leg = (await getCaseFile(viewer, moveId)).legs.find((one) => one.seq === seq);
  if (!leg) throw new Error("no such leg");
  const { legId, carrierName, carrierMark, toPlace, toZone, version, payerName } = leg;
  return editLegInput.parse({ moveId, legId, version, carrierName, carrierMark, toPlace, toZone, miles: leg.miles, payer: payerName ? "other" : "unnamed", payerName, ...given });
};

describe("changing the unit", () => {
  it("keeps before and after on record, and the list finds the new names", async () => {
    const { owner, moveId } = await anOpenMove();
    const { answers, version } = await getEquipment(owner, moveId);
    expect(await editEquipment(owner, { moveId, version, answers: { ...answers, number: "2784", fuel: "200" }, aliases: ["ZVRX 12"] }, anAttempt())).toEqual({ version: 2 });
    expect(await lastEntry(moveId)).toMatchObject({ kind: "equipment.changed", detail: { version: 2, changes: [{ key: "number", before: "2783", after: "2784" }, { key: "fuel", before: null, after: "200 US gal" }, { key: "aliases", before: "VRHL 2783", after: "ZVRX 12" }] } });
    expect((await listMoves(owner, { ...DEFAULT_FILTER, q: "zvrx2784" })).total).toBe(1);
    expect((await listMoves(owner, { ...DEFAULT_FILTER, q: "vrhl" })).total).toBe(0);
    expect(await unsafeVerifyRecord(moveId)).toMatchObject({ entries: 2, brokenAt: null });
  });

  it("tells the loser of two who changed what, and overwrites nothing", async () => {
    const { moveId, owner, contractor } = await seedMove();
    const kept = await getEquipment(owner, moveId);
    const base = { ...kept.answers, bearings: "roller-rotating-cap" };
    await editEquipment(contractor, { moveId, version: 1, answers: { ...base, weight: "360000" }, aliases: [] }, anAttempt());
    await expect(editEquipment(owner, { moveId, version: 1, answers: { ...base, weight: "1" }, aliases: [] }, anAttempt())).rejects.toMatchObject({
      code: "stale", message: expect.stringContaining("T. Ibarra changed this"), missing: expect.arrayContaining(["T. Ibarra: How much does it weigh as it will travel? 360,000 lb, was 362,400 lb"]),
    });
    expect((await getEquipment(owner, moveId)).answers.weight).toBe("360000");
  });

  it("writes nothing when nothing changed, and is the owner’s and the contractor’s alone", async () => {
    const { moveId, owner, contractor, inspectorA, receiver, payer, outsider } = await seedMove();
    const { answers, aliases } = await getEquipment(contractor, moveId);
    expect(await editEquipment(owner, { moveId, version: 1, answers, aliases }, anAttempt())).toEqual({ version: 1 });
    for (const viewer of [inspectorA, receiver]) await expect(editEquipment(viewer, { moveId, version: 1, answers, aliases }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    await expect(getEquipment(payer, moveId)).rejects.toMatchObject({ code: "not_your_part" });
    await expect(getEquipment(outsider, moveId)).rejects.toMatchObject({ code: "not_found" });
  });
});

describe("changing a leg", () => {
  it("moves the interchange for both its carriers", async () => {
    const { owner, moveId } = await anOpenMove();
    await editLeg(owner, await legChange(owner, moveId, 1, { toPlace: "Tolland", toZone: "America/Denver", miles: 180 }), anAttempt());
    const route = await db().select({ from: legs.fromPlace, to: legs.toPlace, miles: legs.miles }).from(legs).where(eq(legs.moveId, moveId)).orderBy(legs.seq);
    expect(route).toEqual([{ from: "Sand Hollow", to: "Tolland", miles: 180 }, { from: "Tolland", to: "Quill Creek", miles: 398 }]);
    expect(await lastEntry(moveId)).toMatchObject({ kind: "leg.changed", detail: { seq: 1, changes: [{ label: "Interchange", before: "Ardell", after: "Tolland" }, { label: "Miles", before: "174", after: "180" }] } });
  });

  it("another carrier leaves the seat of the first, who then sees nothing", async () => {
    const { moveId, owner, inspectorB, legIds } = await seedMove();
    await editLeg(owner, await legChange(owner, moveId, 2, { carrierName: "Coldwater Short Line", carrierMark: "ZCSL" }), anAttempt());
    await expect(getCaseFile(inspectorB, moveId)).rejects.toMatchObject({ code: "not_found" });
    const [leg] = await db().select().from(legs).where(eq(legs.id, legIds[1]));
    expect(leg).toMatchObject({ carrierName: "Coldwater Short Line", carrierCompanyId: null, version: 2 });
    expect(await lastEntry(moveId)).toMatchObject({ kind: "carrier.named", legId: legIds[1], detail: { before: "Sable Mountain Lines", carrier: "Coldwater Short Line" } });
  });

  it("another payer leaves its seat; the owner takes one, and the first gets it back", async () => {
    const { moveId, owner, payer, legIds } = await seedMove();
    const payers = () => db().select({ companyId: moveSeats.companyId, removedAt: moveSeats.removedAt }).from(moveSeats).where(and(eq(moveSeats.legId, legIds[0]), eq(moveSeats.part, "payer")));
    await editLeg(owner, await legChange(owner, moveId, 1, { payer: "ours", payerName: "" }), anAttempt());
    await expect(getCaseFile(payer, moveId)).rejects.toMatchObject({ code: "not_found" });
    expect((await payers()).filter((seat) => seat.removedAt === null)).toEqual([{ companyId: owner.memberships[0]?.companyId, removedAt: null }]);
    await editLeg(owner, await legChange(owner, moveId, 1, { payer: "unnamed", payerName: "" }), anAttempt());
    expect((await payers()).filter((seat) => seat.removedAt === null)).toEqual([]);
    expect((await getCaseFile(owner, moveId)).legs[0]?.payerName).toBeNull();
    await editLeg(owner, await legChange(owner, moveId, 1, { payer: "ours", payerName: "" }), anAttempt());
    expect((await payers()).filter((seat) => seat.removedAt === null)).toHaveLength(1);
  });

  it("the same payer by the same name keeps its seat", async () => {
    const { moveId, owner, payer } = await seedMove();
    await editLeg(owner, await legChange(owner, moveId, 1, { miles: 200 }), anAttempt());
    expect((await getCaseFile(payer, moveId)).legs[0]).toMatchObject({ miles: 200, payerName: "Fenn Valley Fund" });
  });

  it("is refused once it has begun, field by field", async () => {
    const { moveId, owner, legIds } = await seedMove();
    const admin = await database.root();
    await admin.query("insert into inspections (id, move_id, leg_id, number, visited_on, place, zone, inspector_name, air, by_user_id, at) values ('isp_1', ?, ?, 1, '2026-11-01', 'Sand Hollow', 'America/Chicago', 'V. Sorrel', 'off', 'usr_1', now(3))", [moveId, legIds[0]]);
    await expect(editLeg(owner, await legChange(owner, moveId, 1, { carrierName: "Other" }), anAttempt())).rejects.toMatchObject({ code: "not_yet" });
    await admin.query("insert into acceptances (id, move_id, leg_id, restrictions, signature_id, at) values ('apt_1', ?, ?, '[]', 'sig_1', now(3))", [moveId, legIds[0]]);
    await admin.end();
    await expect(editLeg(owner, await legChange(owner, moveId, 1, { toPlace: "Tolland" }), anAttempt())).rejects.toMatchObject({ code: "not_yet", message: expect.stringContaining("withdrawn first") });
    await expect(editMove(owner, { ...(await moveChange(owner, moveId)), origin: { name: "Elsewhere", place: "Elsewhere", zone: "America/Chicago" } }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
    expect(await editLeg(owner, await legChange(owner, moveId, 2, { miles: 400 }), anAttempt())).toEqual({ version: 2 });
  });

  it("needs an interchange where another carrier follows", async () => {
    const { moveId, owner } = await anOpenMove();
    await expect(editLeg(owner, { ...(await legChange(owner, moveId, 1, {})), toPlace: null, toZone: null }, anAttempt())).rejects.toMatchObject({ code: "bad_input", fields: { toPlace: [expect.any(String)], toZone: [expect.any(String)] } });
  });

  it("is the owner’s alone, and one of two writers learns of the other", async () => {
    const { moveId, owner, contractor, deskA } = await seedMove();
    for (const viewer of [contractor, deskA]) await expect(editLeg(viewer, await legChange(viewer, moveId, 1, { miles: 1 }), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    const [mine, theirs] = [await legChange(owner, moveId, 1, { miles: 1 }), await legChange(owner, moveId, 1, { miles: 2 })];
    await editLeg(owner, mine, anAttempt());
    await expect(editLeg(owner, theirs, anAttempt())).rejects.toMatchObject({ code: "stale", missing: ["R. Okafor: Miles 1"] });
  });
});

const moveChange = async (viewer: Viewer, moveId: string) => {
  const { origin, destination, wantedFrom, wantedTo, note, version } = await getCaseFile(viewer, moveId);
  return { moveId, version, origin, destination, wantedFrom, wantedTo, note };
};

describe("changing the ends", () => {
  it("carries them into the first and the last leg", async () => {
    const { owner, moveId } = await anOpenMove();
    await editMove(owner, { ...(await moveChange(owner, moveId)), origin: { name: "Coldwater plant", place: "Coldwater", zone: "America/Chicago" }, wantedTo: "2027-03-01" }, anAttempt());
    const file = await getCaseFile(owner, moveId);
    expect(file).toMatchObject({ version: 2, wantedTo: "2027-03-01", origin: { place: "Coldwater" } });
    expect(file.legs[0]?.fromPlace).toBe("Coldwater");
    expect((await listMoves(owner, { ...DEFAULT_FILTER, q: "coldwater" })).total).toBe(1);
  });
});

describe("cancelling", () => {
  it("ends the case with its reason, tells everybody at work on it, and nothing changes any more", async () => {
    const { moveId, owner, contractor } = await seedMove();
    await expect(cancelMove(contractor, { moveId, reason: "No" }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    await cancelMove(owner, { moveId, reason: "The unit was sold where it stands." }, anAttempt());
    expect(await getCaseFile(contractor, moveId)).toMatchObject({ state: "cancelled", stage: "cancelled", waiting: null, may: { edit: false } });
    expect(await lastEntry(moveId)).toMatchObject({ kind: "move.cancelled", detail: { reason: "The unit was sold where it stands." } });
    const letters = await db().select({ to: outbox.toAddress }).from(outbox).where(and(eq(outbox.moveId, moveId), eq(outbox.kind, "move-closed")));
    expect(letters.map((one) => one.to)).toContain(contractor.email);
    expect(letters.map((one) => one.to)).not.toContain(owner.email);
    await expect(cancelMove(owner, { moveId, reason: "Again" }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  });
});
