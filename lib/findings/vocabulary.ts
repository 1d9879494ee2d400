export const FINDING_STATES = ["open", "answered", "cleared", "withdrawn"] as const;
export type FindingState = (typeof FINDING_STATES)[number];

/** What a finding means for the move, from the inspector who posts it. */
export const SEVERITIES = ["stops-move", "answer-before-pickup", "note"] as const;
export type Severity = (typeof SEVERITIES)[number];

export const SEVERITY_LABELS: Record<Severity, string> = {
  "stops-move": "Stops the move",
  "answer-before-pickup": "Must be answered before pickup",
  note: "Note",
};

export const FINDING_STATE_LABELS: Record<FindingState, string> = { open: "Open", answered: "Answered", cleared: "Cleared", withdrawn: "Withdrawn" };

/** Entries in a finding's thread, in the order in which they were said. */
export const FINDING_ENTRIES = ["answer", "not-cleared", "cleared", "withdrawn"] as const;
export type FindingEntryKind = (typeof FINDING_ENTRIES)[number];
