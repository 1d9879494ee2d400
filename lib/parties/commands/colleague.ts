import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { companyMembers, invitations, users } from "@/db/schema";
import { lockManaged } from "@/lib/companies/commands/company";
import type { CompanyLetter, InviteColleague } from "@/lib/companies/input";
import { AppError } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import { unsafeCountTry } from "@/lib/viewer/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { invitationState } from "../rules";
import { postLetter } from "./letter";

/** Mails somebody a letter into the company itself; who joins by it is a member, and sees all of its moves. */
export async function inviteColleague(viewer: Viewer, input: InviteColleague, attempt: Attempt) {
  await unsafeCountTry("invite-account", viewer.userId, attempt.at);
  const { companyId, email, name, inspects, bills, dispatches } = input;
  return write(viewer, attempt, async (tx) => {
    await lockManaged(tx, viewer, companyId);
    const [member] = await tx.select({ userId: users.id }).from(users).innerJoin(companyMembers, and(eq(companyMembers.userId, users.id), eq(companyMembers.companyId, companyId), isNull(companyMembers.removedAt))).where(eq(users.email, email));
    if (member) throw fault("This person is in the company already, or asks to be admitted.");
    const earlier = await tx.select().from(invitations).where(and(eq(invitations.companyId, companyId), isNull(invitations.moveId), eq(invitations.email, email)));
    if (earlier.some((one) => invitationState(one, attempt.at) === "open")) throw fault("A letter to this address is open already. Send that one again, or revoke it first.");
    const invitationId = newId("invitation");
    const works = { inspects, bills, dispatches };
    const posted = await postLetter(tx, viewer, { invitationId, moveId: null, part: null, legId: null, companyId, email, ...works }, attempt.at);
    await tx.insert(invitations).values({ id: invitationId, companyId, email, name, ...works, invitedBy: viewer.userId, createdAt: attempt.at, ...posted });
    await appendSiteLog(tx, { kind: "company.invited", byUserId: viewer.userId, detail: { companyId, name, ...works } }, attempt.at);
    return { invitationId };
  });
}

const fault = (message: string) => new AppError("bad_input", "Some entries need another look.", { fields: { email: [message] } });

async function requireOpen(tx: Tx, { companyId, invitationId }: CompanyLetter) {
  const [letter] = await tx.select().from(invitations).where(and(eq(invitations.id, invitationId), eq(invitations.companyId, companyId), isNull(invitations.moveId))).for("update");
  if (!letter) throw new AppError("not_found", "No such invitation.");
  if (letter.acceptedAt || letter.revokedAt) throw new AppError("not_yet", letter.acceptedAt ? "This letter has been used." : "This letter was revoked.");
  return letter;
}

/** Mails a colleague's letter anew, under a new secret. */
export async function sendColleagueLetterAgain(viewer: Viewer, input: CompanyLetter, attempt: Attempt) {
  await unsafeCountTry("invite-account", viewer.userId, attempt.at);
  return write(viewer, attempt, async (tx) => {
    await lockManaged(tx, viewer, input.companyId);
    const letter = await requireOpen(tx, input);
    const posted = await postLetter(tx, viewer, { ...letter, invitationId: letter.id, moveId: null, part: null, legId: null }, attempt.at);
    await tx.update(invitations).set({ ...posted, invitedBy: viewer.userId }).where(eq(invitations.id, letter.id));
    return { invitationId: letter.id };
  });
}

/** Takes a colleague's letter back. */
export async function revokeColleagueLetter(viewer: Viewer, input: CompanyLetter, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    await lockManaged(tx, viewer, input.companyId);
    const letter = await requireOpen(tx, input);
    await tx.update(invitations).set({ revokedAt: attempt.at }).where(eq(invitations.id, letter.id));
    await appendSiteLog(tx, { kind: "company.invitation-revoked", byUserId: viewer.userId, detail: { companyId: input.companyId, name: letter.name } }, attempt.at);
    return { invitationId: letter.id };
  });
}
