import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { FieldScreen } from "@/components/findings/field-screen";
import { PostForm } from "@/components/findings/post-form";
import { load } from "@/lib/entry/load";
import { listFindings } from "@/lib/findings/queries";
import { legOfVisit } from "@/lib/inspections/choose-leg";
import { listInspections } from "@/lib/inspections/queries";
import { routes } from "@/lib/routes";

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
    <FieldScreen backHref={routes.findings(moveId)} unit={`${board.unit.mark} ${board.unit.number}`} note={leg.carrierMark ?? ""} title="Post a finding" lead={`${leg.carrierName}, leg ${leg.seq}. Part, place, what was measured and a photo: then one answer can be enough.`}>
      <PostForm moveId={moveId} leg={leg} visitId={visit} unit={board.unit} entering={may === "enter"} />
    </FieldScreen>
  );
}
