/** The groups in which an inspector's sheet asks. */
export const REQUIREMENT_GROUPS = ["identity", "running-gear", "draft", "brakes", "dimensions", "fluids", "body", "papers"] as const;
export type RequirementGroup = (typeof REQUIREMENT_GROUPS)[number];

/** Groups as shown on screen. */
export const REQUIREMENT_GROUP_LABELS: Record<RequirementGroup, string> = {
  identity: "Identity",
  "running-gear": "Running gear",
  draft: "Couplers and draft gear",
  brakes: "Brakes",
  dimensions: "Dimensions and weight",
  fluids: "Fuel and water",
  body: "Body and safety",
  papers: "Papers and money",
};

export type Choice = { readonly value: string; readonly label: string };

/** Answers that stand in a column of their own, because they are computed with; the others are kept by key. */
export type EquipmentColumn = "mark" | "number" | "fEnd" | "shape" | "axles" | "weightLb" | "model" | "builtYear" | "brakeSchedule" | "bearings" | "alignment";

/** One thing that a carrier may ask before it accepts a unit. Which carrier asks it, and its limit, is that carrier's own matter. */
export type Requirement = {
  readonly key: string;
  readonly question: string;
  readonly kind: "choice" | "text" | "number" | "date" | "length";
  readonly choices?: readonly Choice[];
  readonly unit?: string;
  /** What published sources say about it, or why it is asked. */
  readonly hint: string;
  readonly group: RequirementGroup;
  /** What proves the answer; null where the answer is enough. */
  readonly evidence: string | null;
  /** True for a fact about the unit, which travels with it; false for a matter of this one move. */
  readonly ofEquipment: boolean;
  readonly column: EquipmentColumn | null;
};

/** The choice of a plain question. */
export const YES_NO: readonly Choice[] = [
  { value: "yes", label: "Yes" },
  { value: "no", label: "No" },
];
