import type { Metadata } from "next";
import { FeesBoard } from "@/components/fees/fees-board";
import { load } from "@/lib/entry/load";
import { getFees } from "@/lib/fees/queries";

export const metadata: Metadata = { title: "Fees" };

/** What each carrier asks for its leg, as far as the viewer may see it. */
export default async function FeesPage({ params }: { params: Promise<{ moveId: string }> }) {
  const { moveId } = await params;
  const fees = await load((viewer) => getFees(viewer, moveId));
  return <FeesBoard moveId={moveId} first={fees} />;
}
