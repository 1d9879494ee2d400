import { cabLeads, type UnitForm } from "@/lib/moves/places";
import { axleXs, LOCATOR, placePoints } from "./place-points";
import { UNIT_BOX, UnitShape } from "./unit-shape";

const { width, left, scale, sideTop, topY, topHeight } = LOCATOR;
const BODY_WIDTH = UNIT_BOX.width * scale;
const SIDE_LABELS_Y = sideTop + UNIT_BOX.height * scale + 18;

function Wheels({ form }: { form: UnitForm }) {
  return (
    <g textAnchor="middle" className="fill-ink text-[16px] font-[540] [font-stretch:72%]">
      {axleXs(form).map((x, at) => (
        <g key={x}>
          <rect x={x - 7} y={topY - 7} width="14" height="6" className="fill-card stroke-rule-strong" />
          <rect x={x - 7} y={topY + topHeight + 1} width="14" height="6" className="fill-card stroke-rule-strong" />
          <text x={x} y={SIDE_LABELS_Y}>{`L${at + 1}`}</text>
          <text x={x} y={topY - 15}>{`R${at + 1}`}</text>
          <text x={x} y={topY + topHeight + 24}>{`L${at + 1}`}</text>
        </g>
      ))}
    </g>
  );
}

function Top({ form }: { form: UnitForm }) {
  const leads = cabLeads(form.fEnd);
  const cab = form.shape === "end-cab-switcher" ? [14, 52] : form.shape === "cab" ? [34, 70] : [43, 75];
  const [from = 0, to = 0] = leads ? cab : cab.map((x) => UNIT_BOX.width - x).reverse();
  const hood = form.shape === "cab" ? 0 : 10;
  return (
    <g className="fill-card stroke-rule-strong" strokeWidth="1.6">
      <path d={`M${left} ${topY + topHeight / 2 - 3}h${BODY_WIDTH}v6h-${BODY_WIDTH}z`} />
      <rect x={left + 7} y={topY} width={BODY_WIDTH - 14} height={topHeight} />
      <rect x={left + 22} y={topY + hood} width={BODY_WIDTH - 44} height={topHeight - 2 * hood} />
      <rect x={left + from * scale} y={topY + (form.shape === "cab" ? 0 : 3)} width={(to - from) * scale} height={topHeight - (form.shape === "cab" ? 0 : 6)} />
    </g>
  );
}

/** A ring says where; it is drawn on what is marked, not beside it. */
function Ring({ x, y, tone }: { x: number; y: number; tone: "oxide" | "verdigris" | "ink" }) {
  const stroke = { oxide: "stroke-oxide", verdigris: "stroke-verdigris", ink: "stroke-ink" }[tone];
  return (
    <g fill="none">
      <circle cx={x} cy={y} r="12" strokeWidth="6" className="stroke-sheet" />
      <circle cx={x} cy={y} r="12" strokeWidth="3" className={stroke} />
    </g>
  );
}

export type RingMark = { placeId: string; tone?: "oxide" | "verdigris" | "ink" };

/** What the locator shows, to be placed inside its SVG: left side of the unit above, the unit from above below. */
export function LocatorDrawing({ form, rings }: { form: UnitForm; rings: readonly RingMark[] }) {
  const points = placePoints(form);
  return (
    <>
      <g transform={`translate(${left} ${sideTop}) scale(${scale})`}>
        <UnitShape shape={form.shape} axles={form.axles} mirrored={!cabLeads(form.fEnd)} variant="outline" />
      </g>
      <Top form={form} />
      <Wheels form={form} />
      <g className="fill-ink text-[17px] font-[720]">
        <text x="2" y={SIDE_LABELS_Y}>
          F
        </text>
      </g>
      <g className="fill-ink-2 text-[15px] [font-stretch:74%]">
        <text x={width - 1} y={SIDE_LABELS_Y} textAnchor="end">
          rear
        </text>
      </g>
      {rings.map(({ placeId, tone = "oxide" }) => {
        const at = points[placeId];
        return at ? <Ring key={placeId} {...at} tone={tone} /> : null;
      })}
    </>
  );
}
