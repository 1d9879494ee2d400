/** Parts that a company's seat on a move can have. */
export const SEAT_PARTS = ["owner", "contractor", "carrier", "receiver", "payer"] as const;
export type SeatPart = (typeof SEAT_PARTS)[number];

/** What a person of a carrier does there; one or several. */
export const CARRIER_WORKS = ["inspector", "billing", "desk"] as const;
export type CarrierWork = (typeof CARRIER_WORKS)[number];

/** The part in which somebody acts on a move: a seat's part, a carrier's split by the person's work there. `carrier` alone is a carrier's person without work yet. */
export const PARTS = ["owner", "contractor", "carrier", "inspector", "billing", "desk", "receiver", "payer"] as const;
export type Part = (typeof PARTS)[number];

export const PART_LABELS: Record<Part, string> = {
  owner: "Owner",
  contractor: "Contractor",
  carrier: "Carrier",
  inspector: "Carrier’s inspector",
  billing: "Carrier’s billing clerk",
  desk: "Carrier’s transport desk",
  receiver: "Receiver",
  payer: "Named payer",
};

/** How news of an absent carrier came in. */
export const ENTERED_SOURCES = ["paper", "e-mail", "phone"] as const;
export type EnteredSource = (typeof ENTERED_SOURCES)[number];
