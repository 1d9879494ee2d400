import type { HeldPart } from "@/lib/access/types";
import type { Denial } from "@/lib/errors";
import { formatDay } from "@/lib/moves/when";
import { denyTakeOver } from "@/lib/standing/rules";
import type { LegFacts, MoveFacts } from "@/lib/standing/types";
import type { SightingKind } from "./vocabulary";

/** What can happen to a unit while a carrier has it. */
const ON_THE_WAY: readonly SightingKind[] = ["departed", "arrived", "held", "hold-released", "bad-ordered", "bad-order-released", "set-out", "stored", "seen"];

/** Minutes by which a clock may run ahead of ours. */
const AHEAD_MINUTES = 10;

const isLast = (move: MoveFacts, leg: LegFacts) => leg.seq === move.legs.length;

/** Kinds of sightings that make sense on a leg now, in the order in which they usually come. */
export function kindsFor(move: MoveFacts, leg: LegFacts): SightingKind[] {
  if (!leg.takenOver) return leg.seq === 1 ? ["pulled"] : ["received"];
  if (leg.placed) return [];
  if (leg.delivered) return ["seen"];
  return [...ON_THE_WAY, ...(isLast(move, leg) ? (["at-destination", "notified", "placed"] as const) : (["delivered"] as const))];
}

const WHY_NOT: Partial<Record<SightingKind, string>> = {
  pulled: "Pulled is recorded once, on the first leg.",
  received: "Receipt is recorded once, by the carrier that takes over.",
  delivered: "Delivery to the next carrier is recorded by the carrier that has the unit, and not on the last leg.",
  placed: "Placed is recorded on the last leg, while its carrier has the unit.",
};

/** Null when the sighting may be recorded; take-over asks for every condition of the leg. */
export function denySighting(move: MoveFacts, leg: LegFacts, kind: SightingKind): Denial | null {
  if ((kind === "pulled" || kind === "received") && !leg.takenOver && kindsFor(move, leg).includes(kind)) {
    const before = move.legs.find((other) => other.seq === leg.seq - 1);
    if (before && !before.takenOver) return { code: "not_yet", message: `${before.carrierName} has not taken the unit over yet.` };
    return denyTakeOver(move, leg);
  }
  if (kindsFor(move, leg).includes(kind)) return null;
  if (!leg.takenOver) return { code: "not_yet", message: `${leg.carrierName} has not taken the unit over yet.` };
  return { code: "not_yet", message: WHY_NOT[kind] ?? "The unit has left this leg." };
}

/** What a receiver sees with its own eyes; everything before is the carriers' to say. */
const AT_ARRIVAL: readonly SightingKind[] = ["at-destination", "notified", "placed", "seen"];

/** Of the kinds that make sense now, those that a receiver may record: at arrival, on the last leg. */
export const kindsForReceiver = (kinds: readonly SightingKind[], leg: { seq: number }, legs: number) => (leg.seq === legs ? kinds.filter((kind) => AT_ARRIVAL.includes(kind)) : []);

/** True when the viewer speaks for the carrier of the leg. */
export const speaksForCarrier = (parts: readonly HeldPart[], legId: string) => parts.some((held) => held.part === "desk" && held.legId === legId);

/** Null when somebody who does not speak for the leg's carrier may say this of the unit. */
export function denyAsReceiver(parts: readonly HeldPart[], move: MoveFacts, leg: LegFacts, kind: SightingKind): Denial | null {
  if (speaksForCarrier(parts, leg.legId) || (leg.seq === move.legs.length && AT_ARRIVAL.includes(kind))) return null;
  return { code: "not_your_part", message: "The receiver records what happens at arrival, on the last leg; the rest is the carrier’s to say." };
}

/** Null when somebody who does not speak for the leg's carrier may take this back: only what the receiver's own people said. */
export function denyTakingBack(parts: readonly HeldPart[], legId: string, saidByReceiver: boolean): Denial | null {
  if (speaksForCarrier(parts, legId) || saidByReceiver) return null;
  return { code: "not_your_part", message: "The receiver takes back what its own people recorded; the rest is the carrier’s to take back." };
}

/** A look at the unit can't lie ahead. Days are those of the destination. */
export function denyArrivalDay(arrivedOn: string, today: string): Denial | null {
  if (arrivedOn <= today) return null;
  return { code: "bad_input", message: "Some entries need another look.", fields: { arrivedOn: [`This lies ahead; today is ${formatDay(today)} at the destination.`] } };
}

/** A sighting happened; it can't lie ahead. Order on the timeline is by when it happened. */
export function denyTime(occurredAt: Date, now: Date): Denial | null {
  if (occurredAt.getTime() <= now.getTime() + AHEAD_MINUTES * 60_000) return null;
  return { code: "bad_input", message: "Some entries need another look.", fields: { occurredAt: ["This lies ahead. Enter when it happened, by the clock of the place."] } };
}

type Said = { kind: SightingKind; legSeq: number; retracted: boolean };

/** Hand-overs that later ones stand on can't be retracted before those. A correction of the same kind takes the place of the old one, so nothing loses its ground. */
export function denyRetraction(said: Said, all: readonly Said[], arrived: boolean, replacedBy: SightingKind | null = null): Denial | null {
  if (said.retracted) return { code: "stale", message: "This sighting is retracted already." };
  if (arrived) return { code: "not_yet", message: "The arrival is recorded; sightings before it stay as they are." };
  if (replacedBy === said.kind) return null;
  const standing = all.filter((one) => !one.retracted);
  const missing: string[] = [];
  if (said.kind === "pulled" || said.kind === "received") {
    if (standing.some((one) => one.legSeq >= said.legSeq && one.kind !== "pulled" && one.kind !== "received")) missing.push("Sightings after it on this or a later leg");
    if (standing.some((one) => one.legSeq > said.legSeq && one.kind === "received")) missing.push("Receipt by the next carrier");
  }
  if (said.kind === "delivered" && standing.some((one) => one.legSeq === said.legSeq + 1 && one.kind === "received")) missing.push("Receipt by the next carrier");
  return missing.length > 0 ? { code: "not_yet", message: "Retract first what was recorded after it.", missing } : null;
}

/** The owner's words when the unit is tendered. */
export const releaseStatement = (unit: string, carrier: string) => `The owner tenders ${unit} to ${carrier} for movement dead in tow, under its acceptance and movement instruction.`;
export const arrivalStatement = (unit: string, place: string) => `${unit} was looked over at ${place} against the photos taken before departure; what was found is written above.`;
export const closingStatement = (unit: string) => `The move of ${unit} is complete: it has arrived, and everything done for the tow is put back or kept as it is on purpose.`;
