import { BODY, PAPERS } from "./requirements/body-and-papers";
import { DIMENSIONS, FLUIDS } from "./requirements/dimensions-and-fluids";
import { BRAKES, DRAFT } from "./requirements/draft-and-brakes";
import { IDENTITY } from "./requirements/identity";
import { RUNNING_GEAR } from "./requirements/running-gear";
import type { Requirement } from "./requirements/types";

/** Everything that some carrier asks before it accepts a unit, in the order of an inspector's sheet. */
export const CATALOGUE: readonly Requirement[] = [...IDENTITY, ...RUNNING_GEAR, ...DRAFT, ...BRAKES, ...DIMENSIONS, ...FLUIDS, ...BODY, ...PAPERS];

/** The inspector's facts about the unit. */
export const UNIT_REQUIREMENTS = CATALOGUE.filter((requirement) => requirement.ofEquipment);

/** What is asked anew for every move. */
export const MOVE_REQUIREMENTS = CATALOGUE.filter((requirement) => !requirement.ofEquipment);

const BY_KEY = new Map(CATALOGUE.map((requirement) => [requirement.key, requirement]));

/** The requirement of a key; null for a key that an older case still holds. */
export function findRequirement(key: string): Requirement | null {
  return BY_KEY.get(key) ?? null;
}

/** An answer as a person reads it: the label of a choice, a figure with its unit, or the text as typed. */
export function answerText(key: string, value: string): string {
  const requirement = BY_KEY.get(key);
  const choice = requirement?.choices?.find((one) => one.value === value);
  if (choice) return choice.label;
  // A year has four digits and takes no comma.
  const figure = requirement?.kind === "number" && /^\d{5,}$/.test(value) ? Number(value).toLocaleString("en-US") : value;
  return requirement?.unit ? `${figure} ${requirement.unit}` : figure;
}
