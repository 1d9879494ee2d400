import "server-only";
import { and, asc, desc, eq, inArray, isNull, or, sql } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { companies, companyMembers, equipment, followLinks, invitations, legs, moves, moveSeats, seatPeople, users } from "@/db/schema";
import { partFor } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import { sha256Hex } from "@/lib/ids";
import type { Viewer } from "@/lib/viewer/types";
import { invitationState } from "./rules";
import type { FollowLinkView, InvitationView, KnownCompany, LetterView, Party, PartyPerson, PeopleView } from "./types";
import { legWords } from "./words";

/** The people tab of a move: everybody seated, for all; letters and links only for who may make them. */
export async function getPeople(viewer: Viewer, moveId: string, now = new Date()): Promise<PeopleView> {
  const { move, parts } = await requireMove(viewer, moveId);
  const mayInvite = partFor(parts, { action: "party.invite" }) !== null;
  const stretches = await db().select({ legId: legs.id, seq: legs.seq, fromPlace: legs.fromPlace, toPlace: legs.toPlace, carrierName: legs.carrierName, carrierCompanyId: legs.carrierCompanyId, payerName: legs.payerName, payerCompanyId: legs.payerCompanyId })
    .from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq));
  return {
    mayInvite,
    open: move.state === "open",
    legs: stretches,
    parties: await partiesOf(moveId),
    invitations: mayInvite ? await invitationsOf(moveId, now) : [],
    followLinks: mayInvite ? await followLinksOf(moveId, now) : [],
    known: mayInvite ? await listKnownCompanies(viewer) : [],
  };
}

async function partiesOf(moveId: string): Promise<Party[]> {
  const seats = await db().select({ seatId: moveSeats.id, part: moveSeats.part, legId: moveSeats.legId, companyId: companies.id, companyName: companies.name, companyMark: companies.mark, since: moveSeats.createdAt })
    .from(moveSeats).innerJoin(companies, eq(companies.id, moveSeats.companyId))
    .where(and(eq(moveSeats.moveId, moveId), isNull(moveSeats.removedAt))).orderBy(asc(moveSeats.part), asc(moveSeats.id));
  if (seats.length === 0) return [];
  const present = and(isNull(companyMembers.removedAt), sql`${companyMembers.admittedAt} is not null`, inArray(companyMembers.companyId, seats.map((seat) => seat.companyId)));
  const members = await db().select({ companyId: companyMembers.companyId, userId: users.id, name: users.name, inspects: companyMembers.inspects, bills: companyMembers.bills, dispatches: companyMembers.dispatches })
    .from(companyMembers).innerJoin(users, and(eq(users.id, companyMembers.userId), isNull(users.disabledAt))).where(present).orderBy(asc(users.name));
  const guests = await db().select({ seatId: seatPeople.seatId, userId: users.id, name: users.name, inspects: seatPeople.inspects, bills: seatPeople.bills, dispatches: seatPeople.dispatches })
    .from(seatPeople).innerJoin(users, and(eq(users.id, seatPeople.userId), isNull(users.disabledAt)))
    .where(and(inArray(seatPeople.seatId, seats.map((seat) => seat.seatId)), isNull(seatPeople.removedAt))).orderBy(asc(users.name));
  return seats.map((seat) => ({
    ...seat,
    since: seat.since.toISOString(),
    people: peopleOfSeat(members.filter((one) => one.companyId === seat.companyId), guests.filter((one) => one.seatId === seat.seatId)),
  }));
}

type SeatedRow = Omit<PartyPerson, "guest">;

/** Members of the company, their work widened by what they were invited to on this seat; then those invited to the seat alone. */
function peopleOfSeat(members: SeatedRow[], guests: SeatedRow[]): PartyPerson[] {
  const own = members.map((member) => {
    const more = guests.find((one) => one.userId === member.userId);
    return { ...plain(member), inspects: member.inspects || Boolean(more?.inspects), bills: member.bills || Boolean(more?.bills), dispatches: member.dispatches || Boolean(more?.dispatches), guest: false };
  });
  const alone = guests.filter((one) => !members.some((member) => member.userId === one.userId)).map((one) => ({ ...plain(one), guest: true }));
  return [...own, ...alone];
}

const plain = ({ userId, name, inspects, bills, dispatches }: SeatedRow): SeatedRow => ({ userId, name, inspects, bills, dispatches });

async function invitationsOf(moveId: string, now: Date): Promise<InvitationView[]> {
  const rows = await db().select({ letter: invitations, companyName: companies.name, part: moveSeats.part, legId: moveSeats.legId, seatId: moveSeats.id, invitedBy: users.name })
    .from(invitations).innerJoin(moveSeats, eq(moveSeats.id, invitations.seatId)).innerJoin(companies, eq(companies.id, invitations.companyId)).innerJoin(users, eq(users.id, invitations.invitedBy))
    .where(eq(invitations.moveId, moveId)).orderBy(desc(invitations.createdAt));
  return rows.map(({ letter, companyName, part, legId, seatId, invitedBy }) => ({
    invitationId: letter.id, seatId, companyName, part, legId, invitedBy, email: letter.email, name: letter.name, inspects: letter.inspects, bills: letter.bills, dispatches: letter.dispatches,
    createdAt: letter.createdAt.toISOString(), expiresAt: letter.expiresAt.toISOString(), state: invitationState(letter, now),
  }));
}

async function followLinksOf(moveId: string, now: Date): Promise<FollowLinkView[]> {
  const rows = await db().select({ link: followLinks, madeBy: users.name }).from(followLinks).innerJoin(users, eq(users.id, followLinks.createdBy)).where(eq(followLinks.moveId, moveId)).orderBy(desc(followLinks.createdAt));
  return rows.map(({ link, madeBy }) => ({
    followId: link.id, label: link.label, email: link.email, madeBy, uses: link.uses,
    createdAt: link.createdAt.toISOString(), expiresAt: link.expiresAt.toISOString(), lastUsedAt: link.lastUsedAt?.toISOString() ?? null,
    state: link.revokedAt ? "ended" : link.expiresAt <= now ? "expired" : "open",
  }));
}

/** Companies that the viewer belongs to, or whose people share a move with one of theirs; there is no directory of all. */
export async function listKnownCompanies(viewer: Viewer, reader: Reader = db()): Promise<KnownCompany[]> {
  const own = viewer.memberships.map((one) => one.companyId);
  if (own.length === 0) return [];
  const mine = reader.select({ moveId: moveSeats.moveId }).from(moveSeats).where(and(inArray(moveSeats.companyId, own), isNull(moveSeats.removedAt)));
  const rows = await reader.selectDistinct({ companyId: companies.id, name: companies.name }).from(companies).leftJoin(moveSeats, eq(moveSeats.companyId, companies.id))
    .where(and(isNull(companies.mergedIntoId), or(inArray(companies.id, own), inArray(moveSeats.moveId, mine)))).orderBy(asc(companies.name));
  return rows.map((row) => ({ ...row, own: own.includes(row.companyId) }));
}

/** No viewer: the token is what its holder shows. What the letter says; null when it opens nothing (any more). */
export async function unsafeReadLetter(token: string, now = new Date()): Promise<LetterView | null> {
  const [row] = await db().select({ letter: invitations, companyName: companies.name, inviterName: users.name })
    .from(invitations).innerJoin(companies, eq(companies.id, invitations.companyId)).innerJoin(users, eq(users.id, invitations.invitedBy))
    .where(eq(invitations.tokenHash, sha256Hex(token)));
  if (!row || invitationState(row.letter, now) !== "open") return null;
  const { letter, companyName, inviterName } = row;
  const [person] = await db().select({ name: users.name, disabledAt: users.disabledAt }).from(users).where(eq(users.email, letter.email));
  if (person?.disabledAt) return null;
  const says = { companyName, inviterName, email: letter.email, inspects: letter.inspects, bills: letter.bills, dispatches: letter.dispatches, nameKnown: Boolean(letter.name ?? person?.name) };
  if (!letter.moveId || !letter.seatId) return { ...says, inviterCompany: companyName, part: null, unit: "", from: "", to: "", legWords: "" };
  const [there] = await db().select({ part: moveSeats.part, legId: moveSeats.legId, mark: equipment.mark, number: equipment.number, originName: moves.originName, originPlace: moves.originPlace, destinationName: moves.destinationName, destinationPlace: moves.destinationPlace, inviterCompany: companies.name })
    .from(moveSeats).innerJoin(moves, and(eq(moves.id, moveSeats.moveId), eq(moves.state, "open"))).innerJoin(equipment, eq(equipment.moveId, moves.id)).innerJoin(companies, eq(companies.id, moves.ownerCompanyId))
    .where(and(eq(moveSeats.id, letter.seatId), isNull(moveSeats.removedAt)));
  if (!there) return null;
  const [leg] = there.legId ? await db().select({ seq: legs.seq, fromPlace: legs.fromPlace, toPlace: legs.toPlace }).from(legs).where(eq(legs.id, there.legId)) : [];
  return {
    ...says, part: there.part, inviterCompany: there.inviterCompany, unit: `${there.mark} ${there.number}`.trim(),
    from: `${there.originName}, ${there.originPlace}`, to: `${there.destinationName}, ${there.destinationPlace}`, legWords: leg ? legWords(leg) : "",
  };
}
