"use client";

import { useQuery } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { FieldBar } from "@/components/shell/top-bar";
import { ActionBar } from "@/components/ui/action-bar";
import { Button } from "@/components/ui/button";
import { TextLink } from "@/components/ui/link-button";
import { findingOptions } from "@/lib/findings/options";
import type { FindingAct } from "@/lib/findings/rules";
import type { FindingDetail } from "@/lib/findings/types";
import { formatWhen } from "@/lib/moves/when";
import { routes } from "@/lib/routes";
import { FindingHead, FoundPart } from "./finding-head";
import { AnswerForm, loadForms, ReplyForm } from "./forms";
import { Thread } from "./thread";

// Kept outside of the component, so that it runs when the form comes and not with every letter typed.
const focusOnMount = (element: HTMLElement | null) => element?.focus();

export type FindingSheetProps = { first: FindingDetail; userId: string };

/** One finding, made for a phone beside the unit: what was found, what was said, and the one thing to do now. */
export function FindingSheet({ first, userId }: FindingSheetProps) {
  const { data: finding, isError } = useQuery({ ...findingOptions(first.moveId, first.id), initialData: first });
  const [doing, setDoing] = useState<FindingAct | null>(null);
  useEffect(() => void loadForms().catch(() => undefined), []);
  const unit = `${finding.unit.mark} ${finding.unit.number}`;
  const onDone = () => setDoing(null);
  return (
    <article data-field-screen="" aria-label={`Finding ${finding.label}`} className="max-sm:-mx-4">
      <h1 className="sr-only sm:hidden">{unit}</h1>
      <FieldBar backHref={routes.findings(finding.moveId)} backLabel={unit} note={`${finding.label} of ${finding.total}`} />
      <div className="border-rule-strong bg-sheet sm:border">
        <p className="border-b border-rule px-6 py-2.5 text-14 max-sm:hidden">
          <TextLink href={routes.findings(finding.moveId)}>All findings</TextLink>
        </p>
        <div className="lg:grid lg:grid-cols-[minmax(0,460px)_minmax(0,1fr)]">
          <div className="lg:border-r lg:border-rule-strong">
            <FindingHead finding={finding} />
            <FoundPart finding={finding} />
          </div>
          <div className="bg-card px-4 py-4 sm:bg-sheet sm:px-6 sm:pb-6">
            {finding.entries.length > 0 ? <Thread entries={finding.entries} zone={finding.zone} /> : <p className="text-14 text-ink-2">{finding.severity === "note" ? "Nobody has answered. A note needs no answer." : "Nobody has answered yet. The contractor answers here with what was done and what shows it."}</p>}
            <p role="status" className="mt-3 text-14 text-ink-2 empty:hidden">{isError && `No connection. This is the finding as of ${formatWhen(finding.now, finding.zone)}.`}</p>
            {doing === null && <Acts finding={finding} onChoose={setDoing} />}
            {doing !== null && (
              <div key={doing} ref={focusOnMount} tabIndex={-1} className="mt-5 scroll-mt-4 border-t-2 border-ink pt-4 outline-none">
                {doing === "answer" ? <AnswerForm finding={finding} userId={userId} onDone={onDone} /> : <ReplyForm finding={finding} act={doing} onDone={onDone} />}
              </div>
            )}
          </div>
        </div>
      </div>
    </article>
  );
}

/** The two main actions in the bar, what is rarer as words above it. */
function Acts({ finding, onChoose }: { finding: FindingDetail; onChoose: (act: FindingAct) => void }) {
  const { may } = finding;
  const replies = may.clear !== null;
  const answersLater = may.answer !== null && replies;
  return (
    <>
      {(may.withdraw || answersLater) && (
        <div className="no-print mt-4 flex flex-wrap gap-x-6">
          {answersLater && <Button variant="plain" onClick={() => onChoose("answer")}>Add to the answer</Button>}
          {may.withdraw && <Button variant="plain" onClick={() => onChoose("withdraw")}>Withdraw this finding…</Button>}
        </div>
      )}
      {replies && (
        <ActionBar>
          <Button variant="ghost" onClick={() => onChoose("not-cleared")}>Not cleared…</Button>
          <Button onClick={() => onChoose("clear")}>Clear finding</Button>
        </ActionBar>
      )}
      {!replies && may.answer && (
        <ActionBar>
          <Button variant={finding.state === "answered" ? "ghost" : "solid"} onClick={() => onChoose("answer")}>{finding.state === "answered" ? "Add to the answer" : "Answer"}</Button>
        </ActionBar>
      )}
    </>
  );
}
