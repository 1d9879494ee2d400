import "server-only";
import { and, eq, ne } from "drizzle-orm";
import { db } from "@/db/client";
import { accounts, sessions, users } from "@/db/schema";
import { auth } from "@/lib/auth";
import { AppError } from "@/lib/errors";
import { sha256Hex } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import { unsafeCountTry, unsafeHashPassword, unsafeVerifyPassword } from "@/lib/viewer/commands";
import { denyPassword } from "@/lib/viewer/password";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { ChangePassword, EndSession, Rename } from "../input";

/** Changes the viewer's own name; what they signed before keeps the name it was signed with. */
export async function renameMyself(viewer: Viewer, { name }: Rename, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    await tx.update(users).set({ name, updatedAt: attempt.at }).where(eq(users.id, viewer.userId));
    await appendSiteLog(tx, { kind: "account.renamed", byUserId: viewer.userId, detail: { from: viewer.name, to: name } }, attempt.at);
    return { name };
  });
}

/** Ends one of the viewer's own sessions; its next request finds nobody. */
export async function endSession(viewer: Viewer, { sessionId }: EndSession, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    const mine = and(eq(sessions.id, sessionId), eq(sessions.userId, viewer.userId));
    const [found] = await tx.select({ id: sessions.id }).from(sessions).where(mine);
    if (!found) throw new AppError("not_found", "No such session; it may have ended already.");
    await tx.delete(sessions).where(mine);
    await appendSiteLog(tx, { kind: "session.ended", byUserId: viewer.userId, detail: { sessionId } }, attempt.at);
    return { sessionId };
  });
}

/** Ends every session of the viewer but the one that asks. */
export async function endOtherSessions(viewer: Viewer, _input: Record<string, never>, attempt: Attempt) {
  return write(viewer, attempt, async (tx) => {
    await tx.delete(sessions).where(and(eq(sessions.userId, viewer.userId), ne(sessions.id, viewer.sessionId ?? "-")));
    await appendSiteLog(tx, { kind: "session.others-ended", byUserId: viewer.userId, detail: {} }, attempt.at);
    return { ended: true };
  });
}

const wrongField = (field: "currentPassword" | "newPassword", message: string) => new AppError("bad_input", "Some entries need another look.", { fields: { [field]: [message] } });

/** Changes the viewer's own password: needs the one that stands, ends the other sessions when asked, mails that it happened, and goes on under a new session. */
export async function changePassword(viewer: Viewer, input: ChangePassword, attempt: Attempt, headers: Headers) {
  await unsafeCountTry("password-account", viewer.userId, attempt.at);
  const about = { name: viewer.name, email: viewer.email, companies: viewer.memberships.map((one) => one.companyName) };
  const denial = denyPassword(input.newPassword, about);
  const [kept] = await db().select({ id: accounts.id, password: accounts.password }).from(accounts).where(and(eq(accounts.userId, viewer.userId), eq(accounts.providerId, "credential")));
  const proven = await unsafeVerifyPassword(kept?.password ?? "", input.currentPassword);
  let changed = false;
  // A fast hash of this body would be a fast hash of both passwords.
  const answer = await write(viewer, { ...attempt, bodyHash: sha256Hex(attempt.door) }, async (tx) => {
    if (!kept || !proven) throw wrongField("currentPassword", "This is not the password that stands.");
    if (denial) throw wrongField("newPassword", denial);
    await tx.update(accounts).set({ password: await unsafeHashPassword(input.newPassword), updatedAt: attempt.at }).where(eq(accounts.id, kept.id));
    if (input.endOthers) await tx.delete(sessions).where(and(eq(sessions.userId, viewer.userId), ne(sessions.id, viewer.sessionId ?? "-")));
    await putMail(tx, { kind: "password-changed", to: viewer.email, payload: { name: viewer.name }, dedupe: `password-changed:${viewer.userId}:${attempt.key}` }, attempt.at);
    await appendSiteLog(tx, { kind: "password.changed", byUserId: viewer.userId, detail: { endOthers: input.endOthers } }, attempt.at);
    changed = true;
    return { changed: true };
  });
  if (changed) await renewSession(viewer, headers);
  return answer;
}

/** A new token after the person has proven themselves anew; the one before dies. */
async function renewSession(viewer: Viewer, headers: Headers): Promise<void> {
  await auth().api.signInProven({ body: { userId: viewer.userId }, headers });
  if (viewer.sessionId) await db().delete(sessions).where(eq(sessions.id, viewer.sessionId));
}
