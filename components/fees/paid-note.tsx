import { Notice } from "@/components/ui/notice";
import { formatMoney } from "@/lib/fees/money";
import type { PaidView } from "@/lib/fees/types";
import { formatWhen } from "@/lib/moves/when";
import { Refresh } from "./refresh";

/** What the database says of a payment to who comes back from its page. Coming back proves nothing by itself. */
export function PaidNote({ paid }: { paid: PaidView | null }) {
  if (!paid) return <Notice kind="info" title="No such payment">There is no payment under this address that you can see. The fees page shows what is paid.</Notice>;
  const { state, amountCents, carrierName, quoteNumber, paidAt, zone } = paid;
  const what = `${formatMoney(amountCents)} to ${carrierName} for quote ${quoteNumber}`;
  if (state === "paid") {
    return (
      <Notice kind="done" title="Paid" live="status">
        {what}{paidAt ? `, ${formatWhen(paidAt, zone)}` : ""}. Billing is cleared for this leg. A receipt goes out by e-mail to you, the payer and the carrier’s billing clerks.
      </Notice>
    );
  }
  if (state === "late") {
    return (
      <Notice kind="stop" title="Paid, but not expected any more" live="status">
        {what}: the quote was settled or voided before this payment came. A billing clerk looks at it and gives it back.
      </Notice>
    );
  }
  if (state === "failed" || state === "expired") {
    return (
      <Notice kind="stop" title="Nothing was paid" live="status">
        The payment page for {what} has ended without a payment. You can start again on the fees page.
      </Notice>
    );
  }
  return (
    <Notice title="We are waiting for the bank’s word" live="status">
      {what}. This page refreshes by itself; you can also leave it, and the receipt comes by e-mail.
      <Refresh />
    </Notice>
  );
}
