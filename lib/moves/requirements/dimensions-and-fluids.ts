import type { Requirement } from "./types";

const UNIT = { group: "dimensions", ofEquipment: true, column: null } as const;
const AT_THIS_MOVE = { group: "fluids", ofEquipment: false, column: null } as const;

/** What the clearance desk works with. Its thresholds differ from carrier to carrier. */
export const DIMENSIONS: readonly Requirement[] = [
  { ...UNIT, key: "height", question: "How high is it above the rail at its highest point?", kind: "length", hint: "With the stack caps on, and with anything taken off for the move left out.", evidence: "Drawing, or measured on site" },
  { ...UNIT, key: "width", question: "How wide is it at its widest point?", kind: "length", hint: "Over handrails, steps and mirrors.", evidence: "Drawing, or measured on site" },
  { ...UNIT, key: "length", question: "How long is it over the pulling faces of the couplers?", kind: "length", hint: "Pulling face to pulling face.", evidence: "Drawing" },
  { ...UNIT, key: "weight", question: "How much does it weigh as it will travel?", kind: "number", unit: "lb", hint: "With what fuel, water and sand stay on board.", evidence: "Scale ticket", column: "weightLb" },
];

/** What is on board while it travels. */
export const FLUIDS: readonly Requirement[] = [
  { ...AT_THIS_MOVE, key: "fuel", question: "How much fuel is on board?", kind: "number", unit: "US gal", hint: "One carrier wants less than 250 US gallons.", evidence: "Photo of the gauge" },
  {
    ...AT_THIS_MOVE,
    key: "water",
    question: "Is the cooling water drained?",
    kind: "choice",
    choices: [
      { value: "drained", label: "Drained, drains open" },
      { value: "antifreeze", label: "Antifreeze kept, tagged" },
      { value: "no", label: "No" },
    ],
    hint: "It must be drained where it can freeze on the way.",
    evidence: "Photo of the open drains",
  },
];
