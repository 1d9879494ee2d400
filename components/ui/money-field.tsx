import { clsx } from "clsx";
import { type ComponentProps } from "react";
import { describeField, FieldFrame, type FieldProps } from "./field";

export type MoneyFieldProps = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps | "type"> & { currency?: string };

/** An amount in dollars and cents as typed; the server reads it into integer cents. */
export function MoneyField({ label, hint, error, required, className, currency = "USD", ...props }: MoneyFieldProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  const beside = "flex items-center border border-rule-strong bg-manila px-3 font-mono text-14 text-ink-2";
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className: clsx("max-w-72", className) }}>
      <div className="flex items-stretch">
        <span aria-hidden="true" className={clsx(beside, "border-r-0")}>
          $
        </span>
        <input {...props} {...described} type="text" inputMode="decimal" autoComplete={props.autoComplete ?? "off"} required={required} className="field-box text-right font-mono" />
        <span className={clsx(beside, "border-l-0")}>{currency}</span>
      </div>
    </FieldFrame>
  );
}
