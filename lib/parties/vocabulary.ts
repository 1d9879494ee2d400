/** Parts that an owner can invite somebody to; the owner's own comes with the move. */
export const INVITED_PARTS = ["contractor", "carrier", "receiver", "payer"] as const;
export type InvitedPart = (typeof INVITED_PARTS)[number];

/** What became of a letter of invitation. */
export const INVITATION_STATES = ["open", "used", "expired", "revoked"] as const;
export type InvitationState = (typeof INVITATION_STATES)[number];

export const INVITATION_DAYS = 14;
export const FOLLOW_DAYS = 90;

/** Said of every letter that opens nothing any more, whatever the reason, so that a found one tells nothing. */
export const INVITATION_OVER = "This invitation can’t be used any more.";

export const ADDRESS_WANTED = "Enter the address that the invitation goes to.";
export const WORK_WANTED = "Choose what this person does for the carrier.";
