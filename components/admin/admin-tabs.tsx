import { Tabs } from "@/components/ui/tabs";
import { routes } from "@/lib/routes";

const TABS = [{ href: routes.adminCompanies(), label: "Companies" }, { href: routes.adminPeople(), label: "People" }, { href: routes.adminMail(), label: "E-mail" }];

/** The parts of the administration. */
export function AdminTabs({ current }: { current: string }) {
  return <Tabs label="Administration" tabs={TABS.map((tab) => ({ ...tab, current: tab.href === current }))} />;
}
