import { daysBetween, daysText, dayAt, formatDay } from "@/lib/moves/when";
import type { MovementLeg, SightingView } from "./types";
import type { SightingKind } from "./vocabulary";

export type LegNote = { kind: "caution" | "stop" | "info"; text: string };

type Leg = Pick<MovementLeg, "legId" | "carrierName" | "toPlace" | "toZone" | "takenOver" | "delivered" | "validUntil">;
type Seen = Pick<SightingView, "legId" | "kind" | "place" | "zone" | "occurredAt" | "retracted">;

const SOON_DAYS = 7;

/** "2 days"; less than one is "since today". */
const lasting = (from: string, at: string) => {
  const days = daysBetween(from, at);
  return days === 0 ? "since today" : daysText(days);
};

const ago = (from: string, at: string) => {
  const days = daysBetween(from, at);
  return days === 1 ? "1 day ago" : `${days} days ago`;
};

/** The latest of these kinds, unless one of the others came after it. */
function standing(seen: readonly Seen[], kinds: readonly SightingKind[], ended: readonly SightingKind[]): Seen | null {
  const last = seen.findLast((one) => kinds.includes(one.kind) || ended.includes(one.kind));
  return last && kinds.includes(last.kind) ? last : null;
}

/** A hand-over of which only one side was told. */
function handover(leg: Leg, next: Leg | null, seen: readonly Seen[], at: string): LegNote | null {
  if (!next) return null;
  const given = seen.findLast((one) => one.kind === "delivered");
  if (given && !next.takenOver) return { kind: "stop", text: `Handed over at ${given.place}, not received by ${next.carrierName}: ${lasting(given.occurredAt, at)}.` };
  if (next.takenOver && !leg.delivered) return { kind: "info", text: `${next.carrierName} received the unit; ${leg.carrierName} did not report handing it over.` };
  return null;
}

function validity({ validUntil, toZone }: Leg, at: string): LegNote | null {
  if (!validUntil) return null;
  const today = dayAt(at, toZone);
  if (validUntil < today) return { kind: "stop", text: `The acceptance was good until ${formatDay(validUntil)}. Ask the inspector before the unit goes on.` };
  const left = daysBetween(`${today}T00:00:00Z`, `${validUntil}T00:00:00Z`);
  return left <= SOON_DAYS ? { kind: "caution", text: left === 0 ? "The acceptance is good until today." : `The acceptance is good until ${formatDay(validUntil)}, ${daysText(left)} from now.` } : null;
}

/** What somebody should notice about a leg now. Sightings come in the order in which they happened. */
export function legNotes(leg: Leg, next: Leg | null, sightings: readonly Seen[], at: string): LegNote[] {
  const seen = sightings.filter((one) => one.legId === leg.legId && !one.retracted);
  const placed = seen.some((one) => one.kind === "placed");
  const gone = placed || leg.delivered || Boolean(next?.takenOver);
  const notes: (LegNote | null)[] = [handover(leg, next, seen, at)];
  if (gone) return notes.filter((note) => note !== null);
  const bad = standing(seen, ["bad-ordered"], ["bad-order-released"]);
  const held = standing(seen, ["held"], ["hold-released", "departed"]);
  const told = standing(seen, ["notified"], ["placed"]);
  const last = seen.at(-1);
  notes.push(
    bad && { kind: "stop", text: `Bad order at ${bad.place}: ${lasting(bad.occurredAt, at)}.` },
    held && { kind: "caution", text: `Held at ${held.place}: ${lasting(held.occurredAt, at)}.` },
    told && { kind: "caution", text: `Notified and not placed: ${lasting(told.occurredAt, at)}. Until it is placed, storage may be charged.` },
    last && daysBetween(last.occurredAt, at) > 0 ? { kind: "info", text: `Last seen ${ago(last.occurredAt, at)}, ${last.place}.` } : null,
    validity(leg, at),
  );
  return notes.filter((note) => note !== null);
}
