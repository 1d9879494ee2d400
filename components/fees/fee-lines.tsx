import { Button } from "@/components/ui/button";
import { MoneyField } from "@/components/ui/money-field";
import { SelectField } from "@/components/ui/select-field";
import { Mono } from "@/components/ui/text";
import { TextField } from "@/components/ui/text-field";
import { formatMoney, readMoney } from "@/lib/fees/money";
import { FEE_KINDS, FEE_LABELS, type FeeKind } from "@/lib/fees/vocabulary";

/** One line as typed; `row` keeps it apart from its neighbours while lines come and go. */
export type TypedLine = { row: number; kind: FeeKind | ""; description: string; amount: string };

export type FeeLinesProps = { lines: TypedLine[]; onChange: (lines: TypedLine[]) => void; onAdd: () => void; errorOf: (name: string) => string | null };

const KIND_CHOICES = FEE_KINDS.map((kind) => ({ value: kind, label: FEE_LABELS[kind] }));

/** The lines of a quote while it is written, and their sum as far as it can be read. */
export function FeeLines({ lines, onChange, onAdd, errorOf }: FeeLinesProps) {
  const change = (row: number, part: Partial<TypedLine>) => onChange(lines.map((line) => (line.row === row ? { ...line, ...part } : line)));
  const readable = lines.map((line) => readMoney(line.amount).cents);
  const total = readable.reduce<number>((sum, cents) => sum + (cents ?? 0), 0);
  const unread = lines.filter((line, at) => line.amount.trim() !== "" && readable[at] === null).length;
  return (
    <fieldset>
      <legend className="mb-2 text-17 font-[640]">Lines</legend>
      <ol className="border border-rule-strong">
        {lines.map((line, at) => (
          <li key={line.row} className="border-t border-rule px-3.5 py-3.5 first:border-t-0">
            <fieldset className="grid items-start gap-3 md:grid-cols-[12rem_minmax(0,1fr)_15rem_auto]">
              <legend className="sr-only">Line {at + 1}</legend>
              <SelectField name={`lines.${at}.kind`} label="For" blank="Choose" choices={KIND_CHOICES} required value={line.kind} error={errorOf(`lines.${at}.kind`)} onChange={(event) => change(line.row, { kind: event.target.value as TypedLine["kind"] })} />
              <TextField name={`lines.${at}.description`} label="What" required autoComplete="off" value={line.description} error={errorOf(`lines.${at}.description`)} onChange={(event) => change(line.row, { description: event.target.value })} />
              <MoneyField name={`lines.${at}.amount`} label="Amount" required value={line.amount} error={errorOf(`lines.${at}.amount`)} onChange={(event) => change(line.row, { amount: event.target.value })} />
              {lines.length > 1 && (
                <Button variant="plain" size="small" className="md:mt-6" onClick={() => onChange(lines.filter((other) => other.row !== line.row))}>
                  Remove<span className="sr-only"> line {at + 1}</span>
                </Button>
              )}
            </fieldset>
          </li>
        ))}
      </ol>
      <div className="mt-3 flex flex-wrap items-center justify-between gap-3">
        <Button variant="ghost" size="small" onClick={onAdd}>Add a line</Button>
        <p className="text-15" aria-live="polite">
          Total <Mono className="text-17 font-semibold">{formatMoney(total)}</Mono>
          {unread > 0 && <span className="text-14 text-ink-2"> without {unread === 1 ? "one amount" : `${unread} amounts`} that can’t be read yet</span>}
        </p>
      </div>
    </fieldset>
  );
}
