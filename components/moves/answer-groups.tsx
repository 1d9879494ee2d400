"use client";

import { Disclosure } from "@/components/ui/disclosure";
import { REQUIREMENT_GROUP_LABELS, REQUIREMENT_GROUPS, type Requirement } from "@/lib/moves/requirements/types";
import { AnswerField } from "./answer-field";

export type AnswerGroupsProps = {
  requirements: readonly Requirement[];
  answers: Readonly<Record<string, string>>;
  onAnswer: (key: string, value: string) => void;
  errorOf: (path: string) => string | null;
  /** Opens every group, as on a page that is about nothing else. */
  open?: boolean;
};

/** Questions of the catalogue in the groups of an inspector's sheet, each saying how many are answered. */
export function AnswerGroups({ requirements, answers, onAnswer, errorOf, open = false }: AnswerGroupsProps) {
  return (
    <div>
      {REQUIREMENT_GROUPS.map((group) => {
        const asked = requirements.filter((one) => one.group === group);
        if (asked.length === 0) return null;
        const answered = asked.filter(({ key }) => (answers[key] ?? "") !== "").length;
        const wrong = asked.some(({ key }) => errorOf(`answers.${key}`));
        return (
          <Disclosure key={group} open={open || wrong || undefined} className="-mt-px" summary={<>{REQUIREMENT_GROUP_LABELS[group]} <span className="text-14 font-normal text-ink-2">{answered} of {asked.length} answered</span></>}>
            <div className="grid gap-5 pt-2 sm:grid-cols-2 sm:items-end">
              {asked.map((requirement) => (
                <AnswerField key={requirement.key} requirement={requirement} value={answers[requirement.key] ?? ""} onChange={(value) => onAnswer(requirement.key, value)} error={errorOf(`answers.${requirement.key}`)} />
              ))}
            </div>
          </Disclosure>
        );
      })}
    </div>
  );
}
