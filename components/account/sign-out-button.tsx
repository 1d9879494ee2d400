import { type ReactNode } from "react";

/** Signs out; a plain form, so that it works without script and on every page. */
export function SignOutButton({ action, children = "Sign out", className = "inline-flex min-h-11 items-center underline underline-offset-4 hover:text-bar-ink" }: { action: () => Promise<void>; children?: ReactNode; className?: string }) {
  return (
    <form action={action}>
      <button type="submit" className={className}>{children}</button>
    </form>
  );
}
