import { clsx } from "clsx";

export type MarkStencilProps = { mark: string; number: string; size?: "head" | "title" | "row"; className?: string };

const SIZES = { head: "text-46 tracking-[0.01em]", title: "text-28", row: "text-21" };

/** A unit's reporting mark and number as stencilled on its side. */
export function MarkStencil({ mark, number, size = "row", className }: MarkStencilProps) {
  return (
    <span className={clsx("font-stencil leading-none font-normal", size !== "head" && "whitespace-nowrap", SIZES[size], className)}>
      {mark} {number}
    </span>
  );
}
