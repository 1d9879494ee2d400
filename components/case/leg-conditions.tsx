import { Disclosure } from "@/components/ui/disclosure";
import { TickBox } from "@/components/ui/tick-box";
import type { CaseLeg } from "@/lib/moves/types";
import { legAnchor, metOf } from "./case-strip";

export type LegConditionsProps = { leg: CaseLeg; current: boolean };

/** What must stand before a carrier moves the unit on its leg, met or not. */
export function LegConditions({ leg, current }: LegConditionsProps) {
  return (
    <section aria-labelledby={`${legAnchor(leg.legId)}-title`} id={legAnchor(leg.legId)} className="target:bg-manila">
      <h3 id={`${legAnchor(leg.legId)}-title`} className="mb-1 text-15 font-[680]">
        {leg.takenOver ? `${leg.carrierName} has taken it over` : `Before ${leg.carrierName} moves it`}
      </h3>
      <p className="text-14 text-ink-2">
        Leg {leg.seq}, {leg.fromPlace} to {leg.toPlace}
      </p>
      {leg.takenOver ? (
        <Disclosure className="mt-2" summary={`${metOf(leg.conditions)} of ${leg.conditions.length} conditions met`}>
          <Conditions leg={leg} current={false} />
        </Disclosure>
      ) : (
        <Conditions leg={leg} current={current} />
      )}
    </section>
  );
}

function Conditions({ leg, current }: LegConditionsProps) {
  return (
    <ul className="mt-1">
      {leg.conditions.map(({ id, label, met, detail }) => (
        <li key={id} className="flex gap-3 border-b border-rule py-2.5 text-14">
          <TickBox state={met ? "done" : current ? "waiting" : "to-do"} />
          <span>
            {label}
            <span className="block text-ink-2">{detail}</span>
          </span>
        </li>
      ))}
    </ul>
  );
}
