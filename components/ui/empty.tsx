import { clsx } from "clsx";
import { type ReactNode } from "react";

export type EmptyProps = {
  /** What is not there: "No findings yet." */
  title: ReactNode;
  /** What belongs here and who adds it. */
  children: ReactNode;
  action?: ReactNode;
  className?: string;
};

/** An empty place: a broken rule around what belongs there, who adds it, and how. */
export function Empty({ title, children, action, className }: EmptyProps) {
  return (
    <div className={clsx("border-[1.5px] border-dashed border-rule-strong px-5 py-6", className)}>
      <p className="text-17 font-[640]">{title}</p>
      <div className="mt-1 max-w-[60ch] text-14 text-ink-2">{children}</div>
      {action && <div className="mt-4 flex flex-wrap gap-2.5">{action}</div>}
    </div>
  );
}
