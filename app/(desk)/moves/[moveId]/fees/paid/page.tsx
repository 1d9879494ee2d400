import type { Metadata } from "next";
import { PaidNote } from "@/components/fees/paid-note";
import { LinkButton } from "@/components/ui/link-button";
import { Sheet } from "@/components/ui/sheet";
import { load } from "@/lib/entry/load";
import { findPaid } from "@/lib/fees/queries";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: "Payment" };

type Props = { params: Promise<{ moveId: string }>; searchParams: Promise<{ session?: string | string[] }> };

/** Where the payment service sends a payer back to. It shows what is booked and books nothing. */
export default async function PaidPage({ params, searchParams }: Props) {
  const [{ moveId }, { session }] = await Promise.all([params, searchParams]);
  const paid = await load((viewer) => findPaid(viewer, moveId, String(session ?? "")));
  return (
    <Sheet title="Payment">
      <PaidNote paid={paid} />
      <p className="mt-5">
        <LinkButton href={routes.fees(moveId)} variant="ghost">Back to fees</LinkButton>
      </p>
    </Sheet>
  );
}
