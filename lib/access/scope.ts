import "server-only";
import { and, eq, exists, inArray, isNull, or, sql } from "drizzle-orm";
import { db, type Reader, type Tx } from "@/db/client";
import { companyMembers, moveSeats, moves, seatPeople } from "@/db/schema";
import { AppError } from "@/lib/errors";
import type { Viewer } from "@/lib/viewer/types";
import type { HeldPart } from "./types";
import type { Part } from "./vocabulary";

const companyIds = (viewer: Viewer) => viewer.memberships.map((one) => one.companyId);

/** Seats that the viewer holds: those of a company that admitted them, and those they were invited to alone. */
export const heldSeat = (viewer: Viewer) =>
  and(
    isNull(moveSeats.removedAt),
    or(inArray(moveSeats.companyId, companyIds(viewer)), inArray(moveSeats.id, viewer.guestSeatIds)),
  );

/** The one condition that decides which moves a person can see; for a query that selects from or joins `moves`. */
export const seenBy = (viewer: Viewer) =>
  exists(db().select({ one: sql`1` }).from(moveSeats).where(and(eq(moveSeats.moveId, moves.id), heldSeat(viewer))));

type Works = { inspects: boolean; bills: boolean; dispatches: boolean };

function partsOf(seatPart: "owner" | "contractor" | "carrier" | "receiver" | "payer", works: Works): Part[] {
  if (seatPart !== "carrier") return [seatPart];
  const parts: Part[] = ["carrier"];
  if (works.inspects) parts.push("inspector");
  if (works.bills) parts.push("billing");
  if (works.dispatches) parts.push("desk");
  return parts;
}

/** The parts that the viewer holds on one move; empty for an outsider. */
export async function heldParts(viewer: Viewer, moveId: string, reader: Reader = db()): Promise<HeldPart[]> {
  const rows = await reader
    .select({ seatId: moveSeats.id, companyId: moveSeats.companyId, part: moveSeats.part, legId: moveSeats.legId,
      inspects: seatPeople.inspects, bills: seatPeople.bills, dispatches: seatPeople.dispatches, guest: seatPeople.userId })
    .from(moveSeats)
    .leftJoin(seatPeople, and(eq(seatPeople.seatId, moveSeats.id), eq(seatPeople.userId, viewer.userId), isNull(seatPeople.removedAt)))
    .where(and(eq(moveSeats.moveId, moveId), heldSeat(viewer)));
  return rows.flatMap((row) => {
    const member = viewer.memberships.find((one) => one.companyId === row.companyId);
    const works: Works = {
      inspects: Boolean(member?.inspects) || Boolean(row.inspects),
      bills: Boolean(member?.bills) || Boolean(row.bills),
      dispatches: Boolean(member?.dispatches) || Boolean(row.dispatches),
    };
    return partsOf(row.part, works).map((part) => ({ part, legId: row.legId, companyId: row.companyId }));
  });
}

const columns = { id: moves.id, caseNumber: moves.caseNumber, state: moves.state, stage: moves.stage, ownerCompanyId: moves.ownerCompanyId, originName: moves.originName,
  originPlace: moves.originPlace, originZone: moves.originZone, destinationName: moves.destinationName, destinationPlace: moves.destinationPlace, destinationZone: moves.destinationZone,
  waitingPart: moves.waitingPart, waitingLegId: moves.waitingLegId, waitingFor: moves.waitingFor, waitingName: moves.waitingName, waitingSince: moves.waitingSince, version: moves.version };

/** A move that the viewer may see, with the parts they hold on it; refuses `not_found` otherwise, so that an outsider learns nothing. */
export async function requireMove(viewer: Viewer, moveId: string, reader: Reader = db()) {
  const [move] = await reader.select(columns).from(moves).where(and(eq(moves.id, moveId), seenBy(viewer)));
  if (!move) throw new AppError("not_found", "No such move.");
  return { move, parts: await heldParts(viewer, moveId, reader) };
}

/** The same, with the move's row locked until the transaction ends: every write on a move goes one after the other. */
export async function lockMove(tx: Tx, viewer: Viewer, moveId: string) {
  const [move] = await tx.select(columns).from(moves).where(and(eq(moves.id, moveId), seenBy(viewer))).for("update");
  if (!move) throw new AppError("not_found", "No such move.");
  return { move, parts: await heldParts(viewer, moveId, tx) };
}

export type SeenMove = Awaited<ReturnType<typeof lockMove>>["move"];

/** Refuses `not_found` unless the viewer is an admitted member of the company. */
export function requireMember(viewer: Viewer, companyId: string) {
  const member = viewer.memberships.find((one) => one.companyId === companyId);
  if (!member) throw new AppError("not_found", "No such company.");
  return member;
}

/** Admitted, present people of a company; for mail and lists. */
export const presentMember = and(isNull(companyMembers.removedAt), sql`${companyMembers.admittedAt} is not null`);
