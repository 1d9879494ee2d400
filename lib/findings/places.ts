import { AXLES, type Axles } from "@/lib/moves/vocabulary";

/** What sort of spot a place is; a component says which sorts it is found at. */
export const PLACE_KINDS = ["wheel", "axle", "truck", "coupler", "end", "side", "cab", "roof", "underframe", "tank"] as const;
export type PlaceKind = (typeof PLACE_KINDS)[number];

/** A spot on the unit that a finding, a photo or a measurement can point at. */
export type Place = { id: string; kind: PlaceKind; label: string };

const WHOLE_UNIT: readonly Place[] = [
  { id: "coupler-F", kind: "coupler", label: "Coupler, F end" },
  { id: "coupler-rear", kind: "coupler", label: "Coupler, rear end" },
  { id: "end-F", kind: "end", label: "F end" },
  { id: "end-rear", kind: "end", label: "Rear end" },
  { id: "left-side", kind: "side", label: "Left side, looking toward the F end" },
  { id: "right-side", kind: "side", label: "Right side, looking toward the F end" },
  { id: "cab", kind: "cab", label: "Cab" },
  { id: "roof", kind: "roof", label: "Roof" },
  { id: "underframe", kind: "underframe", label: "Underframe" },
  { id: "fuel-tank", kind: "tank", label: "Fuel tank" },
  { id: "main-reservoirs", kind: "tank", label: "Main reservoirs" },
];

const TRUCKS: readonly Place[] = [
  { id: "truck-F", kind: "truck", label: "Truck at the F end" },
  { id: "truck-rear", kind: "truck", label: "Truck at the rear end" },
];

/** Every place on a unit. Wheels and axles are counted from the end stencilled F, which may be the long hood. */
export function placesOf(axles: Axles): readonly Place[] {
  const numbers = Array.from({ length: axles }, (_, index) => index + 1);
  return [
    ...numbers.map((number): Place => ({ id: `L${number}`, kind: "wheel", label: `Wheel L${number}` })),
    ...numbers.map((number): Place => ({ id: `R${number}`, kind: "wheel", label: `Wheel R${number}` })),
    ...numbers.map((number): Place => ({ id: `axle-${number}`, kind: "axle", label: `Axle ${number}` })),
    ...TRUCKS,
    ...WHOLE_UNIT,
  ];
}

/** The place of an id on a unit with so many axles; null when that unit has no such place. */
export function findPlace(axles: Axles, id: string): Place | null {
  return placesOf(axles).find((place) => place.id === id) ?? null;
}

/** The two axle counts that outlines exist for; null for any other number. */
export function axlesOf(count: number): Axles | null {
  return AXLES.find((axles) => axles === count) ?? null;
}

/** The truck above which a wheel or axle turns: the first half of the axles belongs to the F end. */
export function truckOf(axles: Axles, axleNumber: number): "truck-F" | "truck-rear" {
  return axleNumber * 2 <= axles ? "truck-F" : "truck-rear";
}
