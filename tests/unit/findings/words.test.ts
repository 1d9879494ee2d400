import { expect, it } from "vitest";
import { changeWords, countWords, findingLabel, shortStateWords, stateWords, titleWords, whereWords } from "@/lib/findings/words";
import type { FindingState } from "@/lib/findings/vocabulary";

const NOW = "2026-11-18T15:00:00.000Z";
const stated = (state: FindingState, more = {}) => ({ state, sentBack: false, stateSince: "2026-11-14T14:00:00.000Z", severity: "stops-move" as const, zone: "America/Chicago", ...more });

it.each([
  ["open", {}, "Open 4 days", "Open, 4 d"],
  ["open", { sentBack: true }, "Not cleared, open 4 days", "Not cleared, 4 d"],
  ["open", { stateSince: "2026-11-18T14:00:00.000Z" }, "Open since today", "Open, today"],
  ["answered", {}, "Answered, waiting 4 days", "Answered, 4 d"],
  ["answered", { stateSince: "2026-11-17T14:00:00.000Z" }, "Answered, waiting 1 day", "Answered, 1 d"],
  ["cleared", {}, "Cleared 14 Nov 2026", "Cleared 14 Nov"],
  ["withdrawn", {}, "Withdrawn 14 Nov 2026", "Withdrawn 14 Nov"],
] as const)("%s %o says so with its days", (state, more, long, short) => {
  expect(stateWords(stated(state, more), NOW)).toBe(long);
  expect(shortStateWords(stated(state, more), NOW)).toBe(short);
});

it("tells whoever comes second what changed, by the clock of the place", () => {
  expect(changeWords("F-02", { kind: "answer", byName: "T. Ibarra", at: "2026-11-18T20:02:00.000Z" }, "America/Chicago")).toMatch(/^F-02 was answered by T\. Ibarra at 18 Nov 14:02 CST\./);
  expect(changeWords("F-02", null, "America/Chicago")).toMatch(/^F-02 has changed/);
});

it("numbers, places and counts", () => {
  expect([findingLabel(1), findingLabel(12), findingLabel(100)]).toEqual(["F-01", "F-12", "F-100"]);
  expect([whereWords("Wheel R4, right side", "two spots"), whereWords(null, "under the cab"), whereWords("Roof and exhaust", null), whereWords(null, null)]).toEqual(["Wheel R4, right side, two spots", "under the cab", "Roof and exhaust", null]);
  expect([titleWords("Flat spot", "Wheel R4, right side"), titleWords("Hand brake", "Hand brake, chain"), titleWords("Register entry", null)]).toEqual(["Flat spot, wheel R4, right side", "Hand brake, chain", "Register entry"]);
  expect(countWords([{ state: "cleared" }, { state: "open" }, { state: "open" }])).toBe("2 open, 1 cleared");
});
