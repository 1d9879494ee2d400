import { describe, expect, it } from "vitest";
import type { HeldPart } from "@/lib/access/types";
import { RECORD_KINDS } from "@/lib/record/vocabulary";
import { assemble } from "@/lib/timeline/assemble";
import { followDays } from "@/lib/timeline/follow";
import type { RawEntry } from "@/lib/timeline/types";
import { maySeeEntry } from "@/lib/timeline/visible";
import { plainText } from "@/lib/timeline/words";

const DAY = 86_400_000;
const on = (days: number) => new Date(Date.parse("2026-11-03T15:00:00.000Z") + days * DAY).toISOString();

let seq = 0;
const anEntry = (kind: string, at: string, detail: Record<string, unknown> = {}, given: Partial<RawEntry> = {}): RawEntry => {
  seq += 1;
  return { id: `rec-${seq}`, seq, kind, byName: "T. Ibarra", byCompanyName: "Ibarra Rail Mechanical", byPart: "contractor", legId: null, enteredFor: null, detail, at, ...given };
};

const OWNER: HeldPart[] = [{ part: "owner", legId: null, companyId: "own" }];
const given = (entries: RawEntry[], more: Partial<Parameters<typeof assemble>[0]> = {}) => ({ moveId: "mov", parts: OWNER, originZone: "America/Chicago", entries, waits: [], now: on(30), open: false, show: 100, ...more });
const shape = (rows: ReturnType<typeof assemble>["rows"]) => rows.map((row) => (row.type === "quiet" ? `quiet ${row.days}` : [row.day, ...row.entries.map((entry) => plainText(entry.parts))]));

describe("the timeline", () => {
  it("puts quiet days between the days, the newest first", () => {
    const entries = [anEntry("move.opened", on(0)), anEntry("prep.signed", on(9), { phase: "where-it-stands" }), anEntry("move.closed", on(10))];
    expect(shape(assemble(given(entries)).rows)).toEqual([["2026-11-13", "Closed the move"], ["2026-11-12", "Prep signed, where it stands"], "quiet 9", ["2026-11-03", "Opened the move"]]);
    expect(shape(assemble(given(entries, { open: true, now: on(14) })).rows)[0]).toBe("quiet 4");
  });

  it("shows a sighting when it happened, on the day of its place", () => {
    const late = anEntry("sighting.made", on(6), { sightingId: "s", sighting: "departed", place: "Ardell", zone: "America/Los_Angeles", occurredAt: "2026-11-04T07:30:00.000Z" });
    const [, row] = assemble(given([anEntry("prep.signed", on(2)), late])).rows.toReversed();
    expect(row).toBeDefined();
    const day = assemble(given([late])).rows[0];
    expect(day).toMatchObject({ day: "2026-11-03", entries: [{ zone: "America/Los_Angeles", enteredLate: 5 }] });
  });

  it("keeps the zone of the last sighting for what follows, and of the origin after it was taken back", () => {
    const seen = anEntry("sighting.made", on(1), { sightingId: "s", sighting: "pulled", zone: "America/Denver", occurredAt: on(1) });
    const after = anEntry("prep.signed", on(2));
    const zones = (entries: RawEntry[]) => assemble(given(entries)).rows.flatMap((row) => (row.type === "day" ? row.entries : [])).map((entry) => [entry.kind, entry.zone]);
    expect(zones([seen, after])).toEqual([["prep.signed", "America/Denver"], ["sighting.made", "America/Denver"]]);
    expect(zones([seen, anEntry("sighting.retracted", on(1.5), { sightingId: "s", why: "No" }), after])[0]).toEqual(["prep.signed", "America/Chicago"]);
  });

  it("puts runs of photos and items of one day and hand together", () => {
    const entries = [
      anEntry("photo.taken", on(0), { photoId: "a" }), anEntry("photo.kept", on(0.01), { photoId: "a" }, { byName: "Photo check" }), anEntry("photo.taken", on(0.02)), anEntry("prep.done", on(0.03), { templateId: "P1", action: "Capped" }),
      anEntry("prep.done", on(0.04), { templateId: "P2", action: "Drained" }), anEntry("prep.signed", on(0.05)), anEntry("photo.taken", on(0.06)), anEntry("prep.done", on(0.07), { templateId: "P3", action: "Tagged" }, { byName: "Somebody else" }),
    ];
    const [row] = assemble(given(entries)).rows;
    expect(row?.type === "day" && row.entries.map((entry) => [plainText(entry.parts), entry.folded])).toEqual([
      ["Did P3, tagged", []], ["Took a photo", []], ["Prep signed", []], ["Worked off 2 prep items", ["Did P2, drained", "Did P1, capped"]], ["Took 2 photos", []],
    ]);
  });

  it("tells of an original only when it came a day or more after its photo", () => {
    const photo = (id: string, keptAt: string) => [anEntry("photo.taken", on(0), { photoId: id }), anEntry("photo.kept", keptAt, { photoId: id }, { byName: "Photo check" })];
    const { rows, total } = assemble(given([...photo("prompt", on(0.2)), ...photo("late", on(2))]));
    expect(shape(rows)).toEqual([["2026-11-05", "A photo’s original has arrived and is the one that was announced"], ["2026-11-03", "Took 2 photos"]]);
    expect(total).toBe(3);
  });

  it("leaves out a kind that it does not know", () => {
    expect(assemble(given([anEntry("something.new", on(0))]))).toMatchObject({ rows: [], total: 0 });
  });

  it("does not tell of quiet days beyond the page", () => {
    const entries = [anEntry("move.opened", on(0)), anEntry("prep.signed", on(9)), anEntry("move.closed", on(10))];
    expect(shape(assemble(given(entries, { show: 2 })).rows)).toEqual([["2026-11-13", "Closed the move"], ["2026-11-12", "Prep signed"]]);
  });

  it("links only to what the reader may open", () => {
    const clerk: HeldPart[] = [{ part: "billing", legId: "a", companyId: "car" }];
    const entries = [anEntry("finding.posted", on(0), { findingId: "fnd", number: "F-01" }, { legId: "a" }), anEntry("quote.given", on(1), {}, { legId: "a" }), anEntry("equipment.changed", on(2))];
    const links = (parts: HeldPart[]) => assemble(given(entries, { parts })).rows.flatMap((row) => (row.type === "day" ? row.entries.map((entry) => entry.link) : []));
    expect(links(OWNER)).toEqual(["/moves/mov/unit", "/moves/mov/fees", "/moves/mov/findings/fnd"]);
    expect(links(clerk)).toEqual(["/moves/mov/unit", "/moves/mov/fees", null]);
  });
});

describe("who reads an entry", () => {
  const payer: HeldPart[] = [{ part: "payer", legId: "a", companyId: "pay" }];
  const desk: HeldPart[] = [{ part: "desk", legId: "b", companyId: "car" }];

  it("money is for the owner and for payer and payee of its leg", () => {
    const quote = { kind: "quote.given", legId: "a" } as const;
    expect([OWNER, payer, [{ part: "billing" as const, legId: "a", companyId: "x" }]].map((parts) => maySeeEntry(parts, quote))).toEqual([true, true, true]);
    expect([desk, [{ part: "billing" as const, legId: "b", companyId: "x" }], [{ part: "contractor" as const, legId: null, companyId: "x" }]].map((parts) => maySeeEntry(parts, quote))).toEqual([false, false, false]);
    expect(maySeeEntry(payer, { kind: "payment.paid", legId: null })).toBe(false);
  });

  it("a payer without another part reads their leg and the way", () => {
    expect(RECORD_KINDS.filter((kind) => maySeeEntry(payer, { kind, legId: "b" }))).toEqual(["move.opened", "move.cancelled", "unit.released", "sighting.made", "sighting.retracted", "arrival.recorded", "move.closed"]);
    expect(maySeeEntry(payer, { kind: "acceptance.signed", legId: "a" })).toBe(true);
    expect(maySeeEntry([...payer, ...OWNER], { kind: "acceptance.signed", legId: "b" })).toBe(true);
  });
});

it("a notify party reads the way, the newest day first", () => {
  const entries = [
    anEntry("move.opened", on(0)), anEntry("quote.given", on(1)), anEntry("sighting.made", on(3), { sightingId: "s", sighting: "pulled", place: "Ardell", zone: "America/Denver", carrier: "Quillan & Sandbar", occurredAt: on(2) }),
    anEntry("sighting.retracted", on(4), { sightingId: "s", place: "Ardell", why: "T. Ibarra was wrong" }),
  ];
  expect(followDays(entries, "America/Chicago")).toMatchObject([
    { day: "2026-11-07", entries: [{ text: "An earlier sighting at Ardell was taken back" }] },
    { day: "2026-11-05", entries: [{ text: "Pulled at Ardell, Quillan & Sandbar", struck: true }] },
    { day: "2026-11-03", entries: [{ text: "The move was opened" }] },
  ]);
});
