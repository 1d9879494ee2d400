"use client";

import { useMutation } from "@tanstack/react-query";
import { useEffect } from "react";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { useIntent } from "@/components/ui/intent";
import { faultsOf } from "@/lib/entry/fetcher";
import { formatMoney } from "@/lib/fees/money";
import { payMutation } from "@/lib/fees/options";

/** Opens the payment service's page, the one that is open already where there is one. No card data is typed here. */
export function PayButton({ moveId, quoteId, totalCents, open }: { moveId: string; quoteId: string; totalCents: number; open: boolean }) {
  const intent = useIntent();
  const pay = useMutation(payMutation(moveId, quoteId));
  const { reset } = pay;
  // Coming back with the browser's button may show this page as it was left: on its way.
  useEffect(() => {
    const wake = (event: PageTransitionEvent) => {
      if (event.persisted) reset();
    };
    window.addEventListener("pageshow", wake);
    return () => window.removeEventListener("pageshow", wake);
  }, [reset]);
  const start = () =>
    pay.mutate({ key: intent.key() }, {
      onSuccess: ({ url }) => {
        intent.done();
        location.assign(url);
      },
      // The old key would name the old try for ever, also one whose page has ended.
      onError: () => intent.done(),
    });
  return (
    <div className="grid gap-2">
      <FormErrors errors={faultsOf(pay.error).list} title="The payment page was not opened." />
      <div>
        <Button size="large" busy={pay.isPending || pay.isSuccess} busyWords="Opening the payment page…" onClick={start}>
          {open ? `Go on paying ${formatMoney(totalCents)}` : `Pay ${formatMoney(totalCents)} by card`}
        </Button>
      </div>
      <p className="max-w-[60ch] text-14 text-ink-2">Card data is typed on the payment service’s own page, never here. You come back afterwards; billing is cleared when the payment service has confirmed it.</p>
    </div>
  );
}
