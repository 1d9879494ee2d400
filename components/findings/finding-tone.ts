import type { Tone } from "@/components/ui/tone";
import type { FindingState, Severity } from "@/lib/findings/vocabulary";

/** The colour of a finding's state; words beside it say the same. */
export function toneOfFinding({ state, severity }: { state: FindingState; severity: Severity }): Tone {
  if (state === "cleared") return "verdigris";
  if (state === "withdrawn") return "neutral";
  if (state === "answered") return "brass";
  return severity === "note" ? "slate" : "oxide";
}

/** Nothing more is awaited. */
export const isOver = (state: FindingState) => state === "cleared" || state === "withdrawn";
