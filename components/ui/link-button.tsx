import Link from "next/link";
import { type ComponentProps } from "react";
import { buttonClass, type ButtonSize, type ButtonVariant } from "./button-class";

/** Goes somewhere and looks like a button. */
export function LinkButton({ variant, size, className, ...props }: ComponentProps<typeof Link> & { variant?: ButtonVariant; size?: ButtonSize }) {
  return <Link {...props} className={buttonClass(variant, size, className)} />;
}

/** A link inside text. */
export function TextLink({ className, ...props }: ComponentProps<typeof Link>) {
  return <Link {...props} className={`inline-link ${className ?? ""}`} />;
}
