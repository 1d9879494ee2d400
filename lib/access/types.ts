import type { EnteredSource, Part } from "./vocabulary";

/** One part that the viewer holds on a move. `legId` is set for a carrier's and a payer's part. */
export type HeldPart = { part: Part; legId: string | null; companyId: string };

/** A carrier's step, entered by owner or contractor on its behalf. Never the carrier's own signature. */
export type EnteredFor = { carrierName: string; source: EnteredSource; heardOn: string; saidBy: string; reference: string | null };
