import { SEAT_PARTS } from "@/lib/access/vocabulary";
import type { Party, PartyLeg, PeopleView } from "./types";

/** A line of the people tab: a seated company, or a part that nobody holds yet. */
export type PartyRow = { key: string; party: Party } | { key: string; missing: "contractor" | "carrier" | "receiver" | "payer"; leg: PartyLeg | null };

type MissingPart = Extract<PartyRow, { missing: string }>["missing"];

/** Companies in the order of parts and legs, each missing part where it would stand. Who pays for a leg is missing only when nobody is named, or the named one is neither seated nor the owner. */
export function partyRows({ parties, legs }: Pick<PeopleView, "parties" | "legs">): PartyRow[] {
  const has = (part: Party["part"], legId: string | null = null) => parties.some((one) => one.part === part && one.legId === legId);
  const ownerId = parties.find((one) => one.part === "owner")?.companyId;
  const gap = (missing: MissingPart, leg: PartyLeg | null = null): PartyRow => ({ key: `${missing} ${leg?.legId ?? ""}`.trim(), missing, leg });
  const rows: PartyRow[] = [
    ...parties.map((party): PartyRow => ({ key: party.seatId, party })),
    ...(has("contractor") ? [] : [gap("contractor")]),
    ...legs.filter((leg) => !has("carrier", leg.legId)).map((leg) => gap("carrier", leg)),
    ...(has("receiver") ? [] : [gap("receiver")]),
    ...legs.filter((leg) => !has("payer", leg.legId) && (leg.payerCompanyId === null || leg.payerCompanyId !== ownerId)).map((leg) => gap("payer", leg)),
  ];
  const place = (row: PartyRow) => {
    const [part, legId] = "party" in row ? [row.party.part, row.party.legId] : [row.missing, row.leg?.legId ?? null];
    return SEAT_PARTS.indexOf(part) * 1000 + (legs.find((leg) => leg.legId === legId)?.seq ?? 0);
  };
  return rows.sort((one, two) => place(one) - place(two));
}

/** What a missing part says: how things go on without it, and who it would be. */
export function missingWords(row: Extract<PartyRow, { missing: string }>): { title: string; words: string } {
  if (row.missing === "contractor") return { title: "Nobody yet", words: "The contractor prepares the unit where it stands. Nothing begins without one." };
  if (row.missing === "receiver") return { title: "Nobody yet", words: "The receiver looks the unit over at arrival and puts it back to work. There is time until it is under way." };
  if (row.missing === "payer") return row.leg?.payerName ? { title: row.leg.payerName, words: "Named, not seated. A payer sees and pays the fees of this leg alone." } : { title: "Nobody named", words: "The carrier of this leg can’t quote before its payer is named." };
  return { title: row.leg?.carrierName ?? "", words: "By name only. Owner and contractor enter its steps from paper, e-mail or phone; they are shown as entered for it, never as its signature." };
}
