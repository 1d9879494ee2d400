"use client";

import { useEffect } from "react";
import { Disclosure } from "@/components/ui/disclosure";
import { wordsOfQueue } from "@/lib/evidence/words";
import { EntryRow } from "./entry-row";
import { pageQueue, useEntries } from "./page-queue";

/** Keeps sending the photos of one person while they move between the pages of a case, takes up what an earlier visit left unsent, and says how far it is. */
export function UploadQueue({ userId }: { userId: string }) {
  const entries = useEntries();
  const words = wordsOfQueue(entries);
  const unsent = words !== null;
  // A refused file is shown by the field that it was chosen in.
  const shown = entries.filter(({ step, field }) => step !== "done" && (step !== "refused" || field === null));

  useEffect(() => {
    void pageQueue().openFor(userId);
    const again = () => pageQueue().retry();
    window.addEventListener("online", again);
    return () => window.removeEventListener("online", again);
  }, [userId]);

  useEffect(() => {
    if (!unsent) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [unsent]);

  if (shown.length === 0) return null;
  return (
    <section aria-label="Photos on their way" className="mx-auto w-full max-w-[1240px] px-4 pt-4 text-14 sm:px-8 print:hidden">
      <Disclosure summary={words ?? "Some photos were not taken"} className="border-y-0 border-l-[5px] border-slate bg-slate-wash px-3.5">
        <ul>
          {shown.map((entry) => (
            <EntryRow key={entry.clientId} entry={entry} />
          ))}
        </ul>
      </Disclosure>
    </section>
  );
}
