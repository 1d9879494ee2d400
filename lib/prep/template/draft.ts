import { proof } from "./proof";
import type { PrepTemplateItem } from "./types";

const EVERY_UNIT = { appliesWhen: [], when: "On every unit." } as const;

/** Couplers and draft gear, both ends. */
export const DRAFT: readonly PrepTemplateItem[] = [
  {
    ...EVERY_UNIT,
    id: "D1",
    group: "draft",
    phase: "where-it-stands",
    order: 610,
    action: "At each end: coupler height, knuckle, lock, lock lifter, uncoupling lever on both sides, carrier iron.",
    why: "Carriers check the coupler before they take anything in interchange.",
    caution: "Pinch: no hand inside the knuckle, no foot under it; a knuckle pin pulled drops its knuckle. Stand clear of the line of the coupler.",
    evidence: proof("MP", { label: "Coupler height above rail at each end", unit: "in" }),
    restore: null,
    source: "common practice",
  },
  {
    ...EVERY_UNIT,
    id: "D2",
    group: "draft",
    phase: "where-it-stands",
    order: 620,
    action: "Kind of alignment control found out and photographed at each end: shank at the pin hole, and the marking of the draft gear.",
    why: "It decides where in the train the unit may ride, or whether it may ride in an ordinary train at all.",
    caution: "Pinch: photograph from outside the gauge where you can; never between equipment that may be coupled.",
    evidence: proof("P", { label: "Kind at each end" }),
    restore: null,
    source: "published",
  },
  {
    ...EVERY_UNIT,
    id: "D3",
    group: "draft",
    phase: "where-it-stands",
    order: 630,
    action: "Drawbar and draft gear looked over. Stop blocks are fitted only if the carrier's tow instruction asks for them.",
    why: "Some carriers refuse units that have stop blocks; others ask for them.",
    caution: "Pinch and heavy parts: blocks and draft gear are under load or fall when loosened.",
    evidence: proof("P", { label: "As found, and as left" }),
    restore: { action: "Put back as found: take out stop blocks that were fitted for the tow.", caution: "Pinch and heavy parts." },
    source: "published",
  },
];
