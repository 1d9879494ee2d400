import { MarkStencil } from "@/components/drawing/mark-stencil";
import { RouteStrip } from "@/components/drawing/route-strip";
import { TimelineDay, TimelineEntry, TimelineRail } from "@/components/drawing/timeline-rail";
import { Box, BoxGrid } from "@/components/ui/box";
import { Empty } from "@/components/ui/empty";
import { Sheet } from "@/components/ui/sheet";
import { dayAt, formatDay, formatWhen } from "@/lib/moves/when";
import type { FollowView } from "@/lib/timeline/types";
import { clockAt, dayWords } from "./day-words";
import { stripOfFollow } from "./follow-strip";

function wanted({ wantedFrom, wantedTo }: FollowView): string {
  if (wantedFrom && wantedTo) return `${formatDay(wantedFrom)} to ${formatDay(wantedTo)}`;
  if (wantedFrom) return `From ${formatDay(wantedFrom)} on`;
  return wantedTo ? `By ${formatDay(wantedTo)}` : "No days named";
}

/** What somebody sees who follows a move by a link: the unit, its way, and what was told outside the case. */
export function FollowPage({ view }: { view: FollowView }) {
  const { unit, from, to, days } = view;
  const last = days.flatMap((day) => day.entries).find((entry) => entry.seen && !entry.struck);
  return (
    <>
      <div className="border border-rule-strong bg-sheet lg:grid lg:grid-cols-[330px_minmax(0,1fr)]">
        <div className="flex flex-col justify-between gap-3 border-b border-rule-strong px-4 pt-4 pb-3.5 sm:px-5 lg:border-r lg:border-b-0">
          <p className="lab">Case {view.caseNumber} · dead in tow</p>
          <h1>
            <MarkStencil mark={unit.mark} number={unit.number} size="head" />
          </h1>
          <p className="text-14 text-ink-2">You follow this move by a link. It shows where the unit is; names of people and charges stay with the parties.</p>
        </div>
        <BoxGrid framed={false}>
          <Box label="From" span={3} detail={from.place}>
            {from.name}
          </Box>
          <Box label="To" span={3} detail={to.place}>
            {to.name}
          </Box>
          <Box label="Wanted" span={3}>
            {wanted(view)}
          </Box>
          <Box label="Stage" span={3}>
            {view.stage}
          </Box>
          <Box label="Last seen" span={12} detail={last ? formatWhen(last.at, last.zone) : "Carriers and receiver report it once it moves."}>
            {last ? last.text : "Not on its way yet"}
          </Box>
        </BoxGrid>
      </div>
      <div className="border border-t-0 border-rule-strong bg-sheet px-4 py-4 sm:px-12 sm:pb-6">
        <RouteStrip {...stripOfFollow(view)} />
      </div>
      <Sheet title="What happened" lead="The newest first. Times are those of the place." className="mt-6">
        {days.length === 0 ? (
          <Empty title="Nothing to tell yet.">Sightings are written here as carriers and receiver report them.</Empty>
        ) : (
          <TimelineRail>
            {days.map(({ day, entries }) => (
              <TimelineDay key={entries[0]?.id ?? day} day={dayWords(day, view.at)}>
                {entries.map((entry) => (
                  <TimelineEntry key={entry.id} time={clockAt(entry.at, entry.zone)} by={entry.struck ? "Taken back or corrected later" : undefined}>
                    {entry.struck ? <s className="text-ink-2">{entry.text}</s> : entry.text}
                  </TimelineEntry>
                ))}
              </TimelineDay>
            ))}
          </TimelineRail>
        )}
        <p className="mt-6 text-13 text-ink-2 max-sm:text-14">
          As of {formatWhen(view.at, view.originZone)}; this page reads itself again every minute. The link is good until {formatDay(dayAt(view.goodUntil, view.originZone))}.
        </p>
      </Sheet>
    </>
  );
}
