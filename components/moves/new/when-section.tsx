"use client";

import { DateField } from "@/components/ui/date-field";
import { Sheet } from "@/components/ui/sheet";
import { TextArea } from "@/components/ui/text-field";
import type { SectionProps } from "./section";

/** When the move is wanted, and what everybody on it should know. */
export function WhenSection({ form, change, errorOf }: SectionProps) {
  return (
    <Sheet title="4. When" lead="The days between which it should go, as far as that is known. Carriers ask for time to inspect and to mend what is found.">
      <div className="grid gap-5 sm:grid-cols-2">
        <DateField name="wantedFrom" label="Not before" value={form.wantedFrom} onChange={(event) => change({ wantedFrom: event.target.value })} error={errorOf("wantedFrom")} />
        <DateField name="wantedTo" label="Wanted by" value={form.wantedTo} onChange={(event) => change({ wantedTo: event.target.value })} error={errorOf("wantedTo")} />
      </div>
      <TextArea name="note" label="What everybody on the case should know" hint="How to get to the unit, what was agreed already. Every party of the move reads it." className="mt-5" maxLength={2000} value={form.note} onChange={(event) => change({ note: event.target.value })} error={errorOf("note")} />
    </Sheet>
  );
}
