import "server-only";
import { and, asc, eq, gt, isNull } from "drizzle-orm";
import { db } from "@/db/client";
import { equipment, followLinks, moves, record, waits } from "@/db/schema";
import { maySee } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import { AppError } from "@/lib/errors";
import { sha256Hex } from "@/lib/ids";
import { STAGE_LABELS } from "@/lib/moves/stages";
import { AXLES, BODY_SHAPES } from "@/lib/moves/vocabulary";
import { verifyRecord } from "@/lib/record/queries";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Viewer } from "@/lib/viewer/types";
import { assemble } from "./assemble";
import { whereDaysWent, type Waited } from "./days";
import { followDays } from "./follow";
import type { FollowView, RawEntry, Timeline } from "./types";

const columns = { id: record.id, seq: record.seq, kind: record.kind, byName: record.byName, byCompanyName: record.byCompanyName, byPart: record.byPart, legId: record.legId, enteredFor: record.enteredFor, detail: record.detail, at: record.at };

async function entriesOf(moveId: string): Promise<RawEntry[]> {
  const rows = await db().select(columns).from(record).where(eq(record.moveId, moveId)).orderBy(asc(record.seq));
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
}

async function waitsOf(moveId: string): Promise<Waited[]> {
  const rows = await db().select({ part: waits.part, name: waits.name, since: waits.since, until: waits.until }).from(waits).where(eq(waits.moveId, moveId)).orderBy(asc(waits.since));
  return rows.map((row) => ({ ...row, since: row.since.toISOString(), until: row.until?.toISOString() ?? null }));
}

async function headOf(moveId: string) {
  const [row] = await db().select({ state: moves.state, stage: moves.stage, caseNumber: moves.caseNumber, openedAt: moves.openedAt, closedAt: moves.closedAt, cancelledAt: moves.cancelledAt,
    originName: moves.originName, originPlace: moves.originPlace, originZone: moves.originZone, destinationName: moves.destinationName, destinationPlace: moves.destinationPlace,
    wantedFrom: moves.wantedFrom, wantedTo: moves.wantedTo, progressMil: moves.progressMil, mark: equipment.mark, number: equipment.number, shape: equipment.shape, axles: equipment.axles })
    .from(moves).innerJoin(equipment, eq(equipment.moveId, moves.id)).where(eq(moves.id, moveId));
  if (!row) throw new AppError("not_found", "No such move.");
  return row;
}

/** What happened on a move, the newest day first, as far as it concerns the viewer; the latest `show` entries. */
export async function getTimeline(viewer: Viewer, moveId: string, show: number, now = new Date()): Promise<Timeline> {
  const { parts } = await requireMove(viewer, moveId);
  if (!maySee(parts, "timeline")) throw new AppError("not_your_part", "The timeline is not part of what you see on this move.");
  const head = await headOf(moveId);
  const waited = await waitsOf(moveId);
  const at = now.toISOString();
  const openedAt = head.openedAt.toISOString();
  const open = head.state === "open";
  const lines = assemble({ moveId, parts, originZone: head.originZone, entries: await entriesOf(moveId), waits: waited, now: at, open, show });
  const { entries, brokenAt } = await verifyRecord(viewer, moveId);
  return {
    ...lines,
    unit: `${head.mark} ${head.number}`,
    openedAt,
    originZone: head.originZone,
    days: whereDaysWent(waited, openedAt, (head.closedAt ?? head.cancelledAt)?.toISOString() ?? at),
    chain: { entries, brokenAt },
    at,
  };
}

const TOKEN = /^[\w-]{16,64}$/;

/** No viewer: whoever holds the link is a notify party. Null alike for a link that never was, was ended, or has run out. */
export async function unsafeFollow(token: string, now: Date): Promise<{ followId: string; lastUsedAt: Date | null; view: FollowView } | null> {
  if (!TOKEN.test(token)) return null;
  const [link] = await db().select({ id: followLinks.id, moveId: followLinks.moveId, expiresAt: followLinks.expiresAt, lastUsedAt: followLinks.lastUsedAt }).from(followLinks)
    .where(and(eq(followLinks.tokenHash, sha256Hex(token)), isNull(followLinks.revokedAt), gt(followLinks.expiresAt, now)));
  if (!link) return null;
  const head = await headOf(link.moveId);
  const facts = await unsafeGatherFacts(db(), link.moveId);
  return {
    followId: link.id,
    lastUsedAt: link.lastUsedAt,
    view: {
      unit: { mark: head.mark, number: head.number, shape: BODY_SHAPES.find((one) => one === head.shape) ?? "hood", axles: AXLES.find((one) => one === head.axles) ?? 6 },
      caseNumber: head.caseNumber,
      from: { name: head.originName, place: head.originPlace },
      to: { name: head.destinationName, place: head.destinationPlace },
      wantedFrom: head.wantedFrom,
      wantedTo: head.wantedTo,
      stage: STAGE_LABELS[head.stage],
      progressMil: head.progressMil,
      handings: facts.legs.map((leg) => ({ id: leg.legId, carrier: leg.carrierName, mark: leg.carrierMark, from: leg.fromPlace, takenOver: leg.takenOver, miles: leg.miles })),
      days: followDays(await entriesOf(link.moveId), head.originZone),
      goodUntil: link.expiresAt.toISOString(),
      originZone: head.originZone,
      at: now.toISOString(),
    },
  };
}
