import { dehydrate, HydrationBoundary, QueryClient } from "@tanstack/react-query";
import type { Metadata } from "next";
import { DraftList } from "@/components/moves/draft-list";
import { MoveList } from "@/components/moves/move-list";
import { Page } from "@/components/shell/page";
import { load } from "@/lib/entry/load";
import { parseFilter } from "@/lib/moves/list-filter";
import { movesOptions } from "@/lib/moves/options";
import { listCarrierNames, listDrafts, listMoves } from "@/lib/moves/queries";

export const metadata: Metadata = { title: "Moves" };

type Props = { searchParams: Promise<Record<string, string | string[] | undefined>> };

/** The moves that the viewer sees, and the drafts of their companies. */
export default async function MovesPage({ searchParams }: Props) {
  const filter = parseFilter(await searchParams);
  const client = new QueryClient();
  const [found, drafts, carriers] = await load((viewer) => Promise.all([listMoves(viewer, filter), listDrafts(viewer), listCarrierNames(viewer)]));
  client.setQueryData(movesOptions(filter).queryKey, found);
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <Page>
        <MoveList filter={filter} carriers={carriers}>
          <DraftList drafts={drafts} at={found.at} />
        </MoveList>
      </Page>
    </HydrationBoundary>
  );
}
