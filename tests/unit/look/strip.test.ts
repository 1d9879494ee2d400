import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { COLUMNS, handoverAt, labelColumns, passedAt, positionOf, standingSentence, type Handover } from "@/components/drawing/strip";

const handover = (id: string, carrier: string): Handover => ({ id, carrier, place: "Ardell", note: "2 of 6 conditions met", tone: "ahead" });
const ends = { from: { name: "Sand Hollow" }, to: { name: "Vellum Ridge shops" } };
const handovers = [handover("a", "Quillan & Sandbar"), handover("b", "Sable Mountain Lines")];

describe("route strip", () => {
  it("keeps every hand-over's words in columns of their own", () => {
    for (let count = 1; count <= 6; count++) {
      let filled = 0;
      for (let index = 0; index < count; index++) {
        const { start, span } = labelColumns(index, count);
        expect(start, `hand-over ${index} of ${count}`).toBeGreaterThan(filled);
        filled = start + span - 1;
      }
      expect(filled).toBeLessThan(COLUMNS);
    }
  });

  it("counts the hand-overs that the unit has passed, wherever it stands between them", () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 6 }), fc.nat({ max: 6 }), fc.double({ min: 0.01, max: 0.98, noNaN: true }), (count, wanted, along) => {
        const passed = Math.min(wanted, count);
        const position = positionOf({ count, passed, along });
        expect(passedAt(position, count)).toBe(passed);
        expect(position).toBeGreaterThan(0);
        expect(position).toBeLessThan(1);
      }),
    );
  });

  it("stands at its ends before anything and after everything", () => {
    expect(positionOf({ count: 2, passed: 0, along: 0 })).toBe(0);
    expect(positionOf({ count: 2, passed: 2, along: 1 })).toBe(1);
    expect(positionOf({ count: 2, passed: 1, along: 0 })).toBe(handoverAt(0, 2));
  });

  it.each([
    [0, "The unit stands at Sand Hollow."],
    [0.1, "The unit is between Sand Hollow and the hand-over to Quillan & Sandbar."],
    [0.5, "The unit is between the hand-over to Quillan & Sandbar and the hand-over to Sable Mountain Lines."],
    [0.9, "The unit is between the hand-over to Sable Mountain Lines and Vellum Ridge shops."],
    [1, "The unit stands at Vellum Ridge shops."],
  ])("says where the unit is at %d", (position, sentence) => {
    expect(standingSentence({ ends, handovers, position })).toBe(sentence);
  });
});
