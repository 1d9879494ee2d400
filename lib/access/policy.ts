import type { Denial } from "@/lib/errors";
import type { EnteredFor, HeldPart } from "./types";
import { PART_LABELS, type Part } from "./vocabulary";

type Rule = {
  /** Parts that may do it. */
  do: readonly Part[];
  /** True: only on the leg of the seat. */
  ownLeg?: boolean;
  /** Parts that may enter it for a carrier that is not on board. */
  enterFor?: readonly Part[];
};

const STAND_IN: readonly Part[] = ["owner", "contractor"];

/** Who may do what, as one table; the access tests walk it row by row. */
export const ACTIONS = {
  "move.edit": { do: ["owner"] },
  "move.cancel": { do: ["owner"] },
  "move.close": { do: ["owner", "receiver"] },
  "party.invite": { do: ["owner"] },
  "party.remove": { do: ["owner"] },
  "follow.make": { do: ["owner"] },
  "leg.edit": { do: ["owner"] },
  "equipment.edit": { do: ["owner", "contractor"] },
  "photo.take": { do: ["owner", "contractor", "inspector", "desk", "receiver"] },
  "prep.do": { do: ["contractor"] },
  "prep.sign": { do: ["contractor"] },
  "inspection.visit": { do: ["inspector"], ownLeg: true, enterFor: STAND_IN },
  "finding.post": { do: ["inspector"], ownLeg: true, enterFor: STAND_IN },
  "finding.answer": { do: ["contractor"] },
  "finding.clear": { do: ["inspector"], ownLeg: true, enterFor: STAND_IN },
  "acceptance.sign": { do: ["inspector"], ownLeg: true, enterFor: STAND_IN },
  "fee.quote": { do: ["billing"], ownLeg: true, enterFor: ["owner"] },
  "fee.agree": { do: ["owner", "payer"], ownLeg: true },
  "fee.pay": { do: ["owner", "payer"], ownLeg: true },
  "billing.clear": { do: ["billing"], ownLeg: true, enterFor: ["owner"] },
  "movement.instruct": { do: ["desk"], ownLeg: true, enterFor: STAND_IN },
  "movement.sight": { do: ["desk", "receiver"], ownLeg: true, enterFor: STAND_IN },
  "unit.release": { do: ["owner"] },
  "arrival.record": { do: ["receiver", "contractor"] },
  "restore.do": { do: ["contractor", "receiver"] },
  "restore.keep": { do: ["receiver"] },
} as const satisfies Record<string, Rule>;
export type Action = keyof typeof ACTIONS;

/** What may be seen beyond the case's head, route and people. Fees are shown to payer and payee of the leg and to the owner. */
export const AREAS = {
  equipment: ["owner", "contractor", "inspector", "billing", "desk", "receiver"],
  prep: ["owner", "contractor", "inspector", "desk", "receiver"],
  findings: ["owner", "contractor", "inspector", "desk", "receiver"],
  fees: ["owner", "billing", "payer"],
  movement: ["owner", "contractor", "inspector", "desk", "receiver"],
  timeline: ["owner", "contractor", "inspector", "billing", "desk", "receiver", "carrier", "payer"],
} as const satisfies Record<string, readonly Part[]>;
export type Area = keyof typeof AREAS;

const has = (list: readonly Part[] | undefined, part: Part) => list?.includes(part) ?? false;

/** A leg counts as own for the parts tied to it; owner, contractor and receiver have no leg of their own. */
const onLeg = (held: HeldPart, rule: Rule, legId: string | null) => !rule.ownLeg || held.legId === null || legId === null || held.legId === legId;

export type Doing = { action: Action; legId?: string | null; enteredFor?: EnteredFor | null; carrierOnBoard?: boolean };

/** The part in which the viewer may do it; null when in none. */
export function partFor(parts: readonly HeldPart[], { action, legId = null, enteredFor = null, carrierOnBoard = true }: Doing): HeldPart | null {
  const rule: Rule = ACTIONS[action];
  if (enteredFor) return carrierOnBoard ? null : (parts.find((held) => has(rule.enterFor, held.part)) ?? null);
  return parts.find((held) => has(rule.do, held.part) && onLeg(held, rule, legId)) ?? null;
}

/** Null when the viewer may do it; otherwise why not, in words. */
export function denyAction(parts: readonly HeldPart[], doing: Doing): Denial | null {
  if (partFor(parts, doing)) return null;
  const rule: Rule = ACTIONS[doing.action];
  if (doing.enteredFor && doing.carrierOnBoard) return { code: "not_your_part", message: "This carrier is on board and enters its own steps." };
  const who = rule.do.map((part) => PART_LABELS[part].toLowerCase()).join(" or ");
  return { code: "not_your_part", message: `Only the ${who}${rule.ownLeg ? " of this leg" : ""} can do this.` };
}

export const maySee = (parts: readonly HeldPart[], area: Area) => parts.some((held) => has(AREAS[area], held.part));

/** Whether the viewer may see the fees of one leg: the owner, its payer, its payee. A carrier never sees another carrier's. */
export const maySeeFees = (parts: readonly HeldPart[], legId: string) =>
  parts.some((held) => held.part === "owner" || ((held.part === "billing" || held.part === "payer") && held.legId === legId));
