import type { LedgerAccount } from "./vocabulary";

/** One side of a money movement; the postings of a group sum to zero. */
export type Posting = { groupId: string; account: LedgerAccount; amountCents: number };

/** Money from the payer into clearing. The group is the payment itself, so that booking it twice is impossible. */
const takenIn = (paymentId: string, cents: number): Posting[] => [
  { groupId: paymentId, account: "payer", amountCents: -cents },
  { groupId: paymentId, account: "clearing", amountCents: cents },
];

/** A payment that settles a quote: from the payer into clearing, and from clearing on to the payee. */
export const postingsOfPaid = (paymentId: string, cents: number): Posting[] => [
  ...takenIn(paymentId, cents),
  { groupId: `${paymentId}.payee`, account: "clearing", amountCents: -cents },
  { groupId: `${paymentId}.payee`, account: "payee", amountCents: cents },
];

/** A payment that settles nothing stays in clearing until it is given back. */
export const postingsOfLate = takenIn;
