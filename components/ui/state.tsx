import { clsx } from "clsx";
import { type ReactNode } from "react";
import { TONE_ON_WASH, type Tone } from "./tone";

/** The bordered word that says in which state a thing is. */
export function State({ tone = "neutral", children, className }: { tone?: Tone; children: ReactNode; className?: string }) {
  return <span className={clsx("inline-block rounded-sm border border-current px-2 py-0.5 text-13 font-[620] max-sm:text-14", TONE_ON_WASH[tone], className)}>{children}</span>;
}
