/** Messages we send; each has a template of the same name in emails/. */
export const MAIL_KINDS = ["verify-address", "sign-in-link", "reset-password", "password-changed", "invitation", "finding-posted", "finding-answered", "finding-replied", "acceptance-signed", "quote-given", "receipt", "movement", "follow-link", "arrival", "move-closed"] as const;
export type MailKind = (typeof MAIL_KINDS)[number];

/** Work that goes through the same outbox but is no mail. */
export const TASK_KINDS = ["check-photo", "check-payment"] as const;
export type TaskKind = (typeof TASK_KINDS)[number];

export const OUTBOX_KINDS = [...MAIL_KINDS, ...TASK_KINDS] as const;
export type OutboxKind = (typeof OUTBOX_KINDS)[number];

/** `taken`: a worker holds it until the lease ends; a killed worker's row is taken again, with the same Message-ID. */
export const OUTBOX_STATES = ["ready", "taken", "done", "failed"] as const;
export type OutboxState = (typeof OUTBOX_STATES)[number];
