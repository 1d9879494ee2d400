import { AIR_BRAKES } from "./air-brakes";
import { BODY } from "./body";
import { BRAKE_26L } from "./brake-26l";
import { BRAKE_BY_INSTRUCTION } from "./brake-by-instruction";
import { COUPLING } from "./coupling";
import { DRAFT } from "./draft";
import { ELECTRICAL } from "./electrical";
import { PAPERS } from "./papers";
import { POWER_PLANT } from "./power-plant";
import { PROTECTION } from "./protection";
import { RUNNING_GEAR } from "./running-gear";
import type { PrepTemplateItem } from "./types";

/** Every line we know, with several under one id where the equipment decides which is used. */
export const PREP_TEMPLATE: readonly PrepTemplateItem[] = [
  ...PROTECTION,
  ...BRAKE_26L,
  ...BRAKE_BY_INSTRUCTION,
  ...AIR_BRAKES,
  ...ELECTRICAL,
  ...POWER_PLANT,
  ...RUNNING_GEAR,
  ...DRAFT,
  ...BODY,
  ...PAPERS,
  ...COUPLING,
];
