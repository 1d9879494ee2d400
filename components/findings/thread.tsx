import { EnteredBy } from "@/components/access/entered-by";
import { PhotoStrip } from "@/components/evidence/photo-strip";
import { Mono } from "@/components/ui/text";
import type { FindingEntry } from "@/lib/findings/types";
import type { FindingEntryKind } from "@/lib/findings/vocabulary";
import { formatWhen } from "@/lib/moves/when";

const SAYS: Record<FindingEntryKind, { word: string; tone: string }> = {
  answer: { word: "Answer", tone: "text-ink" },
  "not-cleared": { word: "Not cleared", tone: "text-oxide" },
  cleared: { word: "Cleared", tone: "text-verdigris" },
  withdrawn: { word: "Withdrawn", tone: "text-ink" },
};

/** Everything that was said about a finding, in its order; nothing here is ever changed. */
export function Thread({ entries, zone }: { entries: readonly FindingEntry[]; zone: string }) {
  return (
    <ol aria-label="Answers and replies" className="grid gap-3">
      {entries.map((entry) => (
        <li key={entry.id} className="border border-rule-strong bg-sheet">
          <div className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-rule px-3.5 py-2 text-14">
            <span>
              <b>{entry.byName}</b>, {entry.byCompanyName}
            </span>
            <Mono className="text-ink-2">{formatWhen(entry.at, zone)}</Mono>
          </div>
          <div className="grid gap-2 px-3.5 py-2.5 text-15">
            <p className="text-14">
              <span className={`font-[680] ${SAYS[entry.kind].tone}`}>{SAYS[entry.kind].word}</span>
              {entry.round > 0 && <span className="text-ink-2">, round {entry.round}</span>}
            </p>
            {entry.enteredFor && <EnteredBy enteredFor={entry.enteredFor} byName={entry.byName} />}
            {entry.reading && <Mono className="text-17 font-semibold">{entry.reading}</Mono>}
            {entry.text && <p className="whitespace-pre-line [overflow-wrap:anywhere]">{entry.text}</p>}
            {entry.wouldSatisfy && (
              <p className="border-l-[5px] border-brass bg-brass-wash px-3 py-2">
                <span className="block text-14 font-[680]">What would satisfy</span>
                <span className="whitespace-pre-line [overflow-wrap:anywhere]">{entry.wouldSatisfy}</span>
              </p>
            )}
            <PhotoStrip photos={entry.photos} />
          </div>
        </li>
      ))}
    </ol>
  );
}
