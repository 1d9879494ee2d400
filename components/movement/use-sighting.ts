import { useState } from "react";
import { EMPTY_ENTERED_FOR } from "@/components/access/entered-for";
import type { PhotoView } from "@/lib/evidence/types";
import { usualPlace } from "@/lib/movement/prefill";
import type { Movement, MovementLeg, SightingView } from "@/lib/movement/types";
import type { SightingKind } from "@/lib/movement/vocabulary";
import { toWall, zoneName } from "@/lib/moves/when";

const nowAt = (zone: string) => zone && toWall(new Date().toISOString(), zone);

/** The zone's short name about the typed time; within a day of a change of the clocks it may be the other one. */
function shortZone(zone: string, wall: string): string {
  const near = new Date(`${wall}:00Z`);
  return zone === "" ? "" : zoneName(zone, Number.isNaN(near.getTime()) ? new Date() : near);
}

type Typed = { kind: SightingKind | ""; place: string; zone: string; occurredAt: string; train: string; note: string };

function begin(leg: MovementLeg, kinds: readonly SightingKind[], destination: Movement["destination"], corrects: SightingView | null): Typed {
  if (corrects) {
    const { kind, place, zone, occurredAt, train, note } = corrects;
    return { kind, place, zone, occurredAt: toWall(occurredAt, zone), train: train ?? "", note: note ?? "" };
  }
  const only = kinds.length === 1 ? kinds[0] : undefined;
  const usual = (only && usualPlace(only, leg, destination)) ?? { place: "", zone: leg.takenOver ? leg.toZone : leg.fromZone };
  return { kind: only ?? "", ...usual, occurredAt: nowAt(usual.zone), train: leg.instruction?.train ?? "", note: "" };
}

/** The fields of a sighting: choosing what happened fills in where it usually does, and the time is now by the clock there until somebody types another. */
export function useSighting(leg: MovementLeg, kinds: readonly SightingKind[], destination: Movement["destination"], corrects: SightingView | null) {
  const [typed, setTyped] = useState(() => begin(leg, kinds, destination, corrects));
  const [touched, setTouched] = useState({ place: corrects !== null, time: corrects !== null });
  const [photos, setPhotos] = useState<PhotoView[]>([]);
  const [heard, setHeard] = useState(EMPTY_ENTERED_FOR);
  const set = (more: Partial<Typed>) => setTyped({ ...typed, ...more });
  const inZone = (zone: string) => ({ zone, ...(!touched.time && { occurredAt: nowAt(zone) }) });
  return {
    typed, photos, heard, setPhotos, setHeard, set,
    zoneShort: shortZone(typed.zone, typed.occurredAt),
    choose: (kind: SightingKind) => {
      const usual = usualPlace(kind, leg, destination);
      set({ kind, ...(usual && !touched.place && { place: usual.place, ...inZone(usual.zone) }) });
    },
    setPlace: (place: string) => {
      setTouched({ ...touched, place: true });
      set({ place });
    },
    setZone: (zone: string) => set(inZone(zone)),
    setTime: (occurredAt: string) => {
      setTouched({ ...touched, time: true });
      set({ occurredAt });
    },
  };
}
