"use client";

import { usePathname } from "next/navigation";
import { type ReactNode } from "react";

/** The menu of a phone's bar: native, and closed again on the page that it led to. */
export function PhoneMenu({ children }: { children: ReactNode }) {
  return (
    <details key={usePathname()} className="sm:hidden">
      <summary className="flex h-13 items-center px-1 text-15 font-[620] underline-offset-4 [details[open]>&]:underline">Menu</summary>
      <div className="absolute inset-x-0 top-full z-20 border-t border-bar-ink-2/40 border-b-bar-line bg-bar px-4 pt-1 pb-4 max-sm:border-b-4">{children}</div>
    </details>
  );
}
