import type { SeatPart } from "@/lib/access/vocabulary";
import type { Denial } from "@/lib/errors";
import type { LegFacts } from "@/lib/standing/types";
import type { Works } from "./types";
import type { InvitationState } from "./vocabulary";

type Letter = { acceptedAt: Date | null; revokedAt: Date | null; expiresAt: Date };

export function invitationState({ acceptedAt, revokedAt, expiresAt }: Letter, now: Date): InvitationState {
  if (acceptedAt) return "used";
  if (revokedAt) return "revoked";
  return expiresAt <= now ? "expired" : "open";
}

type Joining = {
  /** Whether anybody belongs to the company yet. */
  hasMembers: boolean;
  /** Whether the person who invited manages the company, now, at joining. */
  inviterManages: boolean;
  /** How the joiner stands in it so far. */
  standing: "none" | "guest" | "member";
};

/** How somebody comes into a company by an invitation. The first becomes its manager; whom a manager invites is admitted; whom another company invites is a guest of the one seat, until a manager admits them. A member stays one. */
export function joinAs({ hasMembers, inviterManages, standing }: Joining): "manager" | "member" | "guest" | "as-is" {
  if (standing === "member") return inviterManages ? "member" : "as-is";
  if (!hasMembers) return "manager";
  return inviterManages ? "member" : "guest";
}

/** The thing that waits for somebody who has just joined. */
export function landingOf(part: SeatPart | null, works: Works): "moves" | "case" | "prep" | "findings" | "fees" | "movement" {
  if (part === null) return "moves";
  if (part === "contractor") return "prep";
  if (part === "payer") return "fees";
  if (part !== "carrier") return "case";
  if (works.inspects) return "findings";
  if (works.bills) return "fees";
  return works.dispatches ? "movement" : "case";
}

const notYet = (message: string): Denial => ({ code: "not_yet", message });

/** What a party has signed or agreed stays under its name, so its seat stays too. */
export function denyRemoval(part: SeatPart, leg: LegFacts | null): Denial | null {
  if (part === "owner") return notYet("The owner’s own seat stays for as long as the move does.");
  if (part === "carrier" && leg?.accepted) return notYet(`${leg.carrierName} has accepted the unit for this leg. The acceptance has to be withdrawn first.`);
  if (part === "carrier" && (leg?.takenOver || leg?.instructed)) return notYet(`${leg.carrierName} has given its instruction or taken the unit over; it stays on this leg.`);
  if (part === "payer" && (leg?.quote === "agreed" || leg?.quote === "paid" || leg?.paymentOpen)) return notYet("The charges of this leg are agreed or paid; its payer stays.");
  return null;
}

type Taken = { companyId: string; companyName: string; part: SeatPart; legId: string | null };

/** One company to a part, and on a leg: another one can come only after the first has been taken off. A payer is only a name until the charges are agreed. */
export function denySeating(wanted: { part: SeatPart; legId: string | null; companyId: string | null }, seats: readonly Taken[], leg: LegFacts | null): Denial | null {
  const there = seats.find((seat) => seat.part === wanted.part && seat.legId === wanted.legId);
  if (there && there.companyId === wanted.companyId) return null;
  if (wanted.part === "payer") {
    return leg && (leg.quote === "agreed" || leg.quote === "paid" || leg.paymentOpen || leg.billingCleared) ? notYet("The charges of this leg are agreed or paid; its payer stays.") : null;
  }
  if (there) return notYet(`${there.companyName} has this part. Take that company off the move first, or choose it to invite another of its people.`);
  if (wanted.part === "carrier" && leg?.takenOver) return notYet("This leg’s carrier has taken the unit over already.");
  return null;
}
