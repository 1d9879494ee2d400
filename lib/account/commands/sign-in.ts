import "server-only";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { sessions } from "@/db/schema";
import { auth } from "@/lib/auth";
import { AppError } from "@/lib/errors";
import { appendSiteLog } from "@/lib/record/commands";
import { denyPassword } from "@/lib/viewer/password";
import { unsafeCountTry, unsafeForgetTries, unsafeHashPassword } from "@/lib/viewer/commands";
import { unsafeFindPerson } from "@/lib/viewer/queries";
import type { MailMe, ResetPassword, SignIn, SignUp } from "../input";

/** Where a form in front of sign-in was sent from. */
export type Caller = { address: string; headers: Headers };

const USED_UP = "This link can’t be used any more. It may have been used already, or it is too old; ask for a new one.";

/** The sign-in library's own refusal, told by its shape; null for anything else. */
function refusalOf(error: unknown): { status: number; code: string } | null {
  if (!(error instanceof Error) || !("statusCode" in error) || typeof error.statusCode !== "number") return null;
  const body = "body" in error && error.body && typeof error.body === "object" ? error.body : {};
  return { status: error.statusCode, code: "code" in body ? String(body.code) : "" };
}

/** No viewer: makes an account that opens once its address is checked. A known address gets no new account and no other answer; its owner is mailed a way in, which also takes an account over that somebody else began with their address. */
export async function unsafeSignUp({ name, email, password }: SignUp, caller: Caller, now = new Date()): Promise<void> {
  await unsafeCountTry("sign-up-address", caller.address, now);
  const denial = denyPassword(password, { name, email });
  if (denial) throw new AppError("bad_input", "Some entries need another look.", { fields: { password: [denial] } });
  const known = await unsafeFindPerson({ email });
  if (known) {
    await unsafeHashPassword(password);
    return unsafeCountMail(email, caller, now).then(() => unsafeMailSignInLink({ email }, caller)).catch(onlyTooMany);
  }
  try {
    await auth().api.signUpEmail({ body: { name, email, password } });
    await appendSiteLog(db(), { kind: "account.made", byUserId: null, detail: { email } }, now);
  } catch (error) {
    // Two sign-ups of one address at once: the other one has made it.
    if (refusalOf(error)?.status !== 422) throw error;
  }
}

function onlyTooMany(error: unknown): void {
  if (!(error instanceof AppError && error.code === "too_many")) throw error;
}

/** No viewer: signs in by password. The answer is one and the same for an unknown address, a wrong password and a disabled account. `checkMail`: the password was right, but the address has not been checked; a new mail is on its way. */
export async function unsafeSignIn({ email, password }: Pick<SignIn, "email" | "password">, caller: Caller, earlierSession: string | null, now = new Date()): Promise<"signed-in" | "check-mail"> {
  await unsafeCountTry("sign-in-address", caller.address, now);
  await unsafeCountTry("sign-in-account", email, now);
  try {
    await auth().api.signInEmail({ body: { email, password }, headers: caller.headers });
  } catch (error) {
    const refusal = refusalOf(error);
    if (!refusal) throw error;
    if (refusal.code === "EMAIL_NOT_VERIFIED") {
      await unsafeCountMail(email, caller, now).then(() => unsafeMailCheck({ email })).catch(onlyTooMany);
      return "check-mail";
    }
    throw new AppError("bad_input", "No account has this e-mail address with this password. Try again, or have a sign-in link mailed to you.", { cause: error });
  }
  await unsafeForgetTries("sign-in-account", email);
  await endEarlier(earlierSession);
  return "signed-in";
}

/** The session that this browser had before must not live on beside the new one. */
async function endEarlier(sessionId: string | null): Promise<void> {
  if (sessionId) await db().delete(sessions).where(eq(sessions.id, sessionId));
}

/** No viewer: counts a wish for mail, known address or not, so that nobody's mailbox is flooded. */
export async function unsafeCountMail(email: string, caller: Caller, now = new Date()): Promise<void> {
  await unsafeCountTry("link-address", caller.address, now);
  await unsafeCountTry("link-account", email, now);
}

/** No viewer: mails a sign-in link to a known address, nothing to any other. Its caller has counted the wish, and answers before this runs, so that the time tells nothing either. */
export async function unsafeMailSignInLink({ email }: MailMe, caller: Caller): Promise<void> {
  const person = await unsafeFindPerson({ email });
  if (person && !person.disabled) await auth().api.signInMagicLink({ body: { email }, headers: caller.headers });
}

/** No viewer: mails a link for a new password to a known address, nothing to any other; counted and timed as above. */
export async function unsafeMailReset({ email }: MailMe): Promise<void> {
  const person = await unsafeFindPerson({ email });
  if (person && !person.disabled) await auth().api.requestPasswordReset({ body: { email } });
}

/** No viewer: mails the link that checks an address once more, where it is still unchecked; counted and timed as above. */
export async function unsafeMailCheck({ email }: MailMe): Promise<void> {
  const person = await unsafeFindPerson({ email });
  if (person && !person.disabled && !person.emailVerified) await auth().api.sendVerificationEmail({ body: { email } });
}

/** No viewer: a mailed sign-in link was opened and its button pressed. Works once. */
export async function unsafeEnter(token: string, caller: Caller, earlierSession: string | null, now = new Date()): Promise<void> {
  await unsafeCountTry("token-address", caller.address, now);
  await usedOnce(() => auth().api.magicLinkVerify({ query: { token }, headers: caller.headers }));
  await endEarlier(earlierSession);
}

/** No viewer: the mailed link that checks an address was opened and its button pressed. False when the address had been checked before; then nobody is signed in. */
export async function unsafeVerifyAddress(token: string, caller: Caller, now = new Date()): Promise<boolean> {
  await unsafeCountTry("token-address", caller.address, now);
  const { headers } = await usedOnce(() => auth().api.verifyEmail({ query: { token }, headers: caller.headers, returnHeaders: true }));
  return headers.getSetCookie().length > 0;
}

/** No viewer: sets a new password by a mailed link; every session ends, and the mail says so. */
export async function unsafeResetPassword({ token, password }: ResetPassword, caller: Caller, now = new Date()): Promise<void> {
  await unsafeCountTry("token-address", caller.address, now);
  const kept = await (await auth().$context).internalAdapter.findVerificationValue(`reset-password:${token}`);
  const person = kept ? await unsafeFindPerson({ userId: kept.value }) : null;
  if (!person || person.disabled) throw new AppError("gone", USED_UP);
  const denial = denyPassword(password, person);
  if (denial) throw new AppError("bad_input", "Some entries need another look.", { fields: { password: [denial] } });
  await usedOnce(() => auth().api.resetPassword({ body: { newPassword: password, token } }));
  await appendSiteLog(db(), { kind: "password.reset", byUserId: person.userId, detail: {} }, now);
}

async function usedOnce<T>(run: () => Promise<T>): Promise<T> {
  try {
    return await run();
  } catch (error) {
    if (!refusalOf(error)) throw error;
    throw new AppError("gone", USED_UP, { cause: error });
  }
}
