import "server-only";
import { and, asc, eq, inArray, isNull, or } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { companies, companyMembers, invitations, legs, moveDrafts, moves, moveSeats, seatPeople } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { appendSiteLog } from "@/lib/record/commands";
import { refreshStanding, write } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { MergeCompanies } from "../input";
import { requireSiteAdmin } from "../queries";
import { mergedMember } from "../rules";

type Pair = { keepId: string; goneId: string };

/** Makes one company of two: people, seats, legs, drafts and letters of the one that goes pass to the one that is kept. What was signed, quoted and recorded keeps the name under which it happened. */
export async function mergeCompanies(viewer: Viewer, pair: MergeCompanies, attempt: Attempt) {
  requireSiteAdmin(viewer);
  // Merging a company of one's own would open the other one's cases to oneself.
  if (viewer.memberships.some(({ companyId }) => companyId === pair.keepId || companyId === pair.goneId)) throw new AppError("not_your_part", "You belong to one of these companies. Another administrator merges them.");
  return write(viewer, attempt, async (tx) => {
    // Moves first, as every other write does, then companies; each in the order of ids, so that two merges never wait for each other.
    const moveIds = await movesOf(tx, pair);
    if (moveIds.length > 0) await tx.select({ id: moves.id }).from(moves).where(inArray(moves.id, moveIds)).orderBy(asc(moves.id)).for("update");
    const [keep, gone] = await lockPair(tx, pair);
    await moveMembers(tx, pair, attempt.at);
    await moveSeatsOver(tx, pair, attempt.at);
    await tx.update(legs).set({ carrierCompanyId: pair.keepId }).where(eq(legs.carrierCompanyId, pair.goneId));
    await tx.update(legs).set({ payerCompanyId: pair.keepId }).where(eq(legs.payerCompanyId, pair.goneId));
    await tx.update(moves).set({ ownerCompanyId: pair.keepId }).where(eq(moves.ownerCompanyId, pair.goneId));
    await tx.update(moveDrafts).set({ companyId: pair.keepId }).where(eq(moveDrafts.companyId, pair.goneId));
    await tx.update(invitations).set({ companyId: pair.keepId }).where(eq(invitations.companyId, pair.goneId));
    await tx.update(companies).set({ mergedIntoId: pair.keepId, version: gone.version + 1 }).where(eq(companies.id, pair.goneId));
    await tx.update(companies).set({ mergedIntoId: pair.keepId }).where(eq(companies.mergedIntoId, pair.goneId));
    await tx.update(companies).set({ mark: keep.mark ?? gone.mark, phone: keep.phone ?? gone.phone, payeeAccount: keep.payeeAccount ?? gone.payeeAccount, version: keep.version + 1 }).where(eq(companies.id, pair.keepId));
    for (const moveId of moveIds) await refreshStanding(tx, moveId, attempt.at);
    await appendSiteLog(tx, { kind: "company.merged", byUserId: viewer.userId, detail: { keepId: pair.keepId, keep: keep.name, goneId: pair.goneId, gone: gone.name, moves: moveIds.length } }, attempt.at);
    return { companyId: pair.keepId, moves: moveIds.length };
  });
}

async function movesOf(tx: Tx, { goneId }: Pair): Promise<string[]> {
  const seated = await tx.selectDistinct({ id: moveSeats.moveId }).from(moveSeats).where(eq(moveSeats.companyId, goneId));
  const named = await tx.selectDistinct({ id: legs.moveId }).from(legs).where(or(eq(legs.carrierCompanyId, goneId), eq(legs.payerCompanyId, goneId)));
  const owned = await tx.select({ id: moves.id }).from(moves).where(eq(moves.ownerCompanyId, goneId));
  return [...new Set([...seated, ...named, ...owned].map((row) => row.id))].sort();
}

async function lockPair(tx: Tx, { keepId, goneId }: Pair) {
  const rows = await tx.select().from(companies).where(and(inArray(companies.id, [keepId, goneId]), isNull(companies.mergedIntoId))).orderBy(asc(companies.id)).for("update");
  const keep = rows.find((row) => row.id === keepId);
  const gone = rows.find((row) => row.id === goneId);
  if (!keep || !gone) throw new AppError("not_found", "One of the two companies is not there any more; it may have been merged already.");
  return [keep, gone] as const;
}

async function moveMembers(tx: Tx, { keepId, goneId }: Pair, at: Date) {
  const rows = await tx.select().from(companyMembers).where(inArray(companyMembers.companyId, [keepId, goneId])).for("update");
  for (const gone of rows.filter((row) => row.companyId === goneId)) {
    const { manager, inspects, bills, dispatches, joinedAt, admittedAt, removedAt } = mergedMember(rows.find((row) => row.companyId === keepId && row.userId === gone.userId), gone);
    const row = { manager, inspects, bills, dispatches, joinedAt, admittedAt, removedAt };
    await tx.insert(companyMembers).values({ companyId: keepId, userId: gone.userId, ...row }).onDuplicateKeyUpdate({ set: row });
  }
  await tx.update(companyMembers).set({ removedAt: at }).where(and(eq(companyMembers.companyId, goneId), isNull(companyMembers.removedAt)));
}

/** A seat that both hold becomes the kept company's, with the guests and letters of both. */
async function moveSeatsOver(tx: Tx, { keepId, goneId }: Pair, at: Date) {
  const rows = await tx.select().from(moveSeats).where(inArray(moveSeats.companyId, [keepId, goneId])).for("update");
  for (const gone of rows.filter((row) => row.companyId === goneId)) {
    const twin = rows.find((row) => row.companyId === keepId && row.moveId === gone.moveId && row.part === gone.part && row.legKey === gone.legKey);
    if (!twin) {
      await tx.update(moveSeats).set({ companyId: keepId }).where(eq(moveSeats.id, gone.id));
      continue;
    }
    if (!gone.removedAt && twin.removedAt) await tx.update(moveSeats).set({ removedAt: null }).where(eq(moveSeats.id, twin.id));
    await tx.update(moveSeats).set({ removedAt: gone.removedAt ?? at }).where(eq(moveSeats.id, gone.id));
    await tx.update(invitations).set({ seatId: twin.id }).where(eq(invitations.seatId, gone.id));
    for (const guest of await tx.select().from(seatPeople).where(and(eq(seatPeople.seatId, gone.id), isNull(seatPeople.removedAt)))) {
      await tx.insert(seatPeople).values({ ...guest, seatId: twin.id }).onDuplicateKeyUpdate({ set: { inspects: guest.inspects, bills: guest.bills, dispatches: guest.dispatches, removedAt: null } });
    }
    await tx.update(seatPeople).set({ removedAt: at }).where(and(eq(seatPeople.seatId, gone.id), isNull(seatPeople.removedAt)));
  }
}
