"use client";

import { TextField } from "@/components/ui/text-field";
import { FormShell, type FormAction } from "./form-shell";
import { PasswordField } from "./password-field";
import { SubmitButton } from "./submit-button";

type FormProps = { action: FormAction };

const email = { name: "email", label: "E-mail address", type: "email", autoComplete: "email", inputMode: "email", autoCapitalize: "none", required: true } as const;

/** Signs in by password. */
export function SignInForm({ action, next, email: known = "" }: FormProps & { next: string; email?: string }) {
  return (
    <FormShell action={action} title="Not signed in." fieldNames={["email", "password"]}>
      {({ error, typed }) => (
        <>
          <TextField {...email} autoComplete="username" defaultValue={typed("email") || known} error={error("email")} />
          <PasswordField name="password" label="Password" autoComplete="current-password" required error={error("password")} />
          <input type="hidden" name="next" value={next} />
          <SubmitButton size="large">Sign in</SubmitButton>
        </>
      )}
    </FormShell>
  );
}

/** Makes an account. */
export function SignUpForm({ action }: FormProps) {
  return (
    <FormShell action={action} title="No account was made." fieldNames={["name", "email", "password"]}>
      {({ error, typed }) => (
        <>
          <TextField name="name" label="Your name" hint="As it stands under what you sign." autoComplete="name" required defaultValue={typed("name")} error={error("name")} />
          <TextField {...email} hint="We mail a link there, to see that it is yours." defaultValue={typed("email")} error={error("email")} />
          <PasswordField name="password" label="Password" hint="At least 12 characters, any characters. Four unrelated words do well." autoComplete="new-password" required error={error("password")} />
          <SubmitButton size="large">Make an account</SubmitButton>
        </>
      )}
    </FormShell>
  );
}

/** Asks for something to be mailed to an address. */
export function MailMeForm({ action, label, email: known = "" }: FormProps & { label: string; email?: string }) {
  return (
    <FormShell action={action} title="No mail was sent." fieldNames={["email"]}>
      {({ error, typed }) => (
        <>
          <TextField {...email} defaultValue={typed("email") || known} error={error("email")} />
          <SubmitButton size="large">{label}</SubmitButton>
        </>
      )}
    </FormShell>
  );
}

/** The one button of a mailed link; opening the page alone does nothing, since mail scanners open every link. */
export function TokenForm({ action, token, label }: FormProps & { token: string; label: string }) {
  return (
    <FormShell action={action} fieldNames={[]}>
      {() => (
        <>
          <input type="hidden" name="token" value={token} />
          <SubmitButton size="large">{label}</SubmitButton>
        </>
      )}
    </FormShell>
  );
}

/** Sets a new password by a mailed link. */
export function ResetForm({ action, token }: FormProps & { token: string }) {
  return (
    <FormShell action={action} title="The password was not changed." fieldNames={["password"]}>
      {({ error }) => (
        <>
          <input type="hidden" name="token" value={token} />
          <PasswordField name="password" label="New password" hint="At least 12 characters, any characters. Four unrelated words do well." autoComplete="new-password" required error={error("password")} />
          <SubmitButton size="large">Set the password</SubmitButton>
        </>
      )}
    </FormShell>
  );
}
