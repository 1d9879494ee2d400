import type { Metadata } from "next";
import { AdminTabs } from "@/components/admin/admin-tabs";
import { MailList } from "@/components/admin/mail-list";
import { Page } from "@/components/shell/page";
import { PageHead } from "@/components/ui/page-head";
import { listMail } from "@/lib/admin/queries";
import { mailStateOf } from "@/lib/admin/search";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "E-mail, administration" };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

export default async function AdminMailPage({ searchParams }: Props) {
  const state = mailStateOf(await searchParams);
  const first = await load((viewer) => listMail(viewer, state));
  return (
    <Page>
      <PageHead title="Administration" lead="Help people in, merge doubled companies, look after the mail. Cases stay shut: they belong to their parties." />
      <AdminTabs current={routes.adminMail()} />
      <MailList first={first} state={state} />
    </Page>
  );
}
