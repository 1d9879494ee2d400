import { clsx } from "clsx";
import { type ComponentProps, type ReactNode } from "react";
import { describeField, FieldFrame, type FieldProps } from "./field";

export type DateFieldProps = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps | "type">;

/** A day, posted as YYYY-MM-DD. */
export function DateField({ label, hint, error, required, className, ...props }: DateFieldProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className: clsx("max-w-60", className) }}>
      <input {...props} {...described} type="date" required={required} className="field-box font-mono" />
    </FieldFrame>
  );
}

export type TimeFieldProps = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps | "type"> & {
  /** The zone of the place, in words; it stands behind the time. */
  zone: ReactNode;
  /** Day and time in one control, posted as YYYY-MM-DDTHH:MM. */
  withDate?: boolean;
};

/** A time of day at a place, posted as HH:MM. */
export function TimeField({ label, hint, error, required, className, zone, withDate = false, ...props }: TimeFieldProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className: clsx(withDate ? "max-w-96" : "max-w-72", className) }}>
      <div className="flex items-stretch">
        <input {...props} {...described} type={withDate ? "datetime-local" : "time"} required={required} className={clsx("field-box min-w-0 font-mono", withDate && "max-sm:px-2! max-sm:tracking-[-0.05em]")} />
        <span className="flex items-center border border-l-0 border-rule-strong bg-manila px-3 text-14 whitespace-nowrap text-ink-2">{zone}</span>
      </div>
    </FieldFrame>
  );
}
