"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { prepItemMutation } from "@/lib/prep/options";
import type { PrepItem } from "@/lib/prep/types";

/** Opens an item again, with the reason; a signature over its phase is lifted by it. */
export function ReopenForm({ moveId, item, onDone }: { moveId: string; item: PrepItem; onDone: () => void }) {
  const [asked, setAsked] = useState(false);
  const [why, setWhy] = useState("");
  const intent = useIntent();
  const reopen = useMutation(prepItemMutation(moveId));
  const faults = faultsOf(reopen.error);
  if (!asked) return <div><Button variant="ghost" onClick={() => setAsked(true)}>Open it again…</Button></div>;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { version: item.version, why };
    void reopen.mutateAsync({ itemId: item.id, act: "reopen", key: intent.key(body), body }).then(() => { intent.done(); onDone(); }, () => undefined);
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-3">
      <FormErrors errors={faults.list} />
      <TextField name="why" id={`reopen-${item.id}`} label="Why it is opened again" hint="A signature over this phase no longer stands afterwards; everybody sees why." required value={why} onChange={(event) => setWhy(event.target.value)} error={faults.field("why")} />
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={reopen.isPending}>Open it again</Button>
        <Button variant="ghost" onClick={() => setAsked(false)}>Leave it</Button>
      </div>
    </form>
  );
}
