import "server-only";
import { and, eq, isNull, sql } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { companies, companyMembers, seatPeople, users } from "@/db/schema";
import type { Viewer } from "./types";

/** No viewer yet: this makes one. Null when the account is gone or disabled. */
export async function unsafeViewerOf(userId: string, sessionId: string | null, reader: Reader = db()): Promise<Viewer | null> {
  const [user] = await reader.select({ userId: users.id, name: users.name, email: users.email, emailVerified: users.emailVerified, siteAdmin: users.siteAdmin })
    .from(users).where(and(eq(users.id, userId), isNull(users.disabledAt)));
  if (!user) return null;
  const memberships = await reader
    .select({ companyId: companies.id, companyName: companies.name, manager: companyMembers.manager, inspects: companyMembers.inspects, bills: companyMembers.bills, dispatches: companyMembers.dispatches })
    .from(companyMembers).innerJoin(companies, and(eq(companies.id, companyMembers.companyId), isNull(companies.mergedIntoId)))
    .where(and(eq(companyMembers.userId, userId), isNull(companyMembers.removedAt), sql`${companyMembers.admittedAt} is not null`))
    .orderBy(companies.name);
  const guestSeats = await reader.select({ seatId: seatPeople.seatId }).from(seatPeople).where(and(eq(seatPeople.userId, userId), isNull(seatPeople.removedAt)));
  return { ...user, sessionId, memberships, guestSeatIds: guestSeats.map((one) => one.seatId) };
}

/** No viewer: asked before a session begins, whatever way in was taken. */
export async function unsafeMaySignIn(userId: string): Promise<boolean> {
  const [user] = await db().select({ disabledAt: users.disabledAt }).from(users).where(eq(users.id, userId));
  return Boolean(user) && user?.disabledAt === null;
}

export type Person = { userId: string; name: string; email: string; emailVerified: boolean; disabled: boolean };

/** No viewer: the forms in front of sign-in ask. What it finds decides about mail alone, never about what the asker is told. */
export async function unsafeFindPerson(by: { email: string } | { userId: string }, reader: Reader = db()): Promise<Person | null> {
  const [row] = await reader.select({ userId: users.id, name: users.name, email: users.email, emailVerified: users.emailVerified, disabledAt: users.disabledAt })
    .from(users).where("email" in by ? eq(users.email, by.email) : eq(users.id, by.userId));
  if (!row) return null;
  const { disabledAt, ...person } = row;
  return { ...person, disabled: disabledAt !== null };
}
