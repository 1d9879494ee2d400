import type { HeldPart } from "@/lib/access/types";
import { dayAt, daysBetween } from "@/lib/moves/when";
import { RECORD_KINDS, type RecordKind } from "@/lib/record/vocabulary";
import { routes } from "@/lib/routes";
import type { Waited } from "./days";
import { numberOf, oneOf, textOf } from "./detail";
import { foldDay } from "./fold";
import { quietStretches, type Quiet } from "./quiet";
import { placeOf, sentenceOf, type Sees } from "./sentences";
import type { Entry, RawEntry, TimelineRow } from "./types";
import { maySeeEntry, seesOf } from "./visible";

export type Known = RawEntry & { kind: RecordKind; happenedAt: string };

/** When an entry's matter happened: a sighting at its own time, everything else when it was entered. */
export function happenedAt(entry: Pick<RawEntry, "kind" | "detail" | "at">): string {
  const said = entry.kind === "sighting.made" ? textOf(entry.detail, "occurredAt") : null;
  const moment = said ? new Date(said) : null;
  return moment && !Number.isNaN(moment.getTime()) ? moment.toISOString() : entry.at;
}

/** Entries of known kinds by when they happened, earliest first; those of one moment in the order of the record. */
export function inOrder(entries: readonly RawEntry[]): Known[] {
  return entries
    .flatMap((entry) => {
      const kind = oneOf(RECORD_KINDS, entry.kind);
      return kind ? [{ ...entry, kind, happenedAt: happenedAt(entry) }] : [];
    })
    .sort((a, b) => (a.happenedAt === b.happenedAt ? a.seq - b.seq : a.happenedAt < b.happenedAt ? -1 : 1));
}

/** Sightings that a later entry took back or corrected, with the reason. */
export function takenBack(entries: readonly Pick<RawEntry, "kind" | "detail">[]): Map<string, string> {
  const struck = new Map<string, string>();
  for (const { kind, detail } of entries) {
    const corrected = kind === "sighting.made" ? textOf(detail, "corrects") : null;
    if (corrected) struck.set(corrected, "Corrected by a newer sighting.");
    const retracted = kind === "sighting.retracted" ? textOf(detail, "sightingId") : null;
    if (retracted) struck.set(retracted, textOf(detail, "why") ?? "Taken back.");
  }
  return struck;
}

/** The zone of the place at each moment: that of the last standing sighting, and of the origin before any. */
export function zonesOf(entries: readonly Known[], originZone: string, struck: ReadonlyMap<string, string>): string[] {
  let zone = originZone;
  return entries.map(({ kind, detail }) => {
    const own = kind === "sighting.made" ? textOf(detail, "zone") : null;
    if (own && !struck.has(textOf(detail, "sightingId") ?? "")) zone = own;
    return own ?? zone;
  });
}

function linkOf(moveId: string, kind: RecordKind, detail: RawEntry["detail"], sees: Sees): string | null {
  const place = placeOf(kind);
  const finding = textOf(detail, "findingId");
  if (place === "findings") return sees.findings ? (finding ? routes.finding(moveId, finding) : routes.findings(moveId)) : null;
  if (place === "prep") return sees.prep ? routes.prep(moveId) : null;
  if (place === "fees") return sees.money ? routes.fees(moveId) : null;
  if (place === "unit") return sees.unit ? routes.unit(moveId) : null;
  return place ? routes[place](moveId) : null;
}

/** Originals that arrived within a day of their photo say nothing new; a later one does. */
function withoutPromptOriginals(entries: readonly Known[]): Known[] {
  const taken = new Map(entries.filter((entry) => entry.kind === "photo.taken").map((entry) => [textOf(entry.detail, "photoId"), entry.at]));
  return entries.filter(({ kind, detail, at }) => {
    const since = kind === "photo.kept" ? taken.get(textOf(detail, "photoId")) : undefined;
    return since === undefined || daysBetween(since, at) > 0;
  });
}

type Frame = { moveId: string; parts: readonly HeldPart[]; struck: ReadonlyMap<string, string> };

function entryOf(entry: Known, zone: string, { moveId, parts, struck }: Frame): Entry {
  const { id, kind, detail, happenedAt: at, byName, byCompanyName, byPart, enteredFor } = entry;
  const sees = seesOf(parts, entry);
  const { note, parts: words, state } = sentenceOf(kind, detail, sees);
  return {
    id, kind, at, zone, parts: words, note: note ?? null, folded: [], by: byName, company: byCompanyName, part: byPart, enteredFor, state: state ?? null,
    link: linkOf(moveId, kind, detail, sees),
    photos: sees.prep || sees.findings ? (numberOf(detail, "photos", "photoIds") ?? 0) : 0,
    struck: kind === "sighting.made" ? (struck.get(textOf(detail, "sightingId") ?? "") ?? null) : null,
    enteredLate: daysBetween(at, entry.at),
  };
}

export type Given = { moveId: string; parts: readonly HeldPart[]; originZone: string; entries: readonly RawEntry[]; waits: readonly Waited[]; now: string; open: boolean; show: number };

/** The timeline of one viewer: the newest day first, days without an entry between them. Quiet days are those of the whole record, so that they mean the same to everybody. */
export function assemble({ moveId, parts, originZone, entries, waits, now, open, show }: Given): { rows: TimelineRow[]; shown: number; total: number } {
  const known = inOrder(entries);
  const struck = takenBack(known);
  const zones = zonesOf(known, originZone, struck);
  const told = new Set(withoutPromptOriginals(known));
  const seen = known.map((entry, at) => ({ entry, zone: zones[at] ?? originZone })).filter(({ entry }) => told.has(entry) && maySeeEntry(parts, entry)).reverse();
  const page = seen.slice(0, show);
  const oldest = page.at(-1)?.entry.happenedAt ?? "";
  const quiet = quietStretches(known.map((entry) => entry.happenedAt), waits, open ? now : null).filter((one) => page.length === seen.length || one.from >= oldest);
  const lines = page.map(({ entry, zone }) => entryOf(entry, zone, { moveId, parts, struck }));
  return { rows: rowsOf(lines, quiet.reverse()), shown: page.length, total: seen.length };
}

function rowsOf(entries: readonly Entry[], quiet: readonly Quiet[]): TimelineRow[] {
  const rows: TimelineRow[] = [];
  const waiting = [...quiet];
  const pushQuiet = (after: string) => {
    for (let next = waiting[0]; next && next.from >= after; next = waiting[0]) {
      waiting.shift();
      rows.push({ type: "quiet", id: `quiet-${next.from}`, days: next.days, name: next.name, goesOn: next.goesOn });
    }
  };
  for (const entry of entries) {
    pushQuiet(entry.at);
    const day = dayAt(entry.at, entry.zone);
    const last = rows.at(-1);
    if (last?.type === "day" && last.day === day) last.entries.push(entry);
    else rows.push({ type: "day", id: entry.id, day, entries: [entry] });
  }
  return rows.map((row) => (row.type === "day" ? { ...row, entries: foldDay(row.entries) } : row));
}
