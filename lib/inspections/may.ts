import { partFor, type Action } from "@/lib/access/policy";
import type { EnteredFor, HeldPart } from "@/lib/access/types";
import type { MayStep } from "./types";

// Only that something is entered for a carrier matters to the policy, not what it says.
const SOMETHING: EnteredFor = { carrierName: "", source: "paper", heardOn: "", saidBy: "", reference: null };

/** How somebody may do a carrier's step on a leg; null when not at all. */
export function mayOnLeg(parts: readonly HeldPart[], action: Action, { legId, onBoard }: { legId: string; onBoard: boolean }): MayStep {
  if (partFor(parts, { action, legId })) return "self";
  return partFor(parts, { action, legId, enteredFor: SOMETHING, carrierOnBoard: onBoard }) ? "enter" : null;
}
