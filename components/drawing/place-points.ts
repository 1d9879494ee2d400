import { cabLeads, placesOn, type UnitForm } from "@/lib/moves/places";
import { AXLE_POINTS, UNIT_BOX, WHEEL } from "./unit-shape";

/** The locator's sheet: the side above, the top below, the end marked F always at the left. */
export const LOCATOR = { width: 360, height: 230, scale: 1.35, left: 18, sideTop: 8, topY: 152, topHeight: 44 } as const;

export type Point = { x: number; y: number };

const onSheet = (x: number): number => LOCATOR.left + x * LOCATOR.scale;
const sideY = (y: number): number => LOCATOR.sideTop + y * LOCATOR.scale;

/** Where the axles stand on the sheet, from the F end. */
export function axleXs({ axles, fEnd }: UnitForm): number[] {
  const points = cabLeads(fEnd) ? AXLE_POINTS[axles] : AXLE_POINTS[axles].map((x) => UNIT_BOX.width - x).reverse();
  return points.map(onSheet);
}

const MIDDLE_Y = LOCATOR.topY + LOCATOR.topHeight / 2;
const RIGHT_Y = LOCATOR.topY + 2;
const LEFT_Y = LOCATOR.topY + LOCATOR.topHeight - 2;

/** Places that keep to the F end and its opposite, whatever the body looks like. */
function endPoints(form: UnitForm): Record<string, Point> {
  const xs = axleXs(form);
  const half = form.axles / 2;
  const middle = (points: number[]) => points.reduce((sum, x) => sum + x, 0) / points.length;
  const [front, rear] = [middle(xs.slice(0, half)), middle(xs.slice(half))];
  return {
    "coupler-f": { x: onSheet(2), y: sideY(46.5) },
    "coupler-r": { x: onSheet(238), y: sideY(46.5) },
    "hoses-f": { x: onSheet(4), y: MIDDLE_Y },
    "hoses-r": { x: onSheet(236), y: MIDDLE_Y },
    "pilot-f": { x: onSheet(9), y: sideY(53) },
    "pilot-r": { x: onSheet(231), y: sideY(53) },
    "truck-f": { x: front, y: sideY(51) },
    "truck-r": { x: rear, y: sideY(51) },
    "brake-rigging-f": { x: front, y: LEFT_Y - 10 },
    "brake-rigging-r": { x: rear, y: LEFT_Y - 10 },
    "steps-f-l": { x: onSheet(10), y: LOCATOR.topY + LOCATOR.topHeight - 6 },
    "steps-f-r": { x: onSheet(10), y: LOCATOR.topY + 6 },
    "steps-r-l": { x: onSheet(230), y: LOCATOR.topY + LOCATOR.topHeight - 6 },
    "steps-r-r": { x: onSheet(230), y: LOCATOR.topY + 6 },
    "fuel-tank": { x: onSheet(120), y: sideY(52) },
    underframe: { x: onSheet(120), y: sideY(44.5) },
  };
}

/** Places inside the body, as seen with the cab at the left. Usual arrangement of such units; the words of a finding say more. */
const BODY_POINTS: Record<UnitForm["shape"], Record<string, Point>> = {
  hood: {
    cab: { x: 58, y: 26 },
    "hand-brake": { x: 24, y: 33 },
    "electrical-cabinet": { x: 84, y: 26 },
    engine: { x: 132, y: 28 },
    cooling: { x: 202, y: 24 },
    roof: { x: 117, y: 11 },
  },
  cab: {
    cab: { x: 58, y: 24 },
    "hand-brake": { x: 24, y: 33 },
    "electrical-cabinet": { x: 78, y: 24 },
    engine: { x: 130, y: 30 },
    cooling: { x: 206, y: 18 },
    roof: { x: 126, y: 4 },
  },
  "end-cab-switcher": {
    cab: { x: 33, y: 28 },
    "hand-brake": { x: 18, y: 37 },
    "electrical-cabinet": { x: 62, y: 30 },
    engine: { x: 128, y: 30 },
    cooling: { x: 207, y: 30 },
    roof: { x: 100, y: 17 },
  },
};

/** The point of every place on the sheet. */
export function placePoints(form: UnitForm): Record<string, Point> {
  const leads = cabLeads(form.fEnd);
  const turn = (x: number) => (leads ? x : UNIT_BOX.width - x);
  const body = Object.entries(BODY_POINTS[form.shape]).map(([id, { x, y }]): [string, Point] => [id, { x: onSheet(turn(x)), y: sideY(y) }]);
  const inTopView: [string, Point][] = [
    ["batteries", { x: onSheet(turn(92)), y: MIDDLE_Y + 11 }],
    ["main-reservoirs", { x: onSheet(turn(150)), y: MIDDLE_Y - 11 }],
  ];
  const wheels = axleXs(form).flatMap((x, at): [string, Point][] => [
    [`wheel-L${at + 1}`, { x, y: sideY(WHEEL.y) }],
    [`wheel-R${at + 1}`, { x, y: RIGHT_Y }],
  ]);
  return { ...Object.fromEntries([...wheels, ...body, ...inTopView]), ...endPoints(form) };
}

/** The place nearest to a point that was touched, or null when nothing is near. */
export function nearestPlace(form: UnitForm, point: Point, reach = 24): string | null {
  const points = placePoints(form);
  const [nearest] = placesOn(form)
    .flatMap(({ id }) => {
      const at = points[id];
      return at ? [{ id, distance: Math.hypot(at.x - point.x, at.y - point.y) }] : [];
    })
    .sort((a, b) => a.distance - b.distance);
  return nearest && nearest.distance <= reach ? nearest.id : null;
}
