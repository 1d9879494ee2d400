"use client";

import { useQuery } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { Button } from "@/components/ui/button";
import { Sheet } from "@/components/ui/sheet";
import { formatWhen } from "@/lib/moves/when";
import { movementOptions } from "@/lib/movement/options";
import type { Movement } from "@/lib/movement/types";
import { ArrivalSigned } from "./arrival-view";
import { Closing } from "./closing";
import { ArrivalForm, loadForms } from "./forms";
import { LegBlock } from "./leg-block";
import { homeOf, type FormSwitch, type OpenForm } from "./open-form";

function Arrival({ moveId, movement, switcher }: { moveId: string; movement: Movement; switcher: FormSwitch }) {
  const { arrival, arrived, may, placed, destination } = movement;
  if (arrival) return <ArrivalSigned arrival={arrival} zone={destination.zone} />;
  if (arrived) return <p className="text-14">Looked over and signed. What was found is read by those who prepare, inspect and receive the unit.</p>;
  if (!placed) return <p className="text-14 text-ink-2">When the unit has been placed, the receiver looks it over against the photos from departure and signs.</p>;
  if (!may.arrive) return <p className="text-14">The unit is placed. The receiver looks it over next.</p>;
  if (switcher.open?.form === "arrival") return <ArrivalForm moveId={moveId} movement={movement} onDone={() => switcher.show(null)} />;
  return <Button className="max-sm:min-h-13 max-sm:w-full" onClick={() => switcher.show({ form: "arrival" })}>Record the arrival</Button>;
}

/** Instruction, release, sightings, arrival and closing of a move, kept up to date while they are looked at. */
export function MovementTab({ moveId }: { moveId: string }) {
  const { data: movement, isError } = useQuery(movementOptions(moveId));
  const [open, setOpen] = useState<OpenForm | null>(null);
  useEffect(() => void loadForms().catch(() => undefined), []);
  if (!movement) return null;
  const show = (form: OpenForm | null) => {
    if (!form && open) document.getElementById(homeOf(open))?.focus({ preventScroll: true });
    setOpen(form);
  };
  const switcher = { open, show };
  const current = movement.legs.find((leg) => !leg.takenOver);
  return (
    <Sheet title="Movement" lead="Acceptance, billing cleared, movement instruction and released are four different things; a carrier takes the unit when all of them stand.">
      <div className="grid gap-5">
        {movement.legs.map((leg) => (
          <LegBlock key={leg.legId} {...{ moveId, movement, leg, switcher }} current={leg === current} />
        ))}
        <section aria-labelledby="arrival-title" id="arrival" tabIndex={-1} className="border border-rule-strong px-4 py-4">
          <h3 id="arrival-title" className="mb-2 text-17 font-[680]">
            Arrival at {movement.destination.name}
          </h3>
          <Arrival {...{ moveId, movement, switcher }} />
        </section>
        <section aria-labelledby="closing-title" id="closing" tabIndex={-1} className="border border-rule-strong px-4 py-4">
          <h3 id="closing-title" className="mb-2 text-17 font-[680]">
            Closing
          </h3>
          <Closing {...{ moveId, movement, switcher }} />
        </section>
      </div>
      <p role="status" className="mt-4 text-13 text-ink-2 max-sm:text-14">
        {isError && `No connection. This is the movement as of ${formatWhen(movement.at, movement.destination.zone)}.`}
      </p>
    </Sheet>
  );
}
