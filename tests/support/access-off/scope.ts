import { eq, isNull, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { moves, moveSeats } from "@/db/schema";
import { AppError } from "@/lib/errors";
import type * as real from "../../../lib/access/scope";
import { heldParts, presentMember } from "../../../lib/access/scope";

// The scope switched off: everybody sees every move and belongs to every company. Only the tests of the access tests load it.

export { heldParts, presentMember };

export const heldSeat: typeof real.heldSeat = () => isNull(moveSeats.removedAt);

export const seenBy: typeof real.seenBy = () => sql`true`;

export const requireMove: typeof real.requireMove = async (viewer, moveId, reader = db()) => {
  const [move] = await reader.select().from(moves).where(eq(moves.id, moveId));
  if (!move) throw new AppError("not_found", "No such move.");
  return { move, parts: await heldParts(viewer, moveId, reader) };
};

export const lockMove: typeof real.lockMove = (tx, viewer, moveId) => requireMove(viewer, moveId, tx);

export const requireMember: typeof real.requireMember = (_viewer, companyId) => ({ companyId, companyName: "Anybody’s", manager: true, inspects: true, bills: true, dispatches: true });
