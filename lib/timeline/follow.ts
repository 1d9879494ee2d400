import { EVENT_CODES } from "@/lib/movement/event-codes";
import { SIGHTING_KINDS } from "@/lib/movement/vocabulary";
import { formatDay, dayAt } from "@/lib/moves/when";
import { PREP_PHASES } from "@/lib/prep/vocabulary";
import { audienceOf, type RecordKind } from "@/lib/record/vocabulary";
import { inOrder, takenBack, zonesOf } from "./assemble";
import { oneOf, textOf, type Detail } from "./detail";
import type { FollowEntry, RawEntry } from "./types";

/** A carrier of the route as a notify party sees it. */
export type Handing = { id: string; carrier: string; mark: string | null; from: string; takenOver: boolean; miles: number | null };

const carrier = (detail: Detail) => textOf(detail, "carrier", "carrierName");

function sighting(detail: Detail): string {
  const kind = oneOf(SIGHTING_KINDS, detail.sighting);
  const [place, by] = [textOf(detail, "place"), carrier(detail)];
  return [kind ? EVENT_CODES[kind].label : "Seen", place && ` at ${place}`, by && `, ${by}`].filter(Boolean).join("");
}

/** What is told outside the case: companies that carry, places and times. No person, no reason that somebody typed, no number under which something is billed. */
const TOLD: Partial<Record<RecordKind, (detail: Detail) => string>> = {
  "move.opened": () => "The move was opened",
  "prep.signed": (d) => `Prepared ${oneOf(PREP_PHASES, d.phase) === "when-coupled" ? "with the carrier’s engine coupled" : "where it stands"}`,
  "acceptance.signed": (d) => `Accepted for movement${carrier(d) ? ` by ${carrier(d)}` : ""}`,
  "unit.released": (d) => `Released by the owner${carrier(d) ? ` to ${carrier(d)}` : ""}`,
  "sighting.made": sighting,
  "sighting.retracted": (d) => `An earlier sighting${textOf(d, "place") ? ` at ${textOf(d, "place")}` : ""} was taken back`,
  "arrival.recorded": (d) => {
    const day = textOf(d, "arrivedOn");
    return `Looked over on arrival${day && /^\d{4}-\d\d-\d\d$/.test(day) ? `, ${formatDay(day)}` : ""}`;
  },
  "move.closed": () => "The move was closed",
  "move.cancelled": () => "The move was cancelled",
};

/** The sentence of an entry for a notify party; null for entries that are not for them. */
export const followSentence = (kind: RecordKind, detail: Detail): string | null => (audienceOf(kind) === "follow" ? (TOLD[kind]?.(detail) ?? null) : null);

/** What a notify party reads, the newest day first. */
export function followDays(entries: readonly RawEntry[], originZone: string): { day: string; entries: FollowEntry[] }[] {
  const known = inOrder(entries);
  const struck = takenBack(known);
  const zones = zonesOf(known, originZone, struck);
  const told = known.flatMap(({ id, kind, detail, happenedAt: at }, index): FollowEntry[] => {
    const text = followSentence(kind, detail);
    return text === null ? [] : [{ id, at, zone: zones[index] ?? originZone, text, struck: kind === "sighting.made" && struck.has(textOf(detail, "sightingId") ?? ""), seen: kind === "sighting.made" }];
  });
  const days: { day: string; entries: FollowEntry[] }[] = [];
  for (const entry of told.reverse()) {
    const day = dayAt(entry.at, entry.zone);
    const last = days.at(-1);
    if (last?.day === day) last.entries.push(entry);
    else days.push({ day, entries: [entry] });
  }
  return days;
}
