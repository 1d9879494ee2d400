"use client";

import { useMutation } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { TextField } from "@/components/ui/text-field";
import { withdrawAcceptanceMutation } from "@/lib/acceptance/options";
import type { AcceptanceLeg } from "@/lib/acceptance/types";
import { faultsOf } from "@/lib/entry/fetcher";

export type WithdrawDialogProps = { moveId: string; leg: AcceptanceLeg; acceptanceId: string; open: boolean; onClose: () => void };

/** Takes an acceptance back, with the reason that everybody will read. */
export function WithdrawDialog({ moveId, leg, acceptanceId, open, onClose }: WithdrawDialogProps) {
  const [why, setWhy] = useState("");
  const [enteredFor, setEnteredFor] = useState(EMPTY_ENTERED_FOR);
  const intent = useIntent();
  const withdraw = useMutation(withdrawAcceptanceMutation(moveId, acceptanceId));
  const faults = faultsOf(withdraw.error);
  const entering = leg.mayWithdraw === "enter";
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const body = { why, enteredFor: entering ? enteredFor : null };
    withdraw.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); onClose(); } });
  };
  return (
    <Dialog open={open} onClose={onClose} title={`Withdraw the acceptance by ${leg.carrierName}`}>
      <form noValidate onSubmit={submit} className="grid gap-4">
        <FormErrors errors={faults.list} title="Not withdrawn." />
        <p>It stays on record as signed and withdrawn. The unit can’t be taken over on this leg until another stands.</p>
        {entering && <EnteredForFields value={enteredFor} onChange={setEnteredFor} errors={faults.field} carrierName={leg.carrierName} />}
        <TextField name="why" label="Why" required value={why} onChange={(event) => setWhy(event.target.value)} error={faults.field("why")} autoComplete="off" />
        <div className="grid gap-2.5 sm:flex sm:justify-end">
          <Button variant="ghost" onClick={onClose}>Keep it</Button>
          <Button type="submit" busy={withdraw.isPending} busyWords="Withdrawing…">Withdraw it</Button>
        </div>
      </form>
    </Dialog>
  );
}
