import { and, eq, isNull } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { accounts, companyMembers, invitations, moveSeats, record, seatPeople, sessions, users } from "@/db/schema";
import { heldParts } from "@/lib/access/scope";
import { removeParty } from "@/lib/parties/commands/remove";
import { revokeLetter, sendLetterAgain } from "@/lib/parties/commands/invite";
import { getPeople, unsafeReadLetter } from "@/lib/parties/queries";
import { verifyRecord } from "@/lib/record/queries";
import { unsafeHashPassword } from "@/lib/viewer/commands";
import { newId } from "@/lib/ids";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove, seedUser, viewerOf, type SeededMove } from "../../support/factories";
import { anAddress, invite, join, letterTo, viewerAt } from "./support";

withDatabase();

let move: SeededMove;
beforeAll(async () => {
  move = await seedMove();
});

/** A move whose receiver has been taken off, so that a new one can be invited. */
async function withoutReceiver(): Promise<SeededMove> {
  const fresh = await seedMove();
  const [seat] = await db().select({ id: moveSeats.id }).from(moveSeats).where(and(eq(moveSeats.moveId, fresh.moveId), eq(moveSeats.part, "receiver")));
  await removeParty(fresh.owner, { moveId: fresh.moveId, seatId: seat?.id ?? "" }, anAttempt());
  return fresh;
}

async function invited(email = anAddress()) {
  const fresh = await withoutReceiver();
  const { invitationId } = await invite(fresh.owner, fresh.moveId, { part: "receiver", companyName: `Tallow Gap ${email.slice(7, 15)}`, email, name: "P. Tallow" });
  return { ...fresh, email, token: await letterTo(email), invitationId: invitationId ?? "" };
}

describe("joining", () => {
  it("makes a checked person without a password, the first of the company its manager, and tells the record", async () => {
    const { moveId, email, token } = await invited();
    expect(await join(token)).toMatchObject({ moveId, landing: "case" });
    const person = await viewerAt(email);
    expect(person).toMatchObject({ name: "P. Tallow", emailVerified: true, memberships: [{ manager: true, inspects: false }] });
    expect(await db().select().from(accounts).where(eq(accounts.userId, person.userId))).toEqual([]);
    expect(await db().select().from(sessions).where(eq(sessions.userId, person.userId))).toHaveLength(1);
    expect(await heldParts(person, moveId)).toMatchObject([{ part: "receiver" }]);
    const kinds = (await db().select({ kind: record.kind, by: record.byName }).from(record).where(eq(record.moveId, moveId)).orderBy(record.seq)).slice(-2);
    expect(kinds).toEqual([{ kind: "party.invited", by: "R. Okafor" }, { kind: "party.joined", by: "P. Tallow" }]);
    expect(await verifyRecord(person, moveId)).toMatchObject({ brokenAt: null });
  });

  it("happens once when one page is sent twice at the same time", async () => {
    const { email, token, moveId } = await invited();
    const once = crypto.randomUUID();
    const answers = await Promise.all([join(token, { once }), join(token, { once }), join(token, { once })]);
    expect(new Set(answers.map((one) => one.userId)).size).toBe(1);
    expect(await db().select().from(users).where(eq(users.email, email))).toHaveLength(1);
    expect(await db().select().from(moveSeats).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, "receiver"), isNull(moveSeats.removedAt)))).toHaveLength(1);
    expect(await db().select().from(record).where(and(eq(record.moveId, moveId), eq(record.kind, "party.joined")))).toHaveLength(1);
  });

  it("happens once when two pages are sent at the same time", async () => {
    const { email, token } = await invited();
    const answers = await Promise.allSettled([join(token), join(token), join(token)]);
    expect(answers.filter((one) => one.status === "fulfilled")).toHaveLength(1);
    for (const one of answers) if (one.status === "rejected") expect(one.reason).toMatchObject({ code: "gone" });
    expect(await db().select().from(users).where(eq(users.email, email))).toHaveLength(1);
  });

  it("asks for the name where the letter has none", async () => {
    const email = anAddress();
    const fresh = await withoutReceiver();
    await invite(fresh.owner, fresh.moveId, { part: "receiver", companyName: "Tallow Gap Nameless", email });
    const token = await letterTo(email);
    expect(await unsafeReadLetter(token)).toMatchObject({ nameKnown: false });
    await expect(join(token)).rejects.toMatchObject({ code: "bad_input", fields: { name: ["Enter your name."] } });
    await join(token, { name: "Pella Tallow" });
    expect((await viewerAt(email)).name).toBe("Pella Tallow");
  });

  it("drops what somebody else set on the account before its address was proven", async () => {
    const { email, token } = await invited();
    const userId = await seedUser("Squatter", { email, emailVerified: false });
    const at = new Date();
    await db().insert(accounts).values({ id: newId("account"), accountId: userId, providerId: "credential", userId, password: await unsafeHashPassword("squatter lantern teaspoon"), createdAt: at, updatedAt: at });
    await join(token);
    expect(await db().select().from(accounts).where(eq(accounts.userId, userId))).toEqual([]);
    expect((await viewerAt(email)).emailVerified).toBe(true);
  });

  it("refuses somebody who is signed in under another address", async () => {
    const { token, outsider } = await invited();
    await expect(join(token, { viewer: outsider })).rejects.toMatchObject({ code: "not_your_part" });
    expect(await join(token)).toBeTruthy();
  });

  it("refuses a disabled person", async () => {
    const { email, token } = await invited();
    const userId = await seedUser("Gone Away", { email });
    await db().update(users).set({ disabledAt: new Date() }).where(eq(users.id, userId));
    expect(await unsafeReadLetter(token)).toBeNull();
    await expect(join(token)).rejects.toMatchObject({ code: "gone" });
  });
});

describe("letters that open nothing look alike", () => {
  it.each([
    ["used", async () => { const one = await invited(); await join(one.token); return one.token; }],
    ["revoked", async () => { const one = await invited(); await revokeLetter(one.owner, { moveId: one.moveId, invitationId: one.invitationId }, anAttempt()); return one.token; }],
    ["too old", async () => { const one = await invited(); await db().update(invitations).set({ expiresAt: new Date(Date.now() - 1) }).where(eq(invitations.id, one.invitationId)); return one.token; }],
    ["replaced by a new one", async () => { const one = await invited(); await sendLetterAgain(one.owner, { moveId: one.moveId, invitationId: one.invitationId }, anAttempt()); return one.token; }],
    ["of a seat that is gone", async () => { const one = await invited(); await removeReceiver(one); return one.token; }],
    ["never written", async () => Promise.resolve("x".repeat(32))],
  ])("%s", async (_, make) => {
    const token = await make();
    expect(await unsafeReadLetter(token)).toBeNull();
    await expect(join(token)).rejects.toMatchObject({ code: "gone", message: "This invitation can’t be used any more. Ask whoever sent it for a new one." });
  });

  it("works again when sent again", async () => {
    const one = await invited();
    await db().update(invitations).set({ expiresAt: new Date(Date.now() - 1) }).where(eq(invitations.id, one.invitationId));
    await sendLetterAgain(one.owner, { moveId: one.moveId, invitationId: one.invitationId }, anAttempt());
    await join(await letterTo(one.email));
    expect(await heldParts(await viewerAt(one.email), one.moveId)).toMatchObject([{ part: "receiver" }]);
  });
});

async function removeReceiver({ owner, moveId }: Pick<SeededMove, "owner" | "moveId">) {
  const [seat] = await db().select({ id: moveSeats.id }).from(moveSeats).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, "receiver"), isNull(moveSeats.removedAt)));
  await removeParty(owner, { moveId, seatId: seat?.id ?? "" }, anAttempt());
}

describe("a company that has people already", () => {
  it("takes an invited stranger as a guest of the one seat, with the work invited to", async () => {
    const email = anAddress();
    const companyId = move.inspectorA.memberships[0]?.companyId;
    await invite(move.owner, move.moveId, { part: "carrier", legId: move.legIds[0], companyId, email, name: "G. Guest", inspects: true });
    expect(await join(await letterTo(email))).toMatchObject({ landing: "findings" });
    const guest = await viewerAt(email);
    expect(guest.memberships).toEqual([]);
    expect((await heldParts(guest, move.moveId)).map((held) => held.part)).toEqual(["carrier", "inspector"]);
    const [row] = await db().select().from(companyMembers).where(and(eq(companyMembers.companyId, companyId ?? ""), eq(companyMembers.userId, guest.userId)));
    expect(row).toMatchObject({ admittedAt: null, manager: false });
    const people = (await getPeople(move.owner, move.moveId)).parties.find((party) => party.companyId === companyId)?.people;
    expect(people?.find((one) => one.userId === guest.userId)).toMatchObject({ guest: true, inspects: true });
  });

  it("widens a member's work on the seat alone", async () => {
    const companyId = move.clerkB.memberships[0]?.companyId;
    await invite(move.owner, move.moveId, { part: "carrier", legId: move.legIds[1], companyId, email: move.clerkB.email, inspects: true });
    await join(await letterTo(move.clerkB.email), { viewer: move.clerkB });
    const clerk = await viewerOf(move.clerkB.userId);
    expect(clerk.memberships[0]).toMatchObject({ inspects: false, bills: true });
    expect((await heldParts(clerk, move.moveId)).map((held) => held.part)).toEqual(["carrier", "inspector", "billing"]);
  });

  it("makes one manager when two join a new company at once on different moves", async () => {
    const [one, two] = [await withoutReceiver(), await withoutReceiver()];
    const [first, second] = [anAddress(), anAddress()];
    await invite(one.owner, one.moveId, { part: "receiver", companyName: "Osier Bend Works", email: first, name: "One" });
    const companyId = (await getPeople(one.owner, one.moveId)).parties.find((party) => party.part === "receiver")?.companyId ?? "";
    await db().insert(companyMembers).values({ companyId, userId: two.owner.userId, joinedAt: new Date(), removedAt: new Date() });
    const seatId = newId("seat");
    await db().insert(moveSeats).values({ id: seatId, moveId: two.moveId, companyId, part: "receiver", createdAt: new Date() });
    await db().insert(invitations).values({ id: newId("invitation"), moveId: two.moveId, seatId, companyId, email: second, name: "Two", tokenHash: "0".repeat(64), invitedBy: two.owner.userId, createdAt: new Date(), expiresAt: new Date(Date.now() + 1e6) });
    const [letter] = await db().select().from(invitations).where(eq(invitations.email, second));
    await sendLetterAgain(two.owner, { moveId: two.moveId, invitationId: letter?.id ?? "" }, anAttempt());
    await Promise.all([join(await letterTo(first)), join(await letterTo(second))]);
    const members = await db().select().from(companyMembers).where(and(eq(companyMembers.companyId, companyId), isNull(companyMembers.removedAt)));
    expect(members.filter((row) => row.manager)).toHaveLength(1);
    expect(members).toHaveLength(2);
    expect(await db().select().from(seatPeople).where(eq(seatPeople.userId, members.find((row) => !row.manager)?.userId ?? ""))).toHaveLength(1);
  });
});
