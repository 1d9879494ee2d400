"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { Button } from "@/components/ui/button";
import { DateField } from "@/components/ui/date-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { giveInstructionMutation } from "@/lib/movement/options";
import type { MovementLeg } from "@/lib/movement/types";
import { focusOpened } from "./open-form";

/** The desk's form; for a carrier that is not on board, with how its word came in. */
export function InstructionForm({ moveId, leg, onDone }: { moveId: string; leg: MovementLeg; onDone: () => void }) {
  const before = leg.instruction;
  const [given, setGiven] = useState({ billNumber: before?.billNumber ?? "", clearanceNumber: before?.clearanceNumber ?? "", train: before?.train ?? "", pickupFrom: before?.pickupFrom ?? "", text: before?.text ?? "" });
  const [heard, setHeard] = useState(EMPTY_ENTERED_FOR);
  const intent = useIntent();
  const give = useMutation(giveInstructionMutation(moveId));
  const faults = faultsOf(give.error);
  const type = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { legId: leg.legId, ...given, enteredFor: leg.may.enterFor ? heard : null };
    give.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form ref={focusOpened} tabIndex={-1} noValidate onSubmit={submit} className="outline-none mt-3 grid grid-cols-[minmax(0,1fr)] gap-3 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title="The instruction was not given." />
      <div className="grid gap-3 sm:grid-cols-2">
        <TextField {...type("billNumber")} label="Bill-of-lading number" required mono autoComplete="off" />
        <TextField {...type("clearanceNumber")} label="Clearance number" hint="Where the carrier asks for one." mono autoComplete="off" />
        <TextField {...type("train")} label="Train" autoComplete="off" />
        <DateField {...type("pickupFrom")} label="Pickup from" />
      </div>
      <TextArea {...type("text")} label="Instruction" hint="Where in the train, speed, who rides along: what the crew must know." rows={3} />
      {leg.may.enterFor && <EnteredForFields value={heard} onChange={setHeard} errors={faults.field} carrierName={leg.carrierName} />}
      {before && <p className="text-14 text-ink-2">The instruction that stands now is withdrawn by this one.</p>}
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={give.isPending}>
          {leg.may.enterFor ? "Enter the instruction" : "Give the instruction"}
        </Button>
        <Button variant="ghost" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
