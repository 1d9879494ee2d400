import type { EnteredFor } from "@/lib/access/types";
import type { ClearedHow, FeeKind, PaymentState, QuoteState } from "./vocabulary";

export type FeeLineView = { id: string; kind: FeeKind; description: string; amountCents: number };

/** One try to pay by card. */
export type PaymentView = {
  id: string; attempt: number; state: PaymentState; amountCents: number;
  begunBy: string; begunAt: string; expiresAt: string | null; paidAt: string | null;
  /** How often a card was declined on its page. */
  declines: number;
  /** Why a clerk should look at it, in words. */
  flags: string[];
};

export type QuoteView = {
  id: string; number: number; reference: string | null; payerName: string; state: QuoteState; totalCents: number; note: string | null;
  goodUntil: string | null;
  /** Given, and the last day to agree has passed. */
  lapsed: boolean;
  enteredFor: EnteredFor | null; givenBy: string; givenAt: string;
  agreedBy: string | null; agreedAt: string | null; voidedAt: string | null; voidedWhy: string | null;
  lines: FeeLineView[];
  payments: PaymentView[];
};

export type ClearanceView = { how: ClearedHow; note: string | null; by: string | null; enteredFor: EnteredFor | null; at: string };

/** How the viewer may take a carrier's step: as the carrier's own clerk, or entering it for a carrier that is not on board. */
export type ClerkStep = "own" | "entered" | null;

export type FeeLeg = {
  legId: string; seq: number; carrierName: string; carrierMark: string | null; fromPlace: string; toPlace: string; fromZone: string;
  payerName: string | null;
  /** Whether the named payer is a company here; a quote needs one. */
  payerSeated: boolean;
  payerIsOwner: boolean;
  cleared: ClearanceView | null;
  /** The one that stands, if any. */
  quote: QuoteView | null;
  voided: QuoteView[];
  may: { quote: ClerkStep; clear: ClerkStep; agree: boolean; pay: boolean };
};

/** The fees of a move that the viewer may see: all of them for the owner, the own leg's for payer and payee. */
export type FeesView = { moveId: string; open: boolean; legs: FeeLeg[] };

/** Where a payer stands who came back from the payment page; only what the database says. */
export type PaidView = { state: PaymentState; quoteNumber: number; carrierName: string; amountCents: number; paidAt: string | null; zone: string };
