/** What can be seen of a unit on its way; the standard codes stand beside each in event-codes. */
export const SIGHTING_KINDS = ["pulled", "departed", "arrived", "delivered", "received", "at-destination", "notified", "placed", "held", "hold-released", "bad-ordered", "bad-order-released", "set-out", "stored", "seen"] as const;
export type SightingKind = (typeof SIGHTING_KINDS)[number];
