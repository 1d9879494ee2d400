"use client";

import { useMutation } from "@tanstack/react-query";
import { clearMutation, voidMutation } from "@/lib/fees/options";
import type { ClerkStep, QuoteView } from "@/lib/fees/types";
import { ReasonDialog } from "./reason-dialog";

/** Takes a quote back, with the reason. */
export function VoidStep({ moveId, quote, carrierName, step }: { moveId: string; quote: QuoteView; carrierName: string; step: ClerkStep }) {
  const act = useMutation(voidMutation(moveId, quote.id));
  return (
    <ReasonDialog
      opener={`Void quote ${quote.number}…`}
      title={`Void quote ${quote.number}`}
      lead="The quote stays readable, struck out of the way. A payment page that is open for it is ended. Another quote can be given afterwards."
      name="why"
      label="Why it is voided"
      confirm="Void the quote"
      step={step}
      carrierName={carrierName}
      pending={act.isPending}
      error={act.error}
      onConfirm={({ text, enteredFor, key }, done) => act.mutate({ key, body: { why: text, enteredFor } }, { onSuccess: done })}
    />
  );
}

/** Says that the carrier gives credit: the other way to clear billing. */
export function CreditStep({ moveId, legId, carrierName, step }: { moveId: string; legId: string; carrierName: string; step: ClerkStep }) {
  const act = useMutation(clearMutation(moveId));
  return (
    <ReasonDialog
      opener="Credit agreed…"
      title="Credit agreed"
      lead={`${carrierName} bills the payer later, on credit: billing is cleared for this leg without a payment here. Other parties see that it is met, not what was agreed.`}
      name="note"
      label="What was agreed"
      hint="Such as the credit account or the letter."
      confirm="Clear billing"
      step={step}
      carrierName={carrierName}
      pending={act.isPending}
      error={act.error}
      onConfirm={({ text, enteredFor, key }, done) => act.mutate({ key, body: { legId, note: text, enteredFor } }, { onSuccess: done })}
    />
  );
}
