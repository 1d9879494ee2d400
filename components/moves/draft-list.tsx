"use client";

import { useMutation } from "@tanstack/react-query";
import Link from "next/link";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { discardDraft } from "@/lib/moves/options";
import type { DraftRow } from "@/lib/moves/types";
import { daysBetween } from "@/lib/moves/when";
import { routes } from "@/lib/routes";

const saved = (updatedAt: string, at: string) => {
  const days = daysBetween(updatedAt, at);
  return days === 0 ? "saved within the last day" : days === 1 ? "saved a day ago" : `saved ${days} days ago`;
};

function Discard({ draft, onClose }: { draft: DraftRow; onClose: () => void }) {
  const router = useRouter();
  const [key] = useState(() => crypto.randomUUID());
  const discard = useMutation({
    mutationFn: () => discardDraft(draft.draftId, key),
    onSuccess: () => {
      onClose();
      router.refresh();
    },
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Discard this draft?"
      actions={
        <>
          <Button variant="ghost" onClick={onClose}>
            Keep it
          </Button>
          <Button busy={discard.isPending} busyWords="Discarding…" onClick={() => discard.mutate()}>
            Discard
          </Button>
        </>
      }
    >
      <p>
        {draft.unit}, {draft.route}. What was typed into it is gone afterwards, for everybody at {draft.companyName}.
      </p>
      {discard.error && (
        <p role="alert" className="mt-3 font-[620] text-oxide">
          {discard.error.message}
        </p>
      )}
    </Dialog>
  );
}

/** Moves that are being written down and are not open yet. */
export function DraftList({ drafts, at }: { drafts: readonly DraftRow[]; at: string }) {
  const [discarding, setDiscarding] = useState<DraftRow | null>(null);
  if (drafts.length === 0) return null;
  return (
    <section aria-labelledby="drafts" className="mb-6">
      <h2 id="drafts" className="lab mb-1.5">
        Drafts, not open yet
      </h2>
      <ul className="border border-dashed border-rule-strong bg-sheet">
        {drafts.map((draft) => (
          <li key={draft.draftId} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-rule px-3.5 py-1.5 last:border-b-0">
            <Link href={routes.draft(draft.draftId)} className="inline-link inline-flex min-h-11 items-center font-[620]">
              {draft.unit}
            </Link>
            <span className="min-w-0 flex-1 text-14 text-ink-2">
              {draft.route}; {draft.companyName}, {saved(draft.updatedAt, at)}
            </span>
            <Button variant="plain" size="small" onClick={() => setDiscarding(draft)}>
              Discard<span className="sr-only"> {draft.unit}</span>
            </Button>
          </li>
        ))}
      </ul>
      {discarding && <Discard draft={discarding} onClose={() => setDiscarding(null)} />}
    </section>
  );
}
