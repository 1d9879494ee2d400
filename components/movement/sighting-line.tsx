"use client";

import { PhotoStrip } from "@/components/evidence/photo-strip";
import { Button } from "@/components/ui/button";
import { EVENT_CODES, eventCodeText } from "@/lib/movement/event-codes";
import type { Movement, MovementLeg, SightingView } from "@/lib/movement/types";
import { formatWhen, daysBetween } from "@/lib/moves/when";
import { SaidBy } from "./entered-note";
import { RetractForm, SightingForm } from "./forms";
import type { FormSwitch } from "./open-form";

type Props = { moveId: string; leg: MovementLeg; sighting: SightingView; destination: Movement["destination"]; switcher: FormSwitch };

function Heading({ sighting }: { sighting: SightingView }) {
  const code = eventCodeText(sighting.kind);
  const words = (
    <>
      <b>{EVENT_CODES[sighting.kind].label}</b>, {sighting.place}
    </>
  );
  return (
    <p className="text-15 [overflow-wrap:anywhere]">
      {sighting.retracted ? <s className="text-ink-2">{words}</s> : words}
      {code && <span className="figure ml-2 text-13 text-ink-2 max-sm:text-14">{code}</span>}
    </p>
  );
}

/** One report of where the unit was; what was taken back stays readable with its reason. */
export function SightingLine({ moveId, leg, sighting, destination, switcher }: Props) {
  const { open, show } = switcher;
  const { id, retracted, mayRetract } = sighting;
  const mine = (open?.form === "retract" || open?.form === "correct") && open.id === id ? open.form : null;
  const late = daysBetween(sighting.occurredAt, sighting.at);
  const more = [late > 0 && `entered ${late === 1 ? "a day" : `${late} days`} later`, sighting.corrects && "corrects an earlier one"].filter(Boolean).join(", ");
  return (
    <li className="border-b border-rule py-2.5">
      <div className="grid gap-x-4 gap-y-0.5 sm:grid-cols-[150px_minmax(0,1fr)]">
        <span className="figure text-14 text-ink-2">{formatWhen(sighting.occurredAt, sighting.zone)}</span>
        <div className="min-w-0">
          <Heading sighting={sighting} />
          {sighting.train && <p className="text-14">Train {sighting.train}</p>}
          {sighting.note && <p className="max-w-[66ch] text-14 whitespace-pre-line">{sighting.note}</p>}
          <SaidBy by={sighting.byName} enteredFor={sighting.enteredFor} more={more} />
          {retracted && (
            <p className="text-14">
              Taken back {formatWhen(retracted.at, sighting.zone)}: {retracted.why}
            </p>
          )}
          {sighting.photos.length > 0 && (
            <div className="mt-2">
              <PhotoStrip photos={sighting.photos} />
            </div>
          )}
          {mayRetract && !mine && (
            <div className="mt-1 flex gap-4">
              <Button variant="plain" size="small" onClick={() => show({ form: "correct", legId: leg.legId, id })}>
                Correct
              </Button>
              <Button variant="plain" size="small" onClick={() => show({ form: "retract", legId: leg.legId, id })}>
                Take back
              </Button>
            </div>
          )}
        </div>
      </div>
      {mine === "retract" && <RetractForm moveId={moveId} leg={leg} sightingId={id} onDone={() => show(null)} />}
      {mine === "correct" && <SightingForm moveId={moveId} leg={leg} destination={destination} corrects={sighting} onDone={() => show(null)} />}
    </li>
  );
}
