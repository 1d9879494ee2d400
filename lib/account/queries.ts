import "server-only";
import { and, desc, eq, gt, isNotNull } from "drizzle-orm";
import { db } from "@/db/client";
import { accounts, sessions } from "@/db/schema";
import type { Viewer } from "@/lib/viewer/types";
import { deviceOf } from "./device";
import type { AccountView } from "./types";

/** The viewer's own account: name, whether there is a password, and where they are signed in, last used first. */
export async function getAccount(viewer: Viewer, now = new Date()): Promise<AccountView> {
  const rows = await db().select({ sessionId: sessions.id, userAgent: sessions.userAgent, startedAt: sessions.createdAt, lastUsedAt: sessions.updatedAt })
    .from(sessions).where(and(eq(sessions.userId, viewer.userId), gt(sessions.expiresAt, now))).orderBy(desc(sessions.updatedAt));
  const [password] = await db().select({ id: accounts.id }).from(accounts).where(and(eq(accounts.userId, viewer.userId), eq(accounts.providerId, "credential"), isNotNull(accounts.password)));
  return {
    name: viewer.name,
    email: viewer.email,
    hasPassword: Boolean(password),
    sessions: rows.map(({ sessionId, userAgent, startedAt, lastUsedAt }) => ({
      sessionId, device: deviceOf(userAgent), startedAt: startedAt.toISOString(), lastUsedAt: lastUsedAt.toISOString(), current: sessionId === viewer.sessionId,
    })),
  };
}
