import { describe, expect, it } from "vitest";
import { WAITS } from "@/lib/standing/vocabulary";
import { routeOfWait, WAIT_WORDS, waitDetail, waitName, waitSentence } from "@/lib/moves/waits";

const moveId = "mov_1";

describe.each(WAITS)("waiting to %s", (waitingFor) => {
  it("has a sentence for the one whose turn it is and for everybody else", () => {
    const waiting = { part: "owner" as const, name: "Vellum Ridge", legId: null, waitingFor, count: 2 };
    expect(waitSentence({ ...waiting, you: true })).toMatch(/^[A-Z].*\.$/);
    expect(waitSentence({ ...waiting, you: false })).toMatch(/^The move waits on Vellum Ridge to [a-z].*[^.]\.$/);
  });
  it("leads to a page of the case", () => {
    for (const legId of [null, "leg_1"]) expect(routeOfWait(moveId, { waitingFor, legId })).toMatch(new RegExp(`^/moves/${moveId}/(people|unit|prep|findings|fees|movement)`));
  });
  it("has words for the link", () => expect(WAIT_WORDS[waitingFor].link).toMatch(/^[A-Z]/));
});

it.each([
  [{ part: "inspector" as const, name: "Quillan & Sandbar" }, "Quillan & Sandbar, inspector"],
  [{ part: "desk" as const, name: "Sable Mountain" }, "Sable Mountain, transport desk"],
  [{ part: "payer" as const, name: "Fenn Valley Fund" }, "Fenn Valley Fund"],
])("%o is called %s", (waiting, name) => expect(waitName(waiting)).toBe(name));

it.each([
  ["look-at-answers", 2, 4, "4 days, to look at 2 answers"],
  ["answer", 1, 1, "1 day, to answer 1 finding"],
  ["prepare", 6, 0, "since today, to prepare, 6 items left"],
  ["prepare-coupled", 0, 2, "2 days, to sign the prep when coupled"],
] as const)("%s with %i after %i days", (waitingFor, count, days, words) => expect(waitDetail({ waitingFor, count }, days)).toBe(words));

it("a contractor nobody has invited yet is called so", () =>
  expect(waitSentence({ part: "contractor", name: "Contractor", legId: null, waitingFor: "prepare", count: 3, you: false })).toBe("The move waits on the contractor to prepare, 3 items left."));

it("a carrier is waited on by its person’s work", () =>
  expect(waitSentence({ part: "desk", name: "Quillan & Sandbar", legId: null, waitingFor: "pull", count: null, you: false })).toBe("The move waits on Quillan & Sandbar’s transport desk to pull the unit."));
