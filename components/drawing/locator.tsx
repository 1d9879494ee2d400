import { clsx } from "clsx";
import { placeName, type UnitForm } from "@/lib/moves/places";
import { LocatorDrawing, type RingMark } from "./locator-drawing";
import { LOCATOR } from "./place-points";

export type LocatorProps = { form: UnitForm; rings: readonly RingMark[]; className?: string };

/** Where on the unit: side and top with the wheels numbered from the end marked F, a ring on each place named. */
export function Locator({ form, rings, className }: LocatorProps) {
  const names = rings.map(({ placeId }) => placeName(placeId, form.axles)).filter((name) => name !== null);
  const label = names.length > 0 ? `Outline of the unit. Marked: ${names.join("; ")}.` : "Outline of the unit.";
  return (
    <svg role="img" aria-label={label} viewBox={`0 0 ${LOCATOR.width} ${LOCATOR.height}`} className={clsx("block h-auto w-full max-w-[460px]", className)}>
      <LocatorDrawing form={form} rings={rings} />
    </svg>
  );
}
