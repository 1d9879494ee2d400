import { describe, expect, it } from "vitest";
import { SIGHTING_KINDS } from "@/lib/movement/vocabulary";
import { EVENT_CODES, eventCodeText } from "@/lib/movement/event-codes";

/** CLM list and X12 element 304, as published; a dash where the list has no such code. */
const PUBLISHED = `
pulled             X PFP
departed           P DFL
arrived            A ARI
delivered          J ICH
received           R ICR
at-destination     D ARR
notified           Y PCO
placed             Z PAC
held               H HMI
hold-released      - HRE
bad-ordered        B BAD
bad-order-released G BFR
set-out            - -
stored             S STU
seen               - -
`
  .trim()
  .split("\n")
  .map((line) => line.split(/\s+/))
  .map(([kind = "", clm = "", x12 = ""]) => ({ kind, clm: clm === "-" ? null : clm, x12: x12 === "-" ? null : x12 }));

describe("event codes", () => {
  it("cover every kind of sighting", () => {
    expect(PUBLISHED.map(({ kind }) => kind).sort()).toEqual([...SIGHTING_KINDS].sort());
  });

  it.each(SIGHTING_KINDS.map((kind) => ({ kind })))("$kind carries the published codes", ({ kind }) => {
    const row = PUBLISHED.find((one) => one.kind === kind);
    expect(EVENT_CODES[kind]).toMatchObject({ clm: row?.clm, x12: row?.x12 });
    expect(EVENT_CODES[kind].label).toMatch(/^[A-Z]/);
  });

  it("never uses one code for two kinds", () => {
    for (const list of ["clm", "x12"] as const) {
      const codes = SIGHTING_KINDS.map((kind) => EVENT_CODES[kind][list]).filter((code) => code !== null);
      expect(new Set(codes).size).toBe(codes.length);
    }
  });

  it("shows each code with its list", () => {
    expect(eventCodeText("delivered")).toBe("CLM J, X12 304 ICH");
    expect(eventCodeText("hold-released")).toBe("X12 304 HRE");
    expect(eventCodeText("seen")).toBeNull();
  });
});
