import type { Denial } from "@/lib/errors";
import type { Part } from "@/lib/access/vocabulary";
import type { Condition, LegFacts, MoveFacts, Standing, WaitingOn } from "./types";
import type { Stage, Wait } from "./vocabulary";

const many = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`;

/** Conditions for one leg, in the order in which they usually come true. Delivery counts from the second leg on, release and coupling on the first. */
export function conditionsOf(move: MoveFacts, leg: LegFacts): Condition[] {
  const { standing, coupled } = move;
  const list: Condition[] = [
    { id: "prep", label: "Prep signed, where it stands", met: standing.signed, detail: standing.signed ? `${standing.total} of ${standing.total} items` : standing.left === 0 ? "Done, not signed" : `${many(standing.left, "item")} left of ${standing.total}` },
    { id: "acceptance", label: "Acceptance", met: leg.accepted, detail: acceptanceDetail(leg) },
    { id: "billing", label: "Billing cleared", met: leg.billingCleared, detail: leg.billingCleared ? "Met" : "Not met" },
    { id: "instruction", label: "Movement instruction", met: leg.instructed, detail: leg.instructed ? "Given by the transport desk" : "Not given" },
  ];
  if (leg.unansweredBeforePickup > 0) list.push({ id: "answers", label: "Findings answered before pickup", met: false, detail: `${many(leg.unansweredBeforePickup, "finding")} without an answer` });
  if (leg.seq === 1) {
    list.push({ id: "release", label: "Released by the owner", met: leg.released, detail: leg.released ? "Tendered to the carrier" : "Not released" });
    list.push({ id: "coupled", label: "Prep signed, when coupled", met: coupled.signed, detail: coupled.signed ? `${coupled.total} of ${coupled.total} items` : `${many(coupled.left, "item")} left, at pickup` });
  } else {
    list.push({ id: "delivered", label: "Delivered by the carrier before", met: move.legs.some((other) => other.seq === leg.seq - 1 && other.delivered), detail: leg.fromPlace });
  }
  return list;
}

function acceptanceDetail(leg: LegFacts): string {
  if (leg.accepted) return leg.acceptanceNumber ? `No. ${leg.acceptanceNumber}` : "Signed by the inspector";
  if (leg.acceptanceLapsedOn) return `Ran out on ${leg.acceptanceLapsedOn}; the inspector signs again`;
  if (leg.openFindings + leg.answeredFindings > 0) return [leg.answeredFindings ? `${many(leg.answeredFindings, "finding")} answered` : "", leg.openFindings ? `${leg.openFindings} open` : ""].filter(Boolean).join(", ");
  return leg.visits > 0 ? "Inspected, not signed" : "Not inspected yet";
}

const unmet = (move: MoveFacts, leg: LegFacts, ids: readonly Condition["id"][]) =>
  conditionsOf(move, leg).filter((one) => ids.includes(one.id) && !one.met).map((one) => `${one.label}: ${one.detail.charAt(0).toLowerCase()}${one.detail.slice(1)}`);

const notYet = (message: string, missing: string[]): Denial | null => (missing.length > 0 ? { code: "not_yet", message, missing } : null);

/** Acceptance is about the unit alone: prep signed and no stopping finding open. Money has no say in it. */
export function denyAcceptance(move: MoveFacts, leg: LegFacts): Denial | null {
  const missing = unmet(move, leg, ["prep"]);
  if (leg.stoppingOpen > 0) missing.push(`${many(leg.stoppingOpen, "finding that stops", "findings that stop")} the move: not cleared`);
  return notYet("The unit can’t be accepted yet.", missing);
}

export const denyInstruction = (move: MoveFacts, leg: LegFacts) => notYet("The movement instruction can’t be given yet.", unmet(move, leg, ["acceptance", "billing"]));

export const denyRelease = (move: MoveFacts, leg: LegFacts) => notYet("The unit can’t be released yet.", unmet(move, leg, ["prep", "acceptance", "billing", "instruction"]));

/** Pulled (first leg) or received (later legs): everything else must stand. A receipt without a recorded delivery happens, so delivery is no bar. */
export const denyTakeOver = (move: MoveFacts, leg: LegFacts) =>
  notYet(leg.seq === 1 ? "Pulled can’t be recorded yet." : "Receipt can’t be recorded yet.", unmet(move, leg, ["prep", "acceptance", "billing", "instruction", "answers", "release", "coupled"]));

export function denyClosing(move: MoveFacts): Denial | null {
  const missing: string[] = [];
  if (!move.arrived) missing.push("The receiver’s look at arrival: not recorded");
  if (move.restoreLeft > 0) missing.push(`${many(move.restoreLeft, "restore item")}: not restored and not kept as it is`);
  return notYet("The move can’t be closed yet.", missing);
}

const current = (move: MoveFacts) => move.legs.find((leg) => !leg.takenOver) ?? null;
const onWay = (move: MoveFacts) => move.legs.findLast((leg) => leg.takenOver) ?? null;

function ofCarrier(leg: LegFacts, part: Part, waitingFor: Wait, count: number | null = null): WaitingOn {
  return { part, legId: leg.legId, companyId: leg.carrierCompanyId, name: leg.carrierName, waitingFor, count };
}

/** What a leg still needs before its carrier may take the unit; null when only taking over is left. */
function legNeeds(move: MoveFacts, leg: LegFacts): WaitingOn | null {
  const owner = (waitingFor: Wait): WaitingOn => ({ part: "owner", legId: leg.legId, companyId: move.ownerCompanyId, name: move.ownerName, waitingFor, count: null });
  const payer = (waitingFor: Wait): WaitingOn => ({ part: "payer", legId: leg.legId, companyId: leg.payerCompanyId, name: leg.payerName ?? move.ownerName, waitingFor, count: null });
  const contractor = (waitingFor: Wait, count: number | null): WaitingOn => ({ part: "contractor", legId: leg.legId, companyId: move.contractor?.companyId ?? null, name: move.contractor?.name ?? "Contractor", waitingFor, count });
  // Once billing is cleared nobody has to be named any more, and nobody can be.
  if (!leg.payerName && !leg.billingCleared) return owner("name-payer");
  if (leg.openFindings > 0) return move.contractor ? contractor("answer", leg.openFindings) : owner("invite-contractor");
  // An answer is enough for pickup; after the acceptance nothing waits for somebody to look at it.
  if (leg.answeredFindings > 0 && !leg.accepted) return ofCarrier(leg, "inspector", "look-at-answers", leg.answeredFindings);
  if (!leg.accepted) return ofCarrier(leg, "inspector", leg.visits === 0 ? "inspect" : "accept");
  if (!leg.billingCleared) {
    if (!leg.payerCompanyId) return owner("invite-payer");
    if (leg.quote === "none" || leg.quoteLapsed) return ofCarrier(leg, "billing", "quote");
    if (leg.quote === "given") return payer("agree");
    return leg.paymentOpen ? payer("confirm-payment") : payer("pay");
  }
  if (!leg.instructed) return ofCarrier(leg, "desk", "instruct");
  return null;
}

function waitingFor(move: MoveFacts): WaitingOn | null {
  const owner = (what: Wait, legId: string | null = null): WaitingOn => ({ part: "owner", legId, companyId: move.ownerCompanyId, name: move.ownerName, waitingFor: what, count: null });
  if (move.state !== "open") return null;
  const contractor = (what: Wait, count: number | null = null): WaitingOn => ({ part: "contractor", legId: null, companyId: move.contractor?.companyId ?? null, name: move.contractor?.name ?? "Contractor", waitingFor: what, count });
  const next = current(move);
  const riding = onWay(move);
  if (!move.contractor && !riding) return owner("invite-contractor");
  if (!move.standing.signed && !riding) return move.standing.left > 0 ? contractor("prepare", move.standing.left) : contractor("sign-prep");
  if (next && (!riding || riding.delivered)) {
    const needs = legNeeds(move, next);
    if (needs) return needs;
    if (next.seq > 1) return ofCarrier(next, "desk", "take-over");
    if (!next.released) return owner("release", next.legId);
    if (!move.coupled.signed) return contractor("prepare-coupled", move.coupled.left);
    return ofCarrier(next, "desk", "pull");
  }
  if (riding && !riding.placed) return ofCarrier(riding, "desk", next ? "move-on" : riding.atDestination ? "place" : "move-on");
  if (!move.receiver) return owner("invite-receiver");
  const receiver = (what: Wait, count: number | null = null): WaitingOn => ({ part: "receiver", legId: null, companyId: move.receiver?.companyId ?? null, name: move.receiver?.name ?? "Receiver", waitingFor: what, count });
  if (!move.arrived) return receiver("arrival");
  return move.restoreLeft > 0 ? receiver("restore", move.restoreLeft) : receiver("close");
}

const STAGE_OF: Partial<Record<Wait, Stage>> = {
  "invite-contractor": "opening", "name-payer": "opening", "invite-carrier": "opening",
  prepare: "preparing", "sign-prep": "preparing",
  inspect: "inspecting", answer: "inspecting", "look-at-answers": "inspecting", accept: "inspecting",
  "invite-payer": "billing", quote: "billing", agree: "billing", pay: "billing", "confirm-payment": "billing",
  instruct: "instructing", release: "ready", "prepare-coupled": "ready", pull: "ready",
  "move-on": "moving", place: "moving", "take-over": "interchange",
  "invite-receiver": "placed", arrival: "placed", restore: "restoring", close: "restoring",
};

function stageOf(move: MoveFacts, waiting: WaitingOn | null): Stage {
  if (move.state !== "open") return move.state;
  if (onWay(move)?.delivered && current(move)) return "interchange";
  return (waiting && STAGE_OF[waiting.waitingFor]) ?? "opening";
}

/** Where along the route the hand-over to leg `seq` stands, in thousandths: the strip leaves room for the siding before the first. */
export const handoverMil = (seq: number, legs: number) => Math.round(((seq - 1 + 0.6) / (legs + 0.6)) * 1000);

function progressOf(move: MoveFacts): number {
  const riding = onWay(move);
  const count = move.legs.length;
  if (!riding) return 0;
  if (riding.placed) return 1000;
  if (riding.atDestination) return 970;
  const start = handoverMil(riding.seq, count);
  const end = riding.seq === count ? 1000 : handoverMil(riding.seq + 1, count);
  return riding.delivered ? end : Math.round((start + end) / 2);
}

/** Whose turn it is, how far the move is, and where the unit stands on the strip. */
export function standingOf(move: MoveFacts): Standing {
  const waiting = waitingFor(move);
  return { stage: stageOf(move, waiting), waiting, progressMil: progressOf(move) };
}
