import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { legs, moveDrafts, moves, moveSeats, prepItems, record } from "@/db/schema";
import { beginDraft, discardDraft, openMove, saveDraft } from "@/lib/moves/commands";
import { getCaseFile, getDraft, getEquipment, listDrafts } from "@/lib/moves/queries";
import { fillPrep } from "@/lib/prep/commands";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedCompany, seedPerson } from "../../support/factories";
import { anOpening } from "./support";

withDatabase();

const anOwner = async (name = "Vellum Ridge Heritage Line") => {
  const companyId = await seedCompany(name);
  return { companyId, owner: await seedPerson("R. Okafor", companyId, { manager: true }) };
};

describe("opening a move", () => {
  it("makes the whole case: number, unit, route joined end to end, seats, prep, record, whose turn", async () => {
    const { companyId, owner } = await anOwner();
    const { moveId, caseNumber } = await openMove(owner, anOpening(companyId), anAttempt({ at: new Date("2026-11-24T12:00:00Z") }), fillPrep);
    expect(caseNumber).toMatch(/^26-\d{4}$/);
    const route = await db().select({ from: legs.fromPlace, to: legs.toPlace, payer: legs.payerName, payerCompanyId: legs.payerCompanyId }).from(legs).where(eq(legs.moveId, moveId)).orderBy(legs.seq);
    expect(route).toEqual([{ from: "Sand Hollow", to: "Ardell", payer: "Fenn Valley Fund", payerCompanyId: null }, { from: "Ardell", to: "Quill Creek", payer: "Vellum Ridge Heritage Line", payerCompanyId: companyId }]);
    const seats = await db().select({ part: moveSeats.part }).from(moveSeats).where(eq(moveSeats.moveId, moveId));
    expect(seats.map((seat) => seat.part).sort()).toEqual(["owner", "payer"]);
    expect((await db().select().from(prepItems).where(eq(prepItems.moveId, moveId))).length).toBeGreaterThan(10);
    expect(await unsafeVerifyRecord(moveId)).toMatchObject({ entries: 1, brokenAt: null });
    const file = await getCaseFile(owner, moveId);
    expect(file).toMatchObject({ stage: "opening", waiting: { waitingFor: "invite-contractor", you: true }, unit: { mark: "ZVRX", aliases: ["VRHL 2783"], weightLb: 362400 }, may: { edit: true, cancel: true } });
    expect((await getEquipment(owner, moveId)).answers).toMatchObject({ mark: "ZVRX", axles: "6", coupler: "alignment-control" });
  });

  it("gives numbers one after the other, also to many at once", async () => {
    const { companyId, owner } = await anOwner();
    const at = new Date("2031-03-01T12:00:00Z");
    const opened = await Promise.all(Array.from({ length: 6 }, () => openMove(owner, anOpening(companyId), anAttempt({ at }))));
    expect(opened.map((one) => one.caseNumber).sort()).toEqual(["31-0001", "31-0002", "31-0003", "31-0004", "31-0005", "31-0006"]);
  });

  it("happens once for the same try, and only for an own company", async () => {
    const { companyId, owner } = await anOwner();
    const attempt = anAttempt();
    const first = await openMove(owner, anOpening(companyId), attempt);
    expect(await openMove(owner, anOpening(companyId), attempt)).toEqual(first);
    expect(await db().select({ id: moves.id }).from(moves).where(eq(moves.ownerCompanyId, companyId))).toHaveLength(1);
    await expect(openMove(owner, anOpening((await anOwner()).companyId), anAttempt())).rejects.toMatchObject({ code: "bad_input", fields: { companyId: ["Choose a company of yours."] } });
  });

  it("leaves nothing behind when a later room fails", async () => {
    const { companyId, owner } = await anOwner();
    const { draftId } = await beginDraft(owner, { companyId, body: {} }, anAttempt());
    await expect(openMove(owner, { ...anOpening(companyId), draftId }, anAttempt(), () => Promise.reject(new Error("no room")))).rejects.toThrow("no room");
    expect(await db().select({ id: moves.id }).from(moves).where(eq(moves.ownerCompanyId, companyId))).toHaveLength(0);
    expect(await getDraft(owner, draftId)).toMatchObject({ version: 1 });
  });
});

describe("a draft", () => {
  it("is kept as typed, listed for the company, and ends when its move is opened", async () => {
    const { companyId, owner } = await anOwner();
    const { draftId } = await beginDraft(owner, { companyId, body: { answers: { mark: "ZVRX", number: "2783" }, note: "half a sent" } }, anAttempt());
    const colleague = await seedPerson("L. Vane", companyId);
    expect(await listDrafts(colleague)).toMatchObject([{ draftId, unit: "ZVRX 2783" }]);
    expect((await getDraft(colleague, draftId)).body).toMatchObject({ note: "half a sent" });
    await openMove(owner, { ...anOpening(companyId), draftId }, anAttempt());
    await expect(getDraft(owner, draftId)).rejects.toMatchObject({ code: "not_found" });
    await expect(openMove(colleague, { ...anOpening(companyId), draftId }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  });

  it("refuses to overwrite what somebody else saved, and loses neither", async () => {
    const { companyId, owner } = await anOwner();
    const { draftId } = await beginDraft(owner, { companyId, body: { note: "one" } }, anAttempt());
    const save = (note: string, version: number) => saveDraft(owner, { draftId, companyId, body: { note }, version }, anAttempt());
    expect(await save("two", 1)).toMatchObject({ version: 2 });
    await expect(save("three", 1)).rejects.toMatchObject({ code: "stale" });
    const tries = await Promise.allSettled([save("four", 2), save("five", 2)]);
    expect(tries.filter((one) => one.status === "fulfilled")).toHaveLength(1);
    expect(await getDraft(owner, draftId)).toMatchObject({ version: 3 });
  });

  it("is nobody else’s", async () => {
    const { companyId, owner } = await anOwner();
    const { owner: stranger } = await anOwner("Marrow Pit");
    const { draftId } = await beginDraft(owner, { companyId, body: {} }, anAttempt());
    await expect(getDraft(stranger, draftId)).rejects.toMatchObject({ code: "not_found" });
    await expect(saveDraft(stranger, { draftId, companyId, body: {}, version: 1 }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
    await expect(discardDraft(stranger, { draftId }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
    await expect(beginDraft(stranger, { companyId, body: {} }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
    expect(await listDrafts(stranger)).toEqual([]);
    await discardDraft(owner, { draftId }, anAttempt());
    expect(await db().select().from(moveDrafts).where(eq(moveDrafts.id, draftId))).toEqual([]);
  });
});

it("the record says who opened what", async () => {
  const { companyId, owner } = await anOwner();
  const { moveId } = await openMove(owner, anOpening(companyId), anAttempt());
  const [entry] = await db().select().from(record).where(eq(record.moveId, moveId));
  expect(entry).toMatchObject({ kind: "move.opened", byName: "R. Okafor", byPart: "owner", detail: { unit: "ZVRX 2783", carriers: ["Quillan & Sandbar", "Sable Mountain Lines"] } });
});
