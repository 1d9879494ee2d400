import { BODY_SHAPE_LABELS, F_END_LABELS, TRACTION_MOTOR_LABELS } from "../labels";
import { BODY_SHAPES, F_ENDS, TRACTION_MOTORS } from "../vocabulary";
import { YES_NO, type Requirement } from "./types";

const UNIT = { group: "identity", ofEquipment: true, column: null } as const;

/** Who the unit is and what it is. */
export const IDENTITY: readonly Requirement[] = [
  {
    ...UNIT,
    key: "register",
    question: "How does the unit stand in the equipment register?",
    kind: "choice",
    choices: [
      { value: "clear", label: "Registered, not in conflict" },
      { value: "conflict", label: "Registered, in conflict" },
      { value: "not-registered", label: "Not registered" },
    ],
    hint: "A unit that is in conflict may not move in interchange. Units have been blocked in batches because blue-card data was missing.",
    evidence: "Picture of the register entry",
  },
  {
    ...UNIT,
    key: "mark",
    question: "Which reporting mark is stencilled on it?",
    kind: "text",
    hint: "Letters exactly as on the unit; they have to equal the register.",
    evidence: "Photo of each side",
    column: "mark",
  },
  {
    ...UNIT,
    key: "number",
    question: "Which number is stencilled on it?",
    kind: "text",
    hint: "With the mark it is what every yard clerk looks for.",
    evidence: "Photo of each side",
    column: "number",
  },
  {
    ...UNIT,
    key: "aei",
    question: "Are there working AEI tags with the same mark and number?",
    kind: "choice",
    choices: YES_NO,
    hint: "Yard readers report the unit by its tags; both sides are asked for.",
    evidence: "Tag read-out, or photo of each tag",
  },
  { ...UNIT, key: "model", question: "Which model is it?", kind: "text", hint: "As on the builder's plate.", evidence: "Photo of the builder's plate", column: "model" },
  { ...UNIT, key: "built", question: "In which year was it built?", kind: "number", hint: "The year of building, not of a later rebuild.", evidence: null, column: "builtYear" },
  {
    ...UNIT,
    key: "shape",
    question: "What kind of body does it have?",
    kind: "choice",
    choices: BODY_SHAPES.map((value) => ({ value, label: BODY_SHAPE_LABELS[value] })),
    hint: "Decides which outline is drawn and which places can be named on it.",
    evidence: null,
    column: "shape",
  },
  {
    ...UNIT,
    key: "f-end",
    question: "Which end is stencilled F?",
    kind: "choice",
    choices: F_ENDS.map((value) => ({ value, label: F_END_LABELS[value] })),
    hint: "Left, right and wheel numbers are counted from this end; on some units it is the long hood.",
    evidence: "Photo of the letter F",
    column: "fEnd",
  },
  {
    ...UNIT,
    key: "traction-motors",
    question: "What drives its axles?",
    kind: "choice",
    choices: TRACTION_MOTORS.map((value) => ({ value, label: TRACTION_MOTOR_LABELS[value] })),
    hint: "Decides what the preparation has to do with motors and gears.",
    evidence: null,
  },
  { ...UNIT, key: "engine", question: "Does it have an engine of its own?", kind: "choice", choices: YES_NO, hint: "Slugs and straight electrics have none.", evidence: null },
  {
    ...UNIT,
    key: "mu",
    question: "Is it fitted for multiple-unit working?",
    kind: "choice",
    choices: YES_NO,
    hint: "Some carriers decide the place in the train by it.",
    evidence: "Photo of each end",
  },
  { ...UNIT, key: "head-end-power", question: "Does it have head-end power cables?", kind: "choice", choices: YES_NO, hint: "Their copper is what thieves want most.", evidence: null },
];
