import { z } from "zod";
import { emailOf, idOf, line } from "@/lib/access/input";

// Exactly as typed: nothing is trimmed or normalized. The cap only keeps a flood of text away from the hash.
const password = (missing: string) => z.string({ error: missing }).min(1, missing).max(1024, "At most 256 characters.");

export const signUpInput = z.strictObject({ name: line("Enter your name.", 120), email: emailOf, password: password("Choose a password.") });
export type SignUp = z.output<typeof signUpInput>;

const next = z.string().max(2000).optional();

export const signInInput = z.strictObject({ email: emailOf, password: password("Enter your password."), next });
export type SignIn = z.output<typeof signInInput>;

/** Asks for something to be mailed to an address. */
export const mailMeInput = z.strictObject({ email: emailOf });
export type MailMe = z.output<typeof mailMeInput>;

/** The token of a mailed link; its form is the sign-in library's. */
const token = z.string({ error: "The link is not whole." }).min(8, "The link is not whole.").max(1500, "The link is not whole.");
export const tokenInput = z.strictObject({ token });

export const resetPasswordInput = z.strictObject({ token, password: password("Choose a password.") });
export type ResetPassword = z.output<typeof resetPasswordInput>;

export const nothingInput = z.strictObject({});

export const renameInput = z.strictObject({ name: line("Enter your name.", 120) });
export type Rename = z.output<typeof renameInput>;

export const changePasswordInput = z.strictObject({
  currentPassword: password("Enter the password that you have now."),
  newPassword: password("Choose a new password."),
  endOthers: z.boolean().default(true),
});
export type ChangePassword = z.output<typeof changePasswordInput>;

export const endSessionInput = z.strictObject({ sessionId: idOf });
export type EndSession = z.output<typeof endSessionInput>;
