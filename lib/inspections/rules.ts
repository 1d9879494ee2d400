import type { Denial, FieldErrors } from "@/lib/errors";
import { AIR_LABELS, type AirState } from "./vocabulary";

type Air = { air: AirState; airSource: string | null; airPsi: number | null };

export const NO_SOURCE_WORDS = "Say where the air came from, for instance the contractor’s compressor.";

/** Whether air was on and nobody has said where it came from. */
export const lacksSource = ({ air, airSource }: Partial<Air>) => air === "on" && !airSource;

/** A visit is written down after it took place; `today` is the day at the place. Where air was on, its source belongs to it. */
export function denyVisit(visit: Air & { visitedOn: string }, today: string): Denial | null {
  const fields: FieldErrors = {};
  if (visit.visitedOn > today) fields.visitedOn = ["This day has not come yet at the place of the visit."];
  if (lacksSource(visit)) fields.airSource = [NO_SOURCE_WORDS];
  if (visit.air !== "on" && visit.airSource) fields.airSource = ["Only when air was on the unit."];
  if (visit.air !== "on" && visit.airPsi !== null) fields.airPsi = ["Only when air was on the unit."];
  return Object.keys(fields).length > 0 ? { code: "bad_input", message: "Some entries need another look.", fields } : null;
}

/** Air in one line: `Air was on the unit: contractor’s compressor, 90 psi`. */
export function airWords({ air, airSource, airPsi }: Air): string {
  const more = [airSource, airPsi === null ? null : `${airPsi} psi`].filter((part) => part !== null).join(", ");
  return more ? `${AIR_LABELS[air]}: ${more}` : AIR_LABELS[air];
}

/** What to know about a brake finding of a visit without air; null when there is nothing to say. Common practice: without air a brake can be looked at, not judged. */
export function airCaution(air: AirState, brakes: boolean): string | null {
  if (!brakes || air === "on") return null;
  return air === "off"
    ? "There was no air on the unit. What a brake does under air may differ; treat this as provisional until it is looked at with air."
    : "Whether air was on the unit was not said. Treat this as provisional until it is looked at with air.";
}

/** The same for a table. */
export const airNote = (air: AirState, brakes: boolean): string | null => (!brakes || air === "on" ? null : air === "off" ? "taken without air" : "air not said");
