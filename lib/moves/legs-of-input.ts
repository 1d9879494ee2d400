import type { PayerChoice } from "./draft";

type GivenLeg = { carrierName: string; carrierMark: string | null; miles: number | null; toPlace: string; toZone: string; payer: PayerChoice; payerName: string | null };
type End = { place: string; zone: string };
type Owner = { companyId: string; companyName: string };

/** Who pays a leg, as the database keeps it: the owner, another by name until it is invited, or nobody yet. */
export function payerOf({ payer, payerName }: Pick<GivenLeg, "payer" | "payerName">, owner: Owner): { payerName: string | null; payerCompanyId: string | null } {
  if (payer === "ours") return { payerName: owner.companyName, payerCompanyId: owner.companyId };
  return { payerName: payer === "other" ? payerName : null, payerCompanyId: null };
}

/** Legs in order, joined end to end from the origin to the destination. */
export function chainLegs(given: readonly GivenLeg[], origin: End, destination: End, owner: Owner) {
  return given.map((leg, at) => {
    const before = given[at - 1];
    const from = before ? { place: before.toPlace, zone: before.toZone } : origin;
    const to = at === given.length - 1 ? destination : { place: leg.toPlace, zone: leg.toZone };
    const { carrierName, carrierMark, miles } = leg;
    return { seq: at + 1, carrierName, carrierMark, miles, fromPlace: from.place, fromZone: from.zone, toPlace: to.place, toZone: to.zone, ...payerOf(leg, owner) };
  });
}
