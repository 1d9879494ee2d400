import { clsx } from "clsx";
import { type ComponentProps } from "react";

/** Figures, dates and codes. */
export function Mono({ className, ...props }: ComponentProps<"span">) {
  return <span {...props} className={clsx("figure", className)} />;
}

/** A small label that belongs to no control and no box. */
export function Label({ className, ...props }: ComponentProps<"span">) {
  return <span {...props} className={clsx("lab", className)} />;
}
