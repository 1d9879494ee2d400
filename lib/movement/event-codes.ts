import type { SightingKind } from "@/lib/movement/vocabulary";

/** A sighting in the trade's words and codes; null where that list has no code for it. */
export type EventCode = {
  readonly label: string;
  /** One-letter car location message; J should be followed by R. */
  readonly clm: string | null;
  /** Three-letter event of ASC X12 element 304. */
  readonly x12: string | null;
};

/**
 * Codes from the CLM list and X12 element 304. The same letter means other things in other lists (D and H in X12 element
 * 157), so a code is never kept without the name of its list.
 */
export const EVENT_CODES: Record<SightingKind, EventCode> = {
  pulled: { label: "Pulled", clm: "X", x12: "PFP" },
  departed: { label: "Departed", clm: "P", x12: "DFL" },
  arrived: { label: "Arrived", clm: "A", x12: "ARI" },
  delivered: { label: "Handed over", clm: "J", x12: "ICH" },
  received: { label: "Taken over", clm: "R", x12: "ICR" },
  "at-destination": { label: "Arrived at destination", clm: "D", x12: "ARR" },
  notified: { label: "Notified (clock runs)", clm: "Y", x12: "PCO" },
  placed: { label: "Placed", clm: "Z", x12: "PAC" },
  held: { label: "Held", clm: "H", x12: "HMI" },
  "hold-released": { label: "Hold released", clm: null, x12: "HRE" },
  "bad-ordered": { label: "Bad order", clm: "B", x12: "BAD" },
  "bad-order-released": { label: "Released from bad order", clm: "G", x12: "BFR" },
  // Element 304 knows an anticipated set-out (ASO) but none that has happened.
  "set-out": { label: "Set out", clm: null, x12: null },
  // STU is stored serviceable; the CLM letter does not tell which.
  stored: { label: "Stored", clm: "S", x12: "STU" },
  // Somebody saw it; no carrier reported it.
  seen: { label: "Seen", clm: null, x12: null },
};

/** The codes as a person reads them, each with its list: "CLM J, X12 304 ICH"; null where neither list has one. */
export function eventCodeText(kind: SightingKind): string | null {
  const { clm, x12 } = EVENT_CODES[kind];
  const parts = [clm === null ? null : `CLM ${clm}`, x12 === null ? null : `X12 304 ${x12}`].filter((part) => part !== null);
  return parts.length > 0 ? parts.join(", ") : null;
}
