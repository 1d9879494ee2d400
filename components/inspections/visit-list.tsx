import { EnteredBy } from "@/components/access/entered-by";
import { Mono } from "@/components/ui/text";
import { airWords } from "@/lib/inspections/rules";
import type { VisitView } from "@/lib/inspections/types";
import { formatDay } from "@/lib/moves/when";

/** A carrier's visits to the unit, oldest first, each with whether there was air. */
export function VisitList({ visits }: { visits: readonly VisitView[] }) {
  if (visits.length === 0) return null;
  return (
    <ol className="border-t border-rule">
      {visits.map((visit) => (
        <li key={visit.id} className="grid gap-x-4 gap-y-0.5 border-b border-rule py-2.5 text-14 sm:grid-cols-[7.5rem_minmax(0,1fr)]">
          <Mono className="text-ink-2">{formatDay(visit.visitedOn)}</Mono>
          <div>
            <p>
              <span className="font-[620]">Visit {visit.number}</span>: {visit.inspectorName} at {visit.place}
            </p>
            <p className={visit.air === "on" ? "text-ink-2" : "text-brass"}>{airWords(visit)}</p>
            {visit.note && <p className="whitespace-pre-line">{visit.note}</p>}
            {visit.enteredFor && <EnteredBy enteredFor={visit.enteredFor} byName={visit.enteredBy} />}
          </div>
        </li>
      ))}
    </ol>
  );
}
