import { stripPosition } from "@/components/case/case-strip";
import type { Strip } from "@/components/drawing/strip";
import type { FollowView } from "@/lib/timeline/types";

/** The route of a move for somebody outside of it: which carrier has taken the unit over, no conditions. */
export function stripOfFollow({ unit, from, to, handings, progressMil }: Pick<FollowView, "unit" | "from" | "to" | "handings" | "progressMil">): Strip {
  return {
    ends: { from: { name: from.name, note: from.place }, to: { name: to.name, note: to.place } },
    handovers: handings.map(({ id, carrier, mark, from: place, takenOver, miles }) => ({
      id, carrier, place,
      note: takenOver ? "Taken over" : "Not yet",
      tone: takenOver ? "met" : "ahead",
      leg: [mark ?? carrier, miles === null ? null : `${miles.toLocaleString("en-US")} mi`].filter(Boolean).join(", "),
    })),
    position: stripPosition(progressMil, handings.length),
    unit: { shape: unit.shape, axles: unit.axles },
  };
}
