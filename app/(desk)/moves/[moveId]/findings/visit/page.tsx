import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { FieldScreen } from "@/components/findings/field-screen";
import { VisitForm } from "@/components/inspections/visit-form";
import { load } from "@/lib/entry/load";
import { visitedLeg } from "@/lib/inspections/choose-leg";
import { listInspections } from "@/lib/inspections/queries";
import { routes } from "@/lib/routes";
import { loadCase } from "../../load-case";

export const metadata: Metadata = { title: "Record a visit" };

/** Where an inspector's visit is written down. */
export default async function VisitPage({ params, searchParams }: { params: Promise<{ moveId: string }>; searchParams: Promise<{ leg?: string | string[] }> }) {
  const { moveId } = await params;
  const { leg: asked } = await searchParams;
  const { inspections, name } = await load(async (viewer) => ({ inspections: await listInspections(viewer, moveId), name: viewer.name }));
  const leg = visitedLeg(inspections.legs, asked);
  if (!leg) notFound();
  const { unit } = await loadCase(moveId);
  return (
    <FieldScreen backHref={routes.findings(moveId)} unit={`${unit.mark} ${unit.number}`} note={leg.carrierMark ?? ""} title="Record a visit" lead={`${leg.carrierName}, leg ${leg.seq}. Findings are posted under a visit; a visit without findings is worth writing down too.`}>
      <VisitForm moveId={moveId} leg={leg} zones={[...new Set(inspections.legs.map(({ zone }) => zone))]} inspectorName={name} now={inspections.at} />
    </FieldScreen>
  );
}
