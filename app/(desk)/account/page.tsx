import type { Metadata } from "next";
import { AccountBoard } from "@/components/account/account-board";
import { Page } from "@/components/shell/page";
import { LinkButton } from "@/components/ui/link-button";
import { PageHead } from "@/components/ui/page-head";
import { getAccount } from "@/lib/account/queries";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Account" };

export default async function AccountPage() {
  const account = await load((viewer) => getAccount(viewer));
  return (
    <Page width="reading">
      <PageHead title="Account" lead={`${account.name}, ${account.email}`} actions={<LinkButton href={routes.companies()} variant="ghost">Your companies</LinkButton>} />
      <AccountBoard first={account} />
    </Page>
  );
}
