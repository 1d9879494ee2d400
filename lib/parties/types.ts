import type { SeatPart } from "@/lib/access/vocabulary";
import type { InvitationState, InvitedPart } from "./vocabulary";

/** What somebody does for a carrier; all false elsewhere. */
export type Works = { inspects: boolean; bills: boolean; dispatches: boolean };

/** `guest`: sees this move alone, until a manager of the company admits them. */
export type PartyPerson = Works & { userId: string; name: string; guest: boolean };

export type Party = {
  seatId: string;
  part: SeatPart;
  legId: string | null;
  companyId: string;
  companyName: string;
  companyMark: string | null;
  since: string;
  people: PartyPerson[];
};

export type PartyLeg = {
  legId: string; seq: number; fromPlace: string; toPlace: string;
  carrierName: string; carrierCompanyId: string | null; payerName: string | null; payerCompanyId: string | null;
};

export type InvitationView = Works & {
  invitationId: string; seatId: string; companyName: string; part: InvitedPart | "owner"; legId: string | null;
  email: string; name: string | null; invitedBy: string; createdAt: string; expiresAt: string; state: InvitationState;
};

export type FollowLinkView = { followId: string; label: string; email: string | null; madeBy: string; createdAt: string; expiresAt: string; lastUsedAt: string | null; uses: number; state: "open" | "ended" | "expired" };

/** A company that the viewer may choose by name, since they belong to it or share a move with it. */
export type KnownCompany = { companyId: string; name: string; own: boolean };

/** The people tab. Letters, links and known companies are filled for who may invite, and empty for everybody else. */
export type PeopleView = {
  mayInvite: boolean;
  open: boolean;
  legs: PartyLeg[];
  parties: Party[];
  invitations: InvitationView[];
  followLinks: FollowLinkView[];
  known: KnownCompany[];
};

/** What a letter says to whoever holds it. */
export type LetterView = Works & {
  companyName: string; part: SeatPart | null; inviterName: string; inviterCompany: string;
  unit: string; from: string; to: string; legWords: string; email: string; nameKnown: boolean;
};
