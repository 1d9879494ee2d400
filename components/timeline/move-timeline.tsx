"use client";

import { useQuery } from "@tanstack/react-query";
import { DaysBar, type DaysTone } from "@/components/drawing/days-bar";
import { TimelineDay, TimelineQuiet, TimelineRail } from "@/components/drawing/timeline-rail";
import { Empty } from "@/components/ui/empty";
import { LinkButton } from "@/components/ui/link-button";
import { Sheet } from "@/components/ui/sheet";
import type { Part } from "@/lib/access/vocabulary";
import { daysText, formatDay, dayAt } from "@/lib/moves/when";
import { routes } from "@/lib/routes";
import { timelineOptions } from "@/lib/timeline/options";
import { SHOW_STEP } from "@/lib/timeline/show";
import type { Timeline, TimelineRow } from "@/lib/timeline/types";
import { dayWords } from "./day-words";
import { EntryLine } from "./entry-line";

const TONES: Record<Part, DaysTone> = { owner: "owner", contractor: "contractor", carrier: "carrier", inspector: "carrier", desk: "carrier", billing: "money", payer: "money", receiver: "other" };

const quietWords = ({ days, name, goesOn }: Extract<TimelineRow, { type: "quiet" }>) =>
  `${days} days without an entry${goesOn ? " so far" : ""}.${name ? ` ${goesOn ? "Waiting" : "Waited"} on ${name}.` : ""}`;

function chainWords({ entries, brokenAt }: Timeline["chain"]): string {
  const whole = entries === 1 ? "1 entry" : `${entries} entries`;
  return brokenAt === null ? `Record intact, ${whole}. Each entry carries the hash of the one before it.` : `Entry ${brokenAt} of ${whole} in the record does not fit the one before it. Ask who runs this server.`;
}

/** What happened on a move, the newest first, kept up to date while it is looked at. */
export function MoveTimeline({ moveId, show }: { moveId: string; show: number }) {
  const { data: timeline, isError } = useQuery(timelineOptions(moveId, show));
  if (!timeline) return null;
  const { rows, days, chain, at } = timeline;
  return (
    <Sheet title="Timeline" lead={`${timeline.unit}, opened ${formatDay(dayAt(timeline.openedAt, timeline.originZone))}. Times are those of the place; a sighting stands at the time when it happened.`}>
      <DaysBar className="mb-6" label={`Where the ${daysText(days.total)} went`} parts={days.parts.map((part) => ({ id: part.id, label: part.label, days: part.days, tone: TONES[part.part] }))} />
      {rows.length === 0 ? (
        <Empty title="Nothing has happened yet.">What anybody on the move does is written here as it happens; nobody can change it afterwards.</Empty>
      ) : (
        <TimelineRail>
          {rows.map((row) =>
            row.type === "quiet" ? (
              <TimelineQuiet key={row.id}>{quietWords(row)}</TimelineQuiet>
            ) : (
              <TimelineDay key={row.id} day={dayWords(row.day, at)}>
                {row.entries.map((entry) => (
                  <EntryLine key={entry.id} entry={entry} />
                ))}
              </TimelineDay>
            ),
          )}
        </TimelineRail>
      )}
      {timeline.shown < timeline.total && (
        <div className="mt-4 flex flex-wrap items-center justify-between gap-3">
          <p className="text-14 text-ink-2">
            The latest {timeline.shown} of {timeline.total} entries.
          </p>
          <LinkButton variant="ghost" scroll={false} href={`${routes.timeline(moveId)}?show=${timeline.shown + SHOW_STEP}`}>
            Older entries
          </LinkButton>
        </div>
      )}
      <p role="status" className="mt-6 text-13 text-ink-2 max-sm:text-14">
        {isError ? "No connection. These are the entries as last read. " : ""}
        <span className={chain.brokenAt === null ? undefined : "font-[620] text-oxide"}>{chainWords(chain)}</span>
      </p>
    </Sheet>
  );
}
