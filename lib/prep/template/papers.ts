import { proof } from "./proof";
import type { PrepTemplateItem } from "./types";

const EVERY_UNIT = { appliesWhen: [], when: "On every unit." } as const;

/** What hangs on the unit or lies in its cab. */
export const PAPERS: readonly PrepTemplateItem[] = [
  {
    ...EVERY_UNIT,
    id: "T1",
    group: "papers",
    phase: "where-it-stands",
    order: 810,
    action: "Tow card hung: dead in tow, brake set-up, greatest speed, place in train, people to call, do not start.",
    why: "Crews differ from division to division, and a crew that does not know an old unit damages it or undoes its set-up.",
    caution: "The card informs; what the carrier's own instruction says comes first.",
    evidence: proof("PT"),
    restore: { action: "Take the card off and keep it with the case.", caution: "Only when everything it warns of has been put back." },
    source: "common practice",
  },
  {
    id: "T2",
    group: "papers",
    phase: "where-it-stands",
    order: 820,
    // 49 CFR 229.9(a)(3): seven items, and where the tag hangs.
    action:
      "If a federal defect travels: the \"non-complying locomotive\" tag of 49 CFR 229.9(a)(3) hung by the carrier's qualified person, at the control stand of an MU or control cab unit, otherwise at the isolation switch or near the start switch. If none travels, mark this line as not applicable.",
    why: "Without it the unit may not be moved with the defect.",
    caution: "A qualified person decides whether the move is safe, at what speed, and with what restrictions; nobody else fills the tag.",
    evidence: proof("PT", { label: "Defects and restrictions on the tag" }),
    restore: { action: "Take the tag off together with the repair record.", caution: "Not before the defect is repaired." },
    source: "published",
    appliesWhen: [],
    when: "Units that travel with a federal defect.",
  },
  {
    ...EVERY_UNIT,
    id: "T3",
    group: "papers",
    phase: "where-it-stands",
    order: 830,
    action: "Bad-order cards on the unit listed: how far each lets it go (to a named place, or to the repair track only), who wrote it, and where. Stale ones cleared up with those who may take them off.",
    why: "A card that was left on stops the unit somewhere else; month-old cards have been found still hanging.",
    caution: "Only authorized persons take a card off.",
    evidence: proof("PT", { label: "Cards found: level, inspector, place" }),
    restore: { action: "Taken off only with the repair record.", caution: "Only by someone authorized." },
    source: "published",
  },
  {
    ...EVERY_UNIT,
    id: "T4",
    group: "papers",
    phase: "where-it-stands",
    order: 840,
    // Form FRA F6180-49A, displayed under 49 CFR 229.23(d).
    action: "Blue card (FRA F6180-49A) in the cab under a clear cover, a copy in the case; if it is kept elsewhere, say where.",
    why: "The card has to be displayed; a missing card is a common reason to fail an inspection.",
    caution: null,
    evidence: proof("PT", { label: "Where the original is" }),
    restore: { action: "Bring the card up to date: the out-of-use entry (item 11) and what else has changed.", caution: null },
    source: "published",
  },
  {
    ...EVERY_UNIT,
    id: "T5",
    group: "papers",
    phase: "where-it-stands",
    order: 850,
    action: "List of parts taken off, keys, where the box is, and seal numbers.",
    why: "It settles at arrival what was taken off on purpose and what was stolen.",
    caution: null,
    evidence: proof("", { label: "List of parts, keys and seals" }),
    restore: { action: "Check the parts off against the list.", caution: null },
    source: "published",
  },
];
