import { type ReactNode } from "react";

/** The last lines of every page: what the product does not do. Children are links and the like. */
export function Footer({ children }: { children?: ReactNode }) {
  return (
    <footer className="mx-auto max-w-[1240px] px-4 pb-8 text-14 text-ink-2 sm:px-8">
      <div className="flex flex-wrap items-baseline justify-between gap-x-8 gap-y-2 border-t border-rule-strong pt-3">
        <p className="max-w-[78ch]">
          Towfolio informs qualified people. It accepts, instructs and releases nothing by itself: the carrier’s rules, local codes and a qualified person’s judgment prevail.
        </p>
        {children}
      </div>
    </footer>
  );
}
