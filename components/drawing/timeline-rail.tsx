import { clsx } from "clsx";
import { type ReactNode } from "react";

const ROW = "grid grid-cols-[22px_minmax(0,1fr)] gap-x-3.5 sm:grid-cols-[120px_22px_minmax(0,1fr)]";

/** One rail down its row: solid, or broken where nothing was entered. The mark is where a day begins. */
export function Rail({ broken = false, mark }: { broken?: boolean; mark?: "square" | "diamond" }) {
  return (
    <div aria-hidden="true" className="relative">
      <span className={clsx("absolute inset-y-0 left-[9.5px] w-[3px]", broken ? "bg-[repeating-linear-gradient(var(--rule-strong)_0_5px,transparent_5px_11px)]" : "bg-ink")} />
      {mark && <span className={clsx("absolute top-4 left-1 size-3.5 border-[3px] border-ink bg-sheet", mark === "diamond" && "rotate-45")} />}
    </div>
  );
}

/** The rail with its days, newest or oldest first as given. */
export function TimelineRail({ children }: { children: ReactNode }) {
  return <ol className="text-15">{children}</ol>;
}

export type TimelineDayProps = {
  /** The day as words: "Tue 24 Nov". */
  day: ReactNode;
  mark?: "square" | "diamond";
  children: ReactNode;
};

/** A day with its entries. */
export function TimelineDay({ day, mark = "square", children }: TimelineDayProps) {
  return (
    <li className={ROW}>
      <p className="figure hidden pt-3 text-right text-ink-2 sm:block">{day}</p>
      <Rail mark={mark} />
      <div>
        <p className="figure pt-3 font-semibold sm:hidden">{day}</p>
        <ol>{children}</ol>
      </div>
    </li>
  );
}

export type TimelineEntryProps = {
  /** With its zone: "16:05 CT". */
  time: ReactNode;
  children: ReactNode;
  /** Who did it, or who entered it for whom and from what. */
  by?: ReactNode;
  /** A state, a photo or a link at the right. */
  aside?: ReactNode;
};

/** What happened, when and by whom. */
export function TimelineEntry({ time, children, by, aside }: TimelineEntryProps) {
  return (
    <li className="grid gap-x-3 gap-y-0.5 border-b border-rule py-2.5 sm:grid-cols-[78px_minmax(0,1fr)_auto]">
      <span className="figure text-ink-2">{time}</span>
      <div className="min-w-0 [overflow-wrap:anywhere]">
        {children}
        {by && <span className="block text-14 text-ink-2">{by}</span>}
      </div>
      {aside && <div className="max-sm:mt-1 sm:text-right">{aside}</div>}
    </li>
  );
}

/** Days without an entry: a broken rail and whom they waited on. */
export function TimelineQuiet({ children }: { children: ReactNode }) {
  return (
    <li className={ROW}>
      <span className="hidden sm:block" />
      <Rail broken />
      <p className="border-b border-rule py-2.5 text-14 font-[540] text-brass">{children}</p>
    </li>
  );
}
