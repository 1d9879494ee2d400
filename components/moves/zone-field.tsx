"use client";

import { useState } from "react";
import { SelectField } from "@/components/ui/select-field";
import { NORTH_AMERICAN_ZONES, zoneLabel } from "@/lib/moves/zones";

const MORE = "more";

export type ZoneFieldProps = { name: string; label?: string; value: string; onChange: (zone: string) => void; error?: string | null; required?: boolean; disabled?: boolean };

/** The time zone of a place: the common ones first; the last line opens all there are. */
export function ZoneField({ name, label = "Time zone there", value, onChange, error, required, disabled }: ZoneFieldProps) {
  const [all, setAll] = useState(false);
  const known = value === "" || NORTH_AMERICAN_ZONES.some((one) => one.value === value);
  const others = all ? Intl.supportedValuesOf("timeZone").map((zone) => ({ value: zone, label: zone.replaceAll("_", " ") })) : [];
  return (
    <SelectField
      name={name}
      label={label}
      required={required}
      disabled={disabled}
      error={error}
      blank="choose"
      value={value}
      choices={[
        { group: "North America", choices: NORTH_AMERICAN_ZONES },
        ...(all ? [{ group: "All zones", choices: others }] : [...(known ? [] : [{ value, label: zoneLabel(value) }]), { value: MORE, label: "Another zone…" }]),
      ]}
      onChange={(event) => (event.target.value === MORE ? setAll(true) : onChange(event.target.value))}
    />
  );
}
