import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { companies, invitations, legs, moveSeats, seatPeople } from "@/db/schema";
import { AppError, refuse } from "@/lib/errors";
import { requireLeg, writeOnMove } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { RemoveParty } from "../input";
import { denyRemoval } from "../rules";

/** Takes a company off its part. From the next request on its people no longer see the move (unless they hold another seat), and its open letters are void. Names stay on the leg. */
export async function removeParty(viewer: Viewer, { moveId, seatId }: RemoveParty, attempt: Attempt) {
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "party.remove" });
    const own = and(eq(moveSeats.id, seatId), eq(moveSeats.moveId, moveId), isNull(moveSeats.removedAt));
    const [seat] = await ctx.tx.select({ part: moveSeats.part, legId: moveSeats.legId, companyName: companies.name }).from(moveSeats).innerJoin(companies, eq(companies.id, moveSeats.companyId)).where(own);
    if (!seat) throw new AppError("not_found", "No such party on this move.");
    const facts = await unsafeGatherFacts(ctx.tx, moveId);
    refuse(denyRemoval(seat.part, facts.legs.find((leg) => leg.legId === seat.legId) ?? null));
    await ctx.tx.update(moveSeats).set({ removedAt: ctx.at }).where(own);
    await ctx.tx.update(seatPeople).set({ removedAt: ctx.at }).where(and(eq(seatPeople.seatId, seatId), isNull(seatPeople.removedAt)));
    await ctx.tx.update(invitations).set({ revokedAt: ctx.at }).where(and(eq(invitations.seatId, seatId), isNull(invitations.acceptedAt), isNull(invitations.revokedAt)));
    if (seat.legId) {
      const leg = await requireLeg(ctx.tx, moveId, seat.legId);
      await ctx.tx.update(legs).set({ ...(seat.part === "carrier" ? { carrierCompanyId: null } : { payerCompanyId: null }), version: leg.version + 1 }).where(eq(legs.id, leg.id));
    }
    await ctx.append({ kind: "party.removed", legId: seat.legId, detail: { company: seat.companyName, part: seat.part } });
    return { seatId };
  });
}
