import type { Denial, FieldErrors } from "@/lib/errors";
import type { MoveFacts } from "@/lib/standing/types";
import { restoreTooEarly } from "./restore-order";
import type { PrepPhase, PrepState, RestoreState } from "./vocabulary";

type Item = { phase: PrepPhase; state: PrepState; needsPhoto: boolean; needsTag: boolean; valueLabel: string | null };
type Given = { value: string | null; tagNumber: string | null; photoIds: readonly string[] };

/** Why the phase can't be worked at this time; null when it can. */
export function phaseWaitsFor(move: MoveFacts, phase: PrepPhase): string | null {
  const first = move.legs.find((leg) => leg.seq === 1);
  if (first?.takenOver) return "The unit has been pulled; what was done before is on record.";
  if (phase === "where-it-stands") return null;
  if (!first?.instructed || !first.released) return "These items are done when the carrier’s engine is coupled, at its instruction. They open once the movement instruction is given and the unit is released.";
  return null;
}

export function denyWork(move: MoveFacts, item: Item): Denial | null {
  const why = phaseWaitsFor(move, item.phase);
  return why ? { code: "not_yet", message: why } : null;
}

/** What is still owed as evidence, field by field; null when nothing is. */
export function denyFinish(item: Item, given: Given): Denial | null {
  if (item.state !== "to-do") return { code: "stale", message: "Somebody has already worked on this item. Look again." };
  const fields: FieldErrors = {};
  if (item.needsPhoto && given.photoIds.length === 0) fields.photoIds = ["This item needs a photo."];
  if (item.valueLabel && !given.value) fields.value = ["This item needs the value written down."];
  if (item.needsTag && !given.tagNumber) fields.tagNumber = ["This item needs the tag’s number."];
  return Object.keys(fields).length > 0 ? { code: "bad_input", message: "Something is still missing for this item.", fields } : null;
}

export function denySign(phase: { total: number; left: number; signed: boolean }): Denial | null {
  if (phase.signed) return { code: "stale", message: "This phase is signed already." };
  if (phase.left > 0 || phase.total === 0) return { code: "not_yet", message: "Every item of the phase is done or does not apply before it is signed.", missing: [`${phase.left} of ${phase.total} items are open`] };
  return null;
}

type Twin = { templateId: string; state: PrepState; restoreState: RestoreState };

/** An item is put back after arrival, and never before those that must come first. */
export function denyRestore(arrived: boolean, item: Twin, all: readonly Twin[]): Denial | null {
  if (!arrived) return { code: "not_yet", message: "Items are put back after the receiver has recorded the arrival." };
  if (item.restoreState !== "to-restore") return { code: "stale", message: "This item is not waiting to be put back. Look again." };
  const waiting = new Set(all.filter((one) => one.restoreState === "to-restore").map((one) => one.templateId));
  const missing = restoreTooEarly(item.templateId, waiting);
  return missing.length > 0 ? { code: "not_yet", message: "Something else comes first.", missing } : null;
}

/** The statement over which a phase is signed. */
export const statementOf = (phase: PrepPhase, unit: string, place: string) =>
  phase === "where-it-stands"
    ? `${unit} is prepared for tow where it stands at ${place}: every item of this phase is done or does not apply, the hand brake is applied and proven to hold, and the wheels are chocked.`
    : `${unit} was made ready with the carrier’s engine coupled, at the carrier’s instruction and under its protection: every item of this phase is done or does not apply.`;
