import { clsx } from "clsx";
import { type ComponentProps, type ReactNode } from "react";
import { describeField, FieldError, FieldHint, RequiredMark, type FieldProps } from "./field";

export type CheckFieldProps = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps | "type">;

/** One yes or no; the label is a sentence that is true when the box is ticked. */
export function CheckField({ label, hint, error, required, className, ...props }: CheckFieldProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <div className={clsx("min-w-0", className)}>
      <label htmlFor={described.id} className="flex min-h-11 items-start gap-3 py-2 text-15 max-sm:min-h-13 max-sm:py-3">
        <input {...props} {...described} type="checkbox" required={required} className="pick" />
        <span className="pt-px">
          {label}
          {required && <RequiredMark afterSentence />}
        </span>
      </label>
      {hint && (
        <div className="pl-9">
          <FieldHint id={described.id}>{hint}</FieldHint>
        </div>
      )}
      {error && <FieldError id={described.id}>{error}</FieldError>}
    </div>
  );
}

export type RadioChoice = { value: string; label: ReactNode; hint?: ReactNode; disabled?: boolean };

export type RadioGroupProps = FieldProps & Pick<ComponentProps<"input">, "onChange"> & {
  choices: readonly RadioChoice[];
  value?: string;
  defaultValue?: string;
  /** Side by side where they fit, for two or three short choices. */
  inline?: boolean;
};

/** One of a few, all in sight. */
export function RadioGroup({ name, label, hint, error, required, id, className, choices, value, defaultValue, inline, onChange }: RadioGroupProps) {
  const { id: own, ...described } = describeField({ id, name, hint, error });
  return (
    <fieldset id={own} tabIndex={-1} role="radiogroup" aria-required={required} {...described} className={clsx("min-w-0", className)}>
      <legend className="lab mb-1">
        {label}
        {required && <RequiredMark />}
      </legend>
      {hint && <FieldHint id={own}>{hint}</FieldHint>}
      <div className={clsx("border border-rule-strong bg-sheet", inline ? "flex flex-wrap" : "divide-y divide-rule", error && "border-2 border-oxide")}>
        {choices.map((choice) => (
          <label key={choice.value} className={clsx("flex min-h-11 items-start gap-3 px-3 py-2.5 text-15 hover:bg-manila max-sm:min-h-13 max-sm:py-3.5", inline && "grow")}>
            <input
              type="radio"
              name={name}
              value={choice.value}
              disabled={choice.disabled}
              required={required}
              className="pick"
              onChange={onChange}
              {...(value === undefined ? { defaultChecked: defaultValue === choice.value } : { checked: value === choice.value })}
            />
            <span className="pt-px">
              {choice.label}
              {choice.hint && <span className="block text-14 text-ink-2">{choice.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {error && <FieldError id={own}>{error}</FieldError>}
    </fieldset>
  );
}
