"use client";

import { useState, type FormEvent } from "react";
import { PasswordField } from "@/components/front/password-field";
import { Button } from "@/components/ui/button";
import { CheckField } from "@/components/ui/check-field";
import { FormErrors } from "@/components/ui/form-errors";
import { LinkButton, TextLink } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { changePasswordMutation } from "@/lib/account/options";
import { routes } from "@/lib/routes";
import { useWrite } from "./use-write";

const EMPTY = { currentPassword: "", newPassword: "", endOthers: true };

/** Changes the password, or says how to get a first one. */
export function PasswordPart({ hasPassword }: { hasPassword: boolean }) {
  if (!hasPassword) {
    return (
      <Sheet title="Password" lead="You have none: you came in by a mailed link, and can do so every time. With a password you can also sign in without the mail.">
        <LinkButton href={routes.forgotPassword()} variant="ghost">Have a link for a first password mailed</LinkButton>
      </Sheet>
    );
  }
  return <PasswordForm />;
}

function PasswordForm() {
  const [given, setGiven] = useState(EMPTY);
  const change = useWrite(changePasswordMutation());
  const submit = (event: FormEvent) => {
    event.preventDefault();
    change.send(given, () => setGiven(EMPTY));
  };
  return (
    <Sheet title="Password" lead={<>Forgotten it? <TextLink href={routes.forgotPassword()}>Have a link for a new one mailed</TextLink></>}>
      <form noValidate onSubmit={submit} className="grid max-w-[520px] gap-4">
        <FormErrors errors={change.faults.list} title="The password was not changed." />
        {change.done && given === EMPTY && <Notice kind="done" live="status">The password is changed. We have mailed you that it happened.</Notice>}
        <PasswordField name="currentPassword" label="Password now" autoComplete="current-password" required value={given.currentPassword} onChange={(currentPassword) => setGiven({ ...given, currentPassword })} error={change.faults.field("currentPassword")} />
        <PasswordField name="newPassword" label="New password" hint="At least 12 characters, any characters. Four unrelated words do well." autoComplete="new-password" required value={given.newPassword} onChange={(newPassword) => setGiven({ ...given, newPassword })} error={change.faults.field("newPassword")} />
        <CheckField name="endOthers" label="End my sessions on other devices" checked={given.endOthers} onChange={(event) => setGiven({ ...given, endOthers: event.target.checked })} />
        <div><Button type="submit" busy={change.busy}>Change the password</Button></div>
      </form>
    </Sheet>
  );
}
