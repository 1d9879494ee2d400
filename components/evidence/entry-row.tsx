"use client";

import { Button } from "@/components/ui/button";
import { wordsOfSending } from "@/lib/evidence/words";
import { pageQueue } from "./page-queue";
import { ProofPicture } from "./proof-picture";
import type { Entry } from "./queue";

/** The words, bar and buttons of a photo on its way. `onRemove` where more than the queue has to forget it. */
export function EntryState({ entry, onRemove }: { entry: Entry; onRemove?: () => void }) {
  const { clientId, step, percent, fault, name, onlyHere } = entry;
  const words = wordsOfSending(entry);
  const wrong = step === "refused" || step === "stopped";
  return (
    <div className="min-w-0 grow">
      <p className="truncate font-[620]">{name}</p>
      <p className={wrong ? "font-[620] text-oxide" : undefined}>{words}</p>
      {onlyHere && step !== "done" && <p>This phone has no room to keep it: leave this page open until it is sent.</p>}
      {(step === "proof" || step === "original") && <progress aria-label={words} value={percent} max={100} className="progress" />}
      <div className="flex flex-wrap gap-x-4">
        {(step === "stopped" || (step === "waiting" && fault !== null)) && (
          <Button variant="plain" size="small" onClick={() => pageQueue().retry(clientId)}>
            Try again<span className="sr-only"> to send {name}</span>
          </Button>
        )}
        <Button variant="plain" size="small" onClick={() => (onRemove ? onRemove() : pageQueue().cancel(clientId))}>
          {step === "refused" || onRemove ? "Remove" : "Cancel"}
          <span className="sr-only"> {name}</span>
        </Button>
      </div>
    </div>
  );
}

/** A photo on its way, with its own small picture. */
export function EntryRow({ entry }: { entry: Entry }) {
  return (
    <li className="flex items-start gap-3 border-b border-rule py-2 last:border-b-0">
      <ProofPicture proof={entry.proof} name={entry.name} />
      <EntryState entry={entry} />
    </li>
  );
}
