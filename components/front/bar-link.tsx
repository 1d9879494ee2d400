import Link from "next/link";
import { type ComponentProps } from "react";

/** A link in the bar of a page before sign-in. */
export function BarLink(props: ComponentProps<typeof Link>) {
  return <Link {...props} className="inline-flex min-h-11 items-center text-bar-ink underline-offset-4 hover:underline" />;
}
