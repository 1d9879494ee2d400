import { denyAction, type Action, type Doing } from "@/lib/access/policy";
import type { HeldPart } from "@/lib/access/types";
import type { Denial, FieldErrors } from "@/lib/errors";
import { placeName } from "@/lib/moves/places";
import type { Axles } from "@/lib/moves/vocabulary";
import { findComponent } from "./components";
import type { FindingEntryKind, FindingState } from "./vocabulary";

/** What can be done with a finding once it is posted. */
export const FINDING_ACTS = ["answer", "not-cleared", "clear", "withdraw"] as const;
export type FindingAct = (typeof FINDING_ACTS)[number];

/** The line of the policy that an act falls under: the contractor answers, the inspector of the leg does the rest. */
export const ACTION_OF: Record<FindingAct, Action> = { answer: "finding.answer", "not-cleared": "finding.clear", clear: "finding.clear", withdraw: "finding.clear" };

/** What an act leaves in the thread. */
export const ENTRY_OF: Record<FindingAct, FindingEntryKind> = { answer: "answer", "not-cleared": "not-cleared", clear: "cleared", withdraw: "withdrawn" };

/** Where each act leads. A second answer before the inspector replies adds to the round; cleared and withdrawn are ends. */
const NEXT: Record<FindingState, Partial<Record<FindingAct, FindingState>>> = {
  open: { answer: "answered", withdraw: "withdrawn" },
  answered: { answer: "answered", "not-cleared": "open", clear: "cleared", withdraw: "withdrawn" },
  cleared: {},
  withdrawn: {},
};

const WHY_NOT_OPEN: Partial<Record<FindingAct, string>> = {
  clear: "A finding is cleared once its answer has been looked at. It has no answer to look at yet.",
  "not-cleared": "There is no answer to look at yet.",
};

/** Null when the state allows the act; otherwise why not. */
export function denyState(state: FindingState, act: FindingAct): Denial | null {
  if (NEXT[state][act]) return null;
  if (state === "open") return { code: "not_yet", message: WHY_NOT_OPEN[act] ?? "Not yet." };
  return { code: "stale", message: state === "cleared" ? "This finding is cleared; nothing more is said about it. Something new is a finding of its own." : "This finding was withdrawn; nothing more is said about it." };
}

/** Null when somebody in these parts may do it to a finding in this state. */
export function denyAct(finding: { state: FindingState; legId: string }, act: FindingAct, parts: readonly HeldPart[], doing: Pick<Doing, "enteredFor" | "carrierOnBoard"> = {}): Denial | null {
  return denyAction(parts, { action: ACTION_OF[act], legId: finding.legId, ...doing }) ?? denyState(finding.state, act);
}

/** State, rounds and the entry's round after an act that was allowed. A round is begun by the first answer after a reply. */
export function afterAct(finding: { state: FindingState; rounds: number }, act: FindingAct): { state: FindingState; rounds: number; round: number } {
  const rounds = finding.rounds + (act === "answer" && finding.state === "open" ? 1 : 0);
  return { state: NEXT[finding.state][act] ?? finding.state, rounds, round: rounds };
}

type Posting = { componentId: string; placeId: string | null; placeNote: string | null; photoIds: readonly string[]; noPhotoReason: string | null };

export const NO_PLACE_WORDS = "Say where on the unit it is: on the drawing, from the list or in words.";
export const NO_PHOTO_WORDS = "Add a photo, or say below why there is none.";

/** Whether the part sits somewhere on the unit and nobody has said where. */
export const lacksPlace = ({ componentId, placeId, placeNote }: Partial<Posting>) => (findComponent(componentId ?? "")?.places.length ?? 0) > 0 && !placeId && !placeNote;

/** Whether there is neither a photo nor the reason why there is none. */
export const lacksPhoto = ({ photoIds, noPhotoReason }: Partial<Posting>) => (photoIds?.length ?? 0) === 0 && !noPhotoReason;

/** A finding says what and where on this unit, and shows it or says why it can't. */
export function denyPosting(given: Posting, axles: Axles | null): Denial | null {
  const fields: FieldErrors = {};
  if (!findComponent(given.componentId)) fields.componentId = ["Choose what the finding is about."];
  if (given.placeId && !(axles && placeName(given.placeId, axles))) fields.placeId = ["This unit has no such place."];
  if (lacksPlace(given)) fields.placeId = [NO_PLACE_WORDS];
  if (lacksPhoto(given)) fields.photoIds = [NO_PHOTO_WORDS];
  return Object.keys(fields).length > 0 ? { code: "bad_input", message: "Some entries need another look.", fields } : null;
}
