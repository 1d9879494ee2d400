import type { PhotoView } from "@/lib/evidence/types";
import type { PrepGroup, PrepPhase, PrepState, RestoreState } from "./vocabulary";

/** One item as the list shows it. */
export type PrepItem = {
  id: string;
  templateId: string;
  group: PrepGroup;
  phase: PrepPhase;
  action: string;
  why: string;
  caution: string | null;
  needsPhoto: boolean;
  needsTag: boolean;
  valueLabel: string | null;
  valueUnit: string | null;
  published: boolean;
  state: PrepState;
  value: string | null;
  tagNumber: string | null;
  note: string | null;
  skippedWhy: string | null;
  byName: string | null;
  at: string | null;
  restoreAction: string | null;
  restoreCaution: string | null;
  restoreOrder: number;
  restoreState: RestoreState;
  restoreNote: string | null;
  restoredByName: string | null;
  restoredAt: string | null;
  version: number;
  photos: PhotoView[];
  restorePhotos: PhotoView[];
};

/** A phase's signature; `lifted` tells why one that was given stands no more. */
export type PhaseSignature = { name: string; at: string } | null;

export type PrepPhaseView = { phase: PrepPhase; total: number; left: number; signature: PhaseSignature; lifted: { why: string; at: string } | null; rowsHash: string };

export type PrepList = {
  items: PrepItem[];
  phases: PrepPhaseView[];
  arrived: boolean;
  originZone: string;
  destinationZone: string;
  may: { work: boolean; restore: boolean; keep: boolean; photo: boolean };
  /** Why the second phase can't be worked yet; null when it can. */
  coupledWaitsFor: string | null;
};
