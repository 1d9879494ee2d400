"use client";

import { useQuery } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { TextField } from "@/components/ui/text-field";
import { accountOptions, renameMutation } from "@/lib/account/options";
import type { AccountView } from "@/lib/account/types";
import { PasswordPart } from "./password-part";
import { SessionsPart } from "./sessions-part";
import { useWrite } from "./use-write";

/** A person's own account: name, password, and where they are signed in. */
export function AccountBoard({ first }: { first: AccountView }) {
  const { data } = useQuery({ ...accountOptions(), initialData: first });
  return (
    <div className="grid gap-5">
      <NamePart name={data.name} email={data.email} />
      <PasswordPart hasPassword={data.hasPassword} />
      <SessionsPart sessions={data.sessions} />
    </div>
  );
}

function NamePart({ name, email }: { name: string; email: string }) {
  const [typed, setTyped] = useState(name);
  const rename = useWrite(renameMutation());
  const submit = (event: FormEvent) => {
    event.preventDefault();
    rename.send({ name: typed });
  };
  return (
    <Sheet title="Name and address">
      <form noValidate onSubmit={submit} className="grid max-w-[520px] gap-4">
        <FormErrors errors={rename.faults.list} />
        {rename.done && typed === name && <Notice kind="done" live="status">The name is changed. What you signed before keeps the name it was signed with.</Notice>}
        <TextField name="name" label="Your name" autoComplete="name" required value={typed} onChange={(event) => setTyped(event.target.value)} error={rename.faults.field("name")} />
        <TextField name="own-email" label="E-mail address" value={email} readOnly hint="It is how others invite you, and stays with this account. For another address, be invited there or sign up anew." />
        <div><Button type="submit" busy={rename.busy} aria-disabled={typed === name}>Save the name</Button></div>
      </form>
    </Sheet>
  );
}
