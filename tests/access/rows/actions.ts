/** What proves who is there before a server action does anything. Actions are kept to forms that must work without script. */
type Proof = { proof: string };

/** Every function that a browser may call without a door, such as `signIn of /sign-in`. All ask for our origin first (tests/e2e/doors.spec.ts). */
export const ACTIONS_TABLE: Readonly<Record<string, Proof>> = {
  "signIn of /sign-in": { proof: "password, counted per account and address" },
  "mailSignInLink of /sign-in": { proof: "none; tells nothing, counted per account and address" },
  "signUp of /sign-up": { proof: "none; tells nothing, the address is mailed" },
  "mailReset of /forgot-password": { proof: "none; tells nothing, counted per account and address" },
  "mailAgain of /check-mail": { proof: "none; tells nothing, counted per account and address" },
  "enter of /enter/[token]": { proof: "one-time token" },
  "verifyAddress of /verify/[token]": { proof: "one-time token" },
  "resetPassword of /reset/[token]": { proof: "one-time token" },
  "signOut of /": { proof: "the session that it ends" },
  "signOutTo of /": { proof: "the session that it ends" },
  "join of /join/[token]": { proof: "letter of invitation" },
};
