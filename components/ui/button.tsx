import { type ComponentProps, type MouseEvent } from "react";
import { buttonClass, type ButtonSize, type ButtonVariant } from "./button-class";

export type ButtonProps = ComponentProps<"button"> & {
  variant?: ButtonVariant;
  size?: ButtonSize;
  /** While true the button keeps the focus, refuses to be pressed again and says `busyWords`. */
  busy?: boolean;
  busyWords?: string;
};

const refuse = (event: MouseEvent) => event.preventDefault();

/** Does something here; use `LinkButton` for what goes somewhere. Type is "button" unless told otherwise. */
export function Button({ variant, size, busy = false, busyWords = "Saving…", className, children, onClick, type = "button", ...props }: ButtonProps) {
  return (
    <button {...props} type={type} className={buttonClass(variant, size, className)} aria-disabled={busy || props["aria-disabled"]} aria-busy={busy || undefined} onClick={busy ? refuse : onClick}>
      {busy ? busyWords : children}
    </button>
  );
}
