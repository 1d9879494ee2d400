import { dehydrate, HydrationBoundary, QueryClient } from "@tanstack/react-query";
import type { Metadata } from "next";
import { type ReactNode } from "react";
import { CaseHead } from "@/components/case/case-head";
import { CaseTabs } from "@/components/case/case-tabs";
import { Page } from "@/components/shell/page";
import { caseOptions } from "@/lib/moves/options";
import { loadCase } from "./load-case";

type Props = { params: Promise<{ moveId: string }>; children: ReactNode };

export async function generateMetadata({ params }: Omit<Props, "children">): Promise<Metadata> {
  // The page below says that it can't be shown; thrown from here it would come without any title.
  const file = await loadCase((await params).moveId).catch(() => null);
  if (!file) return { title: "Nothing here" };
  const { unit } = file;
  const name = `${unit.mark} ${unit.number}`;
  return { title: { default: `${name} · Towfolio`, template: `%s · ${name} · Towfolio` } };
}

/** The head of the case and its tabs; each part of the case fills the sheet below them. */
export default async function CaseLayout({ params, children }: Props) {
  const { moveId } = await params;
  const client = new QueryClient();
  client.setQueryData(caseOptions(moveId).queryKey, await loadCase(moveId));
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <Page>
        <CaseHead moveId={moveId} />
        <CaseTabs moveId={moveId} />
        {children}
      </Page>
    </HydrationBoundary>
  );
}
