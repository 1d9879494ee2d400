/** Kinds of entries in a move's record. A new kind needs a sentence in lib/timeline and an audience below. */
export const RECORD_KINDS = [
  "move.opened", "move.changed", "move.cancelled", "equipment.changed", "leg.changed",
  "party.invited", "party.joined", "party.removed", "invitation.revoked", "carrier.named", "follow.made", "follow.ended",
  "photo.taken", "photo.kept", "photo.refused",
  "prep.done", "prep.skipped", "prep.reopened", "prep.signed", "prep.signature-lifted",
  "inspection.visited", "finding.posted", "finding.answered", "finding.not-cleared", "finding.cleared", "finding.withdrawn",
  "acceptance.signed", "acceptance.withdrawn",
  "quote.given", "quote.agreed", "quote.voided", "payment.begun", "payment.paid", "payment.failed", "payment.flagged", "billing.cleared",
  "instruction.given", "instruction.withdrawn", "unit.released", "sighting.made", "sighting.retracted",
  "arrival.recorded", "restore.done", "restore.kept", "restore.reopened", "move.closed",
] as const;
export type RecordKind = (typeof RECORD_KINDS)[number];

/** Who may read an entry: everybody seated, those who see fees, or also a notify party by link. */
export type Audience = "seated" | "money" | "follow";

const MONEY: readonly RecordKind[] = ["quote.given", "quote.agreed", "quote.voided", "payment.begun", "payment.paid", "payment.failed", "payment.flagged"];
const FOLLOW: readonly RecordKind[] = ["move.opened", "prep.signed", "acceptance.signed", "unit.released", "sighting.made", "sighting.retracted", "arrival.recorded", "move.closed", "move.cancelled"];

export const audienceOf = (kind: RecordKind): Audience => (MONEY.includes(kind) ? "money" : FOLLOW.includes(kind) ? "follow" : "seated");

/** What a signature can stand under. */
export const SIGNATURE_KINDS = ["prep-where-it-stands", "prep-when-coupled", "acceptance", "release", "arrival", "closing"] as const;
export type SignatureKind = (typeof SIGNATURE_KINDS)[number];
