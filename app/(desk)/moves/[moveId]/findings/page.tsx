import type { Metadata } from "next";
import { FindingsBoard } from "@/components/findings/findings-board";
import { listAcceptances } from "@/lib/acceptance/queries";
import { load } from "@/lib/entry/load";
import { listFindings } from "@/lib/findings/queries";
import { listInspections } from "@/lib/inspections/queries";

export const metadata: Metadata = { title: "Findings" };

/** Visits, findings and acceptances of every carrier on the route. */
export default async function FindingsPage({ params }: { params: Promise<{ moveId: string }> }) {
  const { moveId } = await params;
  const first = await load(async (viewer) => ({ inspections: await listInspections(viewer, moveId), board: await listFindings(viewer, moveId), acceptances: await listAcceptances(viewer, moveId) }));
  return <FindingsBoard moveId={moveId} first={first} />;
}
