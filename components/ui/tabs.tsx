import { clsx } from "clsx";
import Link from "next/link";
import { type Tab } from "./tab";
import { TabSelect } from "./tab-select";

/** The parts of one thing as folder tabs; on a phone one native select. Stands directly on the sheet that it belongs to. */
export function Tabs({ label, tabs, className }: { label: string; tabs: readonly Tab[]; className?: string }) {
  return (
    <nav aria-label={label} className={className}>
      <ul className="hidden gap-1 pl-2 md:flex">
        {tabs.map((tab) => (
          <li key={tab.href} className={clsx("relative top-px", tab.current && "z-1")}>
            <Link
              href={tab.href}
              aria-current={tab.current ? "page" : undefined}
              className={clsx(
                "flex min-h-11 items-center gap-1.5 rounded-[5px_12px_0_0] border border-rule-strong px-2.5 text-15 whitespace-nowrap lg:px-4",
                tab.current ? "border-b-sheet bg-sheet font-[680] text-ink" : "bg-manila font-[540] text-ink-2 hover:text-ink",
              )}
            >
              {tab.label}
              {tab.count ? <span className="font-mono text-13 font-semibold text-oxide">{tab.count}</span> : null}
            </Link>
          </li>
        ))}
      </ul>
      <TabSelect label={label} tabs={tabs} />
    </nav>
  );
}
