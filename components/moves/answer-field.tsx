"use client";

import { DateField } from "@/components/ui/date-field";
import { SelectField } from "@/components/ui/select-field";
import { TextField } from "@/components/ui/text-field";
import type { Requirement } from "@/lib/moves/requirements/types";

const NOT_LOOKED = "not known yet";

export type AnswerFieldProps = { requirement: Requirement; value: string; onChange: (value: string) => void; error?: string | null; required?: boolean; className?: string };

/** One question of the requirement catalogue with its hint and what proves the answer. */
export function AnswerField({ requirement, value, onChange, error, required, className }: AnswerFieldProps) {
  const { key, question, kind, choices, unit, hint, evidence } = requirement;
  const given = {
    name: `answers.${key}`,
    label: unit ? `${question} (${unit})` : question,
    hint: evidence ? `${hint} Proof: ${evidence.charAt(0).toLowerCase()}${evidence.slice(1)}.` : hint,
    error, required, value, className,
    onChange: (event: { target: { value: string } }) => onChange(event.target.value),
  };
  if (kind === "choice") return <SelectField {...given} blank={required ? "choose" : NOT_LOOKED} choices={choices ?? []} />;
  if (kind === "date") return <DateField {...given} />;
  return <TextField {...given} mono={kind !== "text"} inputMode={kind === "number" ? "numeric" : undefined} autoComplete="off" />;
}
