import { dehydrate, HydrationBoundary, QueryClient } from "@tanstack/react-query";
import type { Metadata } from "next";
import { MovementTab } from "@/components/movement/movement-tab";
import { load } from "@/lib/entry/load";
import { movementOptions } from "@/lib/movement/options";
import { getMovement } from "@/lib/movement/queries";

export const metadata: Metadata = { title: "Movement" };

/** Instruction, release, sightings, arrival and closing of one move. */
export default async function MovementPage({ params }: { params: Promise<{ moveId: string }> }) {
  const { moveId } = await params;
  const client = new QueryClient();
  client.setQueryData(movementOptions(moveId).queryKey, await load((viewer) => getMovement(viewer, moveId)));
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <MovementTab moveId={moveId} />
    </HydrationBoundary>
  );
}
