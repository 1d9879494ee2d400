"use client";

import { type ReactNode } from "react";
import { forgetDrafts } from "@/components/access/drafts";

/** Signs out; a plain form, so that it works without script and on every page. Where there is script, what was typed and not sent goes too. */
export function SignOutButton({ action, children = "Sign out", className = "inline-flex min-h-11 items-center underline underline-offset-4 hover:text-bar-ink" }: { action: () => Promise<void>; children?: ReactNode; className?: string }) {
  return (
    <form action={action} onSubmit={forgetDrafts}>
      <button type="submit" className={className}>{children}</button>
    </form>
  );
}
