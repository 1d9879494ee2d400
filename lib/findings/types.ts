import type { EnteredFor } from "@/lib/access/types";
import type { PhotoView } from "@/lib/evidence/types";
import type { MayStep } from "@/lib/inspections/types";
import type { AirState } from "@/lib/inspections/vocabulary";
import type { UnitForm } from "@/lib/moves/places";
import type { ComponentGroup } from "./components";
import type { FindingAct } from "./rules";
import type { FindingEntryKind, FindingState, Severity } from "./vocabulary";

/** The unit as findings show it; `form` is null where no outline exists. */
export type FoundUnit = { mark: string; number: string; form: UnitForm | null };

/** One finding as a list shows it. */
export type FindingView = {
  id: string;
  /** F-01 */
  label: string;
  legId: string;
  carrierName: string;
  /** Zone of the leg's first place; times are shown in it. */
  zone: string;
  inspectionId: string;
  visitNumber: number;
  visitedOn: string;
  inspectorName: string;
  air: AirState;
  componentId: string;
  component: string;
  /** Null for a component that the list no longer has. */
  group: ComponentGroup | null;
  placeId: string | null;
  /** The place in words, with what was added to it; null for the whole unit. */
  where: string | null;
  observed: string;
  reading: string | null;
  condition: string | null;
  severity: Severity;
  noPhotoReason: string | null;
  photoCount: number;
  state: FindingState;
  /** Answered, and not cleared then. */
  sentBack: boolean;
  /** Since when it is in this state. */
  stateSince: string;
  rounds: number;
  byName: string;
  enteredFor: EnteredFor | null;
  at: string;
  version: number;
};

/** The findings of a move, in the order of their numbers, and on which legs the viewer may post. */
export type FindingsBoard = { moveId: string; at: string; unit: FoundUnit; findings: FindingView[]; mayPost: { legId: string; may: MayStep }[] };

/** Something that was said about a finding. */
export type FindingEntry = {
  id: string;
  round: number;
  kind: FindingEntryKind;
  text: string;
  reading: string | null;
  wouldSatisfy: string | null;
  byName: string;
  byCompanyName: string;
  enteredFor: EnteredFor | null;
  at: string;
  photos: PhotoView[];
};

/** One finding with everything that was said about it. `now` is when it was read. */
export type FindingDetail = FindingView & {
  moveId: string;
  now: string;
  unit: FoundUnit;
  /** How many findings the move has. */
  total: number;
  photos: PhotoView[];
  entries: FindingEntry[];
  may: Record<FindingAct, MayStep>;
};
