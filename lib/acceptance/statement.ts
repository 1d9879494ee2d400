import type { EnteredSource } from "@/lib/access/vocabulary";
import { formatDay } from "@/lib/moves/when";
import { restrictionLabels } from "./rules";
import type { RestrictionId } from "./vocabulary";

export type Accepting = {
  unit: string;
  carrierName: string;
  fromPlace: string;
  toPlace: string;
  restrictions: readonly RestrictionId[];
  restrictionNote: string | null;
  validUntil: string | null;
  /** Set when it is entered for a carrier that is not on board. */
  reported: { source: EnteredSource; heardOn: string; saidBy: string } | null;
};

const HEARD: Record<EnteredSource, string> = { paper: "on paper", "e-mail": "by e-mail", phone: "by phone" };

/** The sentences over which an acceptance is signed. */
export function acceptanceStatement(given: Accepting): string {
  const { unit, carrierName, fromPlace, toPlace, reported } = given;
  const fit = `mechanically fit to be hauled dead in tow by ${carrierName} from ${fromPlace} to ${toPlace}`;
  const opening = reported
    ? `${reported.saidBy} of ${carrierName} said ${HEARD[reported.source]} on ${formatDay(reported.heardOn)} that ${unit} is ${fit}. This is a report of what the carrier said; it is not the carrier’s signature.`
    : `For ${carrierName} I have looked at ${unit} and its findings. I accept it as ${fit}.`;
  const limits = [...restrictionLabels(given.restrictions), ...(given.restrictionNote ? [given.restrictionNote] : [])];
  return [
    opening,
    limits.length > 0 ? `Restrictions: ${limits.join("; ")}.` : "No restrictions were set.",
    given.validUntil ? `Valid until ${formatDay(given.validUntil)}.` : null,
    "This is about the unit’s mechanical fitness on this leg only. Charges and payment have no say in it, and it is no instruction to move the unit.",
  ].filter((sentence) => sentence !== null).join(" ");
}
