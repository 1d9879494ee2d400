import type { InspectedLeg } from "./types";

/** The leg to record a visit on: the one asked for, or the next that the viewer may record for; null when there is none. */
export function visitedLeg(legs: readonly InspectedLeg[], asked: unknown): InspectedLeg | null {
  const open = legs.filter((leg) => leg.mayVisit !== null);
  if (asked !== undefined) return open.find((leg) => leg.legId === asked) ?? null;
  return open.find((leg) => !leg.takenOver) ?? open[0] ?? null;
}

/** The leg and visit of an id, where the viewer may post under it. */
export function legOfVisit(legs: readonly InspectedLeg[], visitId: unknown): InspectedLeg | null {
  return legs.find((leg) => leg.visits.some((visit) => visit.id === visitId)) ?? null;
}
