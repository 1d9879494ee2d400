import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { PostForm } from "@/components/findings/post-form";
import { Sheet } from "@/components/ui/sheet";
import { load } from "@/lib/entry/load";
import { listFindings } from "@/lib/findings/queries";
import { legOfVisit } from "@/lib/inspections/choose-leg";
import { listInspections } from "@/lib/inspections/queries";

export const metadata: Metadata = { title: "Post a finding" };

/** Where a finding is posted under a visit. */
export default async function PostFindingPage({ params, searchParams }: { params: Promise<{ moveId: string }>; searchParams: Promise<{ visit?: string | string[] }> }) {
  const { moveId } = await params;
  const { visit } = await searchParams;
  const { inspections, board } = await load(async (viewer) => ({ inspections: await listInspections(viewer, moveId), board: await listFindings(viewer, moveId) }));
  const leg = legOfVisit(inspections.legs, visit);
  const may = board.mayPost.find((one) => one.legId === leg?.legId)?.may;
  if (!leg || !may || typeof visit !== "string") notFound();
  return (
    <Sheet title="Post a finding" lead={`${leg.carrierName}, leg ${leg.seq}. Part, place, what was measured and a photo: then one answer can be enough.`}>
      <PostForm moveId={moveId} leg={leg} visitId={visit} unit={board.unit} entering={may === "enter"} />
    </Sheet>
  );
}
