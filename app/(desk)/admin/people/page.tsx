import type { Metadata } from "next";
import { AdminTabs } from "@/components/admin/admin-tabs";
import { PeopleList } from "@/components/admin/people-list";
import { Page } from "@/components/shell/page";
import { PageHead } from "@/components/ui/page-head";
import { listPeople } from "@/lib/admin/queries";
import { personSearchOf } from "@/lib/admin/search";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "People, administration" };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function AdminPeoplePage({ searchParams }: Props) {
  const search = personSearchOf(await searchParams);
  const first = await load((viewer) => listPeople(viewer, search));
  return (
    <Page>
      <PageHead title="Administration" lead="Help people in, merge doubled companies, look after the mail. Cases stay shut: they belong to their parties." />
      <AdminTabs current={routes.adminPeople()} />
      <PeopleList first={first} search={search} />
    </Page>
  );
}
