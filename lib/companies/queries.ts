import "server-only";
import { and, asc, count, desc, eq, inArray, isNull, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { companies, companyMembers, equipment, invitations, moveSeats, seatPeople, users } from "@/db/schema";
import { PART_LABELS } from "@/lib/access/vocabulary";
import { presentMember, requireMember } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import type { Viewer } from "@/lib/viewer/types";
import type { CompanyInvitation, CompanySummary, CompanyView, GuestView, MemberView } from "./types";

/** The viewer's companies, with those that have not admitted them yet at the end. */
export async function listCompanies(viewer: Viewer): Promise<CompanySummary[]> {
  const rows = await db().select({ companyId: companies.id, name: companies.name, mark: companies.mark, manager: companyMembers.manager, inspects: companyMembers.inspects, bills: companyMembers.bills, dispatches: companyMembers.dispatches, admittedAt: companyMembers.admittedAt })
    .from(companyMembers).innerJoin(companies, and(eq(companies.id, companyMembers.companyId), isNull(companies.mergedIntoId)))
    .where(and(eq(companyMembers.userId, viewer.userId), isNull(companyMembers.removedAt))).orderBy(asc(companies.name));
  const managed = rows.filter((row) => row.manager && row.admittedAt).map((row) => row.companyId);
  const asking = managed.length === 0 ? [] : await db().select({ companyId: companyMembers.companyId, n: count() }).from(companyMembers)
    .where(and(inArray(companyMembers.companyId, managed), isNull(companyMembers.removedAt), isNull(companyMembers.admittedAt))).groupBy(companyMembers.companyId);
  const list = rows.map(({ admittedAt, ...row }) => ({ ...row, admitted: admittedAt !== null, asking: asking.find((one) => one.companyId === row.companyId)?.n ?? 0 }));
  return [...list.filter((one) => one.admitted), ...list.filter((one) => !one.admitted)];
}

/** One company for a member of it; guests, addresses and letters only for its managers. */
export async function getCompany(viewer: Viewer, companyId: string, now = new Date()): Promise<CompanyView> {
  const { manager: manages } = requireMember(viewer, companyId);
  const [company] = await db().select({ companyId: companies.id, name: companies.name, mark: companies.mark, phone: companies.phone, version: companies.version }).from(companies).where(eq(companies.id, companyId));
  if (!company) throw new AppError("not_found", "No such company.");
  return { ...company, manages, members: await membersOf(viewer, companyId, manages), guests: manages ? await guestsOf(companyId) : [], invitations: manages ? await lettersOf(companyId, now) : [] };
}

async function membersOf(viewer: Viewer, companyId: string, manages: boolean): Promise<MemberView[]> {
  const rows = await db().select({ userId: users.id, name: users.name, email: users.email, joinedAt: companyMembers.joinedAt, manager: companyMembers.manager, inspects: companyMembers.inspects, bills: companyMembers.bills, dispatches: companyMembers.dispatches })
    .from(companyMembers).innerJoin(users, eq(users.id, companyMembers.userId)).where(and(eq(companyMembers.companyId, companyId), presentMember)).orderBy(desc(companyMembers.manager), asc(users.name));
  return rows.map(({ email, joinedAt, ...row }) => ({ ...row, joinedAt: joinedAt.toISOString(), email: manages || row.userId === viewer.userId ? email : null, self: row.userId === viewer.userId }));
}

async function guestsOf(companyId: string): Promise<GuestView[]> {
  const rows = await db().select({ userId: users.id, name: users.name, email: users.email, joinedAt: companyMembers.joinedAt }).from(companyMembers).innerJoin(users, eq(users.id, companyMembers.userId))
    .where(and(eq(companyMembers.companyId, companyId), isNull(companyMembers.removedAt), isNull(companyMembers.admittedAt))).orderBy(asc(companyMembers.joinedAt));
  if (rows.length === 0) return [];
  const seats = await db().select({ userId: seatPeople.userId, part: moveSeats.part, unit: sql<string>`concat(${equipment.mark}, ' ', ${equipment.number})` }).from(seatPeople)
    .innerJoin(moveSeats, and(eq(moveSeats.id, seatPeople.seatId), eq(moveSeats.companyId, companyId), isNull(moveSeats.removedAt))).innerJoin(equipment, eq(equipment.moveId, moveSeats.moveId))
    .where(and(inArray(seatPeople.userId, rows.map((row) => row.userId)), isNull(seatPeople.removedAt)));
  return rows.map((row) => ({ ...row, joinedAt: row.joinedAt.toISOString(), seats: seats.filter((seat) => seat.userId === row.userId).map((seat) => `${PART_LABELS[seat.part].toLowerCase()}, ${seat.unit.trim()}`) }));
}

async function lettersOf(companyId: string, now: Date): Promise<CompanyInvitation[]> {
  const rows = await db().select({ letter: invitations, invitedBy: users.name }).from(invitations).innerJoin(users, eq(users.id, invitations.invitedBy))
    .where(and(eq(invitations.companyId, companyId), isNull(invitations.moveId), isNull(invitations.acceptedAt), isNull(invitations.revokedAt))).orderBy(desc(invitations.createdAt));
  return rows.map(({ letter, invitedBy }) => ({
    invitationId: letter.id, email: letter.email, name: letter.name, inspects: letter.inspects, bills: letter.bills, dispatches: letter.dispatches, invitedBy,
    createdAt: letter.createdAt.toISOString(), expiresAt: letter.expiresAt.toISOString(), expired: letter.expiresAt <= now,
  }));
}
