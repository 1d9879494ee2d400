import { LinkButton } from "@/components/ui/link-button";
import type { CaseFile } from "@/lib/moves/types";
import { routeOfWait, WAIT_WORDS, waitSentence } from "@/lib/moves/waits";
import { daysBetween, daysText, formatWhen } from "@/lib/moves/when";

function ended({ state, endedAt, destination }: CaseFile): string {
  const when = endedAt ? ` on ${formatWhen(endedAt, destination.zone)}` : "";
  if (state === "open") return "Nothing waits at the moment.";
  return state === "closed" ? `The move was closed${when}.` : `The move was cancelled${when}.`;
}

function sinceWords(since: string, at: string, zone: string): string {
  const days = daysBetween(since, at);
  return days === 0 ? `since ${formatWhen(since, zone)}` : `for ${daysText(days)}, since ${formatWhen(since, zone)}`;
}

/** Whose turn it is in one sentence, and the way to where it is done for whoever may do it. */
export function WhatWaits({ file }: { file: CaseFile }) {
  const { waiting } = file;
  if (!waiting) return <p className="text-17">{ended(file)}</p>;
  const href = routeOfWait(file.moveId, waiting);
  return (
    <div>
      <p className="max-w-[52ch] text-17 font-[560]">{waitSentence(waiting)}</p>
      <p className="mt-1 text-14 text-ink-2">
        {waiting.you ? "It waits on you" : "It has waited"} {sinceWords(waiting.since, file.at, file.origin.zone)}.
        {waiting.yourCompany && " This is for your company; somebody there does this work."}
        {waiting.standIn && ` Nobody of ${waiting.name} works here. You can enter what they tell you on paper, by e-mail or by phone.`}
      </p>
      {(waiting.you || waiting.standIn) && (
        <div className="mt-4">
          <LinkButton href={href}>{waiting.you ? WAIT_WORDS[waiting.waitingFor].link : `Enter it for ${waiting.name}`}</LinkButton>
        </div>
      )}
    </div>
  );
}
