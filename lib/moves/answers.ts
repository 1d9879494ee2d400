import { CATALOGUE } from "./catalogue";
import type { EquipmentColumn } from "./requirements/types";

/** The answers that stand in columns of their own, as the database keeps them. */
export type UnitColumns = {
  mark: string; number: string; fEnd: string; shape: string; axles: number;
  weightLb: number | null; model: string | null; builtYear: number | null;
  brakeSchedule: string; bearings: string; alignment: string;
};

const NUMBERS: readonly EquipmentColumn[] = ["axles", "weightLb", "builtYear"];
const NULLABLE: readonly EquipmentColumn[] = ["weightLb", "model", "builtYear"];

/** Splits checked answers into columns and facts. An answer that was left empty is no fact; for brakes, bearings and coupler an empty text says that nobody has looked yet. */
export function splitAnswers(answers: Readonly<Record<string, string>>): { columns: UnitColumns; facts: Record<string, string> } {
  const columns: Record<string, string | number | null> = {};
  const facts: Record<string, string> = {};
  for (const { key, column } of CATALOGUE) {
    const given = (answers[key] ?? "").trim();
    if (!column) {
      if (given !== "") facts[key] = given;
    } else if (given === "" && NULLABLE.includes(column)) columns[column] = null;
    else columns[column] = NUMBERS.includes(column) ? Number(given) : given;
  }
  return { columns: columns as UnitColumns, facts };
}

/** The same the other way round: every known answer by its key, as a form shows it. */
export function joinAnswers(columns: UnitColumns, facts: Readonly<Record<string, string>>): Record<string, string> {
  const answers: Record<string, string> = { ...facts };
  for (const { key, column } of CATALOGUE) {
    const value = column ? columns[column] : null;
    if (value !== null && value !== "") answers[key] = String(value);
  }
  return answers;
}

export type AnswerChange = { key: string; before: string | null; after: string | null };

/** What differs between two sets of answers, in the order of the catalogue; keys of an older catalogue come last. */
export function changedAnswers(before: Readonly<Record<string, string>>, after: Readonly<Record<string, string>>): AnswerChange[] {
  const known = CATALOGUE.map(({ key }) => key);
  const others = Object.keys({ ...before, ...after }).filter((key) => !known.includes(key)).sort();
  return [...known, ...others]
    .map((key) => ({ key, before: before[key] || null, after: after[key] || null }))
    .filter((change) => change.before !== change.after);
}
