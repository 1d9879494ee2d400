import { clsx } from "clsx";
import { type ComponentProps } from "react";
import { describeField, FieldFrame, type FieldProps } from "./field";

export type TextFieldProps = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps> & {
  /** For marks, numbers, codes and measurements. */
  mono?: boolean;
};

/** One line of text; `type` may be email, tel, search, password or url, `inputMode` picks the phone's keyboard. */
export function TextField({ label, hint, error, required, className, mono, type = "text", ...props }: TextFieldProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className }}>
      <input {...props} {...described} type={type} required={required} className={clsx("field-box", mono && "font-mono")} />
    </FieldFrame>
  );
}

export type TextAreaProps = FieldProps & Omit<ComponentProps<"textarea">, keyof FieldProps>;

/** Several lines of text. */
export function TextArea({ label, hint, error, required, className, rows = 4, ...props }: TextAreaProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className }}>
      <textarea {...props} {...described} rows={rows} required={required} className="field-box field-sizing-content resize-y" />
    </FieldFrame>
  );
}
