import "server-only";
import { and, eq, isNull, sql } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { db } from "@/db/client";
import { accounts, companies, companyMembers, invitations, moves, moveSeats, seatPeople, sessions, users } from "@/db/schema";
import { auth } from "@/lib/auth";
import { AppError } from "@/lib/errors";
import { newId, sha256Hex } from "@/lib/ids";
import { appendRecord, appendSiteLog } from "@/lib/record/commands";
import { refreshStanding, write } from "@/lib/standing/commands";
import { unsafeCountTry } from "@/lib/viewer/commands";
import type { SeatPart } from "@/lib/access/vocabulary";
import type { Viewer } from "@/lib/viewer/types";
import type { Join } from "../input";
import { invitationState, joinAs, landingOf } from "../rules";
import { INVITATION_OVER } from "../vocabulary";

type Letter = typeof invitations.$inferSelect;
type Seat = { part: SeatPart; legId: string | null };

const over = () => new AppError("gone", `${INVITATION_OVER} Ask whoever sent it for a new one.`);

export type Joined = { userId: string; moveId: string | null; landing: ReturnType<typeof landingOf> };

/** No viewer is needed: holding the letter shows that the mailbox is the person's own. Makes the person where the address is new, seats them, uses the letter up, and signs them in. Two presses of one page join once. */
export async function unsafeJoin({ token, once, name }: Join, from: { address: string; headers: Headers }, viewer: Pick<Viewer, "userId" | "email"> | null, now = new Date()): Promise<Joined> {
  await unsafeCountTry("token-address", from.address, now);
  const tokenHash = sha256Hex(token);
  const [found] = await db().select({ id: invitations.id, moveId: invitations.moveId, email: invitations.email }).from(invitations).where(eq(invitations.tokenHash, tokenHash));
  if (!found) throw over();
  if (viewer && viewer.email !== found.email) throw new AppError("not_your_part", `This letter is for ${found.email}. Sign out first, then open it again.`);
  // The letter stands in for the viewer that there is not yet: the same page pressed twice gets the first answer.
  const attempt = { key: once, door: "join", bodyHash: tokenHash, at: now };
  const joined = await write<Joined>({ userId: found.id }, attempt, async (tx) => {
    const seat = found.moveId ? await lockSeat(tx, found.id, found.moveId) : null;
    const [letter] = await tx.select().from(invitations).where(eq(invitations.tokenHash, tokenHash)).for("update");
    if (!letter || invitationState(letter, now) !== "open") throw over();
    const person = await provenPerson(tx, letter, name, now);
    await admit(tx, letter, seat, person.userId, now);
    await tx.update(invitations).set({ acceptedAt: now, acceptedBy: person.userId }).where(eq(invitations.id, letter.id));
    await note(tx, letter, seat, person, now);
    return { userId: person.userId, moveId: letter.moveId, landing: landingOf(seat?.part ?? null, letter) };
  });
  if (viewer?.userId !== joined.userId) await auth().api.signInProven({ body: { userId: joined.userId }, headers: from.headers });
  return joined;
}

/** Locks the move, as every write on it does, and gives the seat that the letter is for. */
async function lockSeat(tx: Tx, invitationId: string, moveId: string): Promise<Seat> {
  const [move] = await tx.select({ state: moves.state }).from(moves).where(eq(moves.id, moveId)).for("update");
  const [seat] = await tx.select({ part: moveSeats.part, legId: moveSeats.legId }).from(invitations)
    .innerJoin(moveSeats, and(eq(moveSeats.id, invitations.seatId), isNull(moveSeats.removedAt))).where(eq(invitations.id, invitationId));
  if (!seat || move?.state !== "open") throw over();
  return seat;
}

/** The person behind the address, made where there is none. Whatever was set on an account before its address was proven is dropped. */
async function provenPerson(tx: Tx, letter: Letter, typed: string | null, at: Date) {
  const name = letter.name ?? typed;
  const known = await personBy(tx, letter.email);
  if (!known && !name) throw new AppError("bad_input", "Some entries need another look.", { fields: { name: ["Enter your name."] } });
  // Two letters to one new address may be opened at once: the unique address lets one of them make the person.
  if (!known) await tx.insert(users).values({ id: newId("user"), name: name ?? "", email: letter.email, emailVerified: true, createdAt: at, updatedAt: at }).onDuplicateKeyUpdate({ set: { email: letter.email } });
  const person = known ?? (await personBy(tx, letter.email));
  if (!person || person.disabledAt) throw over();
  if (!person.emailVerified) {
    await tx.delete(accounts).where(eq(accounts.userId, person.userId));
    await tx.delete(sessions).where(eq(sessions.userId, person.userId));
    await tx.update(users).set({ emailVerified: true, updatedAt: at }).where(eq(users.id, person.userId));
  }
  return person;
}

async function personBy(tx: Tx, email: string) {
  const [row] = await tx.select({ userId: users.id, name: users.name, emailVerified: users.emailVerified, disabledAt: users.disabledAt }).from(users).where(eq(users.email, email)).for("update");
  return row ?? null;
}

/** Into the company, as far as the inviter's word reaches; and onto the seat where that is all it reaches. */
async function admit(tx: Tx, letter: Letter, seat: Seat | null, userId: string, at: Date) {
  const { companyId, inspects, bills, dispatches, seatId } = letter;
  // The company's row is the lock: two first joiners at once make one manager.
  const [company] = await tx.select({ mergedIntoId: companies.mergedIntoId }).from(companies).where(eq(companies.id, companyId)).for("update");
  if (!company || company.mergedIntoId) throw over();
  const rows = await tx.select().from(companyMembers).where(and(eq(companyMembers.companyId, companyId), isNull(companyMembers.removedAt))).for("update");
  const mine = rows.find((row) => row.userId === userId);
  const how = joinAs({
    hasMembers: rows.some((row) => row.admittedAt), inviterManages: rows.some((row) => row.userId === letter.invitedBy && row.manager && row.admittedAt !== null),
    standing: mine ? (mine.admittedAt ? "member" : "guest") : "none",
  });
  if (how !== "as-is") {
    const works = how === "guest" ? { inspects: false, bills: false, dispatches: false } : { inspects: inspects || Boolean(mine?.inspects), bills: bills || Boolean(mine?.bills), dispatches: dispatches || Boolean(mine?.dispatches) };
    const row = { manager: how === "manager" || Boolean(mine?.manager), ...works, admittedAt: how === "guest" ? null : (mine?.admittedAt ?? at), removedAt: null };
    await tx.insert(companyMembers).values({ companyId, userId, joinedAt: at, ...row }).onDuplicateKeyUpdate({ set: row });
  }
  if (!seat || !seatId || (how !== "guest" && how !== "as-is")) return;
  // Work from an earlier letter stays, but not from before a removal; the database assigns from left to right.
  const more = { inspects: sql`(${seatPeople.removedAt} is null and ${seatPeople.inspects}) or ${inspects}`, bills: sql`(${seatPeople.removedAt} is null and ${seatPeople.bills}) or ${bills}`, dispatches: sql`(${seatPeople.removedAt} is null and ${seatPeople.dispatches}) or ${dispatches}`, removedAt: null };
  await tx.insert(seatPeople).values({ seatId, userId, inspects, bills, dispatches, joinedAt: at }).onDuplicateKeyUpdate({ set: more });
}

async function note(tx: Tx, letter: Letter, seat: Seat | null, person: { userId: string; name: string }, at: Date) {
  const [company] = await tx.select({ name: companies.name }).from(companies).where(eq(companies.id, letter.companyId));
  const companyName = company?.name ?? null;
  if (!letter.moveId || !seat) return appendSiteLog(tx, { kind: "company.joined", byUserId: person.userId, detail: { companyId: letter.companyId, company: companyName } }, at);
  const by = { userId: person.userId, name: person.name, companyId: letter.companyId, companyName, part: seat.part };
  await appendRecord(tx, letter.moveId, by, { kind: "party.joined", legId: seat.legId, detail: { company: companyName, part: seat.part, name: person.name } }, at);
  await refreshStanding(tx, letter.moveId, at);
}
