import type { Movement, MovementLeg } from "./types";
import type { SightingKind } from "./vocabulary";

/** Where a kind of sighting usually happens: take-over at the leg's beginning, hand-over and arrival at its end; null where it may be anywhere. */
export function usualPlace(kind: SightingKind, leg: Pick<MovementLeg, "fromPlace" | "fromZone" | "toPlace" | "toZone">, destination: Movement["destination"]): { place: string; zone: string } | null {
  switch (kind) {
    case "pulled": case "received":
      return { place: leg.fromPlace, zone: leg.fromZone };
    case "delivered":
      return { place: leg.toPlace, zone: leg.toZone };
    case "at-destination": case "notified":
      return { place: destination.place, zone: destination.zone };
    case "placed":
      return { place: destination.name, zone: destination.zone };
    default:
      return null;
  }
}
