import type { HeldPart } from "@/lib/access/types";
import type { Part } from "@/lib/access/vocabulary";
import type { Condition } from "@/lib/standing/types";
import type { MoveState, Stage, Wait } from "@/lib/standing/vocabulary";
import type { MoveFilter } from "./list-filter";
import type { Axles, BodyShape } from "./vocabulary";

/** Whose turn it is, as one viewer sees it. */
export type WaitView = {
  part: Part;
  legId: string | null;
  name: string;
  waitingFor: Wait;
  count: number | null;
  since: string;
  /** The viewer can do it. */
  you: boolean;
  /** It is for the viewer's company, but the viewer does not do this work there. */
  yourCompany: boolean;
};

export type RowLeg = { legId: string; seq: number; carrierName: string };

/** One move in a list. */
export type MoveRow = {
  moveId: string;
  caseNumber: string;
  mark: string;
  number: string;
  shape: BodyShape;
  originName: string;
  destinationName: string;
  legs: RowLeg[];
  progressMil: number;
  waiting: WaitView | null;
  openedAt: string;
  /** When it was closed or cancelled. */
  endedAt: string | null;
  state: MoveState;
  stage: Stage;
};

/** A page of moves with what the page's head says. */
export type MovePage = { rows: MoveRow[]; total: number; open: number; waitingOnYou: number; filter: MoveFilter; at: string };

export type DraftRow = { draftId: string; companyName: string; unit: string; route: string; updatedAt: string };

/** A draft as kept: the form as typed. */
export type Draft = { draftId: string; companyId: string; body: Record<string, unknown>; version: number; updatedAt: string };

/** What saving a draft answers. */
export type SavedDraft = { draftId: string; version: number; updatedAt: string };

export type Place = { name: string; place: string; zone: string };

export type CaseUnit = {
  mark: string;
  number: string;
  aliases: string[];
  shape: BodyShape;
  axles: Axles;
  fEnd: string;
  weightLb: number | null;
  model: string | null;
  builtYear: number | null;
  brakeSchedule: string;
  bearings: string;
  /** Air-brake date as stencilled, and as the register shows it. */
  airDate: string | null;
  airDateRegister: string | null;
};

export type CaseLeg = {
  legId: string;
  seq: number;
  carrierName: string;
  carrierMark: string | null;
  /** Whether people of the carrier work here; otherwise owner or contractor enter its steps for it. */
  onBoard: boolean;
  fromPlace: string;
  fromZone: string;
  toPlace: string;
  toZone: string;
  miles: number | null;
  payerName: string | null;
  takenOver: boolean;
  delivered: boolean;
  stopped: boolean;
  /** Why the owner may not change this leg any more; null while they may. */
  fixedBecause: string | null;
  /** Why its carrier may not be replaced any more; null while it may. */
  carrierFixedBecause: string | null;
  /** Why its payer may not be changed any more; null while it may. */
  payerFixedBecause: string | null;
  conditions: Condition[];
  version: number;
};

/** Whole days of a case by whom it waited on. */
export type DaysShare = { part: Part; name: string; days: number };

/** Everything that the head of a case and its first page show. */
export type CaseFile = {
  moveId: string;
  caseNumber: string;
  state: MoveState;
  stage: Stage;
  openedAt: string;
  endedAt: string | null;
  /** When this was read; days are counted to here. */
  at: string;
  version: number;
  unit: CaseUnit;
  origin: Place;
  destination: Place;
  wantedFrom: string | null;
  wantedTo: string | null;
  note: string | null;
  ownerName: string;
  contractorName: string | null;
  receiverName: string | null;
  /** Lowest speed that a standing acceptance allows, and whose it is. */
  towSpeed: { mph: number; carrierName: string } | null;
  /** `standIn`: the carrier is not on board and the viewer may enter the step for it. */
  waiting: (WaitView & { standIn: boolean }) | null;
  progressMil: number;
  legs: CaseLeg[];
  days: DaysShare[];
  parts: HeldPart[];
  /** Which parts of the case the viewer may open. */
  see: { prep: boolean; findings: boolean; fees: boolean; movement: boolean; timeline: boolean; unit: boolean };
  may: { edit: boolean; cancel: boolean; editUnit: boolean; editLegs: boolean };
  /** Things that wait behind each tab. */
  counts: { prep: number; findings: number };
};

/** The unit's answers to the requirement catalogue, by key, as the form shows them. */
export type Equipment = { moveId: string; answers: Record<string, string>; aliases: string[]; version: number };
