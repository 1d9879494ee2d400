import "server-only";
import { and, eq, isNull, sql } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { companies, companyMembers, users } from "@/db/schema";
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
  return { ...user, sessionId, memberships };
}
