"use client";

import { useQuery } from "@tanstack/react-query";
import { useEffect } from "react";
import { Sheet } from "@/components/ui/sheet";
import { caseOptions } from "@/lib/moves/options";
import { CancelMove } from "./cancel-move";
import { EndsEditor } from "./ends-editor";
import { EquipmentFacts } from "./equipment-facts";
import { EquipmentForm } from "./equipment-form";
import { loadForms } from "./forms";
import { LegEditor } from "./leg-editor";

/** The unit as an inspector lists it, and the route with its payers; for owner and contractor to change, for others to read. */
export function UnitAndRoute({ moveId }: { moveId: string }) {
  const { data: file } = useQuery(caseOptions(moveId));
  useEffect(() => void loadForms().catch(() => undefined), []);
  if (!file) return null;
  return (
    <>
      <Sheet title="Route and payers" lead="Each carrier inspects the unit for itself. A leg can be changed until its carrier has accepted the unit, its carrier replaced until it has begun.">
        {file.legs.map((leg) => (
          <LegEditor key={leg.legId} file={file} leg={leg} />
        ))}
        {file.may.edit && <EndsEditor file={file} />}
      </Sheet>
      <Sheet className="mt-6" title="The unit" lead="What some carrier may ask before it accepts a unit. Which carrier asks what, and its limits, is that carrier’s own matter.">
        {file.may.editUnit ? <EquipmentForm moveId={moveId} /> : <EquipmentFacts moveId={moveId} />}
      </Sheet>
      {file.may.cancel && (
        <Sheet className="mt-6" title="If the move is not made" actions={<CancelMove file={file} />}>
          <p className="max-w-[66ch] text-14 text-ink-2">Cancelling ends the case. What was done and said on it stays on record.</p>
        </Sheet>
      )}
    </>
  );
}
