import type { Metadata } from "next";
import { QuoteForm } from "@/components/fees/quote-form";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { load } from "@/lib/entry/load";
import { getFees } from "@/lib/fees/queries";
import { requireLegToQuote } from "@/lib/fees/rules";
import { quoteBar } from "@/lib/fees/words";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Give a quote" };

/** The form for a quote, for who may give or enter one on this leg. */
export default async function QuotePage({ params }: { params: Promise<{ moveId: string; legId: string }> }) {
  const { moveId, legId } = await params;
  const leg = await load(async (viewer) => requireLegToQuote(await getFees(viewer, moveId), legId));
  const bar = quoteBar(leg);
  return (
    <Sheet title={`Quote for leg ${leg.seq}`} lead={`${leg.carrierName}, ${leg.fromPlace} to ${leg.toPlace}, to be paid by ${leg.payerName ?? "a payer who is still to be named"}.`}>
      {bar ? (
        <>
          <Notice kind="info">{bar}</Notice>
          <p className="mt-5"><LinkButton href={routes.fees(moveId)} variant="ghost">Back to fees</LinkButton></p>
        </>
      ) : (
        <QuoteForm moveId={moveId} leg={leg} />
      )}
    </Sheet>
  );
}
