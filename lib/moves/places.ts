import type { Axles, BodyShape, FEnd } from "./vocabulary";

/** What a place on a unit depends on. */
export type UnitForm = { shape: BodyShape; axles: Axles; fEnd: FEnd };

/** A named place on a unit. The id is stored with a finding or a fact and never changes its meaning. */
export type Place = { id: string; name: string; group: "Wheels" | "Couplers and hoses" | "Trucks and brakes" | "Body and inside" | "Steps and handholds" };

const SIDES = [
  { letter: "L", word: "left" },
  { letter: "R", word: "right" },
] as const;

const ENDS = [
  { id: "f", name: "F end" },
  { id: "r", name: "rear end" },
] as const;

/** True when the cab, or the short hood of a hood unit, stands at the end marked F. */
export function cabLeads(fEnd: FEnd): boolean {
  return fEnd === "short-hood" || fEnd === "cab-end";
}

/** Wheels as the trade numbers them: from the end marked F, left and right seen by somebody who faces that end from inside the unit. */
function wheels(axles: Axles): Place[] {
  return SIDES.flatMap(({ letter, word }) =>
    Array.from({ length: axles }, (_, at): Place => ({ id: `wheel-${letter}${at + 1}`, name: `Wheel ${letter}${at + 1}, ${word} side`, group: "Wheels" })),
  );
}

function atBothEnds(): Place[] {
  return ENDS.flatMap(({ id, name }): Place[] => [
    { id: `coupler-${id}`, name: `Coupler, ${name}`, group: "Couplers and hoses" },
    { id: `hoses-${id}`, name: `Air hoses and angle cocks, ${name}`, group: "Couplers and hoses" },
    { id: `pilot-${id}`, name: `Pilot, ${name}`, group: "Couplers and hoses" },
    { id: `truck-${id}`, name: `Truck, ${name}`, group: "Trucks and brakes" },
    { id: `brake-rigging-${id}`, name: `Brake rigging and cylinders, ${name} truck`, group: "Trucks and brakes" },
  ]);
}

function steps(): Place[] {
  return ENDS.flatMap((end) =>
    SIDES.map(({ letter, word }): Place => ({ id: `steps-${end.id}-${letter.toLowerCase()}`, name: `Steps and handholds, ${end.name}, ${word} side`, group: "Steps and handholds" })),
  );
}

const BODY: Place[] = [
  { id: "hand-brake", name: "Hand brake", group: "Trucks and brakes" },
  { id: "main-reservoirs", name: "Main reservoirs", group: "Trucks and brakes" },
  { id: "cab", name: "Cab", group: "Body and inside" },
  { id: "electrical-cabinet", name: "Electrical cabinet", group: "Body and inside" },
  { id: "batteries", name: "Batteries", group: "Body and inside" },
  { id: "engine", name: "Engine compartment", group: "Body and inside" },
  { id: "cooling", name: "Radiators and fans", group: "Body and inside" },
  { id: "roof", name: "Roof and exhaust", group: "Body and inside" },
  { id: "fuel-tank", name: "Fuel tank", group: "Body and inside" },
  { id: "underframe", name: "Underframe", group: "Body and inside" },
];

/** Every place on a unit of this form, in the order in which a list shows them. */
export function placesOn({ axles }: Pick<UnitForm, "axles">): Place[] {
  return [...wheels(axles), ...atBothEnds(), ...BODY, ...steps()];
}

/** The place in words, or null when a unit with so many axles has no such place. */
export function placeName(placeId: string, axles: Axles): string | null {
  return placesOn({ axles }).find((place) => place.id === placeId)?.name ?? null;
}
