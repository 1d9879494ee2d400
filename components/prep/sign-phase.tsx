"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { signPhaseMutation } from "@/lib/prep/options";
import type { PrepPhaseView } from "@/lib/prep/types";

const STATEMENT = {
  "where-it-stands": "I sign that every item of this phase is done or does not apply, that the hand brake is applied and proven to hold, and that the wheels are chocked.",
  "when-coupled": "I sign that every item of this phase is done or does not apply, with the carrier’s engine coupled, at its instruction and under its protection.",
} as const;

/** The contractor’s name under a phase; says what is left while it can't be signed. */
export function SignPhase({ moveId, phase }: { moveId: string; phase: PrepPhaseView }) {
  const [name, setName] = useState("");
  const intent = useIntent();
  const sign = useMutation(signPhaseMutation(moveId));
  const faults = faultsOf(sign.error);
  if (phase.signature) return null;
  if (phase.left > 0) return <p className="text-14 text-ink-2">This phase is signed when the last {phase.left === 1 ? "item is" : `${phase.left} items are`} done or marked as not applying.</p>;
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { phase: phase.phase, name, rowsHash: phase.rowsHash };
    sign.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); setName(""); } });
  };
  return (
    <form noValidate onSubmit={submit} className="grid max-w-[60ch] gap-3 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title="Not signed." />
      <p className="text-15">{STATEMENT[phase.phase]}</p>
      <TextField name="name" id={`sign-${phase.phase}`} label="Your name" required autoComplete="name" value={name} onChange={(event) => setName(event.target.value)} error={faults.field("name")} />
      <div><Button type="submit" size="large" busy={sign.isPending} busyWords="Signing…">Sign this phase</Button></div>
    </form>
  );
}
