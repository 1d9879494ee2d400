import type { Axles, BodyShape } from "@/lib/moves/vocabulary";

/** Every outline is drawn in this box, cab at the left, rail at its lower edge. */
export const UNIT_BOX = { width: 240, height: 64 } as const;

export const WHEEL = { y: 56.5, radius: 7 } as const;

/** Where the axles stand, from the cab end. */
export const AXLE_POINTS: Record<Axles, readonly number[]> = {
  4: [36, 64, 176, 204],
  6: [31, 50, 69, 171, 190, 209],
};

/** Body and windows in one path each; the windows are holes. */
const BODIES: Record<BodyShape, { body: string; windows: string; roof: string; lines: string }> = {
  hood: {
    body: "M16 42V26l4-4h23V7q0-2 2-2h28q2 0 2 2v6h147q5 0 5 5v24z",
    windows: "M48 11h8v9h-8zM61 11h9v9h-9z",
    roof: "M41 3.5h36v2.5H41zM112 7.5h9V13h-9zM148 9.5h16V13h-16zM171 9.5h16V13h-16zM194 9.5h16V13h-16z",
    lines: "M8 42V28M8 28.5h8M232 42V28M232 28.5h-5M100 17v21M132 17v21M190 18h28M190 22h28M190 26h28",
  },
  cab: {
    body: "M7 46V34q0-6 6-10l15-7 10-10q3-3 8-3h183q5 0 5 5v37z",
    windows: "M35 17l8-8h7v8zM55 10h9v8h-9zM104 17a4 4 0 1 1 8 0 4 4 0 1 1-8 0zM138 17a4 4 0 1 1 8 0 4 4 0 1 1-8 0zM172 17a4 4 0 1 1 8 0 4 4 0 1 1-8 0z",
    roof: "M122 1h9v3h-9zM150 1.5h16V4h-16zM173 1.5h16V4h-16zM196 1.5h16V4h-16z",
    lines: "M71 9v33M83 9v33M8 36h60M86 28h146M206 10h22M206 14h22M206 18h22",
  },
  "end-cab-switcher": {
    body: "M14 42V7q0-2 2-2h34q2 0 2 2v12h166q7 0 7 7v16z",
    windows: "M19 11h9v10h-9zM36 11h10v10H36z",
    roof: "M11 3.5h44v2.5H11zM96 13h8v6h-8zM128 13h8v6h-8zM62 15.5h14V19H62z",
    lines: "M8 42V28M8 28.5h6M232 42V28M232 28.5h-7M88 23v15M116 23v15M144 23v15M196 24h22M196 29h22M196 34h22",
  },
};

const UNDERSIDE = "M5 42h230v5H5zM5 47h9v11l-9-3zM235 47h-9v11l9-3zM0 44.5h6v4.5H0zM234 44.5h6v4.5h-6zM94 47h52l-5 10H99z";

function truck(points: readonly number[]): string {
  const [first = 0, last = 0] = [Math.min(...points), Math.max(...points)];
  return `M${first - 8} 48.5h${last - first + 16}v6h-${last - first + 16}z`;
}

export type UnitShapeProps = {
  shape: BodyShape;
  axles: Axles;
  /** The cab at the right instead of the left. */
  mirrored?: boolean;
  variant?: "solid" | "outline";
};

/** The side of a unit, to be placed inside an SVG. */
export function UnitShape({ shape, axles, mirrored = false, variant = "solid" }: UnitShapeProps) {
  const { body, windows, roof, lines } = BODIES[shape];
  const points = AXLE_POINTS[axles];
  const half = axles / 2;
  const trucks = truck(points.slice(0, half)) + truck(points.slice(half));
  const solid = variant === "solid";
  const fill = solid ? "fill-ink" : "fill-card stroke-rule-strong";
  return (
    <g transform={mirrored ? `translate(${UNIT_BOX.width} 0) scale(-1 1)` : undefined} strokeWidth="1.2">
      <path d={lines} fill="none" className={solid ? "stroke-ink" : "stroke-rule-strong"} />
      <path d={roof} className={fill} />
      <path d={`${body}${windows}`} fillRule="evenodd" className={fill} />
      {!solid && <path d={lines} fill="none" strokeWidth="0.8" className="stroke-rule-strong" />}
      <path d={UNDERSIDE} className={fill} />
      {points.map((x) => (
        <g key={x}>
          <circle cx={x} cy={WHEEL.y} r={WHEEL.radius} className={fill} />
          <circle cx={x} cy={WHEEL.y} r="2" className={solid ? "fill-sheet" : "fill-none stroke-rule-strong"} />
        </g>
      ))}
      <path d={trucks} className={fill} fillOpacity={solid ? 1 : 0.85} />
    </g>
  );
}
