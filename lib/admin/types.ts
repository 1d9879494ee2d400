import type { OutboxKind, OutboxState } from "@/lib/outbox/vocabulary";

export type AdminCompany = { companyId: string; name: string; mark: string | null; members: number; moves: number; createdAt: string; doubled: boolean };
export type AdminPerson = { userId: string; name: string; email: string; emailVerified: boolean; siteAdmin: boolean; disabledAt: string | null; sessions: number; lastUsedAt: string | null; companies: string[] };
/** A message of the outbox without what it says: letters hold links that sign people in. */
export type AdminMail = { outboxId: string; kind: OutboxKind; to: string | null; state: OutboxState; attempts: number; lastError: string | null; createdAt: string; nextTryAt: string | null; doneAt: string | null };
