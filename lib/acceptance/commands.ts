import "server-only";
import { and, eq } from "drizzle-orm";
import { acceptances } from "@/db/schema";
import { env } from "@/lib/env";
import { AppError, refuse } from "@/lib/errors";
import { findStandingAcceptance, liftAcceptance } from "@/lib/findings/commands/lift-acceptance";
import { newId } from "@/lib/ids";
import { dayAt } from "@/lib/moves/when";
import { keepSignature } from "@/lib/record/commands";
import { routes } from "@/lib/routes";
import { allowOnLeg, requireLeg, writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import { denyAcceptance } from "@/lib/standing/rules";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { SignAcceptance, WithdrawAcceptance } from "./input";
import { unsafeCovered, unsafeCoveredHash, unsafeSignedRows } from "./queries";
import { denyAnother, denyTerms, denyWithdrawal, restrictionLabels } from "./rules";
import { acceptanceStatement } from "./statement";

async function requireLegFacts(ctx: MoveWrite, legId: string) {
  const facts = await unsafeGatherFacts(ctx.tx, ctx.move.id, ctx.at);
  const leg = facts.legs.find((one) => one.legId === legId);
  if (!leg) throw new AppError("not_found", "No such leg on this move.");
  return { facts, leg };
}

/** The inspector's word that the unit is mechanically fit to go on one leg; refused with the list of what is missing. Money has no say in it. */
export async function signAcceptance(viewer: Viewer, input: SignAcceptance, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { leg, held, enteredFor } = await allowOnLeg(ctx, "acceptance.sign", input.legId, input.enteredFor);
    const { facts, leg: fact } = await requireLegFacts(ctx, leg.id);
    refuse(denyAnother(fact));
    refuse(denyAcceptance(facts, fact));
    refuse(denyTerms(input, dayAt(ctx.at.toISOString(), leg.fromZone)));
    const covered = await unsafeCovered(ctx.tx, ctx.move.id, leg.id);
    if (unsafeCoveredHash(covered) !== input.rowsHash) throw new AppError("stale", "Findings or prep have changed since you opened this page. Look them over once more before you sign.");
    const lapsed = await findStandingAcceptance(ctx, leg.id);
    if (lapsed) await liftAcceptance(ctx, lapsed, leg.carrierName, "Ran out; signed again", enteredFor);
    const { restrictions, restrictionNote, number, validUntil } = input;
    const acceptanceId = newId("acceptance");
    const unit = `${covered.unit.mark} ${covered.unit.number}`.trim();
    const statement = acceptanceStatement({ unit, carrierName: leg.carrierName, fromPlace: leg.fromPlace, toPlace: leg.toPlace, restrictions, restrictionNote, validUntil, reported: enteredFor });
    const rows = unsafeSignedRows(covered, input);
    const signatureId = await keepSignature(ctx.tx, { moveId: ctx.move.id, kind: "acceptance", subjectId: acceptanceId, userId: viewer.userId, companyId: held.companyId, name: input.name, statement, rows, enteredFor }, ctx.at);
    await ctx.tx.insert(acceptances).values({ id: acceptanceId, moveId: ctx.move.id, legId: leg.id, number, restrictions, restrictionNote, validUntil, signatureId, at: ctx.at });
    const labels = restrictionLabels(restrictions);
    await ctx.append({ kind: "acceptance.signed", legId: leg.id, enteredFor, detail: { acceptanceId, signatureId, name: input.name, number, restrictions: labels, restrictionNote, validUntil, carrierName: leg.carrierName, fromPlace: leg.fromPlace, toPlace: leg.toPlace } });
    await tellSigned(ctx, { acceptanceId, unit, legId: leg.id, carrierName: leg.carrierName, lines: [statement] });
    return { acceptanceId };
  });
}

async function tellSigned(ctx: MoveWrite, { acceptanceId, unit, legId, carrierName, lines }: { acceptanceId: string; unit: string; legId: string; carrierName: string; lines: string[] }) {
  const news = { unit, caseNumber: ctx.move.caseNumber, headline: `${carrierName} accepts the unit`, lines, actionLabel: "Open the case", url: `${env().APP_URL}${routes.move(ctx.move.id)}` };
  for (const to of [{ part: "owner" as const }, { part: "desk" as const, legId }, { part: "contractor" as const }]) await ctx.tell(to, "acceptance-signed", news, `acceptance-signed:${acceptanceId}`);
}

/** Takes an acceptance back before the carrier has the unit. */
export async function withdrawAcceptance(viewer: Viewer, input: WithdrawAcceptance, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const [row] = await ctx.tx.select({ legId: acceptances.legId, withdrawnAt: acceptances.withdrawnAt }).from(acceptances).where(and(eq(acceptances.id, input.acceptanceId), eq(acceptances.moveId, ctx.move.id)));
    if (!row) throw new AppError("not_found", "No such acceptance on this move.");
    const { enteredFor } = await allowOnLeg(ctx, "acceptance.sign", row.legId, input.enteredFor);
    const leg = await requireLeg(ctx.tx, ctx.move.id, row.legId);
    const { leg: fact } = await requireLegFacts(ctx, row.legId);
    refuse(denyWithdrawal({ withdrawn: row.withdrawnAt !== null, takenOver: fact.takenOver }));
    const standing = await findStandingAcceptance(ctx, row.legId);
    if (standing) await liftAcceptance(ctx, standing, leg.carrierName, input.why, enteredFor);
    return { acceptanceId: input.acceptanceId };
  });
}
