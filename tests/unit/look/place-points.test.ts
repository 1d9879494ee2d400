import { describe, expect, it } from "vitest";
import { axleXs, LOCATOR, nearestPlace, placePoints } from "@/components/drawing/place-points";
import { placeName, placesOn, type UnitForm } from "@/lib/moves/places";
import { AXLES, BODY_SHAPES, F_ENDS } from "@/lib/moves/vocabulary";

const FORMS: UnitForm[] = BODY_SHAPES.flatMap((shape) => AXLES.flatMap((axles) => F_ENDS.map((fEnd) => ({ shape, axles, fEnd }))));

describe("places on a unit", () => {
  it.each(FORMS)("every place on a $shape with $axles axles, F at the $fEnd, has a point on the sheet", (form) => {
    const points = placePoints(form);
    for (const { id } of placesOn(form)) {
      const at = points[id];
      expect(at, id).toBeDefined();
      expect(at && at.x >= 0 && at.x <= LOCATOR.width && at.y >= 0 && at.y <= LOCATOR.height, id).toBe(true);
    }
    expect(Object.keys(points).sort()).toEqual(placesOn(form).map((place) => place.id).sort());
  });

  it.each(FORMS)("touching a place on a $shape with $axles axles, F at the $fEnd, chooses it", (form) => {
    const points = placePoints(form);
    for (const { id } of placesOn(form)) {
      const at = points[id];
      if (at) expect(nearestPlace(form, at)).toBe(id);
    }
  });

  it("chooses nothing far from the unit", () => {
    expect(nearestPlace({ shape: "hood", axles: 6, fEnd: "short-hood" }, { x: 2, y: 2 })).toBeNull();
  });

  it("numbers axles from the F end, which is at the left whichever hood it is", () => {
    for (const fEnd of F_ENDS) {
      const xs = axleXs({ shape: "hood", axles: 6, fEnd });
      expect(xs).toEqual([...xs].sort((a, b) => a - b));
      expect(placePoints({ shape: "hood", axles: 6, fEnd })["wheel-L1"]?.x).toBe(xs[0]);
    }
  });

  it("puts the cab at the other end when the long hood is marked F", () => {
    const cabX = (fEnd: UnitForm["fEnd"]) => placePoints({ shape: "hood", axles: 6, fEnd })["cab"]?.x ?? 0;
    expect(cabX("short-hood")).toBeLessThan(LOCATOR.width / 2);
    expect(cabX("long-hood")).toBeGreaterThan(LOCATOR.width / 2);
  });

  it("has no fifth wheel on a unit with four axles", () => {
    expect(placeName("wheel-L4", 4)).toBe("Wheel L4, left side");
    expect(placeName("wheel-L5", 4)).toBeNull();
    expect(placeName("wheel-L5", 6)).toBe("Wheel L5, left side");
  });
});
