import type { EnteredFor } from "@/lib/access/types";
import type { EnteredSource } from "@/lib/access/vocabulary";
import { formatDay } from "@/lib/moves/when";

const FROM: Record<EnteredSource, string> = { paper: "from paper", "e-mail": "from e-mail", phone: "from a phone call" };

/** Says that a carrier's step was entered by somebody else, and what it came from. */
export function EnteredBy({ enteredFor, byName }: { enteredFor: EnteredFor; byName: string }) {
  const { source, heardOn, saidBy, carrierName, reference } = enteredFor;
  return (
    <p className="text-14 text-slate">
      Entered by {byName} {FROM[source]}, {formatDay(heardOn)}; said by {saidBy} of {carrierName}
      {reference && <> ({reference})</>}.
    </p>
  );
}
