"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { CaseFile, CaseLeg } from "@/lib/moves/types";
import { LegForm } from "./forms";

const payerWords = ({ payerName }: CaseLeg) => (payerName ? `paid by ${payerName}` : "nobody is named as payer yet");

/** One leg of the route with its payer; the owner changes what has not begun. */
export function LegEditor({ file, leg }: { file: CaseFile; leg: CaseLeg }) {
  const editable = file.may.editLegs && !(leg.fixedBecause && leg.payerFixedBecause);
  const [open, setOpen] = useState(editable && leg.payerName === null);
  return (
    <section id={`edit-${leg.legId}`} aria-labelledby={`edit-${leg.legId}-title`} className="border-b border-rule py-4 last:border-b-0">
      <div className="flex flex-wrap items-start justify-between gap-3">
        <div>
          <h3 id={`edit-${leg.legId}-title`} className="text-15 font-[680]">
            Leg {leg.seq}: {leg.carrierName}
            {leg.carrierMark && ` (${leg.carrierMark})`}
          </h3>
          <p className="text-14 text-ink-2">
            {leg.fromPlace} to {leg.toPlace}
            {leg.miles !== null && `, ${leg.miles.toLocaleString("en-US")} mi`}; {payerWords(leg)}
          </p>
          {file.may.editLegs && leg.fixedBecause && <p className="mt-1 text-14 text-ink-2">{leg.fixedBecause}</p>}
        </div>
        {editable && !open && (
          <Button variant="ghost" size="small" onClick={() => setOpen(true)}>
            Change<span className="sr-only"> leg {leg.seq}</span>
          </Button>
        )}
      </div>
      {editable && open && <LegForm moveId={file.moveId} leg={leg} last={leg.seq === file.legs.length} ownerName={file.ownerName} onDone={() => setOpen(false)} />}
    </section>
  );
}
