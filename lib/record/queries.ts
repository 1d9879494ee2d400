import "server-only";
import { and, asc, desc, eq, isNull } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { record, signatures } from "@/db/schema";
import { requireMove } from "@/lib/access/scope";
import { sha256Hex } from "@/lib/ids";
import type { Viewer } from "@/lib/viewer/types";
import { CHAIN_START, chainText } from "./canonical";
import type { SignatureKind } from "./vocabulary";

export type ChainState = { entries: number; lastHash: string; brokenAt: number | null };

/** Recomputes a move's chain: number of entries, last hash, and the first entry that does not fit (changed, missing or out of order). */
export async function verifyRecord(viewer: Viewer, moveId: string): Promise<ChainState> {
  await requireMove(viewer, moveId);
  return unsafeVerifyRecord(moveId);
}

/** Without a viewer: for checks that run by themselves. */
export async function unsafeVerifyRecord(moveId: string): Promise<ChainState> {
  const rows = await db().select().from(record).where(eq(record.moveId, moveId)).orderBy(asc(record.seq));
  let previous = CHAIN_START;
  for (const [index, { id: _id, hash, previous: said, at, ...rest }] of rows.entries()) {
    const right = sha256Hex(chainText(previous, { ...rest, enteredFor: rest.enteredFor ?? null, at: at.toISOString() }));
    if (rest.seq !== index + 1 || said !== previous || hash !== right) return { entries: rows.length, lastHash: previous, brokenAt: index + 1 };
    previous = hash;
  }
  return { entries: rows.length, lastHash: previous, brokenAt: null };
}

/** The standing signature of a kind over a subject, or null. Called by rooms that have already checked the viewer; takes their transaction or the pool. */
export async function unsafeStandingSignature(reader: Reader, moveId: string, kind: SignatureKind, subjectId: string) {
  const [row] = await reader.select({ id: signatures.id, name: signatures.name, at: signatures.at, statement: signatures.statement, rowsHash: signatures.rowsHash, enteredFor: signatures.enteredFor })
    .from(signatures)
    .where(and(eq(signatures.moveId, moveId), eq(signatures.kind, kind), eq(signatures.subjectId, subjectId), isNull(signatures.liftedAt)))
    .orderBy(desc(signatures.at)).limit(1);
  return row ?? null;
}
