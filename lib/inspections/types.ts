import type { EnteredFor } from "@/lib/access/types";
import type { AirState } from "./vocabulary";

/** How the viewer may do a carrier's step: as the carrier, or entered for one that is not on board. */
export type MayStep = "self" | "enter" | null;

/** One visit of a carrier's inspector to the unit. */
export type VisitView = {
  id: string;
  legId: string;
  /** Counts from 1 on the leg. */
  number: number;
  visitedOn: string;
  place: string;
  zone: string;
  inspectorName: string;
  air: AirState;
  airSource: string | null;
  airPsi: number | null;
  note: string | null;
  enteredBy: string;
  enteredFor: EnteredFor | null;
  at: string;
};

/** One carrier of the route with its visits. */
export type InspectedLeg = {
  legId: string;
  seq: number;
  carrierName: string;
  carrierMark: string | null;
  /** Whether anybody of the carrier sits on this move. */
  onBoard: boolean;
  fromPlace: string;
  zone: string;
  takenOver: boolean;
  visits: VisitView[];
  mayVisit: MayStep;
};

/** The visits of a move, carrier by carrier in the order of the route. `today` is per leg's zone at the time of reading. */
export type Inspections = { moveId: string; at: string; legs: InspectedLeg[] };
