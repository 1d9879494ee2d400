import type { EnteredFor } from "@/lib/access/types";
import type { PhotoView } from "@/lib/evidence/types";
import type { Condition } from "@/lib/standing/types";
import type { SightingKind } from "./vocabulary";

/** A report of where the unit was; codes come from event-codes. */
export type SightingView = {
  id: string;
  legId: string;
  kind: SightingKind;
  place: string;
  zone: string;
  occurredAt: string;
  train: string | null;
  note: string | null;
  byName: string;
  enteredFor: EnteredFor | null;
  at: string;
  retracted: { at: string; why: string } | null;
  corrects: string | null;
  photos: PhotoView[];
  /** The viewer may retract it. */
  mayRetract: boolean;
};

export type InstructionView = {
  id: string;
  billNumber: string;
  clearanceNumber: string | null;
  train: string | null;
  pickupFrom: string | null;
  text: string | null;
  byName: string;
  enteredFor: EnteredFor | null;
  at: string;
};

export type ReleaseView = { name: string; statement: string; note: string | null; at: string };

/** One leg as the movement tab shows it. */
export type MovementLeg = {
  legId: string;
  seq: number;
  carrierName: string;
  fromPlace: string;
  fromZone: string;
  toPlace: string;
  toZone: string;
  onBoard: boolean;
  conditions: Condition[];
  instruction: InstructionView | null;
  release: ReleaseView | null;
  takenOver: boolean;
  delivered: boolean;
  /** Restrictions of the standing acceptance, in words. */
  restrictions: string[];
  /** Last day of the standing acceptance, where the inspector named one. */
  validUntil: string | null;
  /** Kinds that the viewer may record now, in the order in which they usually come. */
  kinds: SightingKind[];
  /** `enterFor`: by entering what the absent carrier told. `asReceiver`: what the viewer saw as the receiver. */
  may: { instruct: boolean; sight: boolean; release: boolean; enterFor: boolean; asReceiver: boolean };
};

export type ArrivalView = { arrivedOn: string; condition: string; missing: string | null; byName: string; signedAs: string; at: string; photos: PhotoView[] };

export type Movement = {
  unit: string;
  legs: MovementLeg[];
  sightings: SightingView[];
  /** Null as well for those who may not read what was found; `arrived` says that it was recorded. */
  arrival: ArrivalView | null;
  arrived: boolean;
  destination: { name: string; place: string; zone: string };
  placed: boolean;
  restore: { total: number; left: number };
  closing: { may: boolean; missing: string[]; closedAt: string | null };
  may: { arrive: boolean };
  /** When this was read; days are counted to here. */
  at: string;
};
