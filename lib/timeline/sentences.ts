import type { RecordKind } from "@/lib/record/vocabulary";
import { CASE_SENTENCES } from "./sentences/case";
import { FINDING_SENTENCES } from "./sentences/findings";
import { MONEY_SENTENCES } from "./sentences/money";
import { MOVEMENT_SENTENCES } from "./sentences/movement";
import { PREP_SENTENCES } from "./sentences/prep";
import type { Detail } from "./detail";
import type { Told } from "./sentences/told";
import type { Sentence } from "./types";

/** What may be said to one reader of an entry. */
export type Sees = { prep: boolean; findings: boolean; money: boolean; unit: boolean };

const TABLE: Record<RecordKind, Told> = { ...CASE_SENTENCES, ...PREP_SENTENCES, ...FINDING_SENTENCES, ...MONEY_SENTENCES, ...MOVEMENT_SENTENCES };

/** What an entry of the record says, in plain words; without its particulars for a reader who may not open that part of the case. */
export function sentenceOf(kind: RecordKind, detail: Detail, sees: Sees): Sentence {
  const { area, plain, tell, aside } = TABLE[kind];
  if (area && !sees[area]) return { parts: [{ text: plain }] };
  const told = tell(detail);
  return aside && sees[aside.area] ? { ...told, note: aside.note(detail) ?? told.note ?? null } : told;
}

/** The words for several entries of one kind put together; null for kinds of which each counts. */
export const foldedWords = (kind: RecordKind): ((n: number) => string) | null => TABLE[kind].folded ?? null;

/** The page where the thing itself is; null for entries without one. */
export const placeOf = (kind: RecordKind): Told["place"] | null => TABLE[kind].place ?? null;
