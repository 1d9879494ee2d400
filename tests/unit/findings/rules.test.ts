import { describe, expect, it } from "vitest";
import type { HeldPart } from "@/lib/access/types";
import { PARTS } from "@/lib/access/vocabulary";
import { afterAct, denyAct, denyPosting, FINDING_ACTS, type FindingAct } from "@/lib/findings/rules";
import { FINDING_STATES, type FindingState } from "@/lib/findings/vocabulary";

const LEG = "leg_a";
const held = (part: HeldPart["part"], legId: string | null = null): HeldPart => ({ part, legId, companyId: "com_1" });
const heldBy = (part: HeldPart["part"]) => held(part, ["carrier", "inspector", "billing", "desk", "payer"].includes(part) ? LEG : null);
const ENTERED = { carrierName: "Quillan & Sandbar", source: "e-mail", heardOn: "2026-11-18", saidBy: "V. Sorrel", reference: null } as const;

/** What leads where, and in which part; everything else is refused. */
const ALLOWED: Record<string, FindingState> = {
  "open answer contractor": "answered",
  "open withdraw inspector": "withdrawn",
  "answered answer contractor": "answered",
  "answered not-cleared inspector": "open",
  "answered clear inspector": "cleared",
  "answered withdraw inspector": "withdrawn",
};

const ROWS = FINDING_STATES.flatMap((state) => FINDING_ACTS.flatMap((act) => PARTS.map((part) => ({ state, act, part }))));

describe("a finding", () => {
  it.each(ROWS)("that is $state: $act by the $part", ({ state, act, part }) => {
    const denial = denyAct({ state, legId: LEG }, act, [heldBy(part)]);
    const to = ALLOWED[`${state} ${act} ${part}`];
    expect(denial === null).toBe(to !== undefined);
    if (to) expect(afterAct({ state, rounds: 1 }, act).state).toBe(to);
  });

  it.each(ROWS)("that is $state: $act entered for an absent carrier by the $part", ({ state, act, part }) => {
    const denial = denyAct({ state, legId: LEG }, act, [heldBy(part)], { enteredFor: ENTERED, carrierOnBoard: false });
    const standIn = (part === "owner" || part === "contractor") && act !== "answer";
    expect(denial === null).toBe(standIn && ALLOWED[`${state} ${act} inspector`] !== undefined);
    expect(denyAct({ state, legId: LEG }, act, [heldBy(part)], { enteredFor: ENTERED, carrierOnBoard: true })?.code).toBe("not_your_part");
  });

  it.each(["clear", "not-cleared", "withdraw"] as FindingAct[])("is not the other leg's inspector's to %s", (act) => {
    expect(denyAct({ state: "answered", legId: LEG }, act, [held("inspector", "leg_b")])?.code).toBe("not_your_part");
  });

  it("counts a round with each first answer after a reply", () => {
    let at: { state: FindingState; rounds: number } = { state: "open", rounds: 0 };
    const rounds: number[] = [];
    for (const act of ["answer", "answer", "not-cleared", "answer", "clear"] as FindingAct[]) {
      const { round, ...next } = afterAct(at, act);
      rounds.push(round);
      at = next;
    }
    expect(rounds).toEqual([1, 1, 1, 2, 2]);
    expect(at).toEqual({ state: "cleared", rounds: 2 });
  });
});

describe("posting", () => {
  const GOOD = { componentId: "knuckle", placeId: "coupler-r", placeNote: null, photoIds: [], noPhotoReason: "Too dark in the shed" };
  it.each([
    ["all there", {}, []],
    ["a photo instead of a reason", { photoIds: ["pho_1"], noPhotoReason: null }, []],
    ["the place in words", { placeId: null, placeNote: "behind the step" }, []],
    ["the whole unit", { componentId: "register", placeId: null }, []],
    ["neither photo nor reason", { noPhotoReason: null }, ["photoIds"]],
    ["no place", { placeId: null }, ["placeId"]],
    ["a wheel that the unit lacks", { placeId: "wheel-L5" }, ["placeId"]],
    ["an unknown component", { componentId: "keel" }, ["componentId"]],
    ["everything wrong at once", { componentId: "keel", placeId: "keel", noPhotoReason: null }, ["componentId", "photoIds", "placeId"]],
  ])("%s", (_, change, fields) => {
    expect(Object.keys(denyPosting({ ...GOOD, ...change }, 4)?.fields ?? {}).sort()).toEqual(fields);
  });
});
