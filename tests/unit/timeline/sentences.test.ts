import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { audienceOf, RECORD_KINDS } from "@/lib/record/vocabulary";
import { followSentence } from "@/lib/timeline/follow";
import { sentenceOf, type Sees } from "@/lib/timeline/sentences";
import { byWords, enteredWords, plainText } from "@/lib/timeline/words";

const ALL: Sees = { prep: true, findings: true, money: true, unit: true };
const NONE: Sees = { prep: false, findings: false, money: false, unit: false };

/** What entries carry today, all at once; each sentence takes what it needs. */
const FULL = {
  from: "Sand Hollow elevator", to: "Vellum Ridge shops", company: "Ibarra Rail Mechanical", part: "contractor", legSeq: 1, name: "T. Ibarra", label: "Museum friends", reason: "No money", why: "Another unit", changes: [{ key: "weight", label: "Weight", before: "360,000 lb", after: null }],
  templateId: "P1", action: "Exhaust stack capped", restoreAction: "Remove the cap", phase: "where-it-stands", items: 34, value: "92 psi", tagNumber: "T-7", carrier: "Quillan & Sandbar", number: 2, component: "Flat spot", place: "Ardell",
  reading: "2 5/8 in", severity: "stops-move", air: "on", airPsi: 88, airSource: "the contractor’s compressor", inspectorName: "V. Sorrel", visitedOn: "2026-11-12", restrictions: ["25 mph at most"], validUntil: "2026-12-31", totalCents: 418_500, amountCents: 418_500, payer: "Fenn Valley Fund",
  how: "credit-agreed", billNumber: "B-4410", clearanceNumber: "C-77", pickupFrom: "2026-11-30", train: "QS12", sighting: "delivered", occurredAt: "2026-11-24T20:00:00.000Z", arrivedOn: "2026-11-28", condition: "As it left.", missing: "A light", corrects: "sgt_1", photos: 3,
};

const text = (...given: Parameters<typeof sentenceOf>) => {
  const { parts, note, state } = sentenceOf(...given);
  return [plainText(parts), note, state?.word].filter(Boolean).join(" | ");
};

describe("sentences of the record", () => {
  it.each(RECORD_KINDS)("%s is told, with all of its detail, with none, and to a reader who may not open it", (kind) => {
    for (const told of [text(kind, FULL, ALL), text(kind, {}, ALL), text(kind, FULL, NONE)]) {
      expect(told.length).toBeGreaterThan(3);
      expect(told).not.toMatch(/undefined|null|NaN|\[object|\{|,\s*[,|]| {2}/);
      expect(told).toMatch(/^[A-Z]/);
    }
  });

  it("hold whatever an entry carries", () => {
    const detail = fc.dictionary(fc.constantFrom(...Object.keys(FULL)), fc.oneof(fc.string(), fc.integer(), fc.constant(null), fc.boolean(), fc.array(fc.string()), fc.object()));
    fc.assert(fc.property(fc.constantFrom(...RECORD_KINDS), detail, (kind, given) => {
      const { parts } = sentenceOf(kind, given, ALL);
      expect(parts.length).toBeGreaterThan(0);
      for (const part of parts) expect(typeof part.text).toBe("string");
    }));
  });

  it.each([
    ["move.opened", "Opened the move, Sand Hollow elevator to Vellum Ridge shops"],
    ["equipment.changed", "Changed the unit’s facts | Weight: left empty, was 360,000 lb"],
    ["party.invited", "Invited T. Ibarra of Ibarra Rail Mechanical as contractor of leg 1"],
    ["prep.done", "Did P1, exhaust stack capped | 92 psi, tag T-7"],
    ["prep.signed", "Prep signed, where it stands: 34 items, by T. Ibarra | Signed"],
    ["inspection.visited", "Visit 2 of Quillan & Sandbar, air at 88 psi from the contractor’s compressor | Inspector V. Sorrel, Ardell, 12 Nov 2026"],
    ["acceptance.signed", "Accepted by Quillan & Sandbar, no. 2, good until 31 Dec 2026 | 25 mph at most | Accepted"],
    ["quote.given", "Gave quote 2 of Quillan & Sandbar: $4,185.00, to be paid by Fenn Valley Fund"],
    ["billing.cleared", "Billing cleared, Quillan & Sandbar | The charges are settled, or credit is agreed. | Cleared"],
    ["instruction.given", "Movement instruction of Quillan & Sandbar, bill of lading B-4410 | clearance C-77, train QS12, pickup from 30 Nov 2026 | Given"],
    ["sighting.made", "Handed over, Ardell, Quillan & Sandbar, train QS12 | Corrects an earlier sighting."],
    ["arrival.recorded", "Looked over on arrival, 28 Nov 2026 | As it left. Missing or damaged: A light | Something missing"],
  ] as const)("%s reads as a person would say it", (kind, words) => {
    expect(text(kind, FULL, ALL)).toBe(words);
  });

  it("name a finding by its number, what it is and where on the unit", () => {
    expect(text("finding.answered", { number: "F-02", component: "Flat spot", place: "Wheel R4, right side", reading: "0 in" }, ALL)).toBe("Answered F-02, flat spot, wheel R4, right side | 0 in | Answered");
    expect(text("finding.cleared", { number: "F-11", component: "Hand brake", place: null }, ALL)).toBe("Cleared F-11, hand brake | Cleared");
  });

  it("keep what a reader may not open to themselves", () => {
    expect(text("finding.posted", FULL, NONE)).toBe("Posted a finding");
    expect(text("arrival.recorded", FULL, NONE)).toBe("Looked the unit over on arrival");
    expect(text("billing.cleared", FULL, NONE)).toBe("Billing cleared, Quillan & Sandbar | Cleared");
    for (const kind of RECORD_KINDS) expect(text(kind, FULL, NONE)).not.toMatch(/4,185/);
  });
});

describe("sentences for a notify party", () => {
  it.each(RECORD_KINDS)("%s is told or kept as its audience says", (kind) => {
    const told = followSentence(kind, FULL);
    expect(told !== null).toBe(audienceOf(kind) === "follow");
    expect(followSentence(kind, {}) !== null).toBe(audienceOf(kind) === "follow");
    for (const one of [told, followSentence(kind, {})]) expect(one ?? "Told").not.toMatch(/undefined|null|Ibarra|Sorrel|Another unit|No money|A light|QS12|B-4410|4,185/);
  });
});

it("what was entered for a carrier says by whom, from what, and who said it", () => {
  expect(enteredWords("R. Okafor", { carrierName: "Quillan & Sandbar", source: "e-mail", heardOn: "2026-11-18", saidBy: "V. Sorrel", reference: "Letter 7" })).toBe("entered by R. Okafor for Quillan & Sandbar from an e-mail, 18 Nov 2026, as V. Sorrel said (Letter 7)");
});

it("who did it stands with their company, or else with their part", () => {
  expect(byWords({ by: "T. Ibarra", company: "Ibarra Rail Mechanical", part: "contractor" })).toBe("T. Ibarra, Ibarra Rail Mechanical");
  expect(byWords({ by: "D. Sand", company: null, part: "desk" })).toBe("D. Sand, transport desk");
  expect(byWords({ by: "Payment service", company: null, part: null })).toBe("Payment service");
});
