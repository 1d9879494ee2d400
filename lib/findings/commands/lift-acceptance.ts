import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { acceptances } from "@/db/schema";
import type { EnteredFor } from "@/lib/access/types";
import { liftSignature } from "@/lib/record/commands";
import type { MoveWrite } from "@/lib/standing/commands";

/** The acceptance that stands on a leg, or null. */
export async function findStandingAcceptance(ctx: Pick<MoveWrite, "tx" | "move">, legId: string) {
  const [row] = await ctx.tx.select({ id: acceptances.id, legId: acceptances.legId, signatureId: acceptances.signatureId }).from(acceptances)
    .where(and(eq(acceptances.moveId, ctx.move.id), eq(acceptances.legId, legId), isNull(acceptances.withdrawnAt)));
  return row ?? null;
}

type Standing = NonNullable<Awaited<ReturnType<typeof findStandingAcceptance>>>;

/** Ends an acceptance with its signature and tells the record why; the caller has checked who may. */
export async function liftAcceptance(ctx: MoveWrite, acceptance: Standing, carrierName: string, why: string, enteredFor: EnteredFor | null): Promise<void> {
  await ctx.tx.update(acceptances).set({ withdrawnAt: ctx.at, withdrawnWhy: why }).where(eq(acceptances.id, acceptance.id));
  await liftSignature(ctx.tx, acceptance.signatureId, why, ctx.at);
  await ctx.append({ kind: "acceptance.withdrawn", legId: acceptance.legId, enteredFor, detail: { acceptanceId: acceptance.id, carrierName, why } });
}
