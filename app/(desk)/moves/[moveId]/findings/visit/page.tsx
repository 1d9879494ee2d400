import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { VisitForm } from "@/components/inspections/visit-form";
import { Sheet } from "@/components/ui/sheet";
import { load } from "@/lib/entry/load";
import { listInspections } from "@/lib/inspections/queries";
import { visitedLeg } from "@/lib/inspections/choose-leg";

export const metadata: Metadata = { title: "Record a visit" };

/** Where an inspector's visit is written down. */
export default async function VisitPage({ params, searchParams }: { params: Promise<{ moveId: string }>; searchParams: Promise<{ leg?: string | string[] }> }) {
  const { moveId } = await params;
  const { leg: asked } = await searchParams;
  const { inspections, name } = await load(async (viewer) => ({ inspections: await listInspections(viewer, moveId), name: viewer.name }));
  const leg = visitedLeg(inspections.legs, asked);
  if (!leg) notFound();
  return (
    <Sheet title="Record a visit" lead={`${leg.carrierName}, leg ${leg.seq}. Findings are posted under a visit; a visit without findings is worth writing down too.`}>
      <VisitForm moveId={moveId} leg={leg} zones={[...new Set(inspections.legs.map(({ zone }) => zone))]} inspectorName={name} now={inspections.at} />
    </Sheet>
  );
}
