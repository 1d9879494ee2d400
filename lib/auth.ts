import "server-only";
import { betterAuth } from "better-auth";
import { drizzleAdapter } from "better-auth/adapters/drizzle";
import { createAuthEndpoint } from "better-auth/api";
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
      if (!session) throw ctx.error("INTERNAL_SERVER_ERROR");
      await setSessionCookie(ctx, { session, user });
      return { userId: user.id };
    }),
  },
});

function make() {
  return betterAuth({
    secret: env().AUTH_SECRET,
    baseURL: env().APP_URL,
    trustedOrigins: [env().APP_URL],
    database: drizzleAdapter(db(), { provider: "mysql", schema: { user: users, session: sessions, account: accounts, verification: verifications }, transaction: true }),
    user: { additionalFields: { siteAdmin: { type: "boolean", input: false, defaultValue: false }, disabledAt: { type: "date", input: false, required: false } } },
    emailAndPassword: {
      enabled: true,
      minPasswordLength: 12,
      maxPasswordLength: 256,
      requireEmailVerification: true,
      revokeSessionsOnPasswordReset: true,
      resetPasswordTokenExpiresIn: LINK_SECONDS,
      sendResetPassword: async ({ user, token }) => {
        await putMail(db(), { kind: "reset-password", to: user.email, payload: { name: user.name, url: link(routes.resetPassword(token)) }, dedupe: `reset:${sha256Hex(token)}` }, new Date());
      },
      onPasswordReset: async ({ user }) => {
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
    session: { expiresIn: 7 * DAY, updateAge: DAY, freshAge: 900, cookieCache: { enabled: false } },
    advanced: {
      useSecureCookies: false,
      cookiePrefix: "__Host-tow",
      defaultCookieAttributes: { secure: true, httpOnly: true, sameSite: "lax", path: "/" },
      cookies: { session_token: { name: "__Host-sid" } },
      database: { generateId: ({ model }) => newId(KIND_OF_MODEL[model] ?? "verification") },
    },
    // Our own limits stand before every call; see lib/viewer/limit.
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
