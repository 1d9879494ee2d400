import "server-only";
import { eq, max } from "drizzle-orm";
import { inspections } from "@/db/schema";
import { refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { dayAt } from "@/lib/moves/when";
import { allowOnLeg, writeOnMove } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { RecordVisit } from "./input";
import { denyVisit } from "./rules";

/** Writes down that a carrier's inspector looked at the unit; findings are posted under a visit. */
export async function recordVisit(viewer: Viewer, input: RecordVisit, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { leg, enteredFor } = await allowOnLeg(ctx, "inspection.visit", input.legId, input.enteredFor);
    refuse(denyVisit(input, dayAt(ctx.at.toISOString(), input.zone)));
    const [last] = await ctx.tx.select({ number: max(inspections.number) }).from(inspections).where(eq(inspections.legId, leg.id));
    const { visitedOn, place, zone, inspectorName, air, airSource, airPsi, note } = input;
    const row = { id: newId("inspection"), number: (last?.number ?? 0) + 1, visitedOn, place, zone, inspectorName, air, airSource, airPsi, note };
    await ctx.tx.insert(inspections).values({ ...row, moveId: ctx.move.id, legId: leg.id, byUserId: viewer.userId, enteredFor, at: ctx.at });
    await ctx.append({
      kind: "inspection.visited", legId: leg.id, enteredFor,
      detail: { inspectionId: row.id, number: row.number, visitedOn, place, zone, inspectorName, air, airSource, airPsi, carrierName: leg.carrierName },
    });
    return { inspectionId: row.id, legId: leg.id, number: row.number };
  });
}
