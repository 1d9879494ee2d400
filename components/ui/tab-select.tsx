"use client";

import { useRouter } from "next/navigation";
import { type Tab } from "./tab";

/** The same tabs as one native select; choosing a line goes there. */
export function TabSelect({ label, tabs }: { label: string; tabs: readonly Tab[] }) {
  const router = useRouter();
  return (
    <select
      aria-label={label}
      value={tabs.find((tab) => tab.current)?.href ?? ""}
      onChange={(event) => router.push(event.target.value)}
      className="field-box mb-3 font-[620] md:hidden"
    >
      {tabs.some((tab) => tab.current) ? null : <option value="">{label}</option>}
      {tabs.map((tab) => (
        <option key={tab.href} value={tab.href}>
          {tab.count ? `${tab.label} (${tab.count})` : tab.label}
        </option>
      ))}
    </select>
  );
}
