"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { retractSightingMutation } from "@/lib/movement/options";
import type { MovementLeg } from "@/lib/movement/types";
import { focusOpened } from "./open-form";

/** Takes a sighting back; it stays on record, struck through, with the reason. */
export function RetractForm({ moveId, leg, sightingId, onDone }: { moveId: string; leg: MovementLeg; sightingId: string; onDone: () => void }) {
  const [why, setWhy] = useState("");
  const [heard, setHeard] = useState(EMPTY_ENTERED_FOR);
  const intent = useIntent();
  const retract = useMutation(retractSightingMutation(moveId));
  const faults = faultsOf(retract.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { why, enteredFor: leg.may.enterFor ? heard : null };
    retract.mutate({ sightingId, key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form ref={focusOpened} tabIndex={-1} noValidate onSubmit={submit} className="outline-none my-3 grid grid-cols-[minmax(0,1fr)] gap-3 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title="Not taken back." />
      <TextField name="why" label="Why it is taken back" hint="It stays readable, struck through, with this reason." required value={why} onChange={(event) => setWhy(event.target.value)} error={faults.field("why")} />
      {leg.may.enterFor && <EnteredForFields value={heard} onChange={setHeard} errors={faults.field} carrierName={leg.carrierName} />}
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={retract.isPending}>
          Take it back
        </Button>
        <Button variant="ghost" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
