import { Diamond } from "./diamond";
import { handoverAt, type Handover, type Strip } from "./strip";

const LEFT = 6;
const RIGHT = 244;
const UNIT_WIDTH = 26;

const MINI = {
  hood: "M0 11V6h5V2h6v2h14l1 1v6z",
  cab: "M0 11V8l4-3 3-3h18l1 1v8z",
  "end-cab-switcher": "M0 11V2h7v4h18l1 1v4z",
} as const;

export type SmallStripProps = {
  handovers: readonly Pick<Handover, "id" | "tone">[];
  position: number;
  shape?: Strip["unit"]["shape"];
  /** What the drawing says, in words; without it words beside the drawing say it. */
  label?: string;
};

/** The route strip in a list's row, 250 by 30. */
export function SmallStrip({ handovers, position, shape = "hood", label }: SmallStripProps) {
  const x = (part: number) => LEFT + (RIGHT - LEFT) * Math.min(1, Math.max(0, part));
  const unitLeft = Math.min(RIGHT - UNIT_WIDTH - 3, Math.max(LEFT + 3, x(position) - UNIT_WIDTH / 2));
  const been = position >= 0.999 ? RIGHT : Math.max(unitLeft + UNIT_WIDTH / 2, LEFT);
  return (
    <svg role={label ? "img" : undefined} aria-label={label} aria-hidden={label ? undefined : true} width="250" height="30" viewBox="0 0 250 30" className="block max-w-full">
      <path d={`M${been} 18H${RIGHT}`} strokeWidth="2" strokeDasharray="4 4" className="stroke-rule-strong" />
      <path d={`M${LEFT} 18H${been}`} strokeWidth="3" className="stroke-ink" />
      <path d={`M${LEFT} 11v14M${RIGHT} 11v14`} strokeWidth="2.5" className="stroke-ink" />
      <path d={MINI[shape]} transform={`translate(${unitLeft} 5.5)`} className="fill-ink" />
      {handovers.map(({ id, tone }, index) => (
        <g key={id} transform={`translate(${x(handoverAt(index, handovers.length))} 18)`}>
          <Diamond tone={tone} half={8.5} />
        </g>
      ))}
    </svg>
  );
}
