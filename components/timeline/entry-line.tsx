import Link from "next/link";
import { TimelineEntry } from "@/components/drawing/timeline-rail";
import { Disclosure } from "@/components/ui/disclosure";
import { State } from "@/components/ui/state";
import type { Entry } from "@/lib/timeline/types";
import { byWords, enteredWords, many } from "@/lib/timeline/words";
import { clockAt } from "./day-words";

function Words({ entry: { parts, link } }: { entry: Entry }) {
  return parts.map(({ text, strong }, at) =>
    strong && link ? (
      <Link key={`${at} ${text}`} href={link} className="font-[620] underline decoration-1 underline-offset-3 hover:decoration-2">
        {text}
      </Link>
    ) : strong ? (
      <b key={`${at} ${text}`}>{text}</b>
    ) : (
      text
    ),
  );
}

function Aside({ entry: { state, struck, photos, link } }: { entry: Entry }) {
  const shown = struck ? null : state;
  if (!shown && photos === 0) return null;
  return (
    <span className="flex flex-wrap items-center gap-2 sm:justify-end">
      {photos > 0 && (link ? <Link href={link} className="inline-link text-14">{many(photos, "photo")}</Link> : <span className="text-14 text-ink-2">{many(photos, "photo")}</span>)}
      {shown && <State tone={shown.tone}>{shown.word}</State>}
    </span>
  );
}

const lateWords = (days: number) => (days === 1 ? "entered a day later" : `entered ${days} days later`);

/** One line of the timeline: what happened, who did it or entered it for whom, and what became of it. */
export function EntryLine({ entry }: { entry: Entry }) {
  const { note, folded, enteredFor, struck, enteredLate } = entry;
  const by = enteredFor ? enteredWords(entry.by, enteredFor) : byWords(entry);
  return (
    <TimelineEntry time={clockAt(entry.at, entry.zone)} by={[by, enteredLate > 0 && lateWords(enteredLate)].filter(Boolean).join(", ")} aside={<Aside entry={entry} />}>
      {struck ? (
        <>
          <s className="text-ink-2">
            <Words entry={entry} />
          </s>
          <span className="block text-14">Taken back: {struck}</span>
        </>
      ) : (
        <Words entry={entry} />
      )}
      {note && <span className="block max-w-[66ch] text-14 whitespace-pre-line">{note}</span>}
      {folded.length > 0 && (
        <Disclosure summary="Each of them" className="my-1 border-y-0!">
          <ul className="text-14">
            {folded.map((line) => (
              <li key={line} className="py-0.5">
                {line}
              </li>
            ))}
          </ul>
        </Disclosure>
      )}
    </TimelineEntry>
  );
}
