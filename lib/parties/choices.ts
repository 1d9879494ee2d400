import type { PeopleView } from "./types";
import type { InvitedPart } from "./vocabulary";

export type SlotChoice = { value: string; label: string; part: InvitedPart; legId: string; companyId: string; companyName: string };

/** What somebody can be invited to, with the company that holds it or is named for it already. */
export function slotsOf({ legs, parties, known }: Pick<PeopleView, "legs" | "parties" | "known">): SlotChoice[] {
  const seat = (part: InvitedPart, legId: string | null) => parties.find((one) => one.part === part && one.legId === legId);
  const slot = (part: InvitedPart, label: string, legId = "", named = "") => {
    const there = seat(part, legId || null);
    const listed = known.find((one) => one.name === named);
    return { value: `${part} ${legId}`.trim(), label, part, legId, companyId: there?.companyId ?? listed?.companyId ?? "", companyName: there || listed ? "" : named };
  };
  return [
    slot("contractor", "Contractor"),
    ...legs.map((leg) => slot("carrier", `Carrier of leg ${leg.seq}: ${leg.carrierName}`, leg.legId, leg.carrierName)),
    slot("receiver", "Receiver"),
    ...legs.map((leg) => slot("payer", `Payer of leg ${leg.seq}, ${leg.fromPlace} to ${leg.toPlace}`, leg.legId, leg.payerName ?? "")),
  ];
}
