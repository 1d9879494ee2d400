import { type ReactNode } from "react";
import { LinkButton } from "./link-button";

export type PagerProps = {
  label: string;
  /** Where in the whole this page stands: "26 to 50 of 61 moves". */
  words: ReactNode;
  previousHref?: string | null;
  nextHref?: string | null;
};

/** Earlier and later pages of a long list; nothing when everything is on one page. */
export function Pager({ label, words, previousHref, nextHref }: PagerProps) {
  if (!previousHref && !nextHref) return null;
  return (
    <nav aria-label={label} className="mt-4 flex flex-wrap items-center justify-between gap-3">
      <p className="figure text-14 text-ink-2">{words}</p>
      <div className="flex gap-2.5">
        {previousHref && (
          <LinkButton href={previousHref} variant="ghost" rel="prev">
            Previous
          </LinkButton>
        )}
        {nextHref && (
          <LinkButton href={nextHref} variant="ghost" rel="next">
            Next
          </LinkButton>
        )}
      </div>
    </nav>
  );
}
