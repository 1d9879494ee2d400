import { describe, expect, it } from "vitest";
import { denyRemoval, denySeating, invitationState, joinAs, landingOf } from "@/lib/parties/rules";
import { partWords } from "@/lib/parties/words";
import type { LegFacts } from "@/lib/standing/types";

const none = { inspects: false, bills: false, dispatches: false };
const leg = (given: Partial<LegFacts> = {}): LegFacts => ({
  legId: "leg_1", seq: 1, carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", carrierCompanyId: "com_1", fromPlace: "Sand Hollow", toPlace: "Ardell", miles: null, payerName: null, payerCompanyId: null,
  visits: 0, findings: 0, openFindings: 0, answeredFindings: 0, stoppingOpen: 0, unansweredBeforePickup: 0, accepted: false, acceptanceNumber: null, acceptanceLapsedOn: null, quote: "none", quoteLapsed: false, paymentOpen: false, billingCleared: false,
  instructed: false, released: false, takenOver: false, delivered: false, atDestination: false, placed: false, ...given,
});

describe("how somebody comes into a company", () => {
  it.each([
    ["the first one manages it", { hasMembers: false, inviterManages: false, standing: "none" }, "manager"],
    ["whom another company invites is a guest", { hasMembers: true, inviterManages: false, standing: "none" }, "guest"],
    ["whom its manager invites is admitted", { hasMembers: true, inviterManages: true, standing: "none" }, "member"],
    ["a guest stays one when invited from outside again", { hasMembers: true, inviterManages: false, standing: "guest" }, "guest"],
    ["a guest is admitted when the manager invites", { hasMembers: true, inviterManages: true, standing: "guest" }, "member"],
    ["a member invited from outside stays as they are", { hasMembers: true, inviterManages: false, standing: "member" }, "as-is"],
    ["a guest of a company that everybody left does manage it", { hasMembers: false, inviterManages: false, standing: "guest" }, "manager"],
  ] as const)("%s", (_, joining, how) => {
    expect(joinAs(joining)).toBe(how);
  });
});

describe("a letter", () => {
  const now = new Date("2026-11-20T12:00:00Z");
  const letter = { acceptedAt: null, revokedAt: null, expiresAt: new Date("2026-11-21T00:00:00Z") };
  it("is open until its last moment", () => {
    expect(invitationState(letter, now)).toBe("open");
    expect(invitationState({ ...letter, expiresAt: now }, now)).toBe("expired");
    expect(invitationState({ ...letter, revokedAt: now }, now)).toBe("revoked");
    expect(invitationState({ ...letter, acceptedAt: now, revokedAt: now }, now)).toBe("used");
  });
});

it("leads to what waits", () => {
  expect(landingOf("contractor", none)).toBe("prep");
  expect(landingOf("payer", none)).toBe("fees");
  expect(landingOf("receiver", none)).toBe("case");
  expect(landingOf("carrier", { inspects: true, bills: true, dispatches: true })).toBe("findings");
  expect(landingOf("carrier", { ...none, bills: true })).toBe("fees");
  expect(landingOf("carrier", { ...none, dispatches: true })).toBe("movement");
  expect(landingOf(null, none)).toBe("moves");
});

describe("taking a company off its part", () => {
  it("leaves who has signed or agreed", () => {
    expect(denyRemoval("owner", null)?.code).toBe("not_yet");
    expect(denyRemoval("carrier", leg({ accepted: true }))?.message).toMatch(/acceptance/);
    expect(denyRemoval("carrier", leg({ takenOver: true }))?.code).toBe("not_yet");
    expect(denyRemoval("payer", leg({ quote: "agreed" }))?.code).toBe("not_yet");
  });
  it("lets everybody else go", () => {
    expect(denyRemoval("carrier", leg({ visits: 2, findings: 3 }))).toBeNull();
    expect(denyRemoval("payer", leg({ quote: "given" }))).toBeNull();
    expect(denyRemoval("contractor", null)).toBeNull();
  });
});

describe("seating a company", () => {
  const seats = [{ companyId: "com_1", companyName: "Quillan & Sandbar", part: "carrier", legId: "leg_1" }, { companyId: "com_2", companyName: "Ibarra Rail Mechanical", part: "contractor", legId: null }] as const;
  it("keeps one company to a part", () => {
    expect(denySeating({ part: "carrier", legId: "leg_1", companyId: "com_9" }, seats, leg())?.message).toMatch(/Quillan & Sandbar has this part/);
    expect(denySeating({ part: "contractor", legId: null, companyId: null }, seats, null)?.message).toMatch(/Ibarra/);
  });
  it("takes more people of the same company, and other legs", () => {
    expect(denySeating({ part: "carrier", legId: "leg_1", companyId: "com_1" }, seats, leg())).toBeNull();
    expect(denySeating({ part: "carrier", legId: "leg_2", companyId: "com_9" }, seats, leg({ legId: "leg_2", seq: 2 }))).toBeNull();
  });
  it("changes a payer until the charges are agreed", () => {
    expect(denySeating({ part: "payer", legId: "leg_1", companyId: "com_9" }, seats, leg({ quote: "given" }))).toBeNull();
    expect(denySeating({ part: "payer", legId: "leg_1", companyId: "com_9" }, seats, leg({ quote: "agreed" }))?.code).toBe("not_yet");
  });
});

it("names a part as a sentence does", () => {
  const stretch = { seq: 2, fromPlace: "Ardell", toPlace: "Quill Creek" };
  expect(partWords("carrier", stretch, { inspects: true, bills: false, dispatches: true })).toBe("carrier of leg 2, Ardell to Quill Creek (inspector and transport desk)");
  expect(partWords("contractor", null, none)).toBe("contractor");
  expect(partWords(null, null, none)).toBe("a colleague");
});
