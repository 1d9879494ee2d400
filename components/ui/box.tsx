import { clsx } from "clsx";
import { type ReactNode } from "react";

/** Of twelve columns where there is room for twelve. */
export type BoxSpan = 2 | 3 | 4 | 6 | 8 | 12;

const SPANS: Record<BoxSpan, string> = {
  2: "col-span-6 @lg:col-span-4 @3xl:col-span-2",
  3: "col-span-6 @lg:col-span-6 @3xl:col-span-3",
  4: "col-span-12 @lg:col-span-4",
  6: "col-span-12 @lg:col-span-6",
  8: "col-span-12 @lg:col-span-8",
  12: "col-span-12",
};

export type BoxProps = {
  label: ReactNode;
  /** The fact itself. */
  children: ReactNode;
  detail?: ReactNode;
  /** Figures, dates and codes. */
  mono?: boolean;
  /** Washed in brass while somebody is waiting, in oxide when something is wrong. */
  tone?: "waiting" | "wrong";
  span?: BoxSpan;
};

/** Ruled boxes as on a printed form: one list of facts. Fills its place and counts in twelfths of it. */
export function BoxGrid({ children, className, framed = true }: { children: ReactNode; className?: string; framed?: boolean }) {
  return (
    <div className={clsx("@container overflow-hidden bg-sheet", framed && "border border-rule-strong", className)}>
      <dl className="-mr-px -mb-px grid grid-cols-12">{children}</dl>
    </div>
  );
}

/** One fact in its box, the label in the corner. */
export function Box({ label, children, detail, mono, tone, span = 3 }: BoxProps) {
  return (
    <div
      data-box=""
      className={clsx(
        "min-h-16 min-w-0 border-r border-b border-rule px-3.5 pt-2.5 pb-2.5 [overflow-wrap:anywhere]",
        tone ? "col-span-12" : null,
        tone === "waiting" && "bg-brass-wash",
        tone === "wrong" && "bg-oxide-wash",
        SPANS[span].split(" ").filter((name) => !tone || name.startsWith("@")).join(" "),
      )}
    >
      <dt className="lab mb-1">{label}</dt>
      <dd>
        <span className={clsx("block font-semibold", mono && "figure")}>{children}</span>
        {detail && <span className="block text-13 text-ink-2 max-sm:text-14">{detail}</span>}
      </dd>
    </div>
  );
}
