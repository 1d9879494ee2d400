"use client";

import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/text-field";
import { CallError } from "@/lib/entry/fetcher";
import { type PayerChoice } from "@/lib/moves/draft";
import { caseOptions, editLegMutation, moveKeys } from "@/lib/moves/options";
import type { CaseLeg } from "@/lib/moves/types";
import { PayerFields } from "../payer-fields";
import { useAttemptKey } from "../use-attempt-key";
import { ZoneField } from "../zone-field";
import { fieldErrorOf, SaveState } from "./save-state";

type LegValues = { carrierName: string; carrierMark: string; miles: string; toPlace: string; toZone: string; payer: PayerChoice; payerName: string };

const valuesOf = (leg: CaseLeg, ownerName: string): LegValues => ({
  carrierName: leg.carrierName, carrierMark: leg.carrierMark ?? "", miles: leg.miles === null ? "" : String(leg.miles), toPlace: leg.toPlace, toZone: leg.toZone,
  payer: leg.payerName === null ? "unnamed" : leg.payerName === ownerName ? "ours" : "other",
  payerName: leg.payerName ?? "",
});

type LegFormProps = { moveId: string; leg: CaseLeg; last: boolean; ownerName: string; onDone: () => void };

/** What the owner changes of a leg. */
export function LegForm({ moveId, leg: current, last, ownerName, onDone }: LegFormProps) {
  const client = useQueryClient();
  // As it was when the form was opened; the case goes on being read behind it, and a change there must not pass for seen.
  const [leg, setLeg] = useState(current);
  const [touched, setTouched] = useState<Partial<LegValues>>({});
  const [key, renewKey] = useAttemptKey();
  const save = useMutation({
    ...editLegMutation(moveId, leg.legId),
    onSuccess: async () => {
      renewKey();
      await client.invalidateQueries({ queryKey: moveKeys.case(moveId) });
      onDone();
    },
    onError: async (error) => {
      renewKey();
      if (!(error instanceof CallError) || error.status !== 409) return;
      const file = await client.fetchQuery({ ...caseOptions(moveId), staleTime: 0 });
      setLeg(file.legs.find((one) => one.legId === leg.legId) ?? leg);
    },
  });
  const values = { ...valuesOf(leg, ownerName), ...touched };
  const set = (patch: Partial<LegValues>) => setTouched({ ...touched, ...patch });
  const errorOf = fieldErrorOf(save.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (!save.isPending) save.mutate({ input: { ...values, version: leg.version }, key });
  };
  const own = (name: string) => ({ id: `${leg.legId}-${name}`, name });
  return (
    <form noValidate onSubmit={submit} className="mt-3 grid gap-5 sm:grid-cols-2 sm:items-start">
      <div className="sm:col-span-2">
        <SaveState error={save.error} saved={false} linked={false} />
      </div>
      <TextField {...own("carrierName")} label="Carrier" hint={leg.carrierFixedBecause ?? "Another one than before has to be invited anew, or entered for."} required readOnly={leg.carrierFixedBecause !== null} autoComplete="off" value={values.carrierName} onChange={(event) => set({ carrierName: event.target.value })} error={errorOf("carrierName")} />
      <div className="grid grid-cols-2 gap-5">
        <TextField {...own("carrierMark")} label="Its code" hint="Up to four letters." mono readOnly={leg.fixedBecause !== null} maxLength={4} autoComplete="off" value={values.carrierMark} onChange={(event) => set({ carrierMark: event.target.value })} error={errorOf("carrierMark")} />
        <TextField {...own("miles")} label="Miles" hint="As far as known." mono readOnly={leg.fixedBecause !== null} inputMode="numeric" autoComplete="off" value={values.miles} onChange={(event) => set({ miles: event.target.value })} error={errorOf("miles")} />
      </div>
      {!last && <TextField {...own("toPlace")} label="Interchange with the next carrier" required readOnly={leg.fixedBecause !== null} autoComplete="off" value={values.toPlace} onChange={(event) => set({ toPlace: event.target.value })} error={errorOf("toPlace")} />}
      {!last && <ZoneField name={`${leg.legId}-toZone`} required disabled={leg.fixedBecause !== null} value={values.toZone} onChange={(toZone) => set({ toZone })} error={errorOf("toZone")} />}
      <div className="sm:col-span-2">
        {leg.payerFixedBecause ? <p className="text-14 text-ink-2">{leg.payerFixedBecause}</p> : <PayerFields path="" ownerName={ownerName} payer={values.payer} payerName={values.payerName} onChange={set} errorOf={errorOf} />}
      </div>
      <div className="flex flex-wrap gap-2.5 sm:col-span-2">
        <Button type="submit" busy={save.isPending}>
          Save leg {leg.seq}
        </Button>
        <Button variant="ghost" onClick={onDone}>
          Leave it as it is
        </Button>
      </div>
    </form>
  );
}
