import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { PARTS } from "@/lib/access/vocabulary";
import { whereDaysWent } from "@/lib/timeline/days";
import { quietStretches } from "@/lib/timeline/quiet";
import { showOf } from "@/lib/timeline/show";

const DAY = 86_400_000;
const START = Date.parse("2026-09-25T15:00:00.000Z");
const on = (days: number) => new Date(START + days * DAY).toISOString();

describe("where the days went", () => {
  it("adds up what each was waited on, in the order of their first turn", () => {
    const waits = [
      { part: "owner" as const, name: "Vellum Ridge", since: on(0), until: on(9.2) },
      { part: "contractor" as const, name: "Ibarra", since: on(9.2), until: on(30.5) },
      { part: "inspector" as const, name: "Quillan", since: on(30.5), until: on(47.1) },
      { part: "contractor" as const, name: "Ibarra", since: on(47.1), until: null },
    ];
    const { total, parts } = whereDaysWent(waits, on(0), on(61));
    expect(total).toBe(61);
    expect(parts.map(({ label, days }) => [label, days])).toEqual([["Owner", 9], ["Contractor", 35], ["Quillan, inspector", 17]]);
  });

  it("sums to the days that passed when somebody was always waited on", () => {
    const cuts = fc.array(fc.double({ min: 0.01, max: 20, noNaN: true }), { minLength: 1, maxLength: 12 });
    fc.assert(fc.property(cuts, fc.array(fc.constantFrom(...PARTS), { minLength: 12, maxLength: 12 }), (lengths, parts) => {
      let at = 0;
      const waits = lengths.map((length, index) => ({ part: parts[index] ?? "owner", name: `Company ${index % 3}`, since: on(at), until: on((at += length)) }));
      const { total, parts: shares } = whereDaysWent(waits, on(0), on(at));
      expect(shares.reduce((sum, share) => sum + share.days, 0)).toBe(total);
    }));
  });
});

describe("days without an entry", () => {
  const waits = [{ part: "inspector" as const, name: "Quillan & Sandbar", since: on(0), until: on(9) }, { part: "contractor" as const, name: "Ibarra", since: on(9), until: null }];

  it("count from three whole days on and say whom they mostly waited on", () => {
    expect(quietStretches([on(0), on(2.9), on(7), on(10)], waits, on(12.5))).toEqual([
      { from: on(2.9), to: on(7), days: 4, name: "Quillan & Sandbar, inspector", goesOn: false },
      { from: on(7), to: on(10), days: 3, name: "Quillan & Sandbar, inspector", goesOn: false },
    ]);
  });

  it("go on until now while the case is open, and end with it", () => {
    expect(quietStretches([on(10)], waits, on(15))).toEqual([{ from: on(10), to: on(15), days: 5, name: "Ibarra", goesOn: true }]);
    expect(quietStretches([on(10)], waits, null)).toEqual([]);
    expect(quietStretches([on(20), on(26)], [], null)).toMatchObject([{ days: 6, name: null }]);
  });
});

it("a page shows whole steps, whatever its address asks for", () => {
  expect([null, "", "abc", "-5", "1", "60", "61", "1e9", "Infinity"].map(showOf)).toEqual([60, 60, 60, 60, 60, 60, 120, 3000, 60]);
});
