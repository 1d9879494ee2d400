import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { AcceptanceForm } from "@/components/acceptance/acceptance-form";
import { FieldScreen } from "@/components/findings/field-screen";
import { listAcceptances } from "@/lib/acceptance/queries";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Acceptance" };

/** Where the inspector of a leg signs that the unit is mechanically fit to go on it. */
export default async function AcceptPage({ params }: { params: Promise<{ moveId: string; legId: string }> }) {
  const { moveId, legId } = await params;
  const acceptances = await load((viewer) => listAcceptances(viewer, moveId));
  const leg = acceptances.legs.find((one) => one.legId === legId);
  if (!leg) notFound();
  return (
    <FieldScreen backHref={routes.findings(moveId)} unit={acceptances.unit} note={`Leg ${leg.seq}`} title={`Acceptance by ${leg.carrierName}`} lead={`${acceptances.unit} on leg ${leg.seq}, from ${leg.fromPlace} to ${leg.toPlace}.`}>
      <AcceptanceForm moveId={moveId} legId={legId} first={acceptances} />
    </FieldScreen>
  );
}
