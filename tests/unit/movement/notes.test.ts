import { describe, expect, it } from "vitest";
import { legNotes } from "@/lib/movement/notes";
import { usualPlace } from "@/lib/movement/prefill";
import type { SightingKind } from "@/lib/movement/vocabulary";

const AT = "2026-11-24T20:00:00.000Z";
const daysAgo = (days: number) => new Date(new Date(AT).getTime() - days * 86_400_000).toISOString();

const aLeg = (legId: string, given: { takenOver?: boolean; delivered?: boolean; validUntil?: string | null } = {}) => ({ legId, carrierName: legId === "a" ? "Quillan & Sandbar" : "Sable Mountain Lines", toPlace: "Ardell", toZone: "America/Denver", takenOver: false, delivered: false, validUntil: null, ...given });
const seen = (kind: SightingKind, days: number, given: { legId?: string; retracted?: { at: string; why: string } | null } = {}) => ({ legId: "a", kind, place: "Ardell", zone: "America/Denver", occurredAt: daysAgo(days), retracted: null, ...given });
const texts = (...given: Parameters<typeof legNotes>) => legNotes(...given).map((note) => note.text);

describe("what somebody should notice about a leg", () => {
  it("says how long a unit has stood handed over and not received", () => {
    expect(texts(aLeg("a", { takenOver: true, delivered: true }), aLeg("b"), [seen("pulled", 4), seen("delivered", 2)], AT)).toEqual(["Handed over at Ardell, not received by Sable Mountain Lines: 2 days."]);
    expect(texts(aLeg("a", { takenOver: true, delivered: true }), aLeg("b"), [seen("delivered", 0)], AT)).toEqual(["Handed over at Ardell, not received by Sable Mountain Lines: since today."]);
  });

  it("says so when only the receipt was told, and nothing when both sides were", () => {
    expect(texts(aLeg("a", { takenOver: true }), aLeg("b", { takenOver: true }), [seen("pulled", 4)], AT)).toEqual(["Sable Mountain Lines received the unit; Quillan & Sandbar did not report handing it over."]);
    expect(texts(aLeg("a", { takenOver: true, delivered: true }), aLeg("b", { takenOver: true }), [seen("delivered", 4)], AT)).toEqual([]);
  });

  it("counts bad order and hold until they end", () => {
    const leg = aLeg("a", { takenOver: true });
    expect(texts(leg, null, [seen("pulled", 5), seen("bad-ordered", 2)], AT)).toEqual(["Bad order at Ardell: 2 days.", "Last seen 2 days ago, Ardell."]);
    expect(texts(leg, null, [seen("bad-ordered", 2), seen("bad-order-released", 1)], AT)).toEqual(["Last seen 1 day ago, Ardell."]);
    expect(texts(leg, null, [seen("held", 3), seen("departed", 0)], AT)).toEqual([]);
  });

  it("lets the storage clock run from notified to placed", () => {
    const leg = aLeg("b", { takenOver: true });
    const own = (kind: SightingKind, days: number) => seen(kind, days, { legId: "b" });
    expect(texts(leg, null, [own("notified", 3)], AT)[0]).toBe("Notified and not placed: 3 days. Until it is placed, storage may be charged.");
    expect(texts(leg, null, [own("notified", 3), own("placed", 1)], AT)).toEqual([]);
  });

  it("passes over what was taken back", () => {
    expect(texts(aLeg("a", { takenOver: true }), null, [seen("bad-ordered", 2, { retracted: { at: AT, why: "Another unit" } })], AT)).toEqual([]);
  });

  it("warns before and after the last day of the acceptance", () => {
    const until = (validUntil: string) => legNotes(aLeg("a", { validUntil }), null, [], AT).map(({ kind, text }) => `${kind}: ${text}`);
    expect(until("2026-11-23")).toEqual(["stop: The acceptance was good until 23 Nov 2026. Ask the inspector before the unit goes on."]);
    expect(until("2026-11-24")).toEqual(["caution: The acceptance is good until today."]);
    expect(until("2026-11-26")).toEqual(["caution: The acceptance is good until 26 Nov 2026, 2 days from now."]);
    expect(until("2026-12-31")).toEqual([]);
  });
});

it("a kind that has its place fills it in; the others leave it open", () => {
  const leg = { fromPlace: "Sand Hollow", fromZone: "America/Chicago", toPlace: "Ardell", toZone: "America/Denver" };
  const destination = { name: "Vellum Ridge shops", place: "Quill Creek", zone: "America/Denver" };
  expect(usualPlace("pulled", leg, destination)).toEqual({ place: "Sand Hollow", zone: "America/Chicago" });
  expect(usualPlace("delivered", leg, destination)).toEqual({ place: "Ardell", zone: "America/Denver" });
  expect(usualPlace("placed", leg, destination)).toEqual({ place: "Vellum Ridge shops", zone: "America/Denver" });
  expect(usualPlace("departed", leg, destination)).toBeNull();
});
