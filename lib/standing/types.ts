import type { Part } from "@/lib/access/vocabulary";
import type { MoveState, Stage, Wait } from "./vocabulary";

export type PhaseFacts = { total: number; left: number; signed: boolean };

/** What one leg has come to; plain facts, gathered from the rows of all rooms. */
export type LegFacts = {
  legId: string;
  seq: number;
  carrierName: string;
  carrierMark: string | null;
  carrierCompanyId: string | null;
  fromPlace: string;
  toPlace: string;
  miles: number | null;
  payerName: string | null;
  payerCompanyId: string | null;
  visits: number;
  findings: number;
  openFindings: number;
  answeredFindings: number;
  /** Findings that stop the move and are neither cleared nor withdrawn. */
  stoppingOpen: number;
  /** Findings that must be answered before pickup and have no answer yet. */
  unansweredBeforePickup: number;
  accepted: boolean;
  acceptanceNumber: string | null;
  /** The last day of an acceptance that has run out before the carrier took the unit over. */
  acceptanceLapsedOn: string | null;
  quote: "none" | "given" | "agreed" | "paid";
  /** A quote was given whose last day to agree has passed; only another one helps. */
  quoteLapsed: boolean;
  paymentOpen: boolean;
  billingCleared: boolean;
  instructed: boolean;
  released: boolean;
  /** Pulled on the first leg, received from the carrier before on a later one. */
  takenOver: boolean;
  delivered: boolean;
  atDestination: boolean;
  placed: boolean;
};

export type MoveFacts = {
  state: MoveState;
  ownerCompanyId: string;
  ownerName: string;
  contractor: { companyId: string; name: string } | null;
  receiver: { companyId: string; name: string } | null;
  standing: PhaseFacts;
  coupled: PhaseFacts;
  arrived: boolean;
  restoreTotal: number;
  restoreLeft: number;
  legs: LegFacts[];
};

/** Whose turn it is. `companyId` is null for a carrier that is entered by name only. */
export type WaitingOn = { part: Part; legId: string | null; companyId: string | null; name: string; waitingFor: Wait; count: number | null };

export type Standing = { stage: Stage; waiting: WaitingOn | null; progressMil: number };

/** One thing that must stand before a carrier moves the unit on a leg. */
export type Condition = { id: "prep" | "acceptance" | "billing" | "instruction" | "release" | "coupled" | "answers" | "delivered"; label: string; met: boolean; detail: string };
