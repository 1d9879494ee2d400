import { clsx } from "clsx";
import Link from "next/link";
import { Diamond } from "./diamond";
import { COLUMNS, handoverAt, labelColumns, type Handover, type HandoverTone, type Strip } from "./strip";
import { UNIT_BOX, UnitShape } from "./unit-shape";

const RAIL_Y = 66;
const TRACK_Y = RAIL_Y + 3;
const CLEAR = 10;

const NOTE_TONES: Record<HandoverTone, string> = {
  met: "text-verdigris font-[620]",
  waiting: "text-brass font-[620]",
  ahead: "text-ink-2",
  stopped: "text-oxide font-[620]",
};

const percent = (part: number) => `${Math.round(part * 10_000) / 100}%`;

/** How much of the strip the unit covers, at most. */
const UNIT_SHARE = 0.22;

/** The words over a stretch stand in the middle of its longer part that the unit leaves free; null when it leaves none. */
function legPoint(index: number, count: number, position: number): number | null {
  const start = handoverAt(index, count);
  const end = index === count - 1 ? 1 : handoverAt(index + 1, count);
  const before = [start, Math.min(end, position * (1 - UNIT_SHARE))] as const;
  const after = [Math.max(start, position + UNIT_SHARE * (1 - position)), end] as const;
  const [from, to] = before[1] - before[0] > after[1] - after[0] ? before : after;
  return to - from > 0.08 ? (from + to) / 2 : null;
}

function Rails({ from, to, broken }: { from: string; to: string; broken?: boolean }) {
  return (
    <g strokeWidth="2" className={broken ? "stroke-rule-strong" : "stroke-ink"} strokeDasharray={broken ? "5 4" : undefined}>
      <line x1={from} x2={to} y1={RAIL_Y} y2={RAIL_Y} />
      <line x1={from} x2={to} y1={RAIL_Y + 6} y2={RAIL_Y + 6} />
    </g>
  );
}

function Track({ handovers, position, unit }: Strip) {
  const count = handovers.length;
  const at = Math.min(1, Math.max(0, position));
  const scale = count < 2 ? 0.68 : 0.58;
  const width = UNIT_BOX.width * scale;
  // The unit keeps inside both ends: at 0 it stands right of the first, at 1 left of the last.
  const shift = CLEAR - (width + 2 * CLEAR) * at;
  const front = shift + width;
  return (
    <svg aria-hidden="true" width="100%" height="92" overflow="visible" className="block">
      <line x1="0" x2="100%" y1={TRACK_Y} y2={TRACK_Y} strokeWidth="14" strokeDasharray="5 9" className="stroke-tie" />
      <Rails from="0" to="100%" broken />
      <Rails from="0" to={percent(at)} />
      <g strokeWidth="3">
        <line x1="0" x2="0" y1="50" y2="88" className="stroke-ink" />
        <line x1="100%" x2="100%" y1="50" y2="88" className={at >= 0.999 ? "stroke-ink" : "stroke-rule-strong"} />
      </g>
      <svg x={percent(at)} overflow="visible">
        {front > 0 && <Rails from="-1" to={`${front}`} />}
        <g transform={`translate(${shift} ${RAIL_Y - UNIT_BOX.height * scale}) scale(${scale})`}>
          <UnitShape {...unit} />
        </g>
      </svg>
      {handovers.map((handover, index) => (
        <svg key={handover.id} x={percent(handoverAt(index, count))} overflow="visible">
          <g transform={`translate(0 ${TRACK_Y})`}>
            <Diamond tone={handover.tone} />
          </g>
        </svg>
      ))}
    </svg>
  );
}

function Words({ handover: { carrier, place, note, tone, href } }: { handover: Handover }) {
  const name = "block font-[650]";
  return (
    <>
      {href ? (
        <Link href={href} className={clsx(name, "underline decoration-rule-strong underline-offset-3 after:absolute after:inset-x-0 after:-top-14 after:bottom-0 hover:decoration-2")}>
          {carrier}
        </Link>
      ) : (
        <span className={name}>{carrier}</span>
      )}
      <span className="block text-ink-2">takes over at {place}</span>
      <span className={clsx("block", NOTE_TONES[tone])}>{note}</span>
    </>
  );
}

/** The strip across a wide screen: track above, words below in the columns under their stations. */
export function RouteStripWide(strip: Strip) {
  const { ends, handovers, position } = strip;
  const count = handovers.length;
  const legs = handovers.flatMap(({ id, leg }, index) => {
    const at = legPoint(index, count, position);
    return leg && at !== null ? [{ id, leg, at }] : [];
  });
  return (
    <>
      <div className="relative">
        <Track {...strip} />
        <svg width="100%" height="20" overflow="visible" className="absolute inset-x-0 top-8 text-13">
          {legs.map(({ id, leg, at }) => (
            <text key={id} x={percent(at)} y="14" textAnchor="middle" className="fill-ink-2">
              {leg}
            </text>
          ))}
        </svg>
      </div>
      <ol className="mt-2 grid grid-cols-24 text-13 leading-snug [overflow-wrap:anywhere]">
        <li className={clsx("relative row-start-1 pr-2", `col-start-1 col-span-${count === 0 ? COLUMNS / 2 : labelColumns(0, count).start - 1}`)}>
          <span className="block font-[650]">{ends.from.name}</span>
          <span className="block text-ink-2">{ends.from.note}</span>
        </li>
        {handovers.map((handover, index) => {
          const { start, span } = labelColumns(index, count);
          return (
            <li key={handover.id} className={clsx("relative row-start-1 px-2 text-center", `col-start-${start} col-span-${span}`)}>
              <Words handover={handover} />
            </li>
          );
        })}
        <li className={clsx("relative row-start-1 -col-end-1 pl-2 text-right", `col-span-${count === 0 ? COLUMNS / 2 : COLUMNS + 1 - labelColumns(count - 1, count).start - labelColumns(count - 1, count).span}`)}>
          <span className="block font-[650]">{ends.to.name}</span>
          <span className="block text-ink-2">{ends.to.note}</span>
        </li>
      </ol>
    </>
  );
}
