import { CheckField } from "@/components/ui/check-field";

export type WorksValue = { inspects: boolean; bills: boolean; dispatches: boolean };
export const NO_WORKS: WorksValue = { inspects: false, bills: false, dispatches: false };

const WORKS = [["inspects", "Inspects the unit and signs acceptances"], ["bills", "Quotes, bills and clears money"], ["dispatches", "Gives movement instructions and records the way"]] as const;

type WorksFieldsProps = { value: WorksValue; onChange: (value: WorksValue) => void; idPrefix?: string; legend?: string; hint?: string; error?: string | null };

/** What somebody does for a carrier; one or several. */
export function WorksFields({ value, onChange, idPrefix = "works", legend = "Work for a carrier", hint, error }: WorksFieldsProps) {
  return (
    <fieldset className="min-w-0" id={`field-${idPrefix}`} tabIndex={-1} aria-describedby={error ? `${idPrefix}-error` : undefined}>
      <legend className="lab mb-1">{legend}</legend>
      {hint && <p className="mb-1 max-w-[60ch] text-14 text-ink-2">{hint}</p>}
      {WORKS.map(([key, label]) => (
        <CheckField key={key} id={`${idPrefix}-${key}`} name={key} label={label} checked={value[key]} onChange={(event) => onChange({ ...value, [key]: event.target.checked })} />
      ))}
      {error && <p id={`${idPrefix}-error`} className="mt-1.5 border-l-4 border-oxide pl-2 text-14 font-[620] text-oxide">{error}</p>}
    </fieldset>
  );
}
