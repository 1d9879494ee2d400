import { clsx } from "clsx";
import Link from "next/link";
import { type ReactNode } from "react";
import { Diamond } from "./diamond";
import { passedAt, type HandoverTone, type Strip } from "./strip";
import { UnitOutline } from "./unit-outline";

const NOTE_TONES: Record<HandoverTone, string> = {
  met: "text-verdigris font-[620]",
  waiting: "text-brass font-[620]",
  ahead: "text-ink-2",
  stopped: "text-oxide font-[620]",
};

/** A stretch of track down the left edge of a station's words; the last station has none. */
function Rail({ been }: { been: boolean }) {
  return (
    <span aria-hidden="true" className="absolute top-0 bottom-0 left-2 w-4.5 bg-[repeating-linear-gradient(to_bottom,var(--tie)_0_5px,transparent_5px_13px)]">
      <span className={clsx("absolute inset-y-0 left-1 w-2.5 border-x-2 bg-sheet/0", been ? "border-ink" : "border-dashed border-rule-strong")} />
    </span>
  );
}

function Stop({ marker, been, last, children }: { marker: ReactNode; been?: boolean; last?: boolean; children: ReactNode }) {
  return (
    <li className={clsx("relative pl-12", last ? "min-h-9" : "min-h-20 pb-5")}>
      {!last && <Rail been={been ?? false} />}
      <svg aria-hidden="true" width="34" height="34" viewBox="-17 -17 34 34" overflow="visible" className="absolute top-0 left-0">
        {marker}
      </svg>
      <div className="pt-1.5 text-14">{children}</div>
    </li>
  );
}

const bar = (reached: boolean) => <path d="M-16 0H16" strokeWidth="4" className={reached ? "stroke-ink" : "stroke-rule-strong"} />;

/** The strip down a phone: the same stations, one below the other. */
export function RouteStripTall({ ends, handovers, position, unit }: Strip) {
  const passed = passedAt(position, handovers.length);
  const atStart = position <= 0.001;
  const arrived = position >= 0.999;
  const here = (
    <Stop key="here" been={arrived} marker={<rect x="-8" y="-13" width="16" height="26" className="fill-ink" />}>
      <UnitOutline {...unit} className="mb-1 max-w-36" />
      <span className="font-[620]">{arrived || atStart ? "The unit stands here." : "The unit is on this stretch."}</span>
    </Stop>
  );
  return (
    <ol className="[overflow-wrap:anywhere]">
      <Stop marker={bar(true)} been>
        <span className="block font-[650]">{ends.from.name}</span>
        {ends.from.note && <span className="block text-ink-2">{ends.from.note}</span>}
      </Stop>
      {passed === 0 && !arrived && here}
      {handovers.map(({ id, carrier, place, note, tone, href, leg }, index) => [
        <Stop key={id} marker={<Diamond tone={tone} half={16} />} been={index < passed}>
          {href ? (
            <Link href={href} className="-my-2.5 inline-flex min-h-11 items-center font-[650] underline decoration-rule-strong underline-offset-3">
              {carrier}
            </Link>
          ) : (
            <span className="block font-[650]">{carrier}</span>
          )}
          <span className="block text-ink-2">takes over at {place}</span>
          <span className={clsx("block", NOTE_TONES[tone])}>{note}</span>
          {leg && <span className="block text-ink-2">then {leg}</span>}
        </Stop>,
        index === passed - 1 && !arrived ? here : null,
      ])}
      {arrived && here}
      <Stop marker={bar(arrived)} last>
        <span className="block font-[650]">{ends.to.name}</span>
        {ends.to.note && <span className="block text-ink-2">{ends.to.note}</span>}
      </Stop>
    </ol>
  );
}
