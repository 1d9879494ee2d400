import type { Metadata } from "next";
import { PrepBoard } from "@/components/prep/prep-board";
import { load } from "@/lib/entry/load";
import { getPrep } from "@/lib/prep/queries";

export const metadata: Metadata = { title: "Prep" };

export default async function PrepPage({ params }: { params: Promise<{ moveId: string }> }) {
  const { moveId } = await params;
  const prep = await load((viewer) => getPrep(viewer, moveId));
  return <PrepBoard moveId={moveId} first={prep} />;
}
