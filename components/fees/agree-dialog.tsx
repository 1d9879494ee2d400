"use client";

import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { faultsOf } from "@/lib/entry/fetcher";
import { formatMoney } from "@/lib/fees/money";
import { agreeMutation } from "@/lib/fees/options";
import type { QuoteView } from "@/lib/fees/types";

/** Agreeing binds the payer, so it is asked twice. */
export function AgreeDialog({ moveId, quote, carrierName }: { moveId: string; quote: QuoteView; carrierName: string }) {
  const [open, setOpen] = useState(false);
  const intent = useIntent();
  const agree = useMutation(agreeMutation(moveId, quote.id));
  const confirm = () =>
    agree.mutate({ key: intent.key() }, {
      onSuccess: () => {
        intent.done();
        setOpen(false);
      },
    });
  return (
    <>
      <Button size="large" onClick={() => setOpen(true)}>Agree to quote {quote.number}…</Button>
      <Dialog
        open={open}
        onClose={() => setOpen(false)}
        title={`Agree to ${formatMoney(quote.totalCents)}`}
        actions={
          <>
            <Button variant="ghost" onClick={() => setOpen(false)}>Not now</Button>
            <Button busy={agree.isPending} onClick={confirm}>Agree</Button>
          </>
        }
      >
        <div className="grid gap-3 text-15">
          <FormErrors errors={faultsOf(agree.error).list} />
          <p>
            {quote.payerName} agrees to pay {carrierName} {formatMoney(quote.totalCents)} under quote {quote.number}
            {quote.reference ? ` (${quote.reference})` : ""}. Nothing is charged yet; you pay as the next step.
          </p>
        </div>
      </Dialog>
    </>
  );
}
