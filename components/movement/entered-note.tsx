import { EnteredBy } from "@/components/access/entered-by";
import type { EnteredFor } from "@/lib/access/types";

/** Who said it, and what follows in the same line. What was entered for a carrier is never shown as the carrier's own word. */
export function SaidBy({ by, enteredFor, more }: { by: string; enteredFor: EnteredFor | null; more?: string }) {
  if (!enteredFor) return <p className="text-14 text-ink-2">{[by, more].filter(Boolean).join(", ")}</p>;
  return (
    <>
      <EnteredBy enteredFor={enteredFor} byName={by} />
      {more && <p className="text-14 text-ink-2">{more.charAt(0).toUpperCase() + more.slice(1)}</p>}
    </>
  );
}
