/** Uncoupled and without air, a unit is held by its hand brake and chocks alone; some work waits for the carrier's engine. */
export const PREP_PHASES = ["where-it-stands", "when-coupled"] as const;
export type PrepPhase = (typeof PREP_PHASES)[number];

/** The order of the groups on a printed checklist. */
export const PREP_GROUPS = ["protection", "air-brakes", "electrical", "power-plant", "running-gear", "draft", "body", "papers", "coupling"] as const;
export type PrepGroup = (typeof PREP_GROUPS)[number];

/** "common practice" marks a row for which no published source was read. */
export const PREP_SOURCES = ["published", "common practice"] as const;
export type PrepSource = (typeof PREP_SOURCES)[number];
