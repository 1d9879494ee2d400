import { maySee, maySeeFees } from "@/lib/access/policy";
import type { HeldPart } from "@/lib/access/types";
import { audienceOf, type RecordKind } from "@/lib/record/vocabulary";
import type { Sees } from "./sentences";

/** What a named payer reads besides the entries of the leg that they pay: the way itself, and the case's beginning and end. */
const FOR_PAYERS: readonly RecordKind[] = ["move.opened", "move.cancelled", "move.closed", "unit.released", "sighting.made", "sighting.retracted", "arrival.recorded"];

type Told = { kind: RecordKind; legId: string | null };

/** Whether an entry concerns the viewer. Money is read by the owner, the leg's payer and its payee; a payer who has no other part reads their own leg only. */
export function maySeeEntry(parts: readonly HeldPart[], { kind, legId }: Told): boolean {
  if (audienceOf(kind) === "money") return legId ? maySeeFees(parts, legId) : parts.some((held) => held.part === "owner");
  if (parts.every((held) => held.part === "payer")) return FOR_PAYERS.includes(kind) || (legId !== null && parts.some((held) => held.legId === legId));
  return true;
}

/** Which particulars of an entry the viewer may read. */
export const seesOf = (parts: readonly HeldPart[], { legId }: Pick<Told, "legId">): Sees => ({
  prep: maySee(parts, "prep"),
  findings: maySee(parts, "findings"),
  unit: maySee(parts, "equipment"),
  money: legId !== null && maySeeFees(parts, legId),
});
