import { clsx } from "clsx";
import { type ReactNode } from "react";

/** The id that the skip link leads to. */
const MAIN_ID = "main";

/** The first thing that a keyboard reaches: past the bar to the page. */
export function SkipLink() {
  return (
    <a href={`#${MAIN_ID}`} className="skip-link fixed top-0 left-0 z-50 -translate-y-[120%] bg-sheet px-4 py-3 font-[620] text-ink underline focus:translate-y-0">
      Skip to the page
    </a>
  );
}

export type PageProps = { width?: "full" | "reading" | "form"; className?: string; children: ReactNode };

const WIDTHS = { full: "max-w-[1240px]", reading: "max-w-[900px]", form: "max-w-[680px]" };

/** The main part of a page in its margins. */
export function Page({ width = "full", className, children }: PageProps) {
  return (
    <main id={MAIN_ID} tabIndex={-1} className={clsx("mx-auto w-full px-4 pt-5 pb-12 outline-none sm:px-8 sm:pt-6 sm:pb-16", WIDTHS[width], className)}>
      {children}
    </main>
  );
}
