import type { PrepTemplateItem } from "./template/types";

type Stage = { readonly id: string; readonly label: string; readonly caution: string; readonly items: readonly string[] };

/** The way back, stage by stage; ids within a stage in working order. Rows not named here follow their group. */
export const RESTORE_STAGES = [
  {
    id: "secure",
    label: "Secure the unit where it arrived",
    caution: "Nobody works on the unit before hand brake, chocks and blue signals hold and protect it.",
    items: ["C5", "C6", "C1", "A14"],
  },
  {
    id: "contents",
    label: "Open up and find the parts",
    caution: "What is missing stops the steps that need it; do not start around it.",
    items: ["B2", "T5", "B3", "B1"],
  },
  {
    id: "running-gear",
    label: "Running gear and draft",
    caution: "Chocks in, hand brake on, blue signal up before anyone goes under.",
    items: ["R2", "R3", "R4", "D3", "E7"],
  },
  {
    id: "power-plant",
    label: "Engine, water, oil and fuel",
    caution: "Stack caps come off before the engine is barred over, and the test cocks stand open while it is barred.",
    items: ["P1", "P2", "P5", "P7", "P3", "P4", "P6", "P8"],
  },
  {
    id: "electrical",
    label: "Electrical, battery last",
    caution: "Motors pass their insulation test before any power reaches them. The battery switch closes last, loads off and polarity checked.",
    items: ["E6", "E8", "E9", "E5", "E2", "E3", "E4", "E1"],
  },
  {
    id: "brakes",
    label: "Air and brakes",
    caution: "The dead-engine cock is closed before the unit makes its own air. Hand brake on and wheels chocked until the brake has been restored and tested.",
    items: ["A7", "A6", "A8", "A4", "A3", "A11", "A10", "A1", "A2", "A5", "A17", "A15", "A16", "A13", "A9"],
  },
  {
    id: "papers",
    label: "Lights, marks, tags and cards",
    caution: "A tag comes off only when what it warns of has been put back or repaired.",
    items: ["B8", "B7", "T3", "T2", "T4", "T1"],
  },
] as const satisfies readonly Stage[];

/** Pairs that are never turned round: the first is restored before the second, for the reason given. */
export const RESTORE_BEFORE: readonly { readonly first: string; readonly then: string; readonly because: string }[] = [
  { first: "C5", then: "C1", because: "The unit is held by its hand brake before people go under it." },
  { first: "P1", then: "P7", because: "Stack caps come off before the engine is barred over." },
  { first: "P7", then: "P6", because: "The engine is barred over with test cocks open before fuel can reach it." },
  { first: "P7", then: "E3", because: "The starting fuse stays out while the engine is barred over." },
  { first: "E6", then: "E1", because: "Motors pass their insulation test before power comes back." },
  { first: "E2", then: "E1", because: "Polarity is checked on the refitted battery before its switch closes." },
  { first: "E4", then: "E1", because: "The battery switch closes with every load off." },
  { first: "A7", then: "A5", because: "The dead-engine cock is closed before the unit makes its own air." },
  { first: "A7", then: "A9", because: "The brake is tested after its set-up for the tow has been undone." },
  { first: "A8", then: "A9", because: "The brake is tested at its service setting." },
  { first: "A9", then: "T1", because: "The tow card stays until the brake has been tested." },
];

/** One line of the way back. */
export type RestoreStep = {
  id: string;
  stage: (typeof RESTORE_STAGES)[number]["id"];
  stageLabel: string;
  /** The caution that holds for the whole stage. */
  stageCaution: string;
  action: string;
  caution: string | null;
};

const GROUP_STAGE: Record<PrepTemplateItem["group"], RestoreStep["stage"]> = {
  safety: "secure",
  "when-coupled": "secure",
  "air-brakes": "brakes",
  electrical: "electrical",
  "power-plant": "power-plant",
  "running-gear": "running-gear",
  draft: "running-gear",
  body: "contents",
  papers: "papers",
};

/** Where an item stands on the way back. A row of its own that the list does not name comes first in its group's stage, so that battery and tests stay last. */
function placeOf(item: PrepTemplateItem): { stage: number; within: number } {
  const named = RESTORE_STAGES.findIndex((stage) => (stage.items as readonly string[]).includes(item.id));
  if (named < 0) return { stage: RESTORE_STAGES.findIndex((stage) => stage.id === GROUP_STAGE[item.group]), within: -1 };
  const items: readonly string[] = RESTORE_STAGES[named]?.items ?? [];
  return { stage: named, within: items.indexOf(item.id) };
}

/** The way back for the items of one unit. Items that are never undone have no step. */
export function restoreOrder(items: readonly PrepTemplateItem[]): RestoreStep[] {
  const steps = items.flatMap((item) => {
    const place = placeOf(item);
    const stage = RESTORE_STAGES[place.stage];
    if (!item.restore || !stage) return [];
    const step: RestoreStep = { id: item.id, stage: stage.id, stageLabel: stage.label, stageCaution: stage.caution, ...item.restore };
    return [{ step, place }];
  });
  steps.sort((a, b) => a.place.stage - b.place.stage || a.place.within - b.place.within);
  return steps.map(({ step }) => step);
}

/** Why an item may not be restored yet: the reasons of every earlier item of this unit that is still to be restored. */
export function restoreTooEarly(id: string, stillToRestore: ReadonlySet<string>): string[] {
  return RESTORE_BEFORE.filter((pair) => pair.then === id && stillToRestore.has(pair.first)).map((pair) => pair.because);
}
