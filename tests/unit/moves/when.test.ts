import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { NORTH_AMERICAN_ZONES } from "@/lib/moves/zones";
import { dayAt, daysBetween, daysText, formatDay, formatFullWhen, formatShortDay, formatWhen, toUtc, toWall } from "@/lib/moves/when";

describe("a moment at a place", () => {
  it.each([
    ["2026-11-24T22:05:00Z", "America/Chicago", "24 Nov 16:05 CST"],
    ["2026-07-01T04:00:00Z", "America/Chicago", "30 Jun 23:00 CDT"],
    ["2026-11-24T22:05:00Z", "America/Phoenix", "24 Nov 15:05 MST"],
    ["2026-01-01T00:30:00Z", "America/New_York", "31 Dec 19:30 EST"],
  ])("%s in %s is %s", (iso, zone, words) => expect(formatWhen(iso, zone)).toBe(words));
  it("has its year where it is asked for", () => expect(formatFullWhen("2026-01-01T00:30:00Z", "America/New_York")).toBe("31 Dec 2025 19:30 EST"));
  it("falls on the day of the place", () => expect(dayAt("2026-01-01T00:30:00Z", "America/New_York")).toBe("2025-12-31"));
});

describe("a day", () => {
  it("reads with and without its year", () => expect([formatDay("2026-11-24"), formatShortDay("2026-03-01")]).toEqual(["24 Nov 2026", "1 Mar"]));
  it.each([["2026-11-01T12:00:00Z", "2026-11-02T11:59:59Z", 0], ["2026-11-01T12:00:00Z", "2026-11-02T12:00:00Z", 1], ["2026-11-02T12:00:00Z", "2026-11-01T12:00:00Z", 0], ["2026-09-25T00:00:00Z", "2026-11-25T00:00:00Z", 61]])("from %s to %s are %i", (from, to, days) =>
    expect(daysBetween(from, to)).toBe(days),
  );
  it("counts in words", () => expect([0, 1, 61].map(daysText)).toEqual(["today", "1 day", "61 days"]));
});

describe("a clock time typed for a place", () => {
  it.each(["2026-13-01T10:00", "2026-02-30T10:00", "2026-02-03T25:00", "tomorrow"])("%s is refused", (wall) => expect(() => toUtc(wall, "America/Chicago")).toThrow("Enter a day and a time that exist."));

  it("comes back as it was typed, in every zone of the list, unless the clock skipped it", () => {
    const zones = fc.constantFrom(...NORTH_AMERICAN_ZONES.map(({ value }) => value));
    fc.assert(
      fc.property(zones, fc.date({ min: new Date("2020-01-01"), max: new Date("2035-01-01"), noInvalidDate: true }), (zone, moment) => {
        const wall = toWall(moment.toISOString(), zone);
        const [first, second] = [toUtc(wall, zone), toUtc(wall, zone, true)];
        expect(toWall(first.toISOString(), zone)).toBe(wall);
        expect([first, second].some((one) => Math.abs(one.getTime() - moment.getTime()) < 60_000)).toBe(true);
      }),
    );
  });
});
