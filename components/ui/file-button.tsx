import { clsx } from "clsx";
import { type ComponentProps, type ReactNode } from "react";
import { buttonClass, type ButtonSize, type ButtonVariant } from "./button-class";
import { describeField, FieldError, FieldHint, type FieldProps } from "./field";

export type FileButtonProps = FieldProps & Omit<ComponentProps<"input">, keyof FieldProps | "type" | "size"> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  /** What has been chosen so far, in words: "2 photos chosen". */
  chosen?: ReactNode;
  busy?: boolean;
  busyWords?: string;
};

/** A native file input that looks like a button; with `capture="environment"` a phone opens its camera. */
export function FileButton({ label, hint, error, required, className, variant = "ghost", size, chosen, busy, busyWords = "Sending…", ...props }: FileButtonProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <div className={clsx("min-w-0", className)}>
      {hint && <FieldHint id={described.id}>{hint}</FieldHint>}
      <label
        htmlFor={described.id}
        aria-disabled={busy}
        className={buttonClass(variant, size, "relative has-[:focus-visible]:outline-3 has-[:focus-visible]:outline-offset-2 has-[:focus-visible]:outline-focus")}
      >
        {busy ? busyWords : label}
        <input {...props} {...described} type="file" required={required} disabled={busy || props.disabled} className="sr-only" />
      </label>
      {chosen && (
        <p role="status" className="mt-1.5 text-14 text-ink-2">
          {chosen}
        </p>
      )}
      {error && <FieldError id={described.id}>{error}</FieldError>}
    </div>
  );
}
