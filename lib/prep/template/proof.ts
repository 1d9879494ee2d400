import type { PrepEvidence } from "./types";

/** The trade's evidence letters: P photo, M measurement, T tag number; a typed value comes with its label. */
export function proof(letters: string, value: PrepEvidence["value"] = null): PrepEvidence {
  return { photo: letters.includes("P"), measurement: letters.includes("M"), tag: letters.includes("T"), value };
}
