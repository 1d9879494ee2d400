import { placesOn, type Place, type UnitForm } from "@/lib/moves/places";
import { AXLES, BODY_SHAPES, F_ENDS, type Axles } from "@/lib/moves/vocabulary";

/** What sort of spot a place is; a component says which sorts it is found at. An axle is pointed at by one of its wheels. */
export const PLACE_KINDS = ["wheel", "axle", "truck", "coupler", "end", "side", "cab", "roof", "underframe", "tank"] as const;
export type PlaceKind = (typeof PLACE_KINDS)[number];

/** Sorts of spot by the start of a place's id; the first that fits counts. */
const KINDS_OF: readonly [start: string, kinds: readonly PlaceKind[]][] = [
  ["wheel-", ["wheel", "axle"]],
  ["coupler-", ["coupler", "end"]],
  ["hoses-", ["end"]],
  ["pilot-", ["end"]],
  ["truck-", ["truck"]],
  ["brake-rigging-", ["truck", "wheel"]],
  ["steps-", ["end", "side"]],
  ["hand-brake", ["end", "side", "cab"]],
  ["main-reservoirs", ["tank"]],
  ["fuel-tank", ["tank"]],
  ["cab", ["cab"]],
  ["electrical-cabinet", ["cab", "side"]],
  ["batteries", ["side"]],
  ["engine", ["side"]],
  ["cooling", ["side", "roof"]],
  ["roof", ["roof"]],
  ["underframe", ["underframe"]],
];

/** The sorts of spot that a place is; empty for one that no unit has. */
export const kindsOf = (placeId: string): readonly PlaceKind[] => KINDS_OF.find(([start]) => placeId.startsWith(start))?.[1] ?? [];

/** The places where something of these sorts is usually found, in the order of the list. */
export function usualPlaces(axles: Axles, kinds: readonly PlaceKind[]): Place[] {
  return placesOn({ axles }).filter(({ id }) => kindsOf(id).some((kind) => kinds.includes(kind)));
}

/** The two axle counts that outlines exist for; null for any other number. */
export function axlesOf(count: number): Axles | null {
  return AXLES.find((axles) => axles === count) ?? null;
}

/** The outline of a unit as its facts name it; null when there is no drawing for such a unit. */
export function unitFormOf({ shape, axles, fEnd }: { shape: string; axles: number; fEnd: string }): UnitForm | null {
  const form = { shape: BODY_SHAPES.find((one) => one === shape), axles: axlesOf(axles), fEnd: F_ENDS.find((one) => one === fEnd) };
  return form.shape && form.axles && form.fEnd ? { shape: form.shape, axles: form.axles, fEnd: form.fEnd } : null;
}
