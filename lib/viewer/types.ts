/** A company that has admitted the viewer, and what the viewer does there. */
export type Membership = { companyId: string; companyName: string; manager: boolean; inspects: boolean; bills: boolean; dispatches: boolean };

/** Who is asking. Everything a query or command needs to know of the person; read anew for each request. */
export type Viewer = {
  userId: string;
  name: string;
  email: string;
  emailVerified: boolean;
  siteAdmin: boolean;
  sessionId: string | null;
  memberships: Membership[];
  /** Seats that the viewer was invited to alone, in companies that have not admitted them. */
  guestSeatIds: string[];
};

/** One try of a write: the same key twice gets the first answer. */
export type Attempt = { key: string; door: string; bodyHash: string; at: Date };
