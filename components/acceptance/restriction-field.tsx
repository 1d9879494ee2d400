"use client";

import { FieldError } from "@/components/ui/field";
import { fieldId } from "@/components/ui/field-id";
import { ruleEachOtherOut } from "@/lib/acceptance/rules";
import { RESTRICTIONS, type RestrictionId } from "@/lib/acceptance/vocabulary";

export type RestrictionFieldProps = { value: readonly RestrictionId[]; onChange: (value: RestrictionId[]) => void; error: string | null };

/** Restrictions to tick; ticking one takes back what it rules out, such as another speed. */
export function RestrictionField({ value, onChange, error }: RestrictionFieldProps) {
  const id = fieldId("restrictions");
  const toggle = (one: RestrictionId) => onChange(value.includes(one) ? value.filter((other) => other !== one) : [...value.filter((other) => !ruleEachOtherOut(one, other)), one]);
  return (
    <fieldset id={id} tabIndex={-1} aria-describedby={error ? `${id}-error` : undefined} className="min-w-0">
      <legend className="lab mb-1">Restrictions</legend>
      <div className="grid border border-rule-strong sm:grid-cols-2">
        {RESTRICTIONS.map(({ id: one, label }) => (
          <label key={one} className="flex min-h-11 items-start gap-3 border-b border-rule px-3 py-2.5 text-15 hover:bg-manila max-sm:min-h-13 max-sm:py-3.5">
            <input type="checkbox" className="pick" checked={value.includes(one)} onChange={() => toggle(one)} />
            <span className="pt-px">{label}</span>
          </label>
        ))}
      </div>
      {error && <FieldError id={id}>{error}</FieldError>}
    </fieldset>
  );
}
