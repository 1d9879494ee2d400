"use client";

import { TextField } from "@/components/ui/text-field";
import { FormShell, type FormAction } from "./form-shell";
import { SubmitButton } from "./submit-button";

type JoinFormProps = { action: FormAction; token: string; once: string; askName: boolean; unit: string };

/** The one button of a letter of invitation; asks for the name where nobody has given it. */
export function JoinForm({ action, token, once, askName, unit }: JoinFormProps) {
  return (
    <FormShell action={action} title="Not joined." fieldNames={["name"]}>
      {({ error, typed }) => (
        <>
          <input type="hidden" name="token" value={token} />
          <input type="hidden" name="once" value={once} />
          {askName && <TextField name="name" label="Your name" hint="As it stands under what you sign." autoComplete="name" required defaultValue={typed("name")} error={error("name")} />}
          <SubmitButton size="large">{unit ? "Join the move" : "Join"}</SubmitButton>
          <p className="text-14 text-ink-2">Pressing it shows us that the address is yours and signs you in on this device for a week. You need no password; you can set one later under Account.</p>
        </>
      )}
    </FormShell>
  );
}
