export type MemberWorks = { manager: boolean; inspects: boolean; bills: boolean; dispatches: boolean };

/** A company of the viewer's. `asking`: guests who wait for a manager, counted for managers alone. */
export type CompanySummary = MemberWorks & { companyId: string; name: string; mark: string | null; admitted: boolean; asking: number };

/** `email` is shown to managers and to the person themselves. */
export type MemberView = MemberWorks & { userId: string; name: string; email: string | null; joinedAt: string; self: boolean };

/** Somebody another company invited to one seat; `seats` says to what. */
export type GuestView = { userId: string; name: string; email: string; joinedAt: string; seats: string[] };

export type CompanyInvitation = { invitationId: string; email: string; name: string | null; inspects: boolean; bills: boolean; dispatches: boolean; invitedBy: string; createdAt: string; expiresAt: string; expired: boolean };

/** One company for its own people. Guests and letters are filled for managers. */
export type CompanyView = {
  companyId: string; name: string; mark: string | null; phone: string | null; version: number; manages: boolean;
  members: MemberView[]; guests: GuestView[]; invitations: CompanyInvitation[];
};
