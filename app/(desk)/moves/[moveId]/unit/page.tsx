import { dehydrate, HydrationBoundary, QueryClient } from "@tanstack/react-query";
import type { Metadata } from "next";
import { UnitAndRoute } from "@/components/moves/edit/unit-and-route";
import { load } from "@/lib/entry/load";
import { equipmentOptions } from "@/lib/moves/options";
import { getEquipment } from "@/lib/moves/queries";

export const metadata: Metadata = { title: "Unit and route" };

/** The unit's facts and the route of one move. */
export default async function UnitPage({ params }: { params: Promise<{ moveId: string }> }) {
  const { moveId } = await params;
  const client = new QueryClient();
  client.setQueryData(equipmentOptions(moveId).queryKey, await load((viewer) => getEquipment(viewer, moveId)));
  return (
    <HydrationBoundary state={dehydrate(client)}>
      <UnitAndRoute moveId={moveId} />
    </HydrationBoundary>
  );
}
