import { describe, expect, it } from "vitest";
import type { HeldPart } from "@/lib/access/types";
import type { Part } from "@/lib/access/vocabulary";
import { conditionsFor, editableBy, mayStandIn, seenParts, towSpeedOf, turnOf } from "@/lib/moves/case-rules";
import { denyCarrierChange, denyLegEdit, denyPayerChange } from "@/lib/moves/leg-rules";
import type { LegFacts, MoveFacts } from "@/lib/standing/types";

const held = (part: Part, legId: string | null = null): HeldPart => ({ part, legId, companyId: `com_${part}` });

const leg = (given: Partial<LegFacts> = {}): LegFacts => ({
  legId: "leg_1", seq: 1, carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", carrierCompanyId: null, fromPlace: "Sand Hollow", toPlace: "Ardell", miles: 174, payerName: null, payerCompanyId: null,
  visits: 0, findings: 0, openFindings: 0, answeredFindings: 0, stoppingOpen: 0, unansweredBeforePickup: 0, accepted: false, acceptanceNumber: null, acceptanceLapsedOn: null, quote: "none", quoteLapsed: false, paymentOpen: false, billingCleared: false,
  instructed: false, released: false, takenOver: false, delivered: false, atDestination: false, placed: false, ...given,
});
const move = (legs: LegFacts[]): MoveFacts => ({
  state: "open", ownerCompanyId: "com_owner", ownerName: "Vellum Ridge", contractor: null, receiver: null, standing: { total: 34, left: 3, signed: false }, coupled: { total: 7, left: 7, signed: false }, arrived: false, restoreTotal: 0, restoreLeft: 0, legs,
});

describe("whose turn it is", () => {
  it.each<[HeldPart[], Part, string | null, { you: boolean; yourCompany: boolean }]>([
    [[held("owner")], "owner", "leg_1", { you: true, yourCompany: false }],
    [[held("payer", "leg_2")], "payer", "leg_1", { you: false, yourCompany: false }],
    [[held("carrier", "leg_1"), held("inspector", "leg_1")], "inspector", "leg_1", { you: true, yourCompany: false }],
    [[held("carrier", "leg_1"), held("billing", "leg_1")], "inspector", "leg_1", { you: false, yourCompany: true }],
    [[held("carrier", "leg_2"), held("inspector", "leg_2")], "inspector", "leg_1", { you: false, yourCompany: false }],
    [[held("contractor")], "inspector", "leg_1", { you: false, yourCompany: false }],
  ])("%#", (parts, part, legId, turn) => expect(turnOf(parts, { part, legId })).toEqual(turn));

  it.each<[Part, Parameters<typeof mayStandIn>[1], boolean, boolean]>([
    ["owner", "inspect", false, true], ["contractor", "inspect", false, true], ["contractor", "quote", false, false], ["owner", "quote", false, true],
    ["owner", "inspect", true, false], ["receiver", "inspect", false, false], ["owner", "answer", false, false],
  ])("%s may enter %s for a carrier (on board: %s): %s", (part, wait, onBoard, may) => expect(mayStandIn([held(part)], wait, onBoard)).toBe(may));
});

describe("what one sees of the conditions", () => {
  const facts = move([leg({ findings: 2, openFindings: 2, visits: 1 })]);
  const details = (part: Part) => conditionsFor([held(part, part === "payer" ? "leg_1" : null)], facts, facts.legs[0] ?? leg()).map((one) => [one.id, one.detail]);
  it("owner: everything", () => expect(Object.fromEntries(details("owner"))).toMatchObject({ acceptance: "2 open", prep: "3 items left of 34" }));
  it("payer: met or not met of prep and findings", () => expect(Object.fromEntries(details("payer"))).toMatchObject({ acceptance: "Not met", prep: "Not met", billing: "Not met" }));
});

it("parts open only what they may see", () => {
  expect(seenParts([held("payer", "leg_1")], [leg()])).toEqual({ prep: false, findings: false, fees: true, movement: false, timeline: true, unit: false });
  expect(seenParts([held("inspector", "leg_1")], [leg()])).toMatchObject({ prep: true, findings: true, fees: false, unit: true });
});

it("nobody edits a case that has ended", () => expect(editableBy([held("owner")], false)).toEqual({ edit: false, cancel: false, editUnit: false, editLegs: false }));
it("a contractor edits the unit alone", () => expect(editableBy([held("contractor")], true)).toEqual({ edit: false, cancel: false, editUnit: true, editLegs: false }));

it("the lowest restriction is the tow speed", () => {
  expect(towSpeedOf([{ carrierName: "A", restrictions: ["mph-45", "do-not-hump"] }, { carrierName: "B", restrictions: ["mph-25"] }])).toEqual({ mph: 25, carrierName: "B" });
  expect(towSpeedOf([{ carrierName: "A", restrictions: ["rear"] }])).toBeNull();
});

describe("a leg that has begun", () => {
  it.each<[Partial<LegFacts>, boolean, boolean, boolean]>([
    [{}, true, true, true],
    [{ visits: 1 }, true, false, true],
    [{ quote: "given" }, true, false, true],
    [{ quote: "agreed" }, true, false, false],
    [{ accepted: true, visits: 1 }, false, false, true],
    [{ accepted: true, billingCleared: true }, false, false, false],
    [{ instructed: true }, false, false, true],
    [{ takenOver: true }, false, false, true],
  ])("%o", (given, places, carrier, payer) => {
    const facts = leg(given);
    expect([denyLegEdit(facts) === null, denyCarrierChange(facts) === null, denyPayerChange(facts) === null]).toEqual([places, carrier, payer]);
  });
});
