"use client";

import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { State } from "@/components/ui/state";
import type { Tone } from "@/components/ui/tone";
import { legNotes } from "@/lib/movement/notes";
import type { Movement, MovementLeg } from "@/lib/movement/types";
import { Conditions } from "./conditions";
import { SightingForm } from "./forms";
import { Instruction } from "./instruction";
import type { FormSwitch } from "./open-form";
import { Release } from "./release";
import { SightingLine } from "./sighting-line";

type Props = { moveId: string; movement: Movement; leg: MovementLeg; current: boolean; switcher: FormSwitch };

function stateOf({ movement, leg, current }: Pick<Props, "movement" | "leg" | "current">): { tone: Tone; word: string } {
  const last = leg.seq === movement.legs.length;
  if (last && movement.placed) return { tone: "verdigris", word: "Placed" };
  if (leg.delivered) return { tone: "verdigris", word: "Handed over" };
  if (leg.takenOver) return { tone: "slate", word: "Has the unit" };
  return current ? { tone: "brass", word: "Next" } : { tone: "neutral", word: "Ahead" };
}

const recordWords = (leg: MovementLeg) => {
  const [first] = leg.kinds;
  const what = first === "pulled" ? "Record that it was pulled" : first === "received" ? "Record the receipt" : "Record a sighting";
  return leg.may.enterFor && !leg.may.asReceiver ? `${what} for ${leg.carrierName}` : what;
};

function Sightings({ moveId, movement, leg, switcher }: Omit<Props, "current">) {
  const { open, show } = switcher;
  const own = movement.sightings.filter((one) => one.legId === leg.legId);
  const writing = open?.form === "sighting" && open.legId === leg.legId;
  return (
    <div>
      <h4 className="lab mb-0.5">
        Sightings
      </h4>
      {own.length > 0 ? (
        <ol className="border-t border-rule">
          {own.map((one) => (
            <SightingLine key={one.id} {...{ moveId, leg, switcher }} sighting={one} destination={movement.destination} />
          ))}
        </ol>
      ) : (
        <p className="mt-1 text-14 text-ink-2">None yet. The carrier’s transport desk records where the unit is; for a carrier that is not on board, owner or contractor enter what it tells them.</p>
      )}
      {writing && <SightingForm moveId={moveId} leg={leg} destination={movement.destination} onDone={() => show(null)} />}
      {leg.may.sight && !writing && (
        <Button className="mt-3 max-sm:min-h-13 max-sm:w-full" variant={leg.takenOver || leg.conditions.every((one) => one.met || one.id === "delivered") ? "solid" : "ghost"} onClick={() => show({ form: "sighting", legId: leg.legId })}>
          {recordWords(leg)}
        </Button>
      )}
    </div>
  );
}

/** One carrier's stretch: its conditions, instruction, release and what was seen of the unit. */
export function LegBlock({ moveId, movement, leg, current, switcher }: Props) {
  const state = stateOf({ movement, leg, current });
  const next = movement.legs.find((one) => one.seq === leg.seq + 1) ?? null;
  const notes = movement.closing.closedAt ? [] : legNotes(leg, next, movement.sightings, movement.at);
  return (
    <section id={`leg-${leg.legId}`} tabIndex={-1} aria-labelledby={`leg-title-${leg.legId}`} className="border border-rule-strong">
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-rule-strong bg-manila px-4 py-2.5">
        <div>
          <p className="lab">
            Leg {leg.seq}, {leg.fromPlace} to {leg.toPlace}
          </p>
          <h3 id={`leg-title-${leg.legId}`} className="text-17 font-[680]">
            {leg.carrierName}
          </h3>
        </div>
        <p className="flex flex-wrap items-center gap-2 text-14 text-ink-2">
          {!leg.onBoard && <span>not on board</span>}
          <State tone={state.tone}>{state.word}</State>
        </p>
      </div>
      <div className="lg:grid lg:grid-cols-[minmax(0,1fr)_280px]">
        <div className="grid content-start gap-5 px-4 py-4">
          {notes.length > 0 && (
            <div className="grid gap-2">
              {notes.map((note) => (
                <Notice key={note.text} kind={note.kind}>
                  {note.text}
                </Notice>
              ))}
            </div>
          )}
          <Instruction {...{ moveId, leg, switcher }} />
          {leg.seq === 1 && <Release {...{ moveId, leg, switcher }} unit={movement.unit} />}
          <Sightings {...{ moveId, movement, leg, switcher }} />
        </div>
        <div className="border-t border-rule px-4 py-4 lg:border-t-0 lg:border-l">
          <Conditions leg={leg} current={current} />
        </div>
      </div>
    </section>
  );
}
