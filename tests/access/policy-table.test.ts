import { expect, it } from "vitest";
import { ACTIONS, AREAS, denyAction, maySee, maySeeFees, partFor, type Action, type Area } from "@/lib/access/policy";
import { PARTS, type Part } from "@/lib/access/vocabulary";

type Line = { who: string; leg?: "own"; enter?: string };

/** The table as it was agreed, typed out a second time: who does what; `leg: "own"` where a carrier's or a payer's word counts on its own leg alone; `enter` who may enter it for a carrier that is not on board. */
const DOES: Record<Action, Line> = {
  "move.edit": { who: "owner" },
  "move.cancel": { who: "owner" },
  "move.close": { who: "owner receiver" },
  "party.invite": { who: "owner" },
  "party.remove": { who: "owner" },
  "follow.make": { who: "owner" },
  "leg.edit": { who: "owner" },
  "equipment.edit": { who: "owner contractor" },
  "photo.take": { who: "owner contractor inspector desk receiver" },
  "prep.do": { who: "contractor" },
  "prep.sign": { who: "contractor" },
  "inspection.visit": { who: "inspector", leg: "own", enter: "owner contractor" },
  "finding.post": { who: "inspector", leg: "own", enter: "owner contractor" },
  "finding.answer": { who: "contractor" },
  "finding.clear": { who: "inspector", leg: "own", enter: "owner contractor" },
  "acceptance.sign": { who: "inspector", leg: "own", enter: "owner contractor" },
  "fee.quote": { who: "billing", leg: "own", enter: "owner" },
  "fee.agree": { who: "owner payer", leg: "own" },
  "fee.pay": { who: "owner payer", leg: "own" },
  "billing.clear": { who: "billing", leg: "own", enter: "owner" },
  "movement.instruct": { who: "desk", leg: "own", enter: "owner contractor" },
  "movement.sight": { who: "desk receiver", leg: "own", enter: "owner contractor" },
  "unit.release": { who: "owner" },
  "arrival.record": { who: "receiver contractor" },
  "restore.do": { who: "contractor receiver" },
  "restore.keep": { who: "receiver" },
};

const SEES: Record<Area, string> = {
  equipment: "owner contractor inspector billing desk receiver",
  prep: "owner contractor inspector desk receiver",
  findings: "owner contractor inspector desk receiver",
  fees: "owner billing payer",
  movement: "owner contractor inspector desk receiver",
  timeline: "owner contractor inspector billing desk receiver carrier payer",
};

/** Parts that are tied to a leg. */
const OF_A_LEG: readonly Part[] = ["carrier", "inspector", "billing", "desk", "payer"];

const words = (list: string | undefined): Part[] => PARTS.filter((part) => list?.split(" ").includes(part));
const actions = Object.keys(DOES) as Action[];
const held = (part: Part, legId: string) => [{ part, legId: OF_A_LEG.includes(part) ? legId : null, companyId: "com" }];
const HEARD = { carrierName: "Sable Mountain Lines", source: "phone", heardOn: "2026-11-18", saidBy: "I. Sable", reference: null } as const;

it("the table and the policy name the same actions and areas", () => {
  expect(Object.keys(ACTIONS).sort()).toEqual([...actions].sort());
  expect(Object.keys(AREAS).sort()).toEqual(Object.keys(SEES).sort());
});

it.each(actions)("%s is done by those of the table, and by nobody else", (action) => {
  const doing = PARTS.filter((part) => denyAction(held(part, "leg-1"), { action, legId: "leg-1" }) === null);
  expect(doing).toEqual(words(DOES[action].who));
});

it.each(actions)("%s counts on the own leg alone where the table says so", (action) => {
  const onAnother = PARTS.filter((part) => denyAction(held(part, "leg-1"), { action, legId: "leg-2" }) === null);
  const { who, leg } = DOES[action];
  expect(onAnother).toEqual(words(who).filter((part) => leg !== "own" || !OF_A_LEG.includes(part)));
});

it.each(actions)("%s is entered for an absent carrier by those of the table, and never for one on board", (action) => {
  const entering = (carrierOnBoard: boolean) => PARTS.filter((part) => denyAction(held(part, "leg-1"), { action, legId: "leg-1", enteredFor: HEARD, carrierOnBoard }) === null);
  expect(entering(false)).toEqual(words(DOES[action].enter));
  expect(entering(true)).toEqual([]);
});

it.each(Object.keys(SEES) as Area[])("%s is seen by those of the table, and by nobody else", (area) => {
  expect(PARTS.filter((part) => maySee(held(part, "leg-1"), area))).toEqual(words(SEES[area]));
});

it("fees are seen by the owner, and by the payee and the payer of the very leg", () => {
  const seeing = (legId: string) => PARTS.filter((part) => maySeeFees(held(part, "leg-1"), legId));
  expect(seeing("leg-1")).toEqual(words("owner billing payer"));
  expect(seeing("leg-2")).toEqual(words("owner"));
});

it("somebody without a part does and sees nothing", () => {
  expect(actions.filter((action) => partFor([], { action }) !== null || partFor([], { action, enteredFor: HEARD, carrierOnBoard: false }) !== null)).toEqual([]);
  expect((Object.keys(SEES) as Area[]).filter((area) => maySee([], area))).toEqual([]);
  expect(maySeeFees([], "leg-1")).toBe(false);
});

it("a refusal names who can", () => {
  expect(denyAction(held("payer", "leg-1"), { action: "unit.release" })).toEqual({ code: "not_your_part", message: "Only the owner can do this." });
  expect(denyAction(held("desk", "leg-1"), { action: "finding.post", legId: "leg-1" })?.message).toBe("Only the carrier’s inspector of this leg can do this.");
});
