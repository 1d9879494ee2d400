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
  const { unit } = await loadCase((await params).moveId);
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
