import { clsx } from "clsx";
import { type ComponentProps, type ReactNode } from "react";

/** A line that opens to show more; native, so it needs no script. */
export function Disclosure({ summary, children, className, ...props }: ComponentProps<"details"> & { summary: ReactNode }) {
  return (
    <details {...props} className={clsx("group border-y border-rule", className)}>
      <summary className="flex min-h-11 items-center gap-2.5 py-2 text-15 font-[620] max-sm:min-h-13">
        <svg aria-hidden="true" width="10" height="12" viewBox="0 0 10 12" className="shrink-0 transition-transform duration-150 group-open:rotate-90">
          <path d="M1.5 1l6 5-6 5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
        {summary}
      </summary>
      <div className="pb-3 pl-5">{children}</div>
    </details>
  );
}
