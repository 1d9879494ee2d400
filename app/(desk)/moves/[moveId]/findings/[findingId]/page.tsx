import type { Metadata } from "next";
import { FindingSheet } from "@/components/findings/finding-sheet";
import { load } from "@/lib/entry/load";
import { getFinding } from "@/lib/findings/queries";

export const metadata: Metadata = { title: "Finding" };

/** One finding with its thread. */
export default async function FindingPage({ params }: { params: Promise<{ moveId: string; findingId: string }> }) {
  const { moveId, findingId } = await params;
  const { finding, userId } = await load(async (viewer) => ({ finding: await getFinding(viewer, moveId, findingId), userId: viewer.userId }));
  return <FindingSheet first={finding} userId={userId} />;
}
