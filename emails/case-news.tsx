import type { CaseNews } from "@/lib/outbox/types";
import { Action, Letter, Para } from "./layout";

export const caseNewsSubject = ({ unit, headline }: CaseNews) => `${unit}: ${headline}`;

/** News of a case: what happened, and the one thing to do now. */
export function CaseNewsEmail({ unit, caseNumber, headline, lines, actionLabel, url }: CaseNews) {
  return (
    <Letter preview={`${unit}, case ${caseNumber}`} title={headline}>
      <Para>{unit}, case {caseNumber}.</Para>
      {lines.map((line, index) => <Para key={index}>{line}</Para>)}
      <Action url={url} label={actionLabel} />
    </Letter>
  );
}
