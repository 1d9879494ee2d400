import { expect, it } from "vitest";
import { mayOnLeg } from "@/lib/inspections/may";
import { airCaution, airNote, airWords, denyVisit } from "@/lib/inspections/rules";

const VISIT = { visitedOn: "2026-11-18", air: "on" as const, airSource: "Contractor’s compressor", airPsi: 90 };

it.each([
  ["today with air", {}, []],
  ["air without a gauge", { airPsi: null }, []],
  ["tomorrow", { visitedOn: "2026-11-19" }, ["visitedOn"]],
  ["air from nowhere", { airSource: null }, ["airSource"]],
  ["no air, but a source", { air: "off" as const }, ["airPsi", "airSource"]],
  ["air not said, nothing more", { air: "not-said" as const, airSource: null, airPsi: null }, []],
])("a visit: %s", (_, change, fields) => {
  expect(Object.keys(denyVisit({ ...VISIT, ...change }, "2026-11-18")?.fields ?? {}).sort()).toEqual(fields);
});

it("a brake finding without air is provisional, others are not", () => {
  expect(airCaution("off", true)).toMatch(/no air on the unit/);
  expect(airCaution("not-said", true)).toMatch(/not said/);
  expect([airCaution("on", true), airCaution("off", false), airNote("off", false)]).toEqual([null, null, null]);
  expect(airNote("off", true)).toBe("taken without air");
  expect(airWords(VISIT)).toBe("Air was on the unit: Contractor’s compressor, 90 psi");
});

it("a carrier on board does its own steps; for an absent one owner and contractor enter them", () => {
  const leg = (onBoard: boolean) => ({ legId: "leg_a", onBoard });
  const owner = [{ part: "owner" as const, legId: null, companyId: "com_1" }];
  expect(mayOnLeg(owner, "finding.post", leg(true))).toBeNull();
  expect(mayOnLeg(owner, "finding.post", leg(false))).toBe("enter");
  expect(mayOnLeg([{ part: "inspector", legId: "leg_a", companyId: "com_2" }], "finding.post", leg(true))).toBe("self");
  expect(mayOnLeg([{ part: "inspector", legId: "leg_b", companyId: "com_2" }], "finding.post", leg(true))).toBeNull();
});
