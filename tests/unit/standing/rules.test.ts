import { expect, it } from "vitest";
import { conditionsOf, denyAcceptance, denyClosing, denyInstruction, denyRelease, denyTakeOver, handoverMil, standingOf } from "@/lib/standing/rules";
import type { LegFacts, MoveFacts } from "@/lib/standing/types";
import type { WAITS } from "@/lib/standing/vocabulary";

const aLeg = (given: Partial<LegFacts> = {}): LegFacts => ({
  legId: `leg${given.seq ?? 1}`, seq: 1, carrierName: `Carrier ${given.seq ?? 1}`, carrierMark: null, carrierCompanyId: "com", fromPlace: "Sand Hollow", toPlace: "Ardell", miles: null,
  payerName: "Fenn Valley Fund", payerCompanyId: "com-payer", visits: 0, findings: 0, openFindings: 0, answeredFindings: 0, stoppingOpen: 0, unansweredBeforePickup: 0,
  accepted: false, acceptanceNumber: null, acceptanceLapsedOn: null, quote: "none", quoteLapsed: false, paymentOpen: false, billingCleared: false, instructed: false, released: false, takenOver: false, delivered: false, atDestination: false, placed: false, ...given,
});
const SIGNED = { total: 34, left: 0, signed: true };
const aMove = (given: Partial<MoveFacts> = {}): MoveFacts => ({
  state: "open", ownerCompanyId: "own", ownerName: "Vellum Ridge", contractor: { companyId: "con", name: "Ibarra" }, receiver: { companyId: "rec", name: "Quill Creek" },
  standing: SIGNED, coupled: { total: 7, left: 7, signed: false }, arrived: false, restoreTotal: 0, restoreLeft: 0, legs: [aLeg(), aLeg({ seq: 2 })], ...given,
});
/** A leg that lacks nothing but to be taken over. */
const READY = { accepted: true, billingCleared: true, instructed: true, quote: "paid" } as const;
const RODE = { ...READY, released: true, takenOver: true } as const;

const wait = (move: MoveFacts) => standingOf(move).waiting;

it.each<[string, Partial<MoveFacts>, (typeof WAITS)[number], string]>([
  ["nobody prepares", { contractor: null }, "invite-contractor", "owner"],
  ["items are open", { standing: { total: 34, left: 3, signed: false } }, "prepare", "contractor"],
  ["all done, not signed", { standing: { total: 34, left: 0, signed: false } }, "sign-prep", "contractor"],
  ["no payer named", { legs: [aLeg({ payerName: null })] }, "name-payer", "owner"],
  ["no payer named, and billing cleared on credit", { legs: [aLeg({ payerName: null, billingCleared: true })] }, "inspect", "inspector"],
  ["not looked at", { legs: [aLeg()] }, "inspect", "inspector"],
  ["findings open", { legs: [aLeg({ visits: 1, openFindings: 2 })] }, "answer", "contractor"],
  ["answers to look at", { legs: [aLeg({ visits: 1, answeredFindings: 2 })] }, "look-at-answers", "inspector"],
  ["accepted, an answer not looked at yet", { legs: [aLeg({ visits: 1, answeredFindings: 1, accepted: true })] }, "quote", "billing"],
  ["nothing open, not signed", { legs: [aLeg({ visits: 1 })] }, "accept", "inspector"],
  ["payer named, not on board", { legs: [aLeg({ accepted: true, payerCompanyId: null })] }, "invite-payer", "owner"],
  ["accepted, no price", { legs: [aLeg({ accepted: true })] }, "quote", "billing"],
  ["priced", { legs: [aLeg({ accepted: true, quote: "given" })] }, "agree", "payer"],
  ["priced, and the day to agree has passed", { legs: [aLeg({ accepted: true, quote: "given", quoteLapsed: true })] }, "quote", "billing"],
  ["agreed", { legs: [aLeg({ accepted: true, quote: "agreed" })] }, "pay", "payer"],
  ["payment begun", { legs: [aLeg({ accepted: true, quote: "agreed", paymentOpen: true })] }, "confirm-payment", "payer"],
  ["billing cleared", { legs: [aLeg({ accepted: true, billingCleared: true })] }, "instruct", "desk"],
  ["instructed", { legs: [aLeg(READY)] }, "release", "owner"],
  ["released", { legs: [aLeg({ ...READY, released: true })] }, "prepare-coupled", "contractor"],
  ["coupled and signed", { coupled: SIGNED, legs: [aLeg({ ...READY, released: true })] }, "pull", "desk"],
  ["under way", { legs: [aLeg(RODE), aLeg({ seq: 2 })] }, "move-on", "desk"],
  ["under way, the contractor taken off", { contractor: null, legs: [aLeg(RODE), aLeg({ seq: 2 })] }, "move-on", "desk"],
  ["at the interchange, findings open and nobody to answer", { contractor: null, legs: [aLeg({ ...RODE, delivered: true }), aLeg({ seq: 2, visits: 1, openFindings: 1 })] }, "invite-contractor", "owner"],
  ["delivered, next carrier not ready", { legs: [aLeg({ ...RODE, delivered: true }), aLeg({ seq: 2 })] }, "inspect", "inspector"],
  ["delivered, next carrier ready", { legs: [aLeg({ ...RODE, delivered: true }), aLeg({ seq: 2, ...READY })] }, "take-over", "desk"],
  ["at the last yard", { legs: [aLeg({ ...RODE, atDestination: true })] }, "place", "desk"],
  ["placed, nobody receives", { receiver: null, legs: [aLeg({ ...RODE, placed: true })] }, "invite-receiver", "owner"],
  ["placed", { legs: [aLeg({ ...RODE, placed: true })] }, "arrival", "receiver"],
  ["looked over", { arrived: true, restoreLeft: 6, legs: [aLeg({ ...RODE, placed: true })] }, "restore", "receiver"],
  ["all put back", { arrived: true, legs: [aLeg({ ...RODE, placed: true })] }, "close", "receiver"],
])("%s: it waits to %s", (_, given, waitingFor, part) => {
  expect(wait(aMove(given))).toMatchObject({ waitingFor, part });
});

it("a move that is over waits for nobody", () => {
  for (const state of ["closed", "cancelled"] as const) expect(standingOf(aMove({ state }))).toMatchObject({ waiting: null, stage: state });
});

it("acceptance is about the unit: money has no say, prep and stopping findings have", () => {
  expect(denyAcceptance(aMove(), aLeg({ quote: "none", billingCleared: false }))).toBeNull();
  const denied = denyAcceptance(aMove({ standing: { total: 34, left: 3, signed: false } }), aLeg({ stoppingOpen: 2 }));
  expect(denied?.missing).toHaveLength(2);
  expect(denyAcceptance(aMove(), aLeg({ answeredFindings: 1, stoppingOpen: 1 }))?.missing).toHaveLength(1);
});

it("an acceptance that ran out is no condition met; the inspector signs again", () => {
  const move = aMove({ legs: [aLeg({ visits: 1, acceptanceLapsedOn: "2026-11-20" })] });
  expect(wait(move)).toMatchObject({ waitingFor: "accept", part: "inspector" });
  expect(denyInstruction(move, aLeg({ acceptanceLapsedOn: "2026-11-20", billingCleared: true }))?.missing).toEqual(["Acceptance: ran out on 2026-11-20; the inspector signs again"]);
});

it("the instruction needs acceptance and billing, the release the instruction as well", () => {
  expect(denyInstruction(aMove(), aLeg())?.missing).toHaveLength(2);
  expect(denyInstruction(aMove(), aLeg({ accepted: true, billingCleared: true }))).toBeNull();
  expect(denyRelease(aMove(), aLeg({ accepted: true, billingCleared: true }))?.missing).toEqual(["Movement instruction: not given"]);
});

it.each(["accepted", "billingCleared", "instructed", "released"] as const)("pulled can’t be recorded while %s does not stand", (lacking) => {
  const move = aMove({ coupled: SIGNED });
  expect(denyTakeOver(move, aLeg({ ...READY, released: true }))).toBeNull();
  expect(denyTakeOver(move, aLeg({ ...READY, released: true, [lacking]: false }))?.missing).toHaveLength(1);
});

it("pulled asks for the second phase of prep and for answers; receipt does not ask for the phase", () => {
  expect(denyTakeOver(aMove(), aLeg({ ...READY, released: true }))?.missing).toEqual(["Prep signed, when coupled: 7 items left, at pickup"]);
  expect(denyTakeOver(aMove({ coupled: SIGNED }), aLeg({ ...READY, released: true, unansweredBeforePickup: 1 }))?.missing).toHaveLength(1);
  expect(denyTakeOver(aMove(), aLeg({ seq: 2, ...READY }))).toBeNull();
});

it("the move closes when it was looked over and everything is put back", () => {
  expect(denyClosing(aMove({ restoreLeft: 6 }))?.missing).toHaveLength(2);
  expect(denyClosing(aMove({ arrived: true }))).toBeNull();
});

it("conditions name delivery from the second leg on, release and coupling on the first", () => {
  const ids = (leg: LegFacts) => conditionsOf(aMove({ legs: [leg] }), leg).map((one) => one.id);
  expect(ids(aLeg())).toEqual(["prep", "acceptance", "billing", "instruction", "release", "coupled"]);
  expect(ids(aLeg({ seq: 2 }))).toEqual(["prep", "acceptance", "billing", "instruction", "delivered"]);
});

it("no condition tells an amount", () => {
  for (const { detail } of conditionsOf(aMove(), aLeg({ quote: "given" }))) expect(detail).not.toMatch(/\$|\d{3},\d{3}/);
});

it("the unit’s place on the strip only ever goes forward", () => {
  const places = [{}, RODE, { ...RODE, delivered: true }].map((first) => standingOf(aMove({ legs: [aLeg(first), aLeg({ seq: 2 })] })).progressMil);
  const more = [{}, { atDestination: true }, { placed: true }].map((last) => standingOf(aMove({ legs: [aLeg({ ...RODE, delivered: true }), aLeg({ seq: 2, ...RODE, ...last })] })).progressMil);
  const all = [...places, ...more];
  expect(all).toEqual([...all].sort((a, b) => a - b));
  expect([all[0], all.at(-1)]).toEqual([0, 1000]);
  expect(handoverMil(1, 2)).toBeLessThan(handoverMil(2, 2));
});
