import { describe, expect, it } from "vitest";
import { toUtc } from "@/lib/moves/when";

// From memory: 15 U.S.C. 260a(a), Energy Policy Act of 2005, section 110: from the second Sunday of March to the first Sunday of November, changing at 2 o'clock in the morning.
const SPRING = ["2025-03-09", "2026-03-08", "2027-03-14", "2028-03-12"];
const FALL = ["2025-11-02", "2026-11-01", "2027-11-07", "2028-11-05"];
const HOURS: [string, number][] = [["America/New_York", 5], ["America/Chicago", 6], ["America/Denver", 7], ["America/Los_Angeles", 8]];

describe.each(HOURS)("clocks in %s", (zone, hours) => {
  it.each(SPRING)("%s: from 2:00 to 3:00 no clock showed any time", (day) => {
    expect(toUtc(`${day}T01:59`, zone).toISOString()).toBe(`${day}T${String(1 + hours).padStart(2, "0")}:59:00.000Z`);
    expect(() => toUtc(`${day}T02:00`, zone)).toThrow("never showed 02:00");
    expect(() => toUtc(`${day}T02:59`, zone)).toThrow("it was set forward");
    expect(toUtc(`${day}T03:00`, zone).toISOString()).toBe(`${day}T${String(2 + hours).padStart(2, "0")}:00:00.000Z`);
  });

  it.each(FALL)("%s: from 1:00 to 2:00 clocks showed every time twice", (day) => {
    expect(toUtc(`${day}T01:30`, zone).toISOString()).toBe(`${day}T${String(hours).padStart(2, "0")}:30:00.000Z`);
    expect(toUtc(`${day}T01:30`, zone, true).toISOString()).toBe(`${day}T${String(1 + hours).padStart(2, "0")}:30:00.000Z`);
    expect(toUtc(`${day}T02:00`, zone).toISOString()).toBe(`${day}T${String(2 + hours).padStart(2, "0")}:00:00.000Z`);
  });
});

// Arizona, outside the Navajo Nation, keeps standard time by A.R.S. 1-242 (clause from memory): no time is skipped or doubled there.
it.each([...SPRING, ...FALL])("in Arizona %s is a day like others", (day) => {
  expect(toUtc(`${day}T02:30`, "America/Phoenix").toISOString()).toBe(`${day}T09:30:00.000Z`);
  expect(toUtc(`${day}T01:30`, "America/Phoenix", true)).toEqual(toUtc(`${day}T01:30`, "America/Phoenix"));
});
