import type { EnteredFor } from "@/lib/access/types";
import type { Severity, FindingState } from "@/lib/findings/vocabulary";
import type { MayStep } from "@/lib/inspections/types";
import type { RestrictionId } from "./vocabulary";

/** One acceptance as it was signed or entered. */
export type AcceptanceView = {
  id: string;
  number: string | null;
  restrictions: RestrictionId[];
  restrictionNote: string | null;
  validUntil: string | null;
  /** The day has passed at the place where the carrier takes over. */
  expired: boolean;
  /** As typed; of the person who entered it when `enteredFor` is set. */
  name: string;
  enteredFor: EnteredFor | null;
  statement: string;
  at: string;
  /** Something that it covers is no longer as it was when it was signed. */
  changed: boolean;
  withdrawnAt: string | null;
  withdrawnWhy: string | null;
};

export type CoveredFinding = { id: string; label: string; component: string; severity: Severity; state: FindingState };

/** Where the acceptance of one leg stands. */
export type AcceptanceLeg = {
  legId: string;
  seq: number;
  carrierName: string;
  fromPlace: string;
  toPlace: string;
  zone: string;
  onBoard: boolean;
  takenOver: boolean;
  standing: AcceptanceView | null;
  /** Its last day has passed before the carrier took the unit over; it is signed again. */
  lapsed: AcceptanceView | null;
  /** Withdrawn ones, the latest first. */
  withdrawn: AcceptanceView[];
  /** What keeps it from being signed; empty when it can be, or stands. */
  missing: string[];
  findings: CoveredFinding[];
  maySign: MayStep;
  mayWithdraw: MayStep;
  /** Hash of what a signature would cover now; other rows than those that were shown are not signed. */
  rowsHash: string;
};

export type Acceptances = { moveId: string; at: string; unit: string; legs: AcceptanceLeg[] };
