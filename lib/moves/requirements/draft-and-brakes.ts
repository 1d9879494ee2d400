import { ALIGNMENT_LABELS, BRAKE_SCHEDULE_LABELS } from "../labels";
import { ALIGNMENT, BRAKE_SCHEDULES } from "../vocabulary";
import { YES_NO, type Requirement } from "./types";

const DRAFT_OF_UNIT = { group: "draft", ofEquipment: true, column: null } as const;
const BRAKES_OF_UNIT = { group: "brakes", ofEquipment: true, column: null } as const;

/** Couplers and draft gear. */
export const DRAFT: readonly Requirement[] = [
  {
    ...DRAFT_OF_UNIT,
    key: "coupler",
    question: "Is the coupler kept from swinging sideways, and how?",
    kind: "choice",
    choices: ALIGNMENT.map((value) => ({ value, label: ALIGNMENT_LABELS[value] })),
    hint: "One carrier takes only a shank with winged ears at the pin hole in NC-390 or NC-391 draft gear; stop blocks, push-back or shear-back couplers mean a special train at extra cost.",
    evidence: "Photo of the shank at the pin hole, and of the draft gear's marking",
    column: "alignment",
  },
  { ...DRAFT_OF_UNIT, key: "draft-gear", question: "Which draft gear does it have?", kind: "text", hint: "Type as marked on it.", evidence: "Photo of the marking" },
  {
    ...DRAFT_OF_UNIT,
    key: "coupler-state",
    question: "How are drawbar, knuckle and uncoupling levers at both ends?",
    kind: "text",
    hint: "An inspector goes over each of them with a gauge.",
    evidence: "Photo with the gauge",
  },
  { ...DRAFT_OF_UNIT, key: "stop-blocks", question: "Are stop blocks fitted?", kind: "choice", choices: YES_NO, hint: "Some carriers refuse units that have them.", evidence: "Photo of the coupler pocket" },
];

/** Brakes and what belongs to them. */
export const BRAKES: readonly Requirement[] = [
  {
    ...BRAKES_OF_UNIT,
    key: "brakes",
    question: "Which brake equipment does it have?",
    kind: "choice",
    choices: BRAKE_SCHEDULES.map((value) => ({ value, label: BRAKE_SCHEDULE_LABELS[value] })),
    hint: "Decides how it is set up to be hauled dead.",
    evidence: "Photo of the brake stand",
    column: "brakeSchedule",
  },
  { ...BRAKES_OF_UNIT, key: "brakes-dead", question: "Does its brake work when it is hauled dead?", kind: "choice", choices: YES_NO, hint: "Seen to set and release from the brake pipe alone.", evidence: "Air-test sheet" },
  { ...BRAKES_OF_UNIT, key: "straight-air", question: "Is it piped for straight air?", kind: "choice", choices: YES_NO, hint: "An inspector's sheet asks for it.", evidence: null },
  {
    ...BRAKES_OF_UNIT,
    key: "air-date",
    question: "On which date was the air brake last cleaned and tested, as stencilled?",
    kind: "date",
    hint: "It has to be in date and the same in the register; where they differ the register counts, and the unit can be sent to a shop.",
    evidence: "Photo of the stencil, and picture of the register entry",
  },
  {
    ...BRAKES_OF_UNIT,
    key: "air-date-register",
    question: "Which air-brake date does the register show?",
    kind: "date",
    hint: "Kept beside the stencilled date, so that a difference is seen at home and not at an interchange.",
    evidence: "Picture of the register entry",
  },
  {
    ...BRAKES_OF_UNIT,
    key: "hand-brake",
    question: "Does the hand brake hold, and does it release fully?",
    kind: "choice",
    choices: [
      { value: "yes", label: "Holds and releases fully" },
      { value: "does-not-hold", label: "Does not hold" },
      { value: "does-not-release", label: "Does not release fully" },
    ],
    hint: "A hand brake left partly on has run some 170 miles past about ten wayside detectors unseen.",
    evidence: "Photo of the slack chain and the rigging",
  },
  { ...BRAKES_OF_UNIT, key: "hoses", question: "Which is the oldest date on its air hoses?", kind: "text", hint: "As on the hose; the hoses have to be in date.", evidence: "Photo of each date code" },
  { ...BRAKES_OF_UNIT, key: "shoes", question: "How thick is its thinnest brake shoe?", kind: "length", hint: "More than enough to make the whole trip.", evidence: "Photo with a rule" },
];
