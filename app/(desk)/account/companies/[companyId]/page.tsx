import type { Metadata } from "next";
import { cache } from "react";
import { CompanyBoard } from "@/components/companies/company-board";
import { Page } from "@/components/shell/page";
import { getCompany } from "@/lib/companies/queries";
import { load } from "@/lib/entry/load";

type Props = { params: Promise<{ companyId: string }> };

const loadCompany = cache((companyId: string) => load((viewer) => getCompany(viewer, companyId)));

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  // The page below says that it can't be shown; thrown from here it would come without any title.
  const company = await loadCompany((await params).companyId).catch(() => null);
  return { title: company?.name ?? "Nothing here" };
}

export default async function CompanyPage({ params }: Props) {
  const { companyId } = await params;
  return (
    <Page width="reading">
      <CompanyBoard companyId={companyId} first={await loadCompany(companyId)} />
    </Page>
  );
}
