"use client";

import { useQuery } from "@tanstack/react-query";
import { usePathname } from "next/navigation";
import { type Tab } from "@/components/ui/tab";
import { Tabs } from "@/components/ui/tabs";
import { caseOptions } from "@/lib/moves/options";
import type { CaseFile } from "@/lib/moves/types";
import { routes } from "@/lib/routes";

function tabsOf({ moveId, see, counts, stage }: CaseFile): Tab[] {
  const restoring = stage === "restoring" || stage === "placed";
  return [
    { href: routes.move(moveId), label: "Now" },
    see.prep && { href: routes.prep(moveId), label: restoring ? "Restore" : "Prep", count: counts.prep },
    see.findings && { href: routes.findings(moveId), label: "Findings", count: counts.findings },
    see.fees && { href: routes.fees(moveId), label: "Fees" },
    see.movement && { href: routes.movement(moveId), label: "Movement" },
    see.timeline && { href: routes.timeline(moveId), label: "Timeline" },
    { href: routes.people(moveId), label: "People" },
    see.unit && { href: routes.unit(moveId), label: "Unit and route" },
  ].filter((tab) => tab !== false);
}

/** The parts of a case as tabs, only those that the viewer may open; the numbers follow the case. */
export function CaseTabs({ moveId }: { moveId: string }) {
  const path = usePathname();
  const { data: file } = useQuery(caseOptions(moveId));
  if (!file) return null;
  const tabs = tabsOf(file);
  const home = routes.move(moveId);
  const current = tabs.filter((tab) => tab.href !== home).find((tab) => path === tab.href || path.startsWith(`${tab.href}/`))?.href ?? home;
  return <Tabs label="Parts of the case" className="mt-6" tabs={tabs.map((tab) => ({ ...tab, current: tab.href === current }))} />;
}
