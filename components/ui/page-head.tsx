import Link from "next/link";
import { type ReactNode } from "react";

export type PageHeadProps = {
  title: ReactNode;
  /** A line over the title. */
  label?: ReactNode;
  lead?: ReactNode;
  back?: { href: string; label: string };
  actions?: ReactNode;
};

/** The one heading of a page, what it is about, and its main actions. */
export function PageHead({ title, label, lead, back, actions }: PageHeadProps) {
  return (
    <div className="mb-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-4">
      <div className="min-w-0">
        {back && (
          <Link href={back.href} className="mb-1 inline-flex min-h-11 items-center gap-2 text-14 font-[580] text-ink-2 underline-offset-4 hover:underline">
            <svg aria-hidden="true" width="8" height="12" viewBox="0 0 8 12">
              <path d="M6.5 1l-5 5 5 5" fill="none" stroke="currentColor" strokeWidth="2" />
            </svg>
            {back.label}
          </Link>
        )}
        {label && <p className="lab mb-1">{label}</p>}
        <h1 className="text-28 font-[720] tracking-[-0.015em]">{title}</h1>
        {lead && <div className="mt-1 max-w-[66ch] text-15 text-ink-2">{lead}</div>}
      </div>
      {actions && <div className="no-print flex flex-wrap gap-2.5">{actions}</div>}
    </div>
  );
}
