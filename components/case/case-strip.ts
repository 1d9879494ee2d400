import { handoverMil } from "@/lib/standing/rules";
import { positionOf, type Handover, type HandoverTone, type Strip } from "@/components/drawing/strip";
import { routes } from "@/lib/routes";
import type { CaseFile, CaseLeg, MoveRow } from "@/lib/moves/types";
import type { Condition } from "@/lib/standing/types";

/** How many hand-overs lie behind the unit: one that it merely waits at does not count. */
const passedOf = (progressMil: number, count: number) => Array.from({ length: count }, (_, at) => handoverMil(at + 1, count)).filter((mil) => mil < progressMil).length;

/** The way behind the unit, kept in thousandths of the route, as a place on the drawn strip. */
export function stripPosition(progressMil: number, count: number): number {
  const passed = passedOf(progressMil, count);
  const start = passed === 0 ? 0 : handoverMil(passed, count);
  const end = passed >= count ? 1000 : handoverMil(passed + 1, count);
  return positionOf({ count, passed, along: end === start ? 1 : (progressMil - start) / (end - start) });
}

export const metOf = (conditions: readonly Condition[]) => conditions.filter((one) => one.met).length;

/** The state of a hand-over in words. */
export function conditionsNote({ takenOver, conditions }: Pick<CaseLeg, "takenOver" | "conditions">): string {
  if (takenOver) return "Taken over";
  const met = metOf(conditions);
  return met === conditions.length ? "All conditions met" : `${met} of ${conditions.length} conditions met`;
}

function toneOf(leg: CaseLeg, current: boolean): HandoverTone {
  if (leg.takenOver) return "met";
  if (leg.stopped) return "stopped";
  if (metOf(leg.conditions) === leg.conditions.length) return "met";
  return current ? "waiting" : "ahead";
}

/** The anchor of a leg's conditions on the first page of a case. */
export const legAnchor = (legId: string) => `leg-${legId}`;

/** The route strip of a case. */
export function stripOfCase(file: CaseFile): Strip {
  const next = file.legs.find((leg) => !leg.takenOver);
  const handovers = file.legs.map((leg): Handover => ({
    id: leg.legId,
    carrier: leg.carrierName,
    place: leg.fromPlace,
    note: conditionsNote(leg),
    tone: toneOf(leg, leg === next && file.state === "open"),
    href: `${routes.move(file.moveId)}#${legAnchor(leg.legId)}`,
    leg: [leg.carrierMark ?? leg.carrierName, leg.miles === null ? null : `${leg.miles.toLocaleString("en-US")} mi`].filter(Boolean).join(", "),
  }));
  return {
    ends: { from: { name: file.origin.name, note: file.origin.place }, to: { name: file.destination.name, note: file.destination.place } },
    handovers,
    position: stripPosition(file.progressMil, file.legs.length),
    unit: { shape: file.unit.shape, axles: file.unit.axles },
  };
}

/** The small strip of a row in the list. */
export function stripOfRow({ legs, progressMil, waiting, state }: MoveRow): { handovers: { id: string; tone: HandoverTone }[]; position: number } {
  const passed = passedOf(progressMil, legs.length);
  return {
    handovers: legs.map(({ legId }, at) => ({ id: legId, tone: at < passed ? "met" : at === passed && state === "open" && waiting ? "waiting" : "ahead" })),
    position: stripPosition(progressMil, legs.length),
  };
}
