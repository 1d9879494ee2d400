import "server-only";
import { and, asc, desc, eq } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { arrivals, prepItems, signatures } from "@/db/schema";
import { denyAction, maySee } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import { unsafePhotosOf } from "@/lib/evidence/queries";
import { sha256Hex } from "@/lib/ids";
import { canonicalJson } from "@/lib/record/canonical";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Viewer } from "@/lib/viewer/types";
import { phaseWaitsFor } from "./rules";
import type { PrepItem, PrepList, PrepPhaseView } from "./types";
import { PREP_PHASES, type PrepPhase } from "./vocabulary";

/** The whole list of a move with its photos and signatures, in the order of the work. */
export async function getPrep(viewer: Viewer, moveId: string): Promise<PrepList> {
  const { move, parts } = await requireMove(viewer, moveId);
  if (!maySee(parts, "prep")) throw new AppError("not_your_part", "The prep list is not part of what you see on this move.");
  const rows = await db().select().from(prepItems).where(eq(prepItems.moveId, moveId)).orderBy(asc(prepItems.phase), asc(prepItems.order));
  const ids = rows.map((row) => row.id);
  const [photos, restorePhotos] = [await unsafePhotosOf(db(), "prep", ids), await unsafePhotosOf(db(), "restore", ids)];
  const items = rows.map((row) => itemOf(row, photos.get(row.id) ?? [], restorePhotos.get(row.id) ?? []));
  const facts = await unsafeGatherFacts(db(), moveId);
  const [arrival] = await db().select({ id: arrivals.id }).from(arrivals).where(eq(arrivals.moveId, moveId));
  const open = move.state === "open";
  const allowed = (action: "prep.do" | "restore.do" | "restore.keep" | "photo.take") => open && denyAction(parts, { action }) === null;
  return {
    items,
    phases: await Promise.all(PREP_PHASES.map((phase) => phaseView(moveId, phase, rows))),
    arrived: Boolean(arrival),
    originZone: move.originZone,
    destinationZone: move.destinationZone,
    may: { work: allowed("prep.do"), restore: allowed("restore.do"), keep: allowed("restore.keep"), photo: allowed("photo.take") },
    coupledWaitsFor: phaseWaitsFor(facts, "when-coupled"),
  };
}

type Row = typeof prepItems.$inferSelect;

function itemOf(row: Row, photos: PrepItem["photos"], restorePhotos: PrepItem["photos"]): PrepItem {
  const { moveId: _move, byUserId: _by, restoredByUserId: _restoredBy, order: _order, at, restoredAt, ...shown } = row;
  return { ...shown, at: at?.toISOString() ?? null, restoredAt: restoredAt?.toISOString() ?? null, photos, restorePhotos };
}

async function phaseView(moveId: string, phase: PrepPhase, rows: Row[]): Promise<PrepPhaseView> {
  const own = rows.filter((row) => row.phase === phase);
  const [last] = await db().select().from(signatures).where(and(eq(signatures.moveId, moveId), eq(signatures.kind, `prep-${phase}`))).orderBy(desc(signatures.at)).limit(1);
  return {
    phase, total: own.length, left: own.filter((row) => row.state === "to-do").length, rowsHash: sha256Hex(canonicalJson(signedRows(own))),
    signature: last && !last.liftedAt ? { name: last.name, at: last.at.toISOString() } : null,
    lifted: last?.liftedAt ? { why: last.liftedWhy ?? "", at: last.liftedAt.toISOString() } : null,
  };
}

/** Exactly what a signature covers: each item as it was shown. */
export function unsafeSignedRows(rows: Row[]) {
  return signedRows(rows);
}

const signedRows = (rows: Row[]) =>
  [...rows].sort((a, b) => a.order - b.order).map(({ templateId, action, state, value, tagNumber, note, skippedWhy, byName, at }) => ({ templateId, action, state, value, tagNumber, note, skippedWhy, byName, at: at?.toISOString() ?? null }));

/** No viewer: rows of one phase for the command that signs them, in its transaction. */
export async function unsafePhaseRows(reader: Reader, moveId: string, phase: PrepPhase): Promise<Row[]> {
  return reader.select().from(prepItems).where(and(eq(prepItems.moveId, moveId), eq(prepItems.phase, phase))).orderBy(asc(prepItems.order));
}
