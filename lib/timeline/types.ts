import type { EnteredFor } from "@/lib/access/types";
import type { Part } from "@/lib/access/vocabulary";
import type { Handing } from "./follow";
import type { DaysOf } from "./days";
import type { RecordKind } from "@/lib/record/vocabulary";
import type { Axles, BodyShape } from "@/lib/moves/vocabulary";

/** A stretch of a sentence; the strong one is what it is about, and carries the link. */
export type SentencePart = { text: string; strong?: true };

/** What a tone says, as everywhere else: oxide is wrong, brass waits, verdigris stands, slate informs. */
export type EntryTone = "oxide" | "brass" | "verdigris" | "slate" | "neutral";

export type Sentence = {
  parts: SentencePart[];
  /** What was said besides: a reason, a reading. */
  note?: string | null;
  /** The state that it brought about, in a word. */
  state?: { tone: EntryTone; word: string };
};

/** An entry of the record as the database keeps it, with its moment as ISO text. */
export type RawEntry = {
  id: string;
  seq: number;
  kind: string;
  byName: string;
  byCompanyName: string | null;
  byPart: Part | null;
  legId: string | null;
  enteredFor: EnteredFor | null;
  detail: Record<string, unknown>;
  at: string;
};

/** One line of the timeline. */
export type Entry = {
  id: string;
  kind: RecordKind;
  /** When it happened; for a sighting not the moment at which we heard of it. */
  at: string;
  zone: string;
  parts: SentencePart[];
  note: string | null;
  /** Lines of the same kind that were put together. */
  folded: string[];
  by: string;
  company: string | null;
  part: Part | null;
  enteredFor: EnteredFor | null;
  state: Sentence["state"] | null;
  /** Where the thing itself can be seen; null when the viewer may not open it. */
  link: string | null;
  photos: number;
  /** Set when a later entry took it back: why. */
  struck: string | null;
  /** Whole days between what happened and its entry. */
  enteredLate: number;
};

export type TimelineRow =
  | { type: "day"; id: string; day: string; entries: Entry[] }
  /** Days without an entry, and whom they waited on. */
  | { type: "quiet"; id: string; days: number; name: string | null; goesOn: boolean };

export type Timeline = {
  unit: string;
  openedAt: string;
  originZone: string;
  days: { total: number; parts: DaysOf[] };
  rows: TimelineRow[];
  /** Entries on this page, and in all that the viewer may see. */
  shown: number;
  total: number;
  chain: { entries: number; brokenAt: number | null };
  at: string;
};

/** One line of what a notify party reads: no names of people, no money. */
export type FollowEntry = { id: string; at: string; zone: string; text: string; struck: boolean; /** A report of where the unit was. */ seen: boolean };

export type FollowView = {
  unit: { mark: string; number: string; shape: BodyShape; axles: Axles };
  caseNumber: string;
  from: { name: string; place: string };
  to: { name: string; place: string };
  wantedFrom: string | null;
  wantedTo: string | null;
  stage: string;
  /** Thousandths of the route that lie behind the unit. */
  progressMil: number;
  handings: Handing[];
  days: { day: string; entries: FollowEntry[] }[];
  goodUntil: string;
  originZone: string;
  at: string;
};
