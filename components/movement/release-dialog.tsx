"use client";

import { useMutation } from "@tanstack/react-query";
import { useId, useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { Notice } from "@/components/ui/notice";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { releaseUnitMutation } from "@/lib/movement/options";
import { releaseStatement } from "@/lib/movement/rules";
import type { MovementLeg } from "@/lib/movement/types";

type Props = { moveId: string; unit: string; leg: MovementLeg; open: boolean; onClose: () => void };

/** The owner's signature under the tender: what it means, what it does not, and what still happens at pickup. */
export function ReleaseDialog({ moveId, unit, leg, open, onClose }: Props) {
  const [given, setGiven] = useState({ name: "", note: "" });
  const form = useId();
  const intent = useIntent();
  const release = useMutation(releaseUnitMutation(moveId));
  const faults = faultsOf(release.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    release.mutate({ key: intent.key(given), body: given }, { onSuccess: () => { intent.done(); onClose(); } });
  };
  const actions = (
    <>
      <Button variant="ghost" onClick={onClose}>
        Not yet
      </Button>
      <Button type="submit" form={form} busy={release.isPending} busyWords="Signing…">
        Sign and release
      </Button>
    </>
  );
  return (
    <Dialog open={open} onClose={onClose} title="Release the unit" actions={actions}>
      <form id={form} noValidate onSubmit={submit} className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <FormErrors errors={faults.list} title="Not released." />
        <p className="text-15">{releaseStatement(unit, leg.carrierName)}</p>
        <ul className="list-disc pl-5 text-14">
          <li>Releasing is the owner’s tender. It is not the acceptance, and it moves nothing by itself: {leg.carrierName} pulls the unit under its own rules.</li>
          <li>When the carrier’s engine is coupled, the last prep items are done and signed. Only then can the unit be recorded as pulled.</li>
        </ul>
        <Notice title="Until the carrier’s engine is coupled">The hand brake stays applied and the wheels stay chocked. An uncoupled unit without air is held by nothing else.</Notice>
        <TextArea name="note" label="Note to the carrier" hint="Gate, key, who meets the crew." rows={2} value={given.note} onChange={(event) => setGiven({ ...given, note: event.target.value })} error={faults.field("note")} />
        <TextField name="name" label="Your name" required autoComplete="name" value={given.name} onChange={(event) => setGiven({ ...given, name: event.target.value })} error={faults.field("name")} />
      </form>
    </Dialog>
  );
}
