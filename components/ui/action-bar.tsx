import { type ReactNode } from "react";

/** The one or two main actions of a screen: at the bottom of a phone within reach of a thumb, in the flow elsewhere. Last in its page. */
export function ActionBar({ children }: { children: ReactNode }) {
  return (
    <div
      data-action-bar=""
      className="mt-6 flex flex-wrap gap-2.5 max-sm:sticky max-sm:bottom-0 max-sm:z-10 max-sm:-mx-4 max-sm:grid max-sm:auto-cols-fr max-sm:grid-flow-col max-sm:border-t-2 max-sm:border-ink max-sm:bg-sheet max-sm:px-4 max-sm:pt-2.5 max-sm:pb-[max(14px,env(safe-area-inset-bottom))] max-sm:*:min-h-13 max-sm:*:text-17"
    >
      {children}
    </div>
  );
}
