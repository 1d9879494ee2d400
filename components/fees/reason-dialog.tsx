"use client";

import { useState, type FormEvent, type ReactNode } from "react";
import { EMPTY_ENTERED_FOR, type EnteredForValue } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import type { ClerkStep } from "@/lib/fees/types";

export type ReasonDialogProps = {
  /** The words of the button that opens it. */
  opener: string;
  title: string;
  lead: ReactNode;
  /** Name and label of the one thing to be typed. */
  name: string;
  label: string;
  hint?: string;
  confirm: string;
  step: ClerkStep;
  carrierName: string;
  pending: boolean;
  error: unknown;
  onConfirm: (given: { text: string; enteredFor: EnteredForValue | null; key: string }, done: () => void) => void;
};

/** A clerk's step that needs one line of words, and for a carrier that is not on board, where it was heard. */
export function ReasonDialog({ opener, title, lead, name, label, hint, confirm, step, carrierName, pending, error, onConfirm }: ReasonDialogProps) {
  const [open, setOpen] = useState(false);
  const [text, setText] = useState("");
  const [entry, setEntry] = useState(EMPTY_ENTERED_FOR);
  const intent = useIntent();
  const faults = faultsOf(error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const enteredFor = step === "entered" ? entry : null;
    onConfirm({ text, enteredFor, key: intent.key({ text, enteredFor }) }, () => {
      intent.done();
      setOpen(false);
      setText("");
    });
  };
  return (
    <>
      <Button variant="ghost" onClick={() => setOpen(true)}>{opener}</Button>
      <Dialog open={open} onClose={() => setOpen(false)} title={title}>
        <form noValidate onSubmit={submit} className="grid gap-4">
          <FormErrors errors={faults.list} />
          <p className="text-14 text-ink-2">{lead}</p>
          <TextField name={name} label={label} hint={hint} required value={text} onChange={(event) => setText(event.target.value)} error={faults.field(name)} />
          {step === "entered" && <EnteredForFields value={entry} onChange={setEntry} errors={faults.field} carrierName={carrierName} />}
          <div className="flex flex-wrap gap-2.5">
            <Button type="submit" busy={pending}>{confirm}</Button>
            <Button variant="plain" onClick={() => setOpen(false)}>Not now</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}
