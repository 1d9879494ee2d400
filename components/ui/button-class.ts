import { clsx } from "clsx";

export type ButtonVariant = "solid" | "ghost" | "plain";
export type ButtonSize = "small" | "regular" | "large";

const VARIANTS: Record<ButtonVariant, string> = {
  solid: "border-ink bg-ink text-on-ink hover:border-ink-2 hover:bg-ink-2",
  ghost: "border-ink bg-transparent text-ink hover:bg-manila",
  plain: "border-transparent bg-transparent text-ink underline decoration-1 underline-offset-4 hover:decoration-2",
};

const SIZES: Record<ButtonSize, string> = {
  small: "min-h-9 px-3 text-14 max-sm:min-h-11 pointer-coarse:min-h-11",
  regular: "min-h-11 px-4 text-15",
  large: "min-h-13 px-5 text-17",
};

/** One look for everything that is pressed, whether it is a button, a link or the label of a file input. */
export function buttonClass(variant: ButtonVariant = "solid", size: ButtonSize = "regular", className?: string): string {
  return clsx(
    "inline-flex items-center justify-center gap-2 rounded border-[1.5px] py-1.5 text-center font-[620] leading-tight",
    "aria-disabled:opacity-65 disabled:opacity-65",
    VARIANTS[variant],
    SIZES[size],
    variant === "plain" && "px-1!",
    className,
  );
}
