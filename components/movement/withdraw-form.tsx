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
import { withdrawInstructionMutation } from "@/lib/movement/options";
import type { MovementLeg } from "@/lib/movement/types";
import { focusOpened } from "./open-form";

/** Takes an instruction back, with the reason; everybody on the move sees it. */
export function WithdrawForm({ moveId, leg, instructionId, onDone }: { moveId: string; leg: MovementLeg; instructionId: string; onDone: () => void }) {
  const [why, setWhy] = useState("");
  const [heard, setHeard] = useState(EMPTY_ENTERED_FOR);
  const intent = useIntent();
  const withdraw = useMutation(withdrawInstructionMutation(moveId));
  const faults = faultsOf(withdraw.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { why, enteredFor: leg.may.enterFor ? heard : null };
    withdraw.mutate({ instructionId, key: intent.key(body), body }, { onSuccess: () => { intent.done(); onDone(); } });
  };
  return (
    <form ref={focusOpened} tabIndex={-1} noValidate onSubmit={submit} className="outline-none mt-3 grid grid-cols-[minmax(0,1fr)] gap-3 border-t-2 border-ink pt-4">
      <FormErrors errors={faults.list} title="Not withdrawn." />
      <TextField name="why" label="Why it is withdrawn" required value={why} onChange={(event) => setWhy(event.target.value)} error={faults.field("why")} />
      {leg.may.enterFor && <EnteredForFields value={heard} onChange={setHeard} errors={faults.field} carrierName={leg.carrierName} />}
      <div className="grid gap-2.5 sm:flex">
        <Button type="submit" busy={withdraw.isPending}>
          Withdraw the instruction
        </Button>
        <Button variant="ghost" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}
