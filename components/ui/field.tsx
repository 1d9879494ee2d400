import { clsx } from "clsx";
import { type ReactNode } from "react";
import { fieldId } from "./field-id";

/** What every field takes besides the properties of its native control. */
export type FieldProps = {
  name: string;
  label: ReactNode;
  /** One sentence before the control: what is wanted, in which form. */
  hint?: ReactNode;
  /** The message for this field; null or undefined when there is nothing to say. */
  error?: string | null;
  required?: boolean;
  /** Only when the same name stands twice on a page. */
  id?: string;
  /** On the frame around label and control. */
  className?: string;
};

type Described = { id: string; "aria-describedby": string | undefined; "aria-invalid": true | undefined };

/** The id of the control and its ties to hint and error. */
export function describeField({ id, name, hint, error }: Pick<FieldProps, "id" | "name" | "hint" | "error">): Described {
  const own = id ?? fieldId(name);
  const parts = [hint ? `${own}-hint` : null, error ? `${own}-error` : null].filter((part) => part !== null);
  return { id: own, "aria-describedby": parts.length > 0 ? parts.join(" ") : undefined, "aria-invalid": error ? true : undefined };
}

/** The word beside the label of a field that must be filled; the control itself says so to a screen reader. */
export function RequiredMark({ afterSentence = false }: { afterSentence?: boolean }) {
  return (
    <span aria-hidden="true" className="text-ink-3">
      {afterSentence ? " (required)" : ", required"}
    </span>
  );
}

export function FieldHint({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={`${id}-hint`} className="mb-1.5 max-w-[60ch] text-14 text-ink-2">
      {children}
    </p>
  );
}

export function FieldError({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={`${id}-error`} className="mt-1.5 border-l-4 border-oxide pl-2 text-14 font-[620] text-oxide">
      {children}
    </p>
  );
}

/** Label, hint, control and error in their order. */
export function FieldFrame({ id, label, hint, error, required, className, children }: Omit<FieldProps, "id" | "name"> & { id: string; children: ReactNode }) {
  return (
    <div className={clsx("min-w-0", className)}>
      <label htmlFor={id} className="lab mb-1 block">
        {label}
        {required && <RequiredMark afterSentence={typeof label === "string" && /[.?]$/.test(label)} />}
      </label>
      {hint && <FieldHint id={id}>{hint}</FieldHint>}
      {children}
      {error && <FieldError id={id}>{error}</FieldError>}
    </div>
  );
}
