"use client";

import { Button } from "@/components/ui/button";
import type { InstructionView, MovementLeg } from "@/lib/movement/types";
import { formatDay, formatWhen } from "@/lib/moves/when";
import { SaidBy } from "./entered-note";
import { InstructionForm, WithdrawForm } from "./forms";
import type { FormSwitch } from "./open-form";

const facts = ({ billNumber, clearanceNumber, train, pickupFrom }: InstructionView) =>
  [
    ["Bill of lading", billNumber],
    ["Clearance", clearanceNumber],
    ["Train", train],
    ["Pickup from", pickupFrom && formatDay(pickupFrom)],
  ].filter((pair): pair is [string, string] => Boolean(pair[1]));

function Given({ instruction, zone }: { instruction: InstructionView; zone: string }) {
  return (
    <>
      <dl className="grid grid-cols-[max-content_minmax(0,1fr)] gap-x-4 gap-y-1 text-14">
        {facts(instruction).map(([label, value]) => (
          <div key={label} className="contents">
            <dt className="text-ink-2">{label}</dt>
            <dd className="figure [overflow-wrap:anywhere]">{value}</dd>
          </div>
        ))}
      </dl>
      {instruction.text && <p className="mt-2 max-w-[66ch] text-14 whitespace-pre-line">{instruction.text}</p>}
      <div className="mt-1">
        <SaidBy by={instruction.byName} enteredFor={instruction.enteredFor} more={formatWhen(instruction.at, zone)} />
      </div>
    </>
  );
}

/** The transport desk's instruction for a leg, and for the desk the form for it. */
export function Instruction({ moveId, leg, switcher }: { moveId: string; leg: MovementLeg; switcher: FormSwitch }) {
  const { instruction, may, carrierName } = leg;
  const { open, show } = switcher;
  const unmet = leg.conditions.filter((one) => !one.met && (one.id === "acceptance" || one.id === "billing"));
  const writing = open?.form === "instruction" && open.legId === leg.legId;
  const withdrawing = open?.form === "withdraw" && open.id === instruction?.id;
  return (
    <div>
      <h4 className="lab mb-1.5">
        Movement instruction
      </h4>
      {instruction ? <Given instruction={instruction} zone={leg.fromZone} /> : <p className="text-14 text-ink-2">{leg.takenOver ? "None stands." : `Not given yet. ${carrierName}’s transport desk gives it when acceptance and billing stand.`}</p>}
      {writing && <InstructionForm moveId={moveId} leg={leg} onDone={() => show(null)} />}
      {withdrawing && instruction && <WithdrawForm moveId={moveId} leg={leg} instructionId={instruction.id} onDone={() => show(null)} />}
      {may.instruct && !writing && !withdrawing && (
        <div className="mt-2.5 flex flex-wrap items-center gap-2.5">
          {unmet.length > 0 && !instruction ? (
            <p className="text-14 text-ink-2">It can be given when these stand: {unmet.map((one) => one.label.toLowerCase()).join(" and ")}.</p>
          ) : (
            <Button variant={instruction ? "ghost" : "solid"} size={instruction ? "small" : "regular"} onClick={() => show({ form: "instruction", legId: leg.legId })}>
              {instruction ? "Replace it" : may.enterFor ? `Enter ${carrierName}’s instruction` : "Give the instruction"}
            </Button>
          )}
          {instruction && (
            <Button variant="plain" size="small" onClick={() => show({ form: "withdraw", legId: leg.legId, id: instruction.id })}>
              Withdraw it
            </Button>
          )}
        </div>
      )}
    </div>
  );
}
