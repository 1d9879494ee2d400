import type { Metadata } from "next";
import { load } from "@/lib/entry/load";
import { ownCompanies } from "@/lib/moves/own-companies";
import { getDraft } from "@/lib/moves/queries";
import { NewMove } from "../new-move";

export const metadata: Metadata = { title: "A draft" };

/** A draft that is taken up where it was left. */
export default async function DraftPage({ params }: { params: Promise<{ draftId: string }> }) {
  const { draftId } = await params;
  const found = await load(async (viewer) => ({ companies: ownCompanies(viewer), draft: await getDraft(viewer, draftId) }));
  return <NewMove {...found} />;
}
