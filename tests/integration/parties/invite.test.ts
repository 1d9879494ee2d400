import { and, eq, isNull } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { db } from "@/db/client";
import { acceptances, attempts, companies, followLinks, legs, moveSeats, outbox } from "@/db/schema";
import { requireMove } from "@/lib/access/scope";
import { endFollowLink, makeFollowLink } from "@/lib/parties/commands/follow";
import { inviteParty } from "@/lib/parties/commands/invite";
import { removeParty } from "@/lib/parties/commands/remove";
import { invitePartyInput } from "@/lib/parties/input";
import { getPeople } from "@/lib/parties/queries";
import { newId, sha256Hex } from "@/lib/ids";
import { withDatabase } from "../../support/database";
import { anAttempt, seedCompany, seedMove, type SeededMove } from "../../support/factories";
import { anAddress, invite, letterTo } from "./support";

withDatabase();

let move: SeededMove;
beforeAll(async () => {
  move = await seedMove();
});

const seatOf = async (part: "contractor" | "carrier" | "owner" | "payer" | "receiver", moveId = move.moveId, legId?: string) =>
  (await db().select({ id: moveSeats.id }).from(moveSeats).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, part), isNull(moveSeats.removedAt), legId ? eq(moveSeats.legId, legId) : undefined)))[0]?.id ?? "";
const legOf = async (legId: string) => (await db().select().from(legs).where(eq(legs.id, legId)))[0];

describe("inviting", () => {
  it("is the owner's", async () => {
    for (const viewer of [move.contractor, move.inspectorA, move.receiver, move.payer]) {
      await expect(invite(viewer, move.moveId, { part: "payer", legId: move.legIds[1], companyName: "New Payer", email: anAddress() })).rejects.toMatchObject({ code: "not_your_part" });
    }
    await expect(invite(move.outsider, move.moveId, { part: "payer", legId: move.legIds[1], companyName: "New Payer", email: anAddress() })).rejects.toMatchObject({ code: "not_found" });
  });

  it("names every field that is missing", () => {
    const parsed = invitePartyInput.safeParse({ moveId: move.moveId, part: "carrier", legId: "", companyId: "", companyName: "", email: "", name: "" });
    expect(parsed.error?.issues.map((issue) => issue.path.join("."))).toEqual(["legId", "companyName", "email", "works"]);
    const worked = invitePartyInput.safeParse({ moveId: move.moveId, part: "carrier", legId: move.legIds[0], companyName: "X", email: "a@example.org" });
    expect(worked.error?.issues.map((issue) => issue.path.join("."))).toEqual(["works"]);
  });

  it("refuses a second company in a part, and a company that the inviter does not know", async () => {
    await expect(invite(move.owner, move.moveId, { part: "contractor", companyName: "Second Mechanical", email: anAddress() })).rejects.toMatchObject({ code: "not_yet" });
    const stranger = await seedCompany("Unheard Of Lines");
    await expect(invite(move.owner, move.moveId, { part: "payer", legId: move.legIds[1], companyId: stranger, email: anAddress() })).rejects.toMatchObject({ code: "bad_input", fields: { companyId: [expect.any(String)] } });
    expect((await getPeople(move.owner, move.moveId)).known.map((one) => one.name)).not.toContain("Unheard Of Lines");
  });

  it("makes a new payer known on its leg and takes the earlier one off", async () => {
    const fresh = await seedMove();
    const email = anAddress();
    await invite(fresh.owner, fresh.moveId, { part: "payer", legId: fresh.legIds[0], companyName: "Cinder Row Trust", email });
    const [company] = await db().select().from(companies).where(eq(companies.name, "Cinder Row Trust"));
    expect(await legOf(fresh.legIds[0])).toMatchObject({ payerName: "Cinder Row Trust", payerCompanyId: company?.id, version: 2 });
    await expect(requireMove(fresh.payer, fresh.moveId)).rejects.toMatchObject({ code: "not_found" });
    await expect(invite(fresh.owner, fresh.moveId, { part: "payer", legId: fresh.legIds[0], companyId: company?.id, email })).rejects.toMatchObject({ fields: { email: [expect.stringContaining("open already")] } });
    await expect(invite(fresh.owner, fresh.moveId, { part: "payer", legId: fresh.legIds[1], companyName: "CINDER  row trust", email })).rejects.toMatchObject({ fields: { companyName: [expect.stringContaining("already")] } });
  });

  it("seats a company of the inviter's own without a letter", async () => {
    const fresh = await seedMove();
    await removeParty(fresh.owner, { moveId: fresh.moveId, seatId: await seatOf("contractor", fresh.moveId) }, anAttempt());
    const own = fresh.owner.memberships[0]?.companyId;
    expect(await invite(fresh.owner, fresh.moveId, { part: "contractor", companyId: own })).toMatchObject({ invitationId: null });
    expect((await requireMove(fresh.owner, fresh.moveId)).parts.map((held) => held.part)).toContain("contractor");
    await expect(invite(fresh.owner, fresh.moveId, { part: "contractor", companyId: fresh.contractor.memberships[0]?.companyId })).rejects.toMatchObject({ code: "not_yet" });
  });

  it("happens once under one key, and its answer holds no secret", async () => {
    const fresh = await seedMove();
    await removeParty(fresh.owner, { moveId: fresh.moveId, seatId: await seatOf("receiver", fresh.moveId) }, anAttempt());
    const email = anAddress();
    const input = invitePartyInput.parse({ moveId: fresh.moveId, part: "receiver", companyName: "Once Only Sidings", email });
    const attempt = anAttempt();
    const answers = await Promise.all([1, 2, 3].map(() => inviteParty(fresh.owner, input, attempt)));
    expect(new Set(answers.map((one) => one.invitationId)).size).toBe(1);
    expect(await db().select().from(outbox).where(eq(outbox.toAddress, email))).toHaveLength(1);
    expect(JSON.stringify(await db().select().from(attempts))).not.toContain(await letterTo(email));
  });
});

describe("taking a party off", () => {
  it("works at once, for its people and their letters", async () => {
    const fresh = await seedMove();
    await requireMove(fresh.contractor, fresh.moveId);
    await removeParty(fresh.owner, { moveId: fresh.moveId, seatId: await seatOf("contractor", fresh.moveId) }, anAttempt());
    await expect(requireMove(fresh.contractor, fresh.moveId)).rejects.toMatchObject({ code: "not_found" });
  });

  it("leaves the carrier's name on the leg, and lets it be invited again", async () => {
    const fresh = await seedMove();
    const seatId = await seatOf("carrier", fresh.moveId, fresh.legIds[1]);
    const companyId = fresh.deskB.memberships[0]?.companyId;
    await removeParty(fresh.owner, { moveId: fresh.moveId, seatId }, anAttempt());
    expect(await legOf(fresh.legIds[1])).toMatchObject({ carrierName: "Sable Mountain Lines", carrierCompanyId: null });
    const email = anAddress();
    expect(await invite(fresh.owner, fresh.moveId, { part: "carrier", legId: fresh.legIds[1], companyId, email, dispatches: true })).toMatchObject({ seatId });
    await requireMove(fresh.deskB, fresh.moveId);
  });

  it("refuses for the owner's own seat, a signed carrier and a stranger's seat", async () => {
    const fresh = await seedMove();
    await expect(removeParty(fresh.owner, { moveId: fresh.moveId, seatId: await seatOf("owner", fresh.moveId) }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
    await expect(removeParty(fresh.owner, { moveId: fresh.moveId, seatId: await seatOf("contractor") }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
    await expect(removeParty(fresh.contractor, { moveId: fresh.moveId, seatId: await seatOf("receiver", fresh.moveId) }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    await db().insert(acceptances).values({ id: newId("acceptance"), moveId: fresh.moveId, legId: fresh.legIds[0], restrictions: [], signatureId: newId("signature"), at: new Date() });
    await expect(removeParty(fresh.owner, { moveId: fresh.moveId, seatId: await seatOf("carrier", fresh.moveId, fresh.legIds[0]) }, anAttempt())).rejects.toMatchObject({ code: "not_yet", message: expect.stringContaining("accepted") });
  });
});

describe("follow links", () => {
  it("show their address once, the same under one key, and keep only its hash", async () => {
    const attempt = anAttempt();
    const input = { moveId: move.moveId, label: "Quill Creek Historical Society", email: anAddress() };
    const [one, two] = [await makeFollowLink(move.owner, input, attempt), await makeFollowLink(move.owner, input, attempt)];
    expect(two).toEqual(one);
    const token = one.url.split("/").at(-1) ?? "";
    expect(token).toHaveLength(32);
    const rows = await db().select().from(followLinks).where(eq(followLinks.moveId, move.moveId));
    expect(rows).toHaveLength(1);
    expect(rows[0]?.tokenHash).toBe(sha256Hex(token));
    expect(JSON.stringify([rows, await db().select().from(attempts)])).not.toContain(token);
    await endFollowLink(move.owner, { moveId: move.moveId, followId: one.followId }, anAttempt());
    expect((await getPeople(move.owner, move.moveId)).followLinks).toMatchObject([{ label: input.label, state: "ended" }]);
  });

  it("are the owner's to make, and nobody else sees them", async () => {
    await expect(makeFollowLink(move.contractor, { moveId: move.moveId, label: "Us", email: null }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    const seen = await getPeople(move.contractor, move.moveId);
    expect(seen).toMatchObject({ mayInvite: false, invitations: [], followLinks: [], known: [] });
    expect(seen.parties.map((party) => party.part)).toContain("owner");
    await expect(getPeople(move.outsider, move.moveId)).rejects.toMatchObject({ code: "not_found" });
  });
});
