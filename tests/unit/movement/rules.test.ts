import { describe, expect, it } from "vitest";
import { denyArrivalDay, denyAsReceiver, denyRetraction, denySighting, denyTakingBack, denyTime, kindsFor, kindsForReceiver } from "@/lib/movement/rules";
import { SIGHTING_KINDS } from "@/lib/movement/vocabulary";
import type { LegFacts, MoveFacts } from "@/lib/standing/types";

const aLeg = (seq: number, given: Partial<LegFacts> = {}): LegFacts => ({
  legId: `leg-${seq}`, seq, carrierName: `Carrier ${seq}`, carrierMark: null, carrierCompanyId: null, fromPlace: "Here", toPlace: "There", miles: null, payerName: "Payer", payerCompanyId: "com",
  visits: 1, findings: 0, openFindings: 0, answeredFindings: 0, stoppingOpen: 0, unansweredBeforePickup: 0, accepted: true, acceptanceNumber: null, acceptanceLapsedOn: null, quote: "paid", quoteLapsed: false, paymentOpen: false, billingCleared: true,
  instructed: true, released: seq === 1, takenOver: false, delivered: false, atDestination: false, placed: false, ...given,
});

const aMove = (legs: LegFacts[], given: Partial<MoveFacts> = {}): MoveFacts => ({
  state: "open", ownerCompanyId: "own", ownerName: "Owner", contractor: null, receiver: null, standing: { total: 3, left: 0, signed: true }, coupled: { total: 1, left: 0, signed: true }, arrived: false, restoreTotal: 0, restoreLeft: 0, legs, ...given,
});

const kinds = (legs: LegFacts[], at: number) => kindsFor(aMove(legs), legs[at] ?? aLeg(1));

describe("kinds of sightings", () => {
  const pulled = aLeg(1, { takenOver: true });
  const given = aLeg(1, { takenOver: true, delivered: true });

  it("begin with the take-over and nothing else", () => {
    expect(kinds([aLeg(1), aLeg(2)], 0)).toEqual(["pulled"]);
    expect(kinds([given, aLeg(2)], 1)).toEqual(["received"]);
  });

  it("end with the hand-over on the way and with placed on the last leg", () => {
    expect(kinds([pulled, aLeg(2)], 0)).toContain("delivered");
    expect(kinds([pulled, aLeg(2)], 0)).not.toContain("placed");
    expect(kinds([pulled], 0)).toEqual(expect.arrayContaining(["at-destination", "notified", "placed"]));
    expect(kinds([pulled], 0)).not.toContain("delivered");
  });

  it("are only what somebody saw once the unit was handed over, and none once it is placed", () => {
    expect(kinds([given, aLeg(2)], 0)).toEqual(["seen"]);
    expect(kinds([aLeg(1, { takenOver: true, placed: true })], 0)).toEqual([]);
  });

  it("of a receiver are those of arrival, on the last leg", () => {
    expect(kindsForReceiver(kinds([pulled], 0), pulled, 1)).toEqual(["seen", "at-destination", "notified", "placed"]);
    expect(kindsForReceiver(kinds([pulled, aLeg(2)], 0), pulled, 2)).toEqual([]);
  });
});

describe("a sighting", () => {
  it("that is offered is never refused for its kind, and every other one is", () => {
    const moves = [[aLeg(1), aLeg(2)], [aLeg(1, { takenOver: true }), aLeg(2)], [aLeg(1, { takenOver: true, delivered: true }), aLeg(2, { takenOver: true })], [aLeg(1, { takenOver: true, placed: true })]];
    for (const legs of moves) {
      for (const leg of legs) {
        if (leg.seq > 1 && !legs[leg.seq - 2]?.takenOver) continue;
        const offered = kindsFor(aMove(legs), leg);
        for (const kind of SIGHTING_KINDS) expect(denySighting(aMove(legs), leg, kind) === null, `${kind} on leg ${leg.seq}`).toBe(offered.includes(kind));
      }
    }
  });

  it("of take-over asks for every condition of its leg; a hand-over that nobody reported is no bar", () => {
    const bare = aLeg(1, { accepted: false, billingCleared: false, instructed: false, released: false, unansweredBeforePickup: 2 });
    const denial = denySighting(aMove([bare], { standing: { total: 3, left: 1, signed: false }, coupled: { total: 1, left: 1, signed: false } }), bare, "pulled");
    expect(denial?.missing?.map((one) => one.split(":")[0])).toEqual(["Prep signed, where it stands", "Acceptance", "Billing cleared", "Movement instruction", "Findings answered before pickup", "Released by the owner", "Prep signed, when coupled"]);
    const legs = [aLeg(1, { takenOver: true }), aLeg(2)];
    expect(denySighting(aMove(legs), legs[1] ?? bare, "received")).toBeNull();
  });

  it("of a receipt waits for the carrier before", () => {
    const legs = [aLeg(1), aLeg(2)];
    expect(denySighting(aMove(legs), legs[1] ?? aLeg(2), "received")).toMatchObject({ code: "not_yet", message: "Carrier 1 has not taken the unit over yet." });
  });

  it("may lie ahead by no more than a clock that runs fast", () => {
    const now = new Date("2026-11-24T20:00:00Z");
    expect(denyTime(new Date("2026-11-24T20:10:00Z"), now)).toBeNull();
    expect(denyTime(new Date("2026-11-24T20:10:01Z"), now)?.fields).toHaveProperty("occurredAt");
    expect(denyTime(new Date("2020-01-01T00:00:00Z"), now)).toBeNull();
  });
});

describe("taking a sighting back", () => {
  const said = (kind: (typeof SIGHTING_KINDS)[number], legSeq = 1, retracted = false) => ({ kind, legSeq, retracted });

  it("happens once, and not after the arrival was recorded", () => {
    expect(denyRetraction(said("seen", 1, true), [], false)?.code).toBe("stale");
    expect(denyRetraction(said("seen"), [], true)?.code).toBe("not_yet");
    expect(denyRetraction(said("seen"), [said("pulled")], false)).toBeNull();
  });

  it("of a hand-over waits for what stands on it", () => {
    expect(denyRetraction(said("pulled"), [said("departed")], false)?.missing).toEqual(["Sightings after it on this or a later leg"]);
    expect(denyRetraction(said("pulled"), [said("received", 2)], false)?.missing).toEqual(["Receipt by the next carrier"]);
    expect(denyRetraction(said("delivered"), [said("pulled"), said("received", 2)], false)?.missing).toEqual(["Receipt by the next carrier"]);
    expect(denyRetraction(said("delivered"), [said("pulled"), said("received", 2, true)], false)).toBeNull();
    expect(denyRetraction(said("received", 2), [said("pulled"), said("delivered")], false)).toBeNull();
  });

  it("for one of the same kind loses nobody's ground; for another kind it does", () => {
    expect(denyRetraction(said("pulled"), [said("departed")], false, "pulled")).toBeNull();
    expect(denyRetraction(said("pulled"), [said("departed")], false, "seen")).not.toBeNull();
    expect(denyRetraction(said("pulled", 1, true), [], false, "pulled")?.code).toBe("stale");
  });

  it("is for the carrier, and for the receiver what its own people said", () => {
    const receiver = [{ part: "receiver" as const, legId: null, companyId: "rec" }];
    const desk = [{ part: "desk" as const, legId: "leg-1", companyId: "car" }];
    expect(denyTakingBack(receiver, "leg-1", false)?.code).toBe("not_your_part");
    expect(denyTakingBack(receiver, "leg-1", true)).toBeNull();
    expect(denyTakingBack(desk, "leg-1", false)).toBeNull();
    expect(denyTakingBack(desk, "leg-2", false)?.code).toBe("not_your_part");
  });
});

it("a receiver speaks of arrival on the last leg; the desk of everything on its own", () => {
  const legs = [aLeg(1, { takenOver: true }), aLeg(2, { takenOver: true })];
  const [first, last] = [legs[0] ?? aLeg(1), legs[1] ?? aLeg(2)];
  const receiver = [{ part: "receiver" as const, legId: null, companyId: "rec" }];
  expect(denyAsReceiver(receiver, aMove(legs), last, "placed")).toBeNull();
  expect(denyAsReceiver(receiver, aMove(legs), last, "departed")?.code).toBe("not_your_part");
  expect(denyAsReceiver(receiver, aMove(legs), first, "seen")?.code).toBe("not_your_part");
  expect(denyAsReceiver([{ part: "desk", legId: "leg-1", companyId: "car" }], aMove(legs), first, "departed")).toBeNull();
});

it("the day of the look is today at the latest", () => {
  expect(denyArrivalDay("2026-11-24", "2026-11-24")).toBeNull();
  expect(denyArrivalDay("2026-11-25", "2026-11-24")?.fields?.arrivedOn?.[0]).toBe("This lies ahead; today is 24 Nov 2026 at the destination.");
});
