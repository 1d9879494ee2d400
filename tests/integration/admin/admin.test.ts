import { and, eq, isNull } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { companies, companyMembers, legs, moves, moveSeats, outbox, sessions, siteLog } from "@/db/schema";
import { requireMove } from "@/lib/access/scope";
import { retryMail } from "@/lib/admin/commands/mail";
import { mergeCompanies } from "@/lib/admin/commands/merge";
import { disablePerson, enablePerson, endSessionsOf } from "@/lib/admin/commands/people";
import { listAllCompanies, listMail, listPeople } from "@/lib/admin/queries";
import { newId } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import { verifyRecord } from "@/lib/record/queries";
import { unsafeViewerOf } from "@/lib/viewer/queries";
import type { Viewer } from "@/lib/viewer/types";
import { withDatabase } from "../../support/database";
import { anAttempt, seedCompany, seedMember, seedMove, seedSeat, seedUser, viewerOf } from "../../support/factories";

withDatabase();

let admin: Viewer;
beforeAll(async () => {
  admin = await viewerOf(await seedUser("Site Keeper", { siteAdmin: true }));
});

const companyOf = (viewer: Viewer) => viewer.memberships[0]?.companyId ?? "";
const presentIn = (companyId: string) => db().select().from(companyMembers).where(and(eq(companyMembers.companyId, companyId), isNull(companyMembers.removedAt)));

async function withSession(name: string): Promise<Viewer> {
  const userId = await seedUser(name);
  const at = new Date();
  await db().insert(sessions).values({ id: newId("session"), userId, token: newId("session"), expiresAt: new Date(at.getTime() + 1e7), createdAt: at, updatedAt: at });
  return viewerOf(userId);
}

describe("who is no site administrator", () => {
  it("finds nothing", async () => {
    const { owner } = await seedMove();
    const someone = { userId: admin.userId };
    for (const run of [() => listAllCompanies(owner), () => listPeople(owner, "keeper"), () => listMail(owner), () => disablePerson(owner, someone, anAttempt()), () => enablePerson(owner, someone, anAttempt()), () => endSessionsOf(owner, someone, anAttempt()), () => retryMail(owner, { outboxId: newId("outbox") }, anAttempt()), () => mergeCompanies(owner, { keepId: companyOf(owner), goneId: newId("company") }, anAttempt())]) {
      await expect(run()).rejects.toMatchObject({ code: "not_found" });
    }
  });

  it("and a site administrator sees no case", async () => {
    const { moveId } = await seedMove();
    await expect(requireMove(admin, moveId)).rejects.toMatchObject({ code: "not_found" });
  });
});

describe("merging", () => {
  it("brings people, seats and legs together, and leaves the record whole", async () => {
    const one = await seedMove();
    const two = await seedMove();
    const [keepId, goneId] = [companyOf(one.inspectorA), companyOf(two.inspectorA)];
    // Both sit on the first move's leg, and one person belongs to both.
    await seedSeat(one.moveId, goneId, "carrier", one.legIds[0]);
    await seedMember(goneId, one.inspectorA.userId, { bills: true, manager: true });
    expect((await listAllCompanies(admin, { doubled: true })).map((row) => row.companyId)).toEqual(expect.arrayContaining([keepId, goneId]));
    await mergeCompanies(admin, { keepId, goneId }, anAttempt());
    expect((await presentIn(keepId)).find((row) => row.userId === one.inspectorA.userId)).toMatchObject({ inspects: true, bills: true, manager: true });
    expect(await presentIn(goneId)).toEqual([]);
    for (const [viewer, moveId] of [[two.inspectorA, two.moveId], [two.inspectorA, one.moveId], [one.deskA, two.moveId]] as const) {
      expect((await requireMove(await viewerOf(viewer.userId), moveId)).parts.length).toBeGreaterThan(0);
    }
    const seats = await db().select().from(moveSeats).where(and(eq(moveSeats.moveId, one.moveId), eq(moveSeats.part, "carrier"), eq(moveSeats.legId, one.legIds[0]), isNull(moveSeats.removedAt)));
    expect(seats.map((seat) => seat.companyId)).toEqual([keepId]);
    expect(await db().select().from(legs).where(eq(legs.carrierCompanyId, goneId))).toEqual([]);
    expect((await db().select().from(companies).where(eq(companies.id, goneId)))[0]).toMatchObject({ mergedIntoId: keepId });
    expect(await verifyRecord(two.owner, two.moveId)).toMatchObject({ brokenAt: null });
    expect((await db().select().from(siteLog).where(eq(siteLog.kind, "company.merged")))[0]).toMatchObject({ byUserId: admin.userId, detail: { keepId, goneId, moves: 2 } });
    await expect(mergeCompanies(admin, { keepId, goneId }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  });

  it("passes an owner's moves on", async () => {
    const one = await seedMove();
    const keepId = await seedCompany("Vellum Ridge Heritage Line ");
    await seedMember(keepId, one.outsider.userId);
    await mergeCompanies(admin, { keepId, goneId: companyOf(one.owner) }, anAttempt());
    expect((await db().select().from(moves).where(eq(moves.id, one.moveId)))[0]).toMatchObject({ ownerCompanyId: keepId });
    expect((await requireMove(await viewerOf(one.outsider.userId), one.moveId)).parts.map((held) => held.part)).toContain("owner");
  });

  it("happens once when asked twice at once, either way round", async () => {
    const [one, two] = [await seedCompany("Twice Told"), await seedCompany("Twice Told")];
    const tries = await Promise.allSettled([mergeCompanies(admin, { keepId: one, goneId: two }, anAttempt()), mergeCompanies(admin, { keepId: two, goneId: one }, anAttempt())]);
    expect(tries.filter((tried) => tried.status === "fulfilled")).toHaveLength(1);
  });
});

describe("people", () => {
  it("are found by a part of name or address, never listed", async () => {
    const person = await withSession("Quincy Findable");
    expect(await listPeople(admin, "")).toEqual([]);
    expect(await listPeople(admin, "%%%")).toEqual([]);
    expect(await listPeople(admin, "findab")).toMatchObject([{ userId: person.userId, sessions: 1, disabledAt: null, lastUsedAt: expect.stringMatching(/Z$/) }]);
  });

  it("lose every session when disabled, and come back as they were", async () => {
    const person = await withSession("Sidelined");
    await disablePerson(admin, { userId: person.userId }, anAttempt());
    expect(await db().select().from(sessions).where(eq(sessions.userId, person.userId))).toEqual([]);
    expect(await unsafeViewerOf(person.userId, null)).toBeNull();
    await enablePerson(admin, { userId: person.userId }, anAttempt());
    expect(await unsafeViewerOf(person.userId, null)).not.toBeNull();
    await expect(disablePerson(admin, { userId: admin.userId }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  });

  it("lose their sessions alone when those are ended", async () => {
    const person = await withSession("Lost Phone");
    await endSessionsOf(admin, { userId: person.userId }, anAttempt());
    expect(await db().select().from(sessions).where(eq(sessions.userId, person.userId))).toEqual([]);
    expect(await unsafeViewerOf(person.userId, null)).not.toBeNull();
  });
});

it("lists mail without what it says, and tries a failed one again", async () => {
  await putMail(db(), { kind: "sign-in-link", to: "stuck@example.test", payload: { url: "https://x.example/secret" }, dedupe: "stuck" }, new Date());
  const [row] = await db().select().from(outbox).where(eq(outbox.toAddress, "stuck@example.test"));
  const outboxId = row?.id ?? "";
  await expect(retryMail(admin, { outboxId }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  await db().update(outbox).set({ state: "failed", attempts: 12, lastError: "550 no such mailbox" }).where(eq(outbox.id, outboxId));
  const [seen] = await listMail(admin, "failed");
  expect(seen).toMatchObject({ outboxId, to: "stuck@example.test", lastError: "550 no such mailbox" });
  expect(Object.keys(seen ?? {})).not.toContain("payload");
  await retryMail(admin, { outboxId }, anAttempt());
  expect((await db().select().from(outbox).where(eq(outbox.id, outboxId)))[0]).toMatchObject({ state: "ready", attempts: 0, payload: row?.payload });
});
