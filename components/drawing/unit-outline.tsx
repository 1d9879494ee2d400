import { clsx } from "clsx";
import { UNIT_BOX, UnitShape, type UnitShapeProps } from "./unit-shape";

/** The side of a unit as a drawing of its own; `label` says what it shows, without one it is decoration. */
export function UnitOutline({ label, className, ...shape }: UnitShapeProps & { label?: string; className?: string }) {
  return (
    <svg role={label ? "img" : undefined} aria-label={label} aria-hidden={label ? undefined : true} viewBox={`0 0 ${UNIT_BOX.width} ${UNIT_BOX.height}`} className={clsx("block h-auto w-full", className)}>
      <UnitShape {...shape} />
    </svg>
  );
}
