import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { companies, invitations, legs, moveSeats } from "@/db/schema";
import { companyKey } from "@/lib/companies/words";
import { AppError, refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { requireLeg, writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import { unsafeCountTry } from "@/lib/viewer/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { InviteParty, OneInvitation } from "../input";
import { listKnownCompanies } from "../queries";
import { denySeating, invitationState } from "../rules";
import { ADDRESS_WANTED, WORK_WANTED } from "../vocabulary";
import { postLetter } from "./letter";

type Chosen = { companyId: string; name: string; own: boolean };

const fieldFault = (field: string, message: string) => new AppError("bad_input", "Some entries need another look.", { fields: { [field]: [message] } });

/** Only a company of one's own needs no letter; then everything that the letter lacks is named at once. */
function noAddress({ part, inspects, bills, dispatches }: InviteParty): AppError {
  const idle = part === "carrier" && !inspects && !bills && !dispatches;
  return new AppError("bad_input", "Some entries need another look.", { fields: { email: [ADDRESS_WANTED], ...(idle && { works: [WORK_WANTED] }) } });
}

/** Gives a company a part of the move and mails one of its people a letter; a company of the inviter's own is seated without one. */
export async function inviteParty(viewer: Viewer, input: InviteParty, attempt: Attempt) {
  await unsafeCountTry("invite-account", viewer.userId, attempt.at);
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "party.invite" });
    const leg = input.legId ? await requireLeg(ctx.tx, input.moveId, input.legId) : null;
    const facts = await unsafeGatherFacts(ctx.tx, input.moveId);
    const seats = await ctx.tx.select({ seatId: moveSeats.id, companyId: moveSeats.companyId, companyName: companies.name, part: moveSeats.part, legId: moveSeats.legId })
      .from(moveSeats).innerJoin(companies, eq(companies.id, moveSeats.companyId)).where(and(eq(moveSeats.moveId, input.moveId), isNull(moveSeats.removedAt)));
    refuse(denySeating(input, seats, facts.legs.find((one) => one.legId === input.legId) ?? null));
    const company = await chooseCompany(ctx, viewer, input, leg?.carrierMark ?? null);
    const seatId = await takeSeat(ctx, input, company);
    const told = { company: company.name, part: input.part, legSeq: leg?.seq ?? null, name: input.name };
    if (!input.email) {
      if (!company.own) throw noAddress(input);
      await ctx.append({ kind: "party.joined", legId: input.legId, detail: told });
      return { seatId, invitationId: null };
    }
    const invitationId = await writeLetter(ctx, viewer, { ...input, email: input.email }, company.companyId, seatId);
    await ctx.append({ kind: "party.invited", legId: input.legId, detail: told });
    return { seatId, invitationId };
  });
}

async function chooseCompany(ctx: MoveWrite, viewer: Viewer, input: InviteParty, carrierMark: string | null): Promise<Chosen> {
  const known = await listKnownCompanies(viewer, ctx.tx);
  if (input.companyId) {
    const found = known.find((one) => one.companyId === input.companyId);
    if (!found) throw fieldFault("companyId", "Choose a company of the list, or name a new one.");
    return found;
  }
  const name = input.companyName ?? "";
  const key = companyKey(name);
  if (known.some((one) => companyKey(one.name) === key)) throw fieldFault("companyName", "You share a move with a company of this name already; choose it from the list.");
  const companyId = newId("company");
  await ctx.tx.insert(companies).values({ id: companyId, name, nameKey: key, mark: input.part === "carrier" ? carrierMark : null, createdAt: ctx.at });
  return { companyId, name, own: false };
}

/** The company's seat, made or taken up again. A payer's seat on a leg passes to whom was named last. */
async function takeSeat(ctx: MoveWrite, { moveId, part, legId }: InviteParty, { companyId, name }: Chosen): Promise<string> {
  const onLeg = legId ? eq(moveSeats.legId, legId) : isNull(moveSeats.legId);
  if (part === "payer") await ctx.tx.update(moveSeats).set({ removedAt: ctx.at }).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, "payer"), onLeg, isNull(moveSeats.removedAt)));
  const same = and(eq(moveSeats.moveId, moveId), eq(moveSeats.companyId, companyId), eq(moveSeats.part, part), onLeg);
  await ctx.tx.insert(moveSeats).values({ id: newId("seat"), moveId, companyId, part, legId, legKey: legId ?? "-", createdAt: ctx.at }).onDuplicateKeyUpdate({ set: { removedAt: null } });
  const [seat] = await ctx.tx.select({ id: moveSeats.id }).from(moveSeats).where(same);
  if (!seat) throw new AppError("busy", "The seat was not made. Nothing was saved; try again.");
  if (legId) await noteOnLeg(ctx, legId, part, companyId, name);
  return seat.id;
}

/** The leg names who sits on it; its version moves on, so that somebody who edits the leg meanwhile is told. */
async function noteOnLeg(ctx: MoveWrite, legId: string, part: string, companyId: string, name: string) {
  const leg = await requireLeg(ctx.tx, ctx.move.id, legId);
  const seated = part === "carrier" ? { carrierCompanyId: companyId } : { payerCompanyId: companyId, payerName: name };
  await ctx.tx.update(legs).set({ ...seated, version: leg.version + 1 }).where(eq(legs.id, legId));
}

async function writeLetter(ctx: MoveWrite, viewer: Viewer, input: InviteParty & { email: string }, companyId: string, seatId: string): Promise<string> {
  const earlier = await ctx.tx.select().from(invitations).where(and(eq(invitations.seatId, seatId), eq(invitations.email, input.email)));
  if (earlier.some((one) => invitationState(one, ctx.at) === "open")) throw fieldFault("email", "A letter to this address is open already. Send that one again, or revoke it first.");
  const invitationId = newId("invitation");
  const { inspects, bills, dispatches } = input.part === "carrier" ? input : { inspects: false, bills: false, dispatches: false };
  const posted = await postLetter(ctx.tx, viewer, { invitationId, moveId: input.moveId, part: input.part, legId: input.legId, companyId, email: input.email, inspects, bills, dispatches }, ctx.at);
  await ctx.tx.insert(invitations).values({ id: invitationId, moveId: input.moveId, seatId, companyId, email: input.email, name: input.name, inspects, bills, dispatches, invitedBy: viewer.userId, createdAt: ctx.at, ...posted });
  return invitationId;
}

/** The letter with its seat; refuses when it was used or revoked, or the seat is gone. */
async function requireLetter(ctx: MoveWrite, invitationId: string) {
  const [row] = await ctx.tx.select({ letter: invitations, seat: moveSeats, companyName: companies.name }).from(invitations)
    .innerJoin(moveSeats, and(eq(moveSeats.id, invitations.seatId), isNull(moveSeats.removedAt))).innerJoin(companies, eq(companies.id, invitations.companyId))
    .where(and(eq(invitations.id, invitationId), eq(invitations.moveId, ctx.move.id)));
  if (!row) throw new AppError("not_found", "No such invitation on this move.");
  if (row.letter.acceptedAt || row.letter.revokedAt) throw new AppError("not_yet", row.letter.acceptedAt ? "This letter has been used." : "This letter was revoked.");
  return row;
}

/** Mails a letter anew, under a new secret; the one that went out before opens nothing from then on. */
export async function sendLetterAgain(viewer: Viewer, { moveId, invitationId }: OneInvitation, attempt: Attempt) {
  await unsafeCountTry("invite-account", viewer.userId, attempt.at);
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "party.invite" });
    const { letter, seat, companyName } = await requireLetter(ctx, invitationId);
    const { part, legId } = seat;
    const posted = await postLetter(ctx.tx, viewer, { ...letter, invitationId, part, legId }, ctx.at);
    await ctx.tx.update(invitations).set({ ...posted, invitedBy: viewer.userId }).where(eq(invitations.id, invitationId));
    await ctx.append({ kind: "party.invited", legId, detail: { company: companyName, part, name: letter.name, again: true } });
    return { invitationId };
  });
}

/** Takes a letter back before it was used. */
export async function revokeLetter(viewer: Viewer, { moveId, invitationId }: OneInvitation, attempt: Attempt) {
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "party.invite" });
    const { letter, seat, companyName } = await requireLetter(ctx, invitationId);
    await ctx.tx.update(invitations).set({ revokedAt: ctx.at }).where(eq(invitations.id, letter.id));
    await ctx.append({ kind: "invitation.revoked", legId: seat.legId, detail: { company: companyName, part: seat.part, name: letter.name } });
    return { invitationId };
  });
}
