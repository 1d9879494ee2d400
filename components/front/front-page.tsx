import { type ReactNode } from "react";
import { Page } from "@/components/shell/page";

type FrontPageProps = { title: ReactNode; lead?: ReactNode; children: ReactNode; aside?: ReactNode };

/** One sheet with one task, as all pages before sign-in are. */
export function FrontPage({ title, lead, children, aside }: FrontPageProps) {
  return (
    <Page width="form">
      <div className="mt-2 border border-rule-strong bg-sheet px-4 py-6 sm:mt-8 sm:px-9 sm:py-9">
        <h1 className="text-28 font-[720] tracking-[-0.015em]">{title}</h1>
        {lead && <div className="mt-1.5 max-w-[58ch] text-15 text-ink-2">{lead}</div>}
        <div className="mt-6">{children}</div>
      </div>
      {aside && <div className="mt-5 grid gap-1.5 px-1 text-15 text-ink-2">{aside}</div>}
    </Page>
  );
}
