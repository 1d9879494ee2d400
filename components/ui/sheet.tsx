import { clsx } from "clsx";
import { useId, type ReactNode } from "react";

export type SheetProps = {
  title?: ReactNode;
  /** A sentence or two under the title. */
  lead?: ReactNode;
  /** Buttons and links at the right of the title. */
  actions?: ReactNode;
  /** The title's place in the order of headings. */
  level?: 2 | 3;
  /** No frame around it, for a part inside another sheet. */
  bare?: boolean;
  className?: string;
  children: ReactNode;
};

/** A section on a sheet of paper with one rule around it. */
export function Sheet({ title, lead, actions, level = 2, bare, className, children }: SheetProps) {
  const id = useId();
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <section aria-labelledby={title ? id : undefined} className={clsx("min-w-0", !bare && "border border-rule-strong bg-sheet px-4 py-5 sm:px-6 sm:pb-6", className)}>
      {(title || actions) && (
        <div className="mb-3.5 flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
          <div>
            {title && (
              <Heading id={id} className={clsx("font-[680] tracking-[-0.01em]", level === 2 ? "text-21" : "text-17")}>
                {title}
              </Heading>
            )}
            {lead && <p className="mt-1 max-w-[66ch] text-14 text-ink-2">{lead}</p>}
          </div>
          {actions && <div className="flex flex-wrap gap-2.5">{actions}</div>}
        </div>
      )}
      {children}
    </section>
  );
}
