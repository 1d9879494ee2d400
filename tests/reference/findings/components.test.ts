import { describe, expect, it } from "vitest";
import { COMPONENT_GROUPS, COMPONENTS, findComponent } from "@/lib/findings/components";
import { axlesOf, findPlace, PLACE_KINDS, placesOf, truckOf } from "@/lib/findings/places";

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
  it.each([4, 6] as const)("a unit with %i axles has its wheels, axles and trucks", (axles) => {
    const places = placesOf(axles);
    const ids = places.map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(places.filter(({ kind }) => kind === "wheel").length).toBe(axles * 2);
    expect(places.filter(({ kind }) => kind === "axle").length).toBe(axles);
    expect(ids).toEqual(expect.arrayContaining(["L1", `L${axles}`, "R1", `R${axles}`, "truck-F", "truck-rear", "coupler-F", "coupler-rear", "cab", "roof"]));
    expect(new Set(places.map(({ kind }) => kind))).toEqual(new Set(PLACE_KINDS));
  });

  it("knows no fifth wheel on four axles", () => {
    expect(findPlace(4, "L5")).toBeNull();
    expect(findPlace(6, "L5")?.label).toBe("Wheel L5");
  });

  it.each([
    [4, 2, "truck-F"],
    [4, 3, "truck-rear"],
    [6, 3, "truck-F"],
    [6, 4, "truck-rear"],
  ] as const)("on %i axles, axle %i turns in the %s", (axles, number, truck) => {
    expect(truckOf(axles, number)).toBe(truck);
  });

  it("draws no outline for other axle counts", () => {
    expect([axlesOf(4), axlesOf(6), axlesOf(8)]).toEqual([4, 6, null]);
  });
});
