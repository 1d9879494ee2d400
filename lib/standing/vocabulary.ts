/** Whether work on a case may go on. */
export const MOVE_STATES = ["open", "closed", "cancelled"] as const;
export type MoveState = (typeof MOVE_STATES)[number];

/** How far a move is, in the words that a list shows; worked out from its rows, never set by hand. */
export const STAGES = ["opening", "preparing", "inspecting", "billing", "instructing", "ready", "moving", "interchange", "placed", "restoring", "closed", "cancelled"] as const;
export type Stage = (typeof STAGES)[number];

/** What the move waits for; each belongs to one part. */
export const WAITS = [
  "invite-contractor", "name-payer", "invite-payer", "invite-carrier", "invite-receiver",
  "prepare", "sign-prep", "inspect", "answer", "look-at-answers", "accept",
  "quote", "agree", "pay", "confirm-payment", "instruct", "release", "prepare-coupled", "pull", "move-on", "take-over", "place",
  "arrival", "restore", "close",
] as const;
export type Wait = (typeof WAITS)[number];
