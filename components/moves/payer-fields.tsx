"use client";

import { RadioGroup } from "@/components/ui/check-field";
import { TextField } from "@/components/ui/text-field";
import { PAYER_CHOICES, type PayerChoice } from "@/lib/moves/draft";

export type PayerFieldsProps = {
  /** Before the names of the two fields: "legs.1.", or nothing. */
  path: string;
  /** Who "our company" is. */
  ownerName: string;
  payer: PayerChoice;
  payerName: string;
  onChange: (changed: { payer?: PayerChoice; payerName?: string }) => void;
  errorOf: (path: string) => string | null;
};

/** Who pays a carrier for its leg. */
export function PayerFields({ path, ownerName, payer, payerName, onChange, errorOf }: PayerFieldsProps) {
  return (
    <div className="grid gap-3">
      <RadioGroup
        name={`${path}payer`}
        label="Who pays this carrier"
        value={payer}
        error={errorOf(`${path}payer`)}
        choices={[
          { value: "unnamed", label: "Not yet named", hint: "A carrier bills the owner where no payer is named." },
          { value: "ours", label: `Our company: ${ownerName}` },
          { value: "other", label: "Another company", hint: "It is invited later and agrees to the charges itself." },
        ]}
        onChange={(event) => onChange({ payer: PAYER_CHOICES.find((choice) => choice === event.target.value) ?? "unnamed" })}
      />
      {payer === "other" && <TextField name={`${path}payerName`} label="Name of the company that pays" required autoComplete="organization" value={payerName} onChange={(event) => onChange({ payerName: event.target.value })} error={errorOf(`${path}payerName`)} />}
    </div>
  );
}
