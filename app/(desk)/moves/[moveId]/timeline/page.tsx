import { dehydrate, HydrationBoundary, QueryClient } from "@tanstack/react-query";
import type { Metadata } from "next";
import { MoveTimeline } from "@/components/timeline/move-timeline";
import { load } from "@/lib/entry/load";
import { timelineOptions } from "@/lib/timeline/options";
import { getTimeline } from "@/lib/timeline/queries";
import { showOf } from "@/lib/timeline/show";

type Props = { params: Promise<{ moveId: string }>; searchParams: Promise<{ show?: string | string[] }> };

export const metadata: Metadata = { title: "Timeline" };

/** What happened on one move. */
export default async function TimelinePage({ params, searchParams }: Props) {
  const { moveId } = await params;
  const asked = (await searchParams).show;
  const show = showOf(typeof asked === "string" ? asked : null);
  const client = new QueryClient();
  client.setQueryData(timelineOptions(moveId, show).queryKey, await load((viewer) => getTimeline(viewer, moveId, show)));
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <MoveTimeline moveId={moveId} show={show} />
    </HydrationBoundary>
  );
}
