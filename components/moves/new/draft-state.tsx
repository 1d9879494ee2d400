"use client";

import { Button } from "@/components/ui/button";
import type { SaveStatus } from "../draft-saver";

const clock = (iso: string) => new Date(iso).toLocaleTimeString("en-US", { hour: "2-digit", minute: "2-digit", hourCycle: "h23" });

function words(status: SaveStatus): string {
  switch (status.kind) {
    case "new":
      return "Kept as a draft as soon as you type.";
    case "unsent":
      return "Not kept yet.";
    case "saving":
      return "Saving…";
    case "saved":
      return `Saved ${clock(status.at)}.`;
    case "failed":
      return `Not saved. ${status.message}${status.again ? " It is tried again by itself." : ""}`;
    case "gone":
      return "Not saved: somebody of your company opened or discarded this draft meanwhile. Everything that you typed is still on this page.";
    case "conflict":
      return "Not saved: somebody else saved this draft too. Choose below what shall stand.";
  }
}

/** How keeping the draft stands, in words; by the reader's own clock. */
export function DraftState({ status, onKeepAnew }: { status: SaveStatus; onKeepAnew: () => void }) {
  const bad = status.kind === "failed" || status.kind === "conflict" || status.kind === "gone";
  return (
    <div className="sticky top-0 z-10 -my-2 flex flex-wrap items-center gap-3 border-b border-rule bg-card py-2">
      <p role="status" suppressHydrationWarning className={bad ? "text-14 font-[620] text-oxide" : "text-14 text-ink-2"}>
        {words(status)}
      </p>
      {status.kind === "gone" && (
        <Button variant="ghost" size="small" onClick={onKeepAnew}>
          Keep it as a new draft
        </Button>
      )}
    </div>
  );
}
