import { expect, it } from "vitest";
import { denyAnother, denyTerms, denyWithdrawal, restrictionLabels, ruleEachOtherOut } from "@/lib/acceptance/rules";
import { acceptanceStatement } from "@/lib/acceptance/statement";
import type { RestrictionId } from "@/lib/acceptance/vocabulary";

const today = "2026-11-18";

it.each<[string, RestrictionId[], string | null, string[]]>([
  ["nothing", [], null, []],
  ["one speed and more", ["mph-25", "do-not-hump", "face-a", "rear"], "2026-11-19", []],
  ["two speeds", ["mph-15", "mph-45"], null, ["restrictions"]],
  ["head end and rear", ["head-end", "rear"], null, ["restrictions"]],
  ["both faces", ["face-a", "face-b"], null, ["restrictions"]],
  ["until today", [], today, ["validUntil"]],
])("terms: %s", (_, restrictions, validUntil, fields) => {
  expect(Object.keys(denyTerms({ restrictions, validUntil }, today)?.fields ?? {})).toEqual(fields);
});

it("choosing one speed takes back another, and nothing else", () => {
  expect([ruleEachOtherOut("mph-15", "mph-25"), ruleEachOtherOut("mph-15", "mph-15"), ruleEachOtherOut("mph-15", "rear")]).toEqual([true, false, false]);
  expect(restrictionLabels(["do-not-hump", "mph-25"])).toEqual(["25 mph at most", "Do not hump"]);
});

it("is signed once, and withdrawn while the carrier has not taken the unit", () => {
  expect(denyAnother({ accepted: false, takenOver: false })).toBeNull();
  expect(denyAnother({ accepted: true, takenOver: false })?.code).toBe("stale");
  expect(denyAnother({ accepted: false, takenOver: true })?.code).toBe("not_yet");
  expect(denyWithdrawal({ withdrawn: false, takenOver: false })).toBeNull();
  expect(denyWithdrawal({ withdrawn: true, takenOver: false })?.code).toBe("stale");
  expect(denyWithdrawal({ withdrawn: false, takenOver: true })?.code).toBe("not_yet");
});

it("the statement speaks of one leg and not of money, and an entered one is no signature", () => {
  const given = { unit: "ZVRX 2783", carrierName: "Quillan & Sandbar", fromPlace: "Sand Hollow", toPlace: "Ardell", restrictions: ["mph-25"] as const, restrictionNote: "Behind the power", validUntil: "2026-12-24", reported: null };
  const own = acceptanceStatement(given);
  expect(own).toMatch(/I accept it as mechanically fit .* from Sand Hollow to Ardell\. Restrictions: 25 mph at most; Behind the power\. Valid until 24 Dec 2026\./);
  expect(own).toMatch(/on this leg only\. Charges and payment have no say in it/);
  const entered = acceptanceStatement({ ...given, restrictions: [], restrictionNote: null, reported: { source: "phone", heardOn: "2026-11-17", saidBy: "V. Sorrel" } });
  expect(entered).toMatch(/^V\. Sorrel of Quillan & Sandbar said by phone on 17 Nov 2026 .* not the carrier’s signature\. No restrictions were set\./);
  expect(entered).not.toMatch(/\bI\b/);
});
