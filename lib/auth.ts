import "server-only";
import { betterAuth } from "better-auth";
import { drizzleAdapter } from "better-auth/adapters/drizzle";
import { APIError, createAuthEndpoint } from "better-auth/api";
import { setSessionCookie } from "better-auth/cookies";
import { nextCookies } from "better-auth/next-js";
import { magicLink } from "better-auth/plugins";
import { z } from "zod";
import { db } from "@/db/client";
import { accounts, sessions, users, verifications } from "@/db/schema";
import { env } from "@/lib/env";
import { newId, sha256Hex, type IdKind } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import { routes } from "@/lib/routes";
import { unsafeHashPassword, unsafeNoteProven, unsafeVerifyPassword } from "@/lib/viewer/commands";
import { unsafeMaySignIn } from "@/lib/viewer/queries";

/** Minutes that a mailed sign-in or reset link lives (ASVS 5.0 6.5.5). */
const LINK_SECONDS = 600;
const VERIFY_SECONDS = 24 * 3600;
const DAY = 24 * 3600;
const KIND_OF_MODEL: Record<string, IdKind> = { user: "user", session: "session", account: "account", verification: "verification" };

const link = (path: string) => `${env().APP_URL}${path}`;

/** Signs in a person whose mailbox our own invitation has just proved. Only ever called from our own code: the library has no HTTP door here. */
const signInProven = () => ({
  id: "sign-in-proven",
  endpoints: {
    signInProven: createAuthEndpoint("/sign-in-proven", { method: "POST", body: z.object({ userId: z.string() }), metadata: { SERVER_ONLY: true } }, async (ctx) => {
      const user = await ctx.context.internalAdapter.findUserById(ctx.body.userId);
      if (!user) throw ctx.error("UNAUTHORIZED");
      const session = await ctx.context.internalAdapter.createSession(user.id);
      if (!session) throw ctx.error("UNAUTHORIZED");
      await setSessionCookie(ctx, { session, user });
      return { userId: user.id };
    }),
  },
});

/** Whatever way in was taken: a disabled person gets no session. */
async function refuseDisabled(session: { userId: string }) {
  if (!(await unsafeMaySignIn(session.userId))) throw new APIError("UNAUTHORIZED", { code: "DISABLED" });
}

function make() {
  return betterAuth({
    secret: env().AUTH_SECRET,
    baseURL: env().APP_URL,
    trustedOrigins: [env().APP_URL],
    database: drizzleAdapter(db(), { provider: "mysql", schema: { user: users, session: sessions, account: accounts, verification: verifications }, transaction: true }),
    user: { additionalFields: { siteAdmin: { type: "boolean", input: false, defaultValue: false }, disabledAt: { type: "date", input: false, required: false } } },
    emailAndPassword: {
      enabled: true,
      // Counts UTF-16 units; what a person may choose is decided in lib/viewer/password, by characters.
      minPasswordLength: 12,
      maxPasswordLength: 512,
      password: { hash: unsafeHashPassword, verify: ({ hash, password }) => unsafeVerifyPassword(hash, password) },
      requireEmailVerification: true,
      revokeSessionsOnPasswordReset: true,
      resetPasswordTokenExpiresIn: LINK_SECONDS,
      sendResetPassword: async ({ user, token }) => {
        await putMail(db(), { kind: "reset-password", to: user.email, payload: { name: user.name, url: link(routes.resetPassword(token)) }, dedupe: `reset:${sha256Hex(token)}` }, new Date());
      },
      onPasswordReset: async ({ user }) => {
        // The link came by mail and replaced whatever password was there, so the address is proven.
        await unsafeNoteProven(user.id);
        await putMail(db(), { kind: "password-changed", to: user.email, payload: { name: user.name }, dedupe: `password-changed:${user.id}:${Date.now()}` }, new Date());
      },
    },
    emailVerification: {
      expiresIn: VERIFY_SECONDS,
      autoSignInAfterVerification: true,
      sendOnSignUp: true,
      sendVerificationEmail: async ({ user, token }) => {
        await putMail(db(), { kind: "verify-address", to: user.email, payload: { name: user.name, url: link(routes.verifyAddress(token)) }, dedupe: `verify:${sha256Hex(token)}` }, new Date());
      },
    },
    // One-time values are looked up by their hash, so that a copy of the table opens nothing.
    verification: { storeIdentifier: "hashed" },
    // Moved on at most every quarter of an hour: the account page shows it as the last use.
    session: { expiresIn: 7 * DAY, updateAge: 900, freshAge: 900, cookieCache: { enabled: false } },
    databaseHooks: { session: { create: { before: refuseDisabled } } },
    // Refusals are told to the person; the library would write addresses into the log.
    logger: { level: "error" },
    advanced: {
      ipAddress: { ipAddressHeaders: [env().TRUSTED_PROXY_HEADER ?? []].flat(), disableIpTracking: !env().TRUSTED_PROXY_HEADER },
      useSecureCookies: false,
      cookiePrefix: "__Host-tow",
      defaultCookieAttributes: { secure: true, httpOnly: true, sameSite: "lax", path: "/" },
      cookies: { session_token: { name: "__Host-sid" } },
      database: { generateId: ({ model }) => newId(KIND_OF_MODEL[model] ?? "verification") },
    },
    // Our own limits stand before every call; see lib/viewer/limits.
    rateLimit: { enabled: false },
    telemetry: { enabled: false },
    plugins: [
      magicLink({
        expiresIn: LINK_SECONDS, storeToken: "hashed", disableSignUp: true,
        sendMagicLink: async ({ email, token }) => {
          await putMail(db(), { kind: "sign-in-link", to: email, payload: { url: link(routes.enter(token)) }, dedupe: `enter:${sha256Hex(token)}` }, new Date());
        },
      }),
      signInProven(),
      nextCookies(), // must stay last: it hands the cookies of all the others to Next
    ],
  });
}

let known: ReturnType<typeof make> | undefined;

/** The sign-in library, set up at first use so that a build needs no environment. Its calls run behind our own forms and doors. */
export const auth = () => (known ??= make());
