import type { MailKind, TaskKind } from "./vocabulary";

/** News of a case: what happened, and the one thing to do now. */
export type CaseNews = { unit: string; caseNumber: string; headline: string; lines: string[]; actionLabel: string; url: string };

export type Receipt = {
  unit: string; caseNumber: string; payer: string; payee: string;
  lines: { label: string; amount: string }[]; total: string; paidOn: string; reference: string; url: string;
};

export type Invitation = { inviterName: string; inviterCompany: string; companyName: string; part: string; unit: string; from: string; to: string; url: string; goodUntil: string };

type News = "finding-posted" | "finding-answered" | "finding-replied" | "acceptance-signed" | "quote-given" | "movement" | "arrival" | "move-closed";

/** What each message needs; its template in emails/ takes just this. */
export type MailPayloads = { [K in News]: CaseNews } & {
  "verify-address": { name: string; url: string };
  "sign-in-link": { url: string };
  "reset-password": { name: string; url: string };
  "password-changed": { name: string };
  invitation: Invitation;
  receipt: Receipt;
  "follow-link": { unit: string; from: string; to: string; url: string };
};

export type TaskPayloads = { "check-photo": { photoId: string }; "check-payment": { paymentId: string } };

export type Payloads = MailPayloads & TaskPayloads;

// Compile-time proof that every kind has a payload.
export type EveryKind = { [K in MailKind]: MailPayloads[K] } & { [K in TaskKind]: TaskPayloads[K] };
