export const FEE_KINDS = ["inspection", "line-haul", "switching", "special-handling", "fuel", "correction", "storage", "other"] as const;
export type FeeKind = (typeof FEE_KINDS)[number];

export const FEE_LABELS: Record<FeeKind, string> = {
  inspection: "Inspection",
  "line-haul": "Line haul",
  switching: "Switching",
  "special-handling": "Special handling",
  fuel: "Fuel",
  correction: "Correction",
  storage: "Storage",
  other: "Other",
};

export const QUOTE_STATES = ["given", "agreed", "paid", "voided"] as const;
export type QuoteState = (typeof QUOTE_STATES)[number];

/** `begun` before the payment service answered; `open` while its page waits for the payer; `late` paid after another payment had settled the quote, for a clerk to refund. */
export const PAYMENT_STATES = ["begun", "open", "paid", "failed", "expired", "late"] as const;
export type PaymentState = (typeof PAYMENT_STATES)[number];

/** Accounts of a move's ledger; every posting group sums to zero. */
export const LEDGER_ACCOUNTS = ["payer", "payee", "clearing", "refunds"] as const;
export type LedgerAccount = (typeof LEDGER_ACCOUNTS)[number];

export const CLEARED_HOW = ["paid", "credit-agreed"] as const;
export type ClearedHow = (typeof CLEARED_HOW)[number];
