import { AXLE_LABELS, BEARING_LABELS } from "../labels";
import { AXLES, BEARINGS } from "../vocabulary";
import type { Requirement } from "./types";

const UNIT = { group: "running-gear", ofEquipment: true, column: null } as const;

/** Bearings, wheels, trucks and gears. */
export const RUNNING_GEAR: readonly Requirement[] = [
  {
    ...UNIT,
    key: "bearings",
    question: "Which kind of journal bearings does it have?",
    kind: "choice",
    choices: BEARINGS.map((value) => ({ value, label: BEARING_LABELS[value] })),
    hint: "Carriers differ: one asks for sealed rollers, another only for end caps that turn. Plain bearings are not taken in interchange and move by private agreement only.",
    evidence: "Photo of each journal end",
    column: "bearings",
  },
  {
    ...UNIT,
    key: "wheels",
    question: "How are the wheels: worst flange, rim and tread, and at which wheel?",
    kind: "text",
    hint: "They need enough left to make the whole trip; thin wheels mean new wheelsets before interchange. Each wheel's figures are kept as measurements.",
    evidence: "Gauge photo of each wheel",
  },
  {
    ...UNIT,
    key: "gear-ratio",
    question: "Which gear ratio does it have?",
    kind: "text",
    hint: "With the wheel size it gives the speed that the motors stand; written like 62:15.",
    evidence: "Photo of the builder's plate",
  },
  {
    ...UNIT,
    key: "axles",
    question: "How many axles does it have?",
    kind: "choice",
    choices: AXLES.map((value) => ({ value: String(value), label: AXLE_LABELS[value] })),
    hint: "Some clearance desks look at every unit with more than four.",
    evidence: null,
    column: "axles",
  },
  { ...UNIT, key: "axle-spacing", question: "What is the axle spacing in each truck?", kind: "length", hint: "Center to center of neighboring axles.", evidence: "Drawing" },
  { ...UNIT, key: "truck-centers", question: "How far apart are the truck centers?", kind: "length", hint: "Decides how far the body swings out in a curve.", evidence: "Drawing" },
  { ...UNIT, key: "wheel-diameter", question: "Which wheel diameter does it have?", kind: "length", hint: "As measured now, not as new.", evidence: null },
  { ...UNIT, key: "journal-size", question: "Which journal size does it have?", kind: "text", hint: "As stencilled or cast, for instance 6-1/2 x 12.", evidence: null },
];
