"use client";

import { Button } from "@/components/ui/button";
import type { MovementLeg } from "@/lib/movement/types";
import { formatWhen } from "@/lib/moves/when";
import { ReleaseDialog } from "./forms";
import type { FormSwitch } from "./open-form";

const BEFORE: readonly string[] = ["prep", "acceptance", "billing", "instruction"];

/** The owner's release on the first leg: given, or what it still waits for. */
export function Release({ moveId, unit, leg, switcher }: { moveId: string; unit: string; leg: MovementLeg; switcher: FormSwitch }) {
  const { release } = leg;
  const unmet = leg.conditions.filter((one) => BEFORE.includes(one.id) && !one.met);
  return (
    <div>
      <h4 className="lab mb-1.5">
        Released by the owner
      </h4>
      {release ? (
        <>
          <p className="max-w-[66ch] text-14">{release.statement}</p>
          {release.note && <p className="mt-1 max-w-[66ch] text-14 whitespace-pre-line">{release.note}</p>}
          <p className="mt-1 text-14 text-ink-2">
            Signed by {release.name}, {formatWhen(release.at, leg.fromZone)}
          </p>
        </>
      ) : (
        <p className="text-14 text-ink-2">Not released yet. The owner tenders the unit to {leg.carrierName} when its instruction stands.</p>
      )}
      {leg.may.release && unmet.length > 0 && <p className="mt-1.5 text-14 text-ink-2">It can be released when these stand: {unmet.map((one) => one.label.toLowerCase()).join(", ")}.</p>}
      {leg.may.release && unmet.length === 0 && (
        <div className="mt-2.5">
          <Button onClick={() => switcher.show({ form: "release" })}>Release the unit…</Button>
          <ReleaseDialog moveId={moveId} unit={unit} leg={leg} open={switcher.open?.form === "release"} onClose={() => switcher.show(null)} />
        </div>
      )}
    </div>
  );
}
