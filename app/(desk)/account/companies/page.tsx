import type { Metadata } from "next";
import { CompanyList } from "@/components/companies/company-list";
import { Page } from "@/components/shell/page";
import { LinkButton } from "@/components/ui/link-button";
import { PageHead } from "@/components/ui/page-head";
import { listCompanies } from "@/lib/companies/queries";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Companies" };

export default async function CompaniesPage() {
  const companies = await load((viewer) => listCompanies(viewer));
  return (
    <Page width="reading">
      <PageHead title="Companies" lead="A company’s people see all of its moves. What each of them does there decides what they can sign." actions={<LinkButton href={routes.newCompany()} variant="ghost">Add a company</LinkButton>} />
      <CompanyList first={companies} />
    </Page>
  );
}
