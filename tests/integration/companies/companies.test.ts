import { beforeAll, describe, expect, it } from "vitest";
import { requireMove } from "@/lib/access/scope";
import { editCompany, makeCompany } from "@/lib/companies/commands/company";
import { admitMember, changeMember, removeMember } from "@/lib/companies/commands/members";
import { getCompany, listCompanies } from "@/lib/companies/queries";
import { inviteColleague, revokeColleagueLetter, sendColleagueLetterAgain } from "@/lib/parties/commands/colleague";
import { withDatabase } from "../../support/database";
import { anAttempt, seedCompany, seedMember, seedMove, seedPerson, seedUser, viewerOf, type SeededMove } from "../../support/factories";
import { anAddress, invite, join, letterTo, viewerAt } from "../parties/support";

withDatabase();

let move: SeededMove;
beforeAll(async () => {
  move = await seedMove();
});

const works = { inspects: false, bills: false, dispatches: false };
const companyOf = (viewer: { memberships: { companyId: string }[] }) => viewer.memberships[0]?.companyId ?? "";

describe("a company", () => {
  it("is managed by who made it", async () => {
    const userId = await seedUser("Solo Shipper");
    const { companyId } = await makeCompany(await viewerOf(userId), { name: "Mallow Siding", mark: "ZMAL", phone: null }, anAttempt());
    expect(await getCompany(await viewerOf(userId), companyId)).toMatchObject({ name: "Mallow Siding", manages: true, version: 1, members: [{ name: "Solo Shipper", manager: true, self: true }] });
  });

  it("tells the loser of an edit what changed", async () => {
    const companyId = await seedCompany("Brindle Yard");
    const boss = await seedPerson("Boss", companyId, { manager: true });
    const facts = { mark: null, phone: null, version: 1 };
    await editCompany(boss, { companyId, ...facts, name: "Brindle Yards" }, anAttempt());
    await expect(editCompany(boss, { companyId, ...facts, name: "Brindle Yard Works" }, anAttempt())).rejects.toMatchObject({ code: "stale", fields: { name: ["Somebody else has changed the name to “Brindle Yards”."] } });
  });

  it("is not found by strangers, and its managers' matters are not members'", async () => {
    await expect(getCompany(move.outsider, companyOf(move.contractor))).rejects.toMatchObject({ code: "not_found" });
    const seen = await getCompany(move.inspectorA, companyOf(move.inspectorA));
    expect(seen).toMatchObject({ manages: false, guests: [], invitations: [] });
    expect(seen.members.filter((one) => one.email !== null).map((one) => one.self)).toEqual([true]);
    await expect(editCompany(move.inspectorA, { companyId: companyOf(move.inspectorA), version: 1, name: "Mine", mark: null, phone: null }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    await expect(inviteColleague(move.inspectorA, { companyId: companyOf(move.inspectorA), email: anAddress(), name: null, ...works }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  });
});

describe("people of a company", () => {
  it("a guest sees one move; admitted, all; removed, none, at once", async () => {
    const fresh = await seedMove();
    const companyId = companyOf(fresh.inspectorA);
    const boss = await seedPerson("Boss", companyId, { manager: true });
    const email = anAddress();
    await invite(fresh.owner, fresh.moveId, { part: "carrier", legId: fresh.legIds[0], companyId, email, name: "G. Guest", inspects: true });
    await join(await letterTo(email));
    const guest = await viewerAt(email);
    await requireMove(guest, fresh.moveId);
    expect((await listCompanies(boss))[0]).toMatchObject({ asking: 1 });
    expect((await getCompany(boss, companyId)).guests).toMatchObject([{ name: "G. Guest", email, seats: ["carrier, ZVRX 2783"] }]);
    expect(await listCompanies(guest)).toMatchObject([{ companyId, admitted: false, asking: 0 }]);
    await expect(getCompany(guest, companyId)).rejects.toMatchObject({ code: "not_found" });
    await expect(admitMember(fresh.inspectorA, { companyId, userId: guest.userId, ...works }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    await admitMember(boss, { companyId, userId: guest.userId, ...works, inspects: true }, anAttempt());
    const member = await viewerAt(email);
    expect(member.memberships).toMatchObject([{ companyId, inspects: true }]);
    await removeMember(boss, { companyId, userId: guest.userId }, anAttempt());
    await expect(requireMove(await viewerAt(email), fresh.moveId)).rejects.toMatchObject({ code: "not_found" });
  });

  it("always have a manager among them, also when two take each other's right at once", async () => {
    const companyId = await seedCompany("Two Heads");
    const [one, two] = [await seedPerson("One", companyId, { manager: true }), await seedPerson("Two", companyId, { manager: true })];
    const tries = await Promise.allSettled([
      changeMember(one, { companyId, userId: two.userId, manager: false, ...works }, anAttempt()),
      changeMember(two, { companyId, userId: one.userId, manager: false, ...works }, anAttempt()),
    ]);
    expect(tries.filter((tried) => tried.status === "fulfilled")).toHaveLength(1);
    const left = (await getCompany(await viewerOf(one.userId), companyId)).members.filter((member) => member.manager);
    expect(left).toHaveLength(1);
    await expect(removeMember(await viewerOf(left[0]?.userId ?? ""), { companyId, userId: left[0]?.userId ?? "" }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  });

  it("may leave by themselves, and nobody else's company can be touched", async () => {
    const companyId = await seedCompany("Leaving Lines");
    const boss = await seedPerson("Boss", companyId, { manager: true });
    const clerk = await seedPerson("Clerk", companyId);
    await expect(removeMember(move.outsider, { companyId, userId: clerk.userId }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
    await expect(removeMember(clerk, { companyId, userId: boss.userId }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
    await removeMember(clerk, { companyId, userId: clerk.userId }, anAttempt());
    expect((await viewerOf(clerk.userId)).memberships).toEqual([]);
  });
});

describe("a colleague's letter", () => {
  it("makes a member with the work given, once", async () => {
    const companyId = await seedCompany("Pewter Junction");
    const boss = await seedPerson("Boss", companyId, { manager: true });
    await seedMember(companyId, await seedUser("Other"));
    const email = anAddress();
    const { invitationId } = await inviteColleague(boss, { companyId, email, name: "New Clerk", ...works, bills: true }, anAttempt());
    await expect(inviteColleague(boss, { companyId, email, name: null, ...works }, anAttempt())).rejects.toMatchObject({ fields: { email: [expect.any(String)] } });
    const first = await letterTo(email);
    await sendColleagueLetterAgain(boss, { companyId, invitationId }, anAttempt());
    await expect(join(first)).rejects.toMatchObject({ code: "gone" });
    expect(await join(await letterTo(email))).toMatchObject({ moveId: null, landing: "moves" });
    expect((await viewerAt(email)).memberships).toMatchObject([{ companyId, manager: false, bills: true, inspects: false }]);
    await expect(revokeColleagueLetter(boss, { companyId, invitationId }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  });

  it("makes a guest of nobody's seat when its sender manages no longer", async () => {
    const companyId = await seedCompany("Changed Hands");
    const boss = await seedPerson("Boss", companyId, { manager: true });
    const next = await seedPerson("Next", companyId, { manager: true });
    const email = anAddress();
    await inviteColleague(boss, { companyId, email, name: "Late", ...works }, anAttempt());
    await changeMember(next, { companyId, userId: boss.userId, manager: false, ...works }, anAttempt());
    await join(await letterTo(email));
    expect((await viewerAt(email)).memberships).toEqual([]);
  });
});
