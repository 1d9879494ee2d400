import { CaseNow } from "@/components/case/case-now";

/** What waits now on one move, and the conditions of each leg. */
export default async function CasePage({ params }: { params: Promise<{ moveId: string }> }) {
  return <CaseNow moveId={(await params).moveId} />;
}
