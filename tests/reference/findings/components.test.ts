import { describe, expect, it } from "vitest";
import { COMPONENT_GROUPS, COMPONENTS, findComponent } from "@/lib/findings/components";
import { axlesOf, kindsOf, PLACE_KINDS, usualPlaces } from "@/lib/findings/places";
import { placesOn } from "@/lib/moves/places";
import { AXLES } from "@/lib/moves/vocabulary";

/** ASC X12 element 1488, bad-order reason, the letters of use for a locomotive, in our words. */
const ELEMENT_1488 = {
  B: "braking system",
  D: "derailment or accident",
  F: "draft system",
  J: "mechanical inspection",
  L: "safety appliance",
  M: "trucks, not wheels",
  N: "underframe",
  O: "wheel assembly",
};

describe("components", () => {
  it("use each letter of the standard list once", () => {
    expect(COMPONENT_GROUPS.map(({ letter }) => letter).sort()).toEqual(Object.keys(ELEMENT_1488));
  });

  it.each([
    ["brake-shoe", "B"],
    ["piston-travel", "B"],
    ["hand-brake", "B"],
    ["derailment", "D"],
    ["knuckle", "F"],
    ["draft-gear", "F"],
    ["yoke", "F"],
    ["blue-card", "J"],
    ["handhold", "L"],
    ["step", "L"],
    ["ladder", "L"],
    ["uncoupling-lever", "L"],
    ["truck-frame", "M"],
    ["bolster", "M"],
    ["spring", "M"],
    ["snubber", "M"],
    ["side-bearing", "M"],
    ["sill", "N"],
    ["rim", "O"],
    ["axle", "O"],
    ["journal-bearing", "O"],
    ["plain-bearing", "O"],
    ["hot-box", "O"],
  ])("%s goes by %s", (id, letter) => {
    expect(findComponent(id)?.letter).toBe(letter);
  });

  it("have ids of their own and at least one place on a unit, or none for the whole unit", () => {
    expect(new Set(COMPONENTS.map(({ id }) => id)).size).toBe(COMPONENTS.length);
    expect(COMPONENTS.filter(({ places }) => places.length === 0).map(({ id }) => id)).toEqual(["register", "clearance"]);
    for (const { places } of COMPONENTS) expect(new Set(places).size).toBe(places.length);
    expect(findComponent("gone")).toBeNull();
  });
});

describe("places", () => {
  it.each(AXLES)("every place on a unit with %i axles is of some sort, and every sort has a place", (axles) => {
    const places = placesOn({ axles });
    for (const { id } of places) expect(kindsOf(id), id).not.toEqual([]);
    expect(new Set(places.flatMap(({ id }) => kindsOf(id)))).toEqual(new Set(PLACE_KINDS));
  });

  it("every component that is found somewhere has a usual place", () => {
    for (const { id, places } of COMPONENTS) expect(usualPlaces(4, places).length > 0, id).toBe(places.length > 0);
  });

  it("finds a knuckle at the couplers and a flat spot at the wheels", () => {
    expect(usualPlaces(4, findComponent("knuckle")?.places ?? []).map(({ id }) => id)).toEqual(["coupler-f", "coupler-r"]);
    expect(usualPlaces(6, ["axle"])).toHaveLength(12);
    expect(kindsOf("keel")).toEqual([]);
  });

  it("draws no outline for other axle counts", () => {
    expect([axlesOf(4), axlesOf(6), axlesOf(8)]).toEqual([4, 6, null]);
  });
});
