"use client";

import { UnitOutline } from "@/components/drawing/unit-outline";
import { Disclosure } from "@/components/ui/disclosure";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { TextField } from "@/components/ui/text-field";
import { CATALOGUE, findRequirement } from "@/lib/moves/catalogue";
import { consequencesOf } from "@/lib/moves/consequences";
import { BODY_SHAPES } from "@/lib/moves/vocabulary";
import { AnswerField } from "../answer-field";
import { AnswerGroups } from "../answer-groups";
import type { SectionProps } from "./section";

const IDENTITY = ["shape", "f-end", "axles", "model", "built", "weight"] as const;
const NEEDED: readonly string[] = ["shape", "f-end", "axles"];
const FIRST = ["bearings", "coupler", "brakes"] as const;
const ASKED_ABOVE: readonly string[] = ["mark", "number", ...IDENTITY, ...FIRST];
const LATER = CATALOGUE.filter(({ key }) => !ASKED_ABOVE.includes(key));

/** The unit as an inspector lists it: its names, its form, and the three questions that decide most. */
export function UnitSection({ form, change, errorOf }: SectionProps) {
  const { answers } = form;
  const answer = (key: string, value: string) => change({ answers: { ...answers, [key]: value } });
  const field = (key: string) => {
    const requirement = findRequirement(key);
    return requirement && <AnswerField key={key} requirement={requirement} value={answers[key] ?? ""} onChange={(value) => answer(key, value)} error={errorOf(`answers.${key}`)} required={NEEDED.includes(key)} />;
  };
  const shape = BODY_SHAPES.find((one) => one === answers.shape);
  return (
    <Sheet title="1. The unit" lead="As it stands there, not as a roster has it.">
      <div className="grid gap-5 sm:grid-cols-2 sm:items-end">
        <div className="grid grid-cols-2 gap-5">
          <TextField name="answers.mark" label="Reporting mark" hint="Exactly as stencilled." mono required maxLength={12} autoComplete="off" autoCapitalize="characters" value={answers.mark ?? ""} onChange={(event) => answer("mark", event.target.value)} error={errorOf("answers.mark")} />
          <TextField name="answers.number" label="Number" hint="Exactly as stencilled." mono required maxLength={12} autoComplete="off" value={answers.number ?? ""} onChange={(event) => answer("number", event.target.value)} error={errorOf("answers.number")} />
        </div>
        <TextField name="aliases" label="Other marks and numbers it is known by" hint="Commas between them. Yards look for what they see: an old number under new paint, a mark without stencil." value={form.aliases} autoComplete="off" onChange={(event) => change({ aliases: event.target.value })} error={errorOf("aliases") ?? errorOf("aliases.0")} />
        {IDENTITY.map(field)}
      </div>
      {shape && (answers.axles === "4" || answers.axles === "6") && (
        <div className="mt-5 max-w-72">
          <UnitOutline shape={shape} axles={answers.axles === "4" ? 4 : 6} variant="outline" label="The outline that will be drawn for this unit" />
        </div>
      )}
      <h3 className="mt-8 mb-1 text-17 font-[680]">What every carrier asks first</h3>
      <p className="mb-4 max-w-[66ch] text-14 text-ink-2">Answer as far as you know. Nothing here stops a move; it tells you what usually follows, so that you can ask early.</p>
      <div className="grid gap-5 sm:grid-cols-3 sm:items-end">{FIRST.map(field)}</div>
      <div className="mt-4 grid gap-3">
        {consequencesOf(answers).filter(({ key, weight }) => weight === "caution" || (answers[key] ?? "") !== "").map(({ key, weight, text }) => (
          <Notice key={key} kind={weight === "caution" ? "caution" : "info"}>
            {text}
          </Notice>
        ))}
      </div>
      <p className="mt-3 text-13 text-ink-2 max-sm:text-14">Common practice as carriers describe it; each carrier’s own rules prevail.</p>
      <Disclosure className="mt-6" summary="More that carriers may ask; it can wait until the move is open">
        <AnswerGroups requirements={LATER} answers={answers} onAnswer={answer} errorOf={errorOf} />
      </Disclosure>
    </Sheet>
  );
}
