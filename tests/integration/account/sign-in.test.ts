import { eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { outbox, sessions, users, verifications } from "@/db/schema";
import { unsafeEnter, unsafeMailReset, unsafeMailSignInLink, unsafeResetPassword, unsafeSignIn, unsafeSignUp, unsafeVerifyAddress, type Caller } from "@/lib/account/commands/sign-in";
import { changePassword, endSession } from "@/lib/account/commands/own";
import { getAccount } from "@/lib/account/queries";
import { auth } from "@/lib/auth";
import { unseal } from "@/lib/outbox/seal";
import { unsafeHashPassword, unsafeVerifyPassword } from "@/lib/viewer/commands";
import { unsafeViewerOf } from "@/lib/viewer/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedUser } from "../../support/factories";

withDatabase();

const PASSWORD = "gravel lantern teaspoon";
const anAddress = () => `person.${crypto.randomUUID().slice(0, 8)}@example.test`;
const caller = (address = crypto.randomUUID()): Caller => ({ address, headers: new Headers({ "user-agent": "Mozilla/5.0 (X11; Linux x86_64) Firefox/130.0" }) });

/** Letters to an address, newest last, with what they say. */
async function mailTo(email: string) {
  const rows = await db().select().from(outbox).where(eq(outbox.toAddress, email)).orderBy(outbox.createdAt);
  return rows.map((row) => ({ kind: row.kind, ...(JSON.parse(unseal(row.payload)) as { url?: string }) }));
}
const tokenIn = (url = "") => url.split("/").at(-1) ?? "";
const personOf = async (email: string) => (await db().select().from(users).where(eq(users.email, email)))[0];
const sessionsOf = async (email: string) => db().select().from(sessions).where(eq(sessions.userId, (await personOf(email))?.id ?? ""));

async function signedUp(email = anAddress()) {
  await unsafeSignUp({ name: "Wren Halloway", email, password: PASSWORD }, caller());
  const [letter] = await mailTo(email);
  await unsafeVerifyAddress(tokenIn(letter?.url), caller());
  return email;
}

it("opens an account only after the mailed button was pressed", async () => {
  const email = anAddress();
  await unsafeSignUp({ name: "Wren Halloway", email, password: PASSWORD }, caller());
  expect(await unsafeSignIn({ email, password: PASSWORD }, caller(), null)).toBe("check-mail");
  expect(await sessionsOf(email)).toHaveLength(0);
  const [letter] = await mailTo(email);
  expect(letter?.kind).toBe("verify-address");
  expect(await unsafeVerifyAddress(tokenIn(letter?.url), caller())).toBe(true);
  expect(await unsafeVerifyAddress(tokenIn(letter?.url), caller())).toBe(false);
  expect(await unsafeSignIn({ email, password: PASSWORD }, caller(), null)).toBe("signed-in");
  expect(await sessionsOf(email)).toHaveLength(2);
});

it("takes the password exactly as typed", async () => {
  const email = anAddress();
  const typed = `  Päss ${"wide of the mark ".repeat(6)} `;
  await unsafeSignUp({ name: "Wren Halloway", email, password: typed }, caller());
  await unsafeVerifyAddress(tokenIn((await mailTo(email))[0]?.url), caller());
  for (const other of [typed.trim(), typed.toLowerCase(), typed.slice(0, 72), typed.normalize("NFD")]) await expect(unsafeSignIn({ email, password: other }, caller(), null)).rejects.toMatchObject({ code: "bad_input" });
  expect(await unsafeSignIn({ email, password: typed }, caller(), null)).toBe("signed-in");
});

it("keeps passwords under scrypt with its parameters", async () => {
  const [one, two] = [await unsafeHashPassword("the same words"), await unsafeHashPassword("the same words")];
  expect(one).toMatch(/^scrypt\$16\$8\$1\$/);
  expect(one).not.toBe(two);
  expect(await unsafeVerifyPassword("plain", "plain")).toBe(false);
});

it("refuses a common password with the field named", async () => {
  const email = anAddress();
  await expect(unsafeSignUp({ name: "Wren Halloway", email, password: "Password2026!" }, caller())).rejects.toMatchObject({ code: "bad_input", fields: { password: [expect.stringContaining("tried first")] } });
  expect(await personOf(email)).toBeUndefined();
});

it("gives a known address no second account, and mails its owner a way in", async () => {
  const email = await signedUp();
  const before = await personOf(email);
  await unsafeSignUp({ name: "Somebody Else", email, password: "another lantern teaspoon" }, caller());
  expect(await personOf(email)).toEqual(before);
  expect((await mailTo(email)).map((letter) => letter.kind)).toEqual(["verify-address", "sign-in-link"]);
  expect(await unsafeSignIn({ email, password: PASSWORD }, caller(), null)).toBe("signed-in");
});

it("drops a password that somebody else set before the address was proven", async () => {
  const email = anAddress();
  await unsafeSignUp({ name: "Not The Owner", email, password: "squatter lantern teaspoon" }, caller());
  await unsafeSignUp({ name: "Wren Halloway", email, password: PASSWORD }, caller());
  await unsafeEnter(tokenIn((await mailTo(email)).find((letter) => letter.kind === "sign-in-link")?.url), caller(), null);
  await expect(unsafeSignIn({ email, password: "squatter lantern teaspoon" }, caller(), null)).rejects.toMatchObject({ code: "bad_input" });
});

it("lets exactly five of twenty parallel wrong tries through, whatever network they come from", async () => {
  const email = await signedUp();
  const tries = await Promise.allSettled(Array.from({ length: 20 }, () => unsafeSignIn({ email, password: "wrong lantern teaspoon" }, caller(), null)));
  const codes = tries.map((one) => (one.status === "rejected" ? (one.reason as { code: string }).code : "in"));
  expect(codes.filter((code) => code === "bad_input")).toHaveLength(5);
  expect(codes.filter((code) => code === "too_many")).toHaveLength(15);
});

it("answers an unknown address like a wrong password", async () => {
  const email = await signedUp();
  const [wrong, unknown] = await Promise.all([email, anAddress()].map((who) => unsafeSignIn({ email: who, password: "wrong lantern teaspoon" }, caller(), null).catch((error: Error) => error)));
  expect(wrong).toMatchObject({ message: (unknown as Error).message, code: "bad_input" });
});

it("ends the session that the browser had before", async () => {
  const email = await signedUp();
  const [first] = await sessionsOf(email);
  await unsafeSignIn({ email, password: PASSWORD }, caller(), first?.id ?? null);
  const left = await sessionsOf(email);
  expect(left).toHaveLength(1);
  expect(left[0]?.token).not.toBe(first?.token);
});

it("lets a mailed link in once out of ten, and mails nothing to an unknown address", async () => {
  const email = await signedUp();
  const unknown = anAddress();
  await unsafeMailSignInLink({ email: unknown }, caller());
  expect(await mailTo(unknown)).toEqual([]);
  await unsafeMailSignInLink({ email }, caller());
  const token = tokenIn((await mailTo(email)).at(-1)?.url);
  const before = (await sessionsOf(email)).length;
  const tries = await Promise.allSettled(Array.from({ length: 10 }, () => unsafeEnter(token, caller(), null)));
  expect(tries.filter((one) => one.status === "fulfilled")).toHaveLength(1);
  expect(await sessionsOf(email)).toHaveLength(before + 1);
});

it("stores no one-time token in clear", async () => {
  const email = await signedUp();
  await unsafeMailSignInLink({ email }, caller());
  await unsafeMailReset({ email });
  const tokens = (await mailTo(email)).slice(-2).map((letter) => tokenIn(letter.url));
  const kept = JSON.stringify(await db().select().from(verifications));
  for (const token of tokens) expect(kept).not.toContain(token);
});

it("refuses a link after ten minutes", async () => {
  const email = await signedUp();
  await unsafeMailSignInLink({ email }, caller());
  const token = tokenIn((await mailTo(email)).at(-1)?.url);
  await db().update(verifications).set({ expiresAt: new Date(Date.now() - 1000) }).where(eq(verifications.identifier, verifications.identifier));
  await expect(unsafeEnter(token, caller(), null)).rejects.toMatchObject({ code: "gone" });
});

it("sets a new password by a mailed link once, and ends every session", async () => {
  const email = await signedUp();
  await unsafeMailReset({ email });
  const token = tokenIn((await mailTo(email)).at(-1)?.url);
  await expect(unsafeResetPassword({ token, password: "Halloway2026!" }, caller())).rejects.toMatchObject({ code: "bad_input" });
  await unsafeResetPassword({ token, password: "pebble orchard canister" }, caller());
  expect(await sessionsOf(email)).toHaveLength(0);
  await expect(unsafeResetPassword({ token, password: "another orchard canister" }, caller())).rejects.toMatchObject({ code: "gone" });
  expect((await mailTo(email)).at(-1)?.kind).toBe("password-changed");
  expect(await unsafeSignIn({ email, password: "pebble orchard canister" }, caller(), null)).toBe("signed-in");
});

it("keeps a disabled person out whatever way they take, with the same answers", async () => {
  const email = await signedUp();
  await unsafeMailSignInLink({ email }, caller());
  const token = tokenIn((await mailTo(email)).at(-1)?.url);
  await db().update(users).set({ disabledAt: new Date() }).where(eq(users.email, email));
  await expect(unsafeSignIn({ email, password: PASSWORD }, caller(), null)).rejects.toMatchObject({ code: "bad_input" });
  await expect(unsafeEnter(token, caller(), null)).rejects.toMatchObject({ code: "gone" });
  await unsafeMailSignInLink({ email }, caller());
  await unsafeMailReset({ email });
  expect((await mailTo(email)).filter((letter) => letter.kind !== "verify-address")).toHaveLength(1);
});

it("changes a password only with the one that stands, and ends the other sessions", async () => {
  const email = await signedUp();
  await unsafeSignIn({ email, password: PASSWORD }, caller(), null);
  const [mine] = await sessionsOf(email);
  const viewer = await unsafeViewerOf((await personOf(email))?.id ?? "", mine?.id ?? null);
  if (!viewer) throw new Error("nobody");
  const input = { currentPassword: PASSWORD, newPassword: "pebble orchard canister", endOthers: true };
  await expect(changePassword(viewer, { ...input, currentPassword: "wrong lantern teaspoon" }, anAttempt(), new Headers())).rejects.toMatchObject({ fields: { currentPassword: [expect.any(String)] } });
  await expect(changePassword(viewer, { ...input, newPassword: "Password2026!" }, anAttempt(), new Headers())).rejects.toMatchObject({ fields: { newPassword: [expect.any(String)] } });
  const attempt = anAttempt();
  await changePassword(viewer, input, attempt, new Headers());
  await changePassword(viewer, input, attempt, new Headers());
  const left = await sessionsOf(email);
  expect(left).toHaveLength(1);
  expect(left[0]?.id).not.toBe(mine?.id);
  expect((await mailTo(email)).filter((letter) => letter.kind === "password-changed")).toHaveLength(1);
  expect(await unsafeSignIn({ email, password: "pebble orchard canister" }, caller(), null)).toBe("signed-in");
});

it("lists a person's own sessions and ends only those", async () => {
  const email = await signedUp();
  const [mine] = await sessionsOf(email);
  const viewer = await unsafeViewerOf((await personOf(email))?.id ?? "", mine?.id ?? null);
  const other = await unsafeViewerOf(await seedUser("Somebody Else"), null);
  if (!viewer || !other || !mine) throw new Error("nobody");
  expect((await getAccount(viewer)).sessions).toMatchObject([{ sessionId: mine.id, device: "Firefox on Linux", current: true }]);
  await expect(endSession(other, { sessionId: mine.id }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  await endSession(viewer, { sessionId: mine.id }, anAttempt());
  expect(await sessionsOf(email)).toHaveLength(0);
});

it("hands out a cookie that only the server reads", async () => {
  const email = await signedUp();
  const { headers } = await auth().api.signInEmail({ body: { email, password: PASSWORD }, headers: new Headers(), returnHeaders: true });
  const [cookie] = headers.getSetCookie();
  expect(cookie).toMatch(/^__Host-sid=[^;]{40,}; Max-Age=604800; Path=\/; HttpOnly; Secure; SameSite=Lax$/);
});
