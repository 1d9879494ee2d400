import type { Metadata } from "next";
import { AdminTabs } from "@/components/admin/admin-tabs";
import { CompaniesBoard } from "@/components/admin/companies-board";
import { Page } from "@/components/shell/page";
import { PageHead } from "@/components/ui/page-head";
import { listAllCompanies } from "@/lib/admin/queries";
import { companySearchOf } from "@/lib/admin/search";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Companies, administration" };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function AdminCompaniesPage({ searchParams }: Props) {
  const search = companySearchOf(await searchParams);
  const first = await load((viewer) => listAllCompanies(viewer, search));
  return (
    <Page>
      <PageHead title="Administration" lead="Help people in, merge doubled companies, look after the mail. Cases stay shut: they belong to their parties." />
      <AdminTabs current={routes.adminCompanies()} />
      <CompaniesBoard first={first} search={search} />
    </Page>
  );
}
