"use client";

import { Sheet } from "@/components/ui/sheet";
import { TextField } from "@/components/ui/text-field";
import type { PlaceForm } from "@/lib/moves/draft";
import { ZoneField } from "../zone-field";
import type { SectionProps } from "./section";

export type PlaceFieldsProps = {
  /** The path of the place in the form. */
  path: string;
  title: string;
  place: PlaceForm;
  onChange: (place: PlaceForm) => void;
  errorOf: SectionProps["errorOf"];
  examples: { name: string; place: string };
  disabled?: boolean;
};

/** One end of the route: what it is called, where it is, which clock it keeps. */
export function PlaceFields({ path, title, place, onChange, errorOf, examples, disabled }: PlaceFieldsProps) {
  return (
    <fieldset className="grid min-w-0 gap-5" disabled={disabled}>
      <legend className="mb-3 text-17 font-[680]">{title}</legend>
      <TextField name={`${path}.name`} label="What it is called" hint={examples.name} required autoComplete="off" value={place.name} onChange={(event) => onChange({ ...place, name: event.target.value })} error={errorOf(`${path}.name`)} />
      <TextField name={`${path}.place`} label="Town or station" hint={examples.place} required autoComplete="off" value={place.place} onChange={(event) => onChange({ ...place, place: event.target.value })} error={errorOf(`${path}.place`)} />
      <ZoneField name={`${path}.zone`} required value={place.zone} onChange={(zone) => onChange({ ...place, zone })} error={errorOf(`${path}.zone`)} />
    </fieldset>
  );
}

/** Where the unit stands and where it goes. */
export function EndsSection({ form, change, errorOf }: SectionProps) {
  return (
    <Sheet title="2. From and to" lead="Times of day are shown by the clock of the place where something happens.">
      <div className="grid gap-8 sm:grid-cols-2">
        <PlaceFields path="origin" title="Where it stands" place={form.origin} onChange={(origin) => change({ origin })} errorOf={errorOf} examples={{ name: "Shop, yard, siding or customer track.", place: "As a railroad timetable names it." }} />
        <PlaceFields path="destination" title="Where it goes" place={form.destination} onChange={(destination) => change({ destination })} errorOf={errorOf} examples={{ name: "Who puts it back to work, and on which track.", place: "Where the last carrier places it." }} />
      </div>
    </Sheet>
  );
}
