export const AIR_STATES = ["on", "off", "not-said"] as const;
export type AirState = (typeof AIR_STATES)[number];

export const AIR_LABELS: Record<AirState, string> = { on: "Air was on the unit", off: "No air on the unit", "not-said": "Not said" };
