import "server-only";
import { eq } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { sessions, users } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { OnePerson } from "../input";
import { requireSiteAdmin } from "../queries";

async function requirePerson(tx: Tx, userId: string) {
  const [person] = await tx.select({ userId: users.id, email: users.email, disabledAt: users.disabledAt }).from(users).where(eq(users.id, userId)).for("update");
  if (!person) throw new AppError("not_found", "No such person.");
  return person;
}

/** Shuts a person out: every session ends at once, and no way in makes a new one. */
export async function disablePerson(viewer: Viewer, { userId }: OnePerson, attempt: Attempt) {
  requireSiteAdmin(viewer);
  if (userId === viewer.userId) throw new AppError("not_yet", "You can’t disable your own account; another site administrator can.");
  return write(viewer, attempt, async (tx) => {
    const person = await requirePerson(tx, userId);
    await tx.update(users).set({ disabledAt: person.disabledAt ?? attempt.at, updatedAt: attempt.at }).where(eq(users.id, userId));
    await tx.delete(sessions).where(eq(sessions.userId, userId));
    await appendSiteLog(tx, { kind: "person.disabled", byUserId: viewer.userId, detail: { userId, email: person.email } }, attempt.at);
    return { userId };
  });
}

/** Lets a person in again; their companies and seats are as they were. */
export async function enablePerson(viewer: Viewer, { userId }: OnePerson, attempt: Attempt) {
  requireSiteAdmin(viewer);
  return write(viewer, attempt, async (tx) => {
    const person = await requirePerson(tx, userId);
    await tx.update(users).set({ disabledAt: null, updatedAt: attempt.at }).where(eq(users.id, userId));
    await appendSiteLog(tx, { kind: "person.enabled", byUserId: viewer.userId, detail: { userId, email: person.email } }, attempt.at);
    return { userId };
  });
}

/** Ends all sessions of a person, say after a phone was lost; they can sign in again. */
export async function endSessionsOf(viewer: Viewer, { userId }: OnePerson, attempt: Attempt) {
  requireSiteAdmin(viewer);
  return write(viewer, attempt, async (tx) => {
    const person = await requirePerson(tx, userId);
    await tx.delete(sessions).where(eq(sessions.userId, userId));
    await appendSiteLog(tx, { kind: "person.sessions-ended", byUserId: viewer.userId, detail: { userId, email: person.email } }, attempt.at);
    return { userId };
  });
}
