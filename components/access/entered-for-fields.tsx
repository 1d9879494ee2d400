"use client";

import { RadioGroup } from "@/components/ui/check-field";
import { DateField } from "@/components/ui/date-field";
import { TextField } from "@/components/ui/text-field";
import { ENTERED_SOURCES, type EnteredSource } from "@/lib/access/vocabulary";
import type { EnteredForValue } from "./entered-for";

const SOURCE_LABELS: Record<EnteredSource, string> = { paper: "On paper", "e-mail": "By e-mail", phone: "By phone" };
const CHOICES = ENTERED_SOURCES.map((value) => ({ value, label: SOURCE_LABELS[value] }));

export type EnteredForFieldsProps = {
  value: EnteredForValue;
  onChange: (value: EnteredForValue) => void;
  /** The message for a field by its full name, such as `enteredFor.saidBy`. */
  errors: (name: string) => string | null;
  /** The carrier that is not on board. */
  carrierName: string;
};

/** How a carrier's step came to be known that somebody else enters; stands in every such form. */
export function EnteredForFields({ value, onChange, errors, carrierName }: EnteredForFieldsProps) {
  const type = (name: "heardOn" | "saidBy" | "reference") => ({
    name: `enteredFor.${name}`, value: value[name], error: errors(`enteredFor.${name}`), onChange: (event: { target: { value: string } }) => onChange({ ...value, [name]: event.target.value }),
  });
  const source = CHOICES.find((choice) => choice.value === value.source)?.value ?? "";
  return (
    <fieldset className="grid gap-4 border-l-[5px] border-slate bg-slate-wash px-4 py-3.5">
      <legend className="sr-only">How it is known</legend>
      <p className="text-14">
        Nobody of {carrierName} is on board here, so you enter this for the carrier. It is shown as entered by you, with where it came from, and never as the carrier’s signature.
      </p>
      <RadioGroup name="enteredFor.source" label="How it came" required inline choices={CHOICES} value={source} error={errors("enteredFor.source")} onChange={(event) => onChange({ ...value, source: ENTERED_SOURCES.find((one) => one === event.target.value) ?? "" })} />
      <DateField {...type("heardOn")} label="On which day" required />
      <TextField {...type("saidBy")} label={`Who at ${carrierName} said it`} required autoComplete="off" />
      <TextField {...type("reference")} label="Reference" hint="A letter’s number or an e-mail’s subject, so that it can be found again." autoComplete="off" />
    </fieldset>
  );
}
