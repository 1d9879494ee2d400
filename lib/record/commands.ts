import "server-only";
import { desc, eq } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { record, signatures, siteLog } from "@/db/schema";
import type { EnteredFor } from "@/lib/access/types";
import type { Part } from "@/lib/access/vocabulary";
import { newId, sha256Hex } from "@/lib/ids";
import { canonicalJson, CHAIN_START, chainText } from "./canonical";
import type { RecordKind, SignatureKind } from "./vocabulary";

/** Who speaks in an entry. `userId` is null for a service. */
export type Speaker = { userId: string | null; name: string; companyId: string | null; companyName: string | null; part: Part | null };

export type NewEntry = { kind: RecordKind; detail: Record<string, unknown>; legId?: string | null; enteredFor?: EnteredFor | null };

/** Appends one entry; takes the transaction of the write it tells of. The caller holds the move's row lock, so numbers follow each other. Returns the entry's id. */
export async function appendRecord(tx: Tx, moveId: string, by: Speaker, entry: NewEntry, at: Date): Promise<string> {
  const [last] = await tx.select({ seq: record.seq, hash: record.hash }).from(record).where(eq(record.moveId, moveId)).orderBy(desc(record.seq)).limit(1);
  const row = {
    moveId, seq: (last?.seq ?? 0) + 1, kind: entry.kind,
    byUserId: by.userId, byName: by.name, byCompanyId: by.companyId, byCompanyName: by.companyName, byPart: by.part,
    legId: entry.legId ?? null, enteredFor: entry.enteredFor ?? null,
    // Through JSON once, so that what is hashed is what will be read back.
    detail: JSON.parse(JSON.stringify(entry.detail)) as Record<string, unknown>,
  };
  const previous = last?.hash ?? CHAIN_START;
  const id = newId("record");
  await tx.insert(record).values({ ...row, id, at, previous, hash: sha256Hex(chainText(previous, { ...row, at: at.toISOString() })) });
  return id;
}

export type NewSignature = { moveId: string; kind: SignatureKind; subjectId: string; userId: string; companyId: string; name: string; statement: string; rows: unknown; enteredFor?: EnteredFor | null };

/** Keeps a signature with the hash of exactly the rows that were shown. Returns its id. */
export async function keepSignature(tx: Tx, given: NewSignature, at: Date): Promise<string> {
  const { rows, enteredFor = null, ...rest } = given;
  const id = newId("signature");
  await tx.insert(signatures).values({ ...rest, id, enteredFor, rowsHash: sha256Hex(canonicalJson(rows)), at });
  return id;
}

/** Lifts a signature because what it covered has changed. */
export async function liftSignature(tx: Tx, signatureId: string, why: string, at: Date): Promise<void> {
  await tx.update(signatures).set({ liftedAt: at, liftedWhy: why }).where(eq(signatures.id, signatureId));
}

/** Appends to the log of what happened outside of any move: accounts, companies, administration. No secrets in `detail`. */
export async function appendSiteLog(tx: Pick<Tx, "insert">, entry: { kind: string; byUserId: string | null; detail: Record<string, unknown> }, at: Date): Promise<void> {
  await tx.insert(siteLog).values({ id: newId("siteLog"), ...entry, at });
}
