import { Disclosure } from "@/components/ui/disclosure";
import { TickBox } from "@/components/ui/tick-box";
import type { MovementLeg } from "@/lib/movement/types";

function List({ conditions, current }: { conditions: MovementLeg["conditions"]; current: boolean }) {
  return (
    <ul>
      {conditions.map(({ id, label, met, detail }) => (
        <li key={id} className="flex gap-3 border-b border-rule py-2 text-14 last:border-b-0">
          <TickBox state={met ? "done" : current ? "waiting" : "to-do"} className="mt-px" />
          <span>
            {label}
            <span className="block text-ink-2">{detail}</span>
          </span>
        </li>
      ))}
    </ul>
  );
}

/** What must stand before the carrier takes the unit; put away once it has it. Restrictions of the acceptance stay in sight all the way. */
export function Conditions({ leg, current }: { leg: MovementLeg; current: boolean }) {
  const { conditions, restrictions, takenOver } = leg;
  const met = conditions.filter((one) => one.met).length;
  return (
    <div>
      {takenOver ? (
        <Disclosure summary="Conditions at take-over" className="border-y-0!">
          <List conditions={conditions} current={false} />
        </Disclosure>
      ) : (
        <>
          <h4 className="lab mb-1">
            Conditions, {met} of {conditions.length} met
          </h4>
          <List conditions={conditions} current={current} />
        </>
      )}
      <h4 className="lab mt-4 mb-1">Restrictions</h4>
      {restrictions.length > 0 ? (
        <ul className="list-disc pl-5 text-14">
          {restrictions.map((text) => (
            <li key={text} className="whitespace-pre-line">
              {text}
            </li>
          ))}
        </ul>
      ) : (
        <p className="text-14 text-ink-2">{conditions.some((one) => one.id === "acceptance" && one.met) ? "None beyond the carrier’s own rules." : "Come with the acceptance."}</p>
      )}
    </div>
  );
}
