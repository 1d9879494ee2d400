import "server-only";
import { and, asc, count, countDistinct, desc, eq, gt, inArray, isNull, like, or, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { companies, companyMembers, moveSeats, outbox, sessions, users } from "@/db/schema";
import { presentMember } from "@/lib/access/scope";
import { companyKey } from "@/lib/companies/words";
import { AppError } from "@/lib/errors";
import { MAIL_KINDS, type OutboxState } from "@/lib/outbox/vocabulary";
import type { Viewer } from "@/lib/viewer/types";
import type { AdminCompany, AdminMail, AdminPerson } from "./types";

const PAGE = 100;

/** Refuses like a page that is not there: who is no site administrator learns of none. */
export function requireSiteAdmin(viewer: Viewer): void {
  if (!viewer.siteAdmin) throw new AppError("not_found", "No such page.");
}

const containing = (typed: string) => `%${typed.replaceAll(/[\\%_]/g, (char) => `\\${char}`)}%`;

/** Companies by name or mark; or only those whose name stands more than once. */
export async function listAllCompanies(viewer: Viewer, { search = "", doubled = false }: { search?: string; doubled?: boolean } = {}): Promise<AdminCompany[]> {
  requireSiteAdmin(viewer);
  const twice = db().select({ key: companies.nameKey }).from(companies).where(isNull(companies.mergedIntoId)).groupBy(companies.nameKey).having(gt(count(), 1));
  const key = companyKey(search);
  const rows = await db().select({ companyId: companies.id, name: companies.name, nameKey: companies.nameKey, mark: companies.mark, createdAt: companies.createdAt }).from(companies)
    .where(and(isNull(companies.mergedIntoId), key ? or(like(companies.nameKey, containing(key)), eq(companies.mark, key.toUpperCase().replaceAll(/[^A-Z]/g, "") || "-")) : undefined, doubled ? inArray(companies.nameKey, twice) : undefined))
    .orderBy(asc(companies.nameKey), asc(companies.createdAt)).limit(PAGE);
  if (rows.length === 0) return [];
  const ids = rows.map((row) => row.companyId);
  const keys = (await twice).map((row) => row.key);
  const members = await db().select({ companyId: companyMembers.companyId, n: count() }).from(companyMembers).where(and(inArray(companyMembers.companyId, ids), presentMember)).groupBy(companyMembers.companyId);
  const moves = await db().select({ companyId: moveSeats.companyId, n: countDistinct(moveSeats.moveId) }).from(moveSeats).where(and(inArray(moveSeats.companyId, ids), isNull(moveSeats.removedAt))).groupBy(moveSeats.companyId);
  const nOf = (list: { companyId: string; n: number }[], companyId: string) => list.find((one) => one.companyId === companyId)?.n ?? 0;
  return rows.map(({ nameKey, createdAt, ...row }) => ({ ...row, createdAt: createdAt.toISOString(), members: nOf(members, row.companyId), moves: nOf(moves, row.companyId), doubled: keys.includes(nameKey) }));
}

/** People by a part of name or address, at least three characters, since nobody needs a list of all. */
export async function listPeople(viewer: Viewer, search: string, now = new Date()): Promise<AdminPerson[]> {
  requireSiteAdmin(viewer);
  const typed = search.normalize("NFC").trim().toLowerCase();
  if (typed.length < 3) return [];
  const rows = await db().select({ userId: users.id, name: users.name, email: users.email, emailVerified: users.emailVerified, siteAdmin: users.siteAdmin, disabledAt: users.disabledAt }).from(users)
    .where(or(like(users.email, containing(typed)), sql`lower(${users.name}) like ${containing(typed)}`)).orderBy(asc(users.email)).limit(PAGE);
  if (rows.length === 0) return [];
  const ids = rows.map((row) => row.userId);
  const open = await db().select({ userId: sessions.userId, n: count(), last: sql<Date | string | null>`max(${sessions.updatedAt})` }).from(sessions).where(and(inArray(sessions.userId, ids), gt(sessions.expiresAt, now))).groupBy(sessions.userId);
  const belongs = await db().select({ userId: companyMembers.userId, name: companies.name }).from(companyMembers).innerJoin(companies, and(eq(companies.id, companyMembers.companyId), isNull(companies.mergedIntoId))).where(and(inArray(companyMembers.userId, ids), presentMember)).orderBy(asc(companies.name));
  return rows.map((row) => {
    const live = open.find((one) => one.userId === row.userId);
    return { ...row, disabledAt: row.disabledAt?.toISOString() ?? null, sessions: live?.n ?? 0, lastUsedAt: instantOf(live?.last), companies: belongs.filter((one) => one.userId === row.userId).map((one) => one.name) };
  });
}

/** An aggregate comes back as text in UTC. */
const instantOf = (value: Date | string | null | undefined) => (value === null || value === undefined ? null : (value instanceof Date ? value : new Date(`${value.replace(" ", "T")}Z`)).toISOString());

/** Messages of the outbox, newest first, without what they say. */
export async function listMail(viewer: Viewer, state: OutboxState | null = null): Promise<AdminMail[]> {
  requireSiteAdmin(viewer);
  const rows = await db().select({ outboxId: outbox.id, kind: outbox.kind, to: outbox.toAddress, state: outbox.state, attempts: outbox.attempts, lastError: outbox.lastError, createdAt: outbox.createdAt, runAt: outbox.runAt, doneAt: outbox.doneAt })
    .from(outbox).where(and(inArray(outbox.kind, [...MAIL_KINDS]), state ? eq(outbox.state, state) : undefined)).orderBy(desc(outbox.createdAt), desc(outbox.id)).limit(PAGE);
  return rows.map(({ createdAt, runAt, doneAt, ...row }) => ({ ...row, createdAt: createdAt.toISOString(), nextTryAt: row.state === "ready" ? runAt.toISOString() : null, doneAt: doneAt?.toISOString() ?? null }));
}
