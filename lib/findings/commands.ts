import "server-only";
import { and, eq, max } from "drizzle-orm";
import { companies, equipment, findingEntries, findings, legs } from "@/db/schema";
import type { EnteredFor } from "@/lib/access/types";
import { env } from "@/lib/env";
import { AppError, refuse } from "@/lib/errors";
import { linkPhotos } from "@/lib/evidence/commands";
import { newId } from "@/lib/ids";
import { unsafeVisit } from "@/lib/inspections/queries";
import { placeName } from "@/lib/moves/places";
import type { CaseNews } from "@/lib/outbox/types";
import type { RecordKind } from "@/lib/record/vocabulary";
import { routes } from "@/lib/routes";
import { allowOnLeg, writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { findStandingAcceptance, liftAcceptance } from "./commands/lift-acceptance";
import { findComponent } from "./components";
import type { AnswerFinding, ClearFinding, NotCleared, PostFinding, WithdrawFinding } from "./input";
import { axlesOf } from "./places";
import { unsafeLastEntry } from "./queries";
import { ACTION_OF, afterAct, denyPosting, denyState, ENTRY_OF, type FindingAct } from "./rules";
import { SEVERITY_LABELS } from "./vocabulary";
import { changeWords, findingLabel, titleWords, whereWords } from "./words";

type Finding = typeof findings.$inferSelect;
type Leg = typeof legs.$inferSelect;

/** What every sentence about a finding is made of. */
type Told = { label: string; component: string; where: string | null; unit: string; carrierName: string };

async function toldOf(ctx: MoveWrite, finding: Pick<Finding, "number" | "componentId" | "placeId" | "placeNote">, leg: Leg): Promise<Told> {
  const [unit] = await ctx.tx.select({ mark: equipment.mark, number: equipment.number, axles: equipment.axles }).from(equipment).where(eq(equipment.moveId, ctx.move.id));
  const axles = unit ? axlesOf(unit.axles) : null;
  const place = finding.placeId && axles ? placeName(finding.placeId, axles) : null;
  return { label: findingLabel(finding.number), component: findComponent(finding.componentId)?.label ?? finding.componentId, where: whereWords(place, finding.placeNote), unit: unit ? `${unit.mark} ${unit.number}` : "", carrierName: leg.carrierName };
}

const detailOf = ({ label, component, where, carrierName }: Told, more: Record<string, unknown>) => ({ number: label, component, place: where, carrierName, ...more });

function newsOf(ctx: MoveWrite, told: Told, findingId: string, headline: string, lines: (string | null)[], actionLabel: string): CaseNews {
  return { unit: told.unit, caseNumber: ctx.move.caseNumber, headline, lines: [`${told.label}: ${titleWords(told.component, told.where)}.`, ...lines.filter((line) => line !== null)], actionLabel, url: `${env().APP_URL}${routes.finding(ctx.move.id, findingId)}` };
}

/** Posts a finding under a visit. One that stops the move ends an acceptance that was signed before, unless the carrier has the unit already. */
export async function postFinding(viewer: Viewer, input: PostFinding, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const visit = await unsafeVisit(ctx.tx, ctx.move.id, input.inspectionId);
    if (!visit) throw new AppError("not_found", "No such visit on this move.");
    const { leg, enteredFor } = await allowOnLeg(ctx, "finding.post", visit.legId, input.enteredFor);
    const [unit] = await ctx.tx.select({ axles: equipment.axles }).from(equipment).where(eq(equipment.moveId, ctx.move.id));
    refuse(denyPosting(input, unit ? axlesOf(unit.axles) : null));
    const [last] = await ctx.tx.select({ number: max(findings.number) }).from(findings).where(eq(findings.moveId, ctx.move.id));
    const { componentId, placeId, placeNote, observed, reading, condition, severity, photoIds } = input;
    const row = { id: newId("finding"), number: (last?.number ?? 0) + 1, componentId, placeId, placeNote, observed, reading, condition, severity, noPhotoReason: photoIds.length > 0 ? null : input.noPhotoReason };
    await ctx.tx.insert(findings).values({ ...row, moveId: ctx.move.id, legId: leg.id, inspectionId: visit.id, byUserId: viewer.userId, byName: viewer.name, enteredFor, at: ctx.at });
    await linkPhotos(ctx, photoIds, "finding", row.id);
    const told = await toldOf(ctx, row, leg);
    await ctx.append({
      kind: "finding.posted", legId: leg.id, enteredFor,
      detail: detailOf(told, { findingId: row.id, severity, severityLabel: SEVERITY_LABELS[severity], reading, visit: visit.number, air: visit.air, photos: photoIds.length }),
    });
    const lifted = severity === "stops-move" && (await liftBecauseOf(ctx, leg, told.label));
    const lines = [`${SEVERITY_LABELS[severity]}.`, observed, reading ? `Measured: ${reading}` : null, lifted ? "The acceptance of this leg was withdrawn because of it." : null];
    const news = newsOf(ctx, told, row.id, `${leg.carrierName} posted ${told.label}`, lines, "Look at the finding");
    await ctx.tell({ part: "contractor" }, "finding-posted", news, `finding-posted:${row.id}`);
    await ctx.tell({ part: "owner" }, "finding-posted", news, `finding-posted:${row.id}`);
    if (lifted) await ctx.tell({ part: "desk", legId: leg.id }, "finding-posted", news, `finding-posted:${row.id}`);
    return { findingId: row.id, number: told.label, acceptanceWithdrawn: lifted };
  });
}

async function liftBecauseOf(ctx: MoveWrite, leg: Leg, label: string): Promise<boolean> {
  const standing = await findStandingAcceptance(ctx, leg.id);
  if (!standing) return false;
  const { legs: facts } = await unsafeGatherFacts(ctx.tx, ctx.move.id, ctx.at);
  if (facts.find((one) => one.legId === leg.id)?.takenOver) return false;
  await liftAcceptance(ctx, standing, leg.carrierName, `${label} posted after`, null);
  return true;
}

type Ask = { findingId: string; version: number; enteredFor?: Omit<EnteredFor, "carrierName"> | null };

/** Finds the finding, checks who may, and refuses when it has changed since it was read. */
async function beginAct(ctx: MoveWrite, act: FindingAct, input: Ask) {
  const [row] = await ctx.tx.select({ finding: findings, leg: legs }).from(findings).innerJoin(legs, eq(legs.id, findings.legId)).where(and(eq(findings.id, input.findingId), eq(findings.moveId, ctx.move.id)));
  if (!row) throw new AppError("not_found", "No such finding on this move.");
  const { finding, leg } = row;
  const { held, enteredFor } = act === "answer" ? { held: ctx.allow({ action: ACTION_OF[act] }), enteredFor: null } : await allowOnLeg(ctx, ACTION_OF[act], finding.legId, input.enteredFor ?? null);
  if (finding.version !== input.version) {
    const last = await unsafeLastEntry(ctx.tx, finding.id);
    throw new AppError("stale", changeWords(findingLabel(finding.number), last ? { ...last, at: last.at.toISOString() } : null, leg.fromZone));
  }
  refuse(denyState(finding.state, act));
  const [company] = await ctx.tx.select({ name: companies.name }).from(companies).where(eq(companies.id, held.companyId));
  return { finding, leg, enteredFor, companyName: company?.name ?? "" };
}

type Said = { text: string; reading?: string | null; wouldSatisfy?: string | null; photoIds?: string[] };

const KIND_OF: Record<FindingAct, RecordKind> = { answer: "finding.answered", "not-cleared": "finding.not-cleared", clear: "finding.cleared", withdraw: "finding.withdrawn" };

/** Says something about a finding: one entry, the state after it, the record. What was said before stays as it is. */
async function sayOn(ctx: MoveWrite, viewer: Viewer, act: FindingAct, input: Ask, { text, reading = null, wouldSatisfy = null, photoIds = [] }: Said) {
  const { finding, leg, enteredFor, companyName } = await beginAct(ctx, act, input);
  const { state, rounds, round } = afterAct(finding, act);
  const entryId = newId("findingEntry");
  await ctx.tx.insert(findingEntries).values({
    id: entryId, moveId: ctx.move.id, findingId: finding.id, round, kind: ENTRY_OF[act], text, reading, wouldSatisfy, byUserId: viewer.userId, byName: viewer.name, byCompanyName: companyName, enteredFor, at: ctx.at,
  });
  await ctx.tx.update(findings).set({ state, rounds, version: finding.version + 1 }).where(and(eq(findings.id, finding.id), eq(findings.version, finding.version)));
  await linkPhotos(ctx, photoIds, "finding-entry", entryId);
  const told = await toldOf(ctx, finding, leg);
  await ctx.append({ kind: KIND_OF[act], legId: leg.id, enteredFor, detail: detailOf(told, { findingId: finding.id, entryId, round, severity: finding.severity, reading, photos: photoIds.length }) });
  return { told, leg, entryId, answer: { findingId: finding.id, state, rounds, version: finding.version + 1 } };
}

/** The contractor says what was done; the inspector of the leg is told. */
export async function answerFinding(viewer: Viewer, input: AnswerFinding, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { told, leg, entryId, answer } = await sayOn(ctx, viewer, "answer", input, input);
    const news = newsOf(ctx, told, answer.findingId, `${told.label} was answered`, [input.text, input.reading ? `Measured: ${input.reading}` : null], "Look at the answer");
    await ctx.tell({ part: "inspector", legId: leg.id }, "finding-answered", news, `finding-answered:${entryId}`);
    return answer;
  });
}

/** The answer does not clear it: why, and what would. */
export async function notClearFinding(viewer: Viewer, input: NotCleared, attempt: Attempt) {
  return replyTo(viewer, attempt, "not-cleared", input, { text: input.text, wouldSatisfy: input.wouldSatisfy, photoIds: input.photoIds });
}

/** The inspector clears a finding after looking at its answer. */
export async function clearFinding(viewer: Viewer, input: ClearFinding, attempt: Attempt) {
  return replyTo(viewer, attempt, "clear", input, { text: input.text ?? "" });
}

/** The inspector takes a finding back, for instance because it was about another unit. It stays to be read. */
export async function withdrawFinding(viewer: Viewer, input: WithdrawFinding, attempt: Attempt) {
  return replyTo(viewer, attempt, "withdraw", input, { text: input.text });
}

const REPLIED: Record<Exclude<FindingAct, "answer">, string> = { "not-cleared": "was not cleared", clear: "was cleared", withdraw: "was withdrawn" };

async function replyTo(viewer: Viewer, attempt: Attempt, act: Exclude<FindingAct, "answer">, input: Ask & { moveId: string }, said: Said) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { told, entryId, answer } = await sayOn(ctx, viewer, act, input, said);
    const news = newsOf(ctx, told, answer.findingId, `${told.label} ${REPLIED[act]}`, [said.text || null, said.wouldSatisfy ? `What would satisfy: ${said.wouldSatisfy}` : null], act === "not-cleared" ? "Answer again" : "Look at the finding");
    await ctx.tell({ part: "contractor" }, "finding-replied", news, `finding-replied:${entryId}`);
    return answer;
  });
}
