import { answerText, findRequirement } from "./catalogue";
import { changedAnswers } from "./answers";

/** One field before and after, in words, as the record keeps it. */
export type Change = { key: string; label: string; before: string | null; after: string | null };

const words = (key: string, value: string | null) => (value === null ? null : answerText(key, value));

type Unit = { answers: Readonly<Record<string, string>>; aliases: readonly string[] };

/** What was changed about a unit, question by question. */
export function unitChanges(before: Unit, after: Unit): Change[] {
  const answers = changedAnswers(before.answers, after.answers)
    .map((change) => ({ key: change.key, label: findRequirement(change.key)?.question ?? change.key, before: words(change.key, change.before), after: words(change.key, change.after) }));
  const [was, is] = [before.aliases.join(", ") || null, after.aliases.join(", ") || null];
  return was === is ? answers : [...answers, { key: "aliases", label: "Other marks and numbers", before: was, after: is }];
}

/** What differs between two versions of a row; only the fields that have a label are looked at. */
export function fieldChanges(labels: Readonly<Record<string, string>>, before: Readonly<Record<string, unknown>>, after: Readonly<Record<string, unknown>>): Change[] {
  const text = (value: unknown) => (value === null || value === undefined || value === "" ? null : String(value));
  return Object.entries(labels)
    .map(([key, label]) => ({ key, label, before: text(before[key]), after: text(after[key]) }))
    .filter((change) => change.before !== change.after);
}

/** A change as a line for somebody who was writing at the same time. */
export const changeLine = (by: string, { label, before, after }: Change) => `${by}: ${label} ${after ?? "left empty"}${before ? `, was ${before}` : ""}`;
