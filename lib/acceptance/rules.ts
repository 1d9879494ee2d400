import type { Denial, FieldErrors } from "@/lib/errors";
import { RESTRICTIONS, type RestrictionId } from "./vocabulary";

/** Restrictions of which only one can hold. */
const ONE_OF: readonly { ids: readonly RestrictionId[]; why: string }[] = [
  { ids: ["mph-15", "mph-25", "mph-35", "mph-45"], why: "Choose one speed at most." },
  { ids: ["head-end", "rear"], why: "Choose either the head end or the rear of the train." },
  { ids: ["face-a", "face-b"], why: "Choose one way for the unit to face." },
];

/** Whether two restrictions rule each other out, so that choosing one takes back the other. */
export const ruleEachOtherOut = (one: RestrictionId, other: RestrictionId) => one !== other && ONE_OF.some(({ ids }) => ids.includes(one) && ids.includes(other));

/** What is wrong with an acceptance as filled in; `today` is the day where the carrier takes over. */
export function denyTerms(given: { restrictions: readonly RestrictionId[]; validUntil: string | null }, today: string): Denial | null {
  const fields: FieldErrors = {};
  const clashes = ONE_OF.filter(({ ids }) => given.restrictions.filter((id) => ids.includes(id)).length > 1).map(({ why }) => why);
  if (clashes.length > 0) fields.restrictions = clashes;
  if (given.validUntil && given.validUntil <= today) fields.validUntil = ["This day must lie ahead. Leave it empty when no day was set."];
  return Object.keys(fields).length > 0 ? { code: "bad_input", message: "Some entries need another look.", fields } : null;
}

/** An acceptance is signed once, before the carrier has the unit. */
export function denyAnother({ accepted, takenOver }: { accepted: boolean; takenOver: boolean }): Denial | null {
  if (takenOver) return { code: "not_yet", message: "The carrier of this leg has taken the unit already." };
  return accepted ? { code: "stale", message: "This leg is accepted already. Withdraw that acceptance before another is signed." } : null;
}

/** An acceptance is withdrawn while the carrier has not taken the unit. */
export function denyWithdrawal({ withdrawn, takenOver }: { withdrawn: boolean; takenOver: boolean }): Denial | null {
  if (withdrawn) return { code: "stale", message: "This acceptance was withdrawn already." };
  return takenOver ? { code: "not_yet", message: "The unit was taken over under this acceptance; it can’t be withdrawn any more. Post what is wrong as a finding." } : null;
}

/** Restrictions in words, in the order of the list. */
export const restrictionLabels = (ids: readonly RestrictionId[]): string[] => RESTRICTIONS.filter(({ id }) => ids.includes(id)).map(({ label }) => label);
