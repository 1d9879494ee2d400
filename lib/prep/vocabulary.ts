/** Prep happens in two phases: an uncoupled unit without air is held by hand brake and chocks alone. */
export const PREP_PHASES = ["where-it-stands", "when-coupled"] as const;
export type PrepPhase = (typeof PREP_PHASES)[number];

export const PREP_GROUPS = ["safety", "power-plant", "electrical", "air-brakes", "running-gear", "draft", "body", "papers", "when-coupled"] as const;
export type PrepGroup = (typeof PREP_GROUPS)[number];

export const PREP_STATES = ["to-do", "done", "not-applicable"] as const;
export type PrepState = (typeof PREP_STATES)[number];

/** `none`: nothing to undo. `later`: not yet disturbed or the unit has not arrived. `kept` needs the receiver's word. */
export const RESTORE_STATES = ["none", "later", "to-restore", "restored", "kept"] as const;
export type RestoreState = (typeof RESTORE_STATES)[number];
