"use client";

import { useMutation } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import { EnteredForFields } from "@/components/access/entered-for-fields";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { RadioGroup } from "@/components/ui/check-field";
import { DateField } from "@/components/ui/date-field";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { SelectField } from "@/components/ui/select-field";
import { TextArea, TextField } from "@/components/ui/text-field";
import { faultsOf } from "@/lib/entry/fetcher";
import { recordVisitMutation } from "@/lib/inspections/options";
import type { InspectedLeg } from "@/lib/inspections/types";
import { AIR_LABELS, AIR_STATES, type AirState } from "@/lib/inspections/vocabulary";
import { dayAt } from "@/lib/moves/when";
import { routes } from "@/lib/routes";

export type VisitFormProps = { moveId: string; leg: InspectedLeg; zones: readonly string[]; inspectorName: string; now: string };

const AIR_CHOICES = AIR_STATES.map((value) => ({ value, label: AIR_LABELS[value] }));

/** Writes down an inspector's visit: when, where, who, and whether there was air on the unit. */
export function VisitForm({ moveId, leg, zones, inspectorName, now }: VisitFormProps) {
  const router = useRouter();
  const entering = leg.mayVisit === "enter";
  const [given, setGiven] = useState({ visitedOn: dayAt(now, leg.zone), place: leg.fromPlace, zone: leg.zone, inspectorName: entering ? "" : inspectorName, airSource: "", airPsi: "", note: "" });
  const [air, setAir] = useState<AirState | "">("");
  const [enteredFor, setEnteredFor] = useState(EMPTY_ENTERED_FOR);
  const intent = useIntent();
  const record = useMutation(recordVisitMutation(moveId));
  const faults = faultsOf(record.error);
  const type = (name: keyof typeof given) => ({ name, value: given[name], error: faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const withAir = air === "on" ? {} : { airSource: "", airPsi: "" };
    const body = { ...given, ...withAir, legId: leg.legId, air, enteredFor: entering ? enteredFor : null };
    record.mutate({ key: intent.key(body), body }, { onSuccess: () => { intent.done(); router.push(routes.findings(moveId)); } });
  };
  return (
    <form noValidate onSubmit={submit} className="grid max-w-[640px] gap-4">
      <FormErrors errors={faults.list} />
      {entering && <EnteredForFields value={enteredFor} onChange={setEnteredFor} errors={faults.field} carrierName={leg.carrierName} />}
      <DateField {...type("visitedOn")} label="Day of the visit" required max={dayAt(now, given.zone)} />
      <TextField {...type("place")} label="Where the unit was looked at" required autoComplete="off" />
      {zones.length > 1 && <SelectField {...type("zone")} label="Time zone of that place" required choices={zones.map((value) => ({ value, label: value.replaceAll("_", " ") }))} />}
      <TextField {...type("inspectorName")} label="Inspector" required autoComplete="off" />
      <RadioGroup name="air" label="Air" hint="Brakes can be judged with air on the unit only. A unit that must not be started needs air from elsewhere." required choices={AIR_CHOICES} value={air} error={faults.field("air")} onChange={(event) => setAir(AIR_STATES.find((one) => one === event.target.value) ?? "")} />
      {air === "on" && (
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField {...type("airSource")} label="Where the air came from" hint="For instance the contractor’s compressor." required autoComplete="off" />
          <TextField {...type("airPsi")} label="Pressure in psi" hint="As the gauge showed it." mono inputMode="numeric" autoComplete="off" />
        </div>
      )}
      {air !== "" && air !== "on" && <Notice>Findings about brakes from this visit are marked as {air === "off" ? "taken without air" : "taken while it was not said whether there was air"}.</Notice>}
      <TextArea {...type("note")} label="Note" rows={3} />
      <ActionBar>
        <LinkButton href={routes.findings(moveId)} variant="ghost">Back</LinkButton>
        <Button type="submit" busy={record.isPending}>Record the visit</Button>
      </ActionBar>
    </form>
  );
}
