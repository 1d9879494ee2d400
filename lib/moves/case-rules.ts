import { RESTRICTIONS, type RestrictionId } from "@/lib/acceptance/vocabulary";
import { ACTIONS, denyAction, maySee, maySeeFees, type Action } from "@/lib/access/policy";
import type { HeldPart } from "@/lib/access/types";
import type { Part } from "@/lib/access/vocabulary";
import { conditionsOf } from "@/lib/standing/rules";
import type { Condition, LegFacts, MoveFacts, WaitingOn } from "@/lib/standing/types";
import type { Wait } from "@/lib/standing/vocabulary";
import type { CaseFile } from "./types";

const holds = (held: HeldPart, part: Part, legId: string | null) => held.part === part && (held.legId === null || legId === null || held.legId === legId);

/** Whether what is waited for is the viewer's own turn, or somebody else's in their company. */
export function turnOf(parts: readonly HeldPart[], waiting: Pick<WaitingOn, "part" | "legId">): { you: boolean; yourCompany: boolean } {
  const you = parts.some((held) => holds(held, waiting.part, waiting.legId));
  const ofCarrier = waiting.part === "inspector" || waiting.part === "billing" || waiting.part === "desk";
  const yourCompany = !you && ofCarrier && parts.some((held) => holds(held, "carrier", waiting.legId));
  return { you, yourCompany };
}

/** The step by which a carrier ends a wait; only these can be entered for it. */
const STEP_OF: Partial<Record<Wait, Action>> = {
  inspect: "inspection.visit", "look-at-answers": "finding.clear", accept: "acceptance.sign", quote: "fee.quote", instruct: "movement.instruct",
  pull: "movement.sight", "move-on": "movement.sight", "take-over": "movement.sight", place: "movement.sight",
};

/** Whether the viewer may enter what is waited for on behalf of a carrier whose people do not work here. */
export function mayStandIn(parts: readonly HeldPart[], waitingFor: Wait, carrierOnBoard: boolean): boolean {
  const step = STEP_OF[waitingFor];
  if (!step || carrierOnBoard) return false;
  const rule = ACTIONS[step];
  const standIns: readonly Part[] = "enterFor" in rule ? rule.enterFor : [];
  return parts.some((held) => standIns.includes(held.part));
}

const HIDDEN: Partial<Record<Condition["id"], "prep" | "findings">> = { prep: "prep", coupled: "prep", acceptance: "findings", answers: "findings" };

/** The conditions of a leg for one viewer: whoever may not open the findings or the prep sees met or not met, nothing more. */
export function conditionsFor(parts: readonly HeldPart[], move: MoveFacts, leg: LegFacts): Condition[] {
  return conditionsOf(move, leg).map((condition) => {
    const area = HIDDEN[condition.id];
    return area && !maySee(parts, area) ? { ...condition, detail: condition.met ? "Met" : "Not met" } : condition;
  });
}

const MPH: Partial<Record<RestrictionId, number>> = Object.fromEntries(RESTRICTIONS.filter((one) => one.id.startsWith("mph-")).map((one) => [one.id, Number(one.id.slice(4))]));

/** The lowest speed among standing acceptances, which binds the whole way; null while none names one. */
export function towSpeedOf(acceptances: readonly { carrierName: string; restrictions: readonly RestrictionId[] }[]): CaseFile["towSpeed"] {
  const speeds = acceptances.flatMap(({ carrierName, restrictions }) => restrictions.flatMap((id) => (MPH[id] === undefined ? [] : [{ mph: MPH[id], carrierName }])));
  return speeds.sort((a, b) => a.mph - b.mph)[0] ?? null;
}

/** Which parts of the case the viewer may open. */
export function seenParts(parts: readonly HeldPart[], legs: readonly { legId: string }[]): CaseFile["see"] {
  return {
    prep: maySee(parts, "prep"),
    findings: maySee(parts, "findings"),
    fees: legs.some((leg) => maySeeFees(parts, leg.legId)),
    movement: maySee(parts, "movement"),
    timeline: maySee(parts, "timeline"),
    unit: maySee(parts, "equipment"),
  };
}

/** What the viewer may change while the case is open. */
export function editableBy(parts: readonly HeldPart[], open: boolean): CaseFile["may"] {
  const may = (action: Action) => open && denyAction(parts, { action }) === null;
  return { edit: may("move.edit"), cancel: may("move.cancel"), editUnit: may("equipment.edit"), editLegs: may("leg.edit") };
}

/** What waits behind the tabs: prep and restore items to do, findings that are not settled. */
export function tabCounts(facts: MoveFacts): CaseFile["counts"] {
  const placed = facts.arrived;
  return {
    prep: placed ? facts.restoreLeft : facts.standing.left,
    findings: facts.legs.reduce((sum, leg) => sum + leg.openFindings + leg.answeredFindings, 0),
  };
}
