import type { Metadata } from "next";
import { MakeCompanyForm } from "@/components/companies/make-company-form";
import { Page } from "@/components/shell/page";
import { PageHead } from "@/components/ui/page-head";
import { Sheet } from "@/components/ui/sheet";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Add a company" };

export default async function NewCompanyPage() {
  await load(async () => null);
  return (
    <Page width="form">
      <PageHead title="Add a company" back={{ href: routes.companies(), label: "Companies" }} lead="You become its manager, and can invite colleagues. If your company is here already, ask one of its managers to invite you instead." />
      <Sheet>
        <MakeCompanyForm />
      </Sheet>
    </Page>
  );
}
