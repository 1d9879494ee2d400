import "server-only";
import { and, eq } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { arrivals, equipment, prepItems } from "@/db/schema";
import { AppError, refuse } from "@/lib/errors";
import { linkPhotos } from "@/lib/evidence/commands";
import { newId, sha256Hex } from "@/lib/ids";
import { canonicalJson } from "@/lib/record/canonical";
import { keepSignature, liftSignature } from "@/lib/record/commands";
import { unsafeStandingSignature } from "@/lib/record/queries";
import { writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import { unsafeGatherFacts } from "@/lib/standing/queries";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { chooseTemplate } from "./choose";
import { prepFactsOf } from "./facts";
import type { FinishItem, KeepItem, ReopenItem, RestoreItem, SignPhase, SkipItem } from "./input";
import { unsafePhaseRows, unsafeSignedRows } from "./queries";
import { restoreOrder } from "./restore-order";
import { denyFinish, denyRestore, denySign, denyWork, statementOf } from "./rules";

/** Copies the checklist that fits the unit onto a new move; takes the transaction that opens it. */
export async function fillPrep(tx: Tx, moveId: string, unit: Parameters<typeof prepFactsOf>[0]): Promise<void> {
  const items = chooseTemplate(prepFactsOf(unit));
  const back = restoreOrder(items).map((step) => step.id);
  if (items.length === 0) return;
  await tx.insert(prepItems).values(items.map((item) => ({
    id: newId("prep"), moveId, templateId: item.id, group: item.group, phase: item.phase, order: item.order, action: item.action, why: item.why, caution: item.caution,
    needsPhoto: item.evidence.photo, needsTag: item.evidence.tag, valueLabel: item.evidence.value?.label ?? (item.evidence.measurement ? "Measured" : null), valueUnit: item.evidence.value?.unit ?? null,
    published: item.source === "published", restoreAction: item.restore?.action ?? null, restoreCaution: item.restore?.caution ?? null, restoreOrder: back.indexOf(item.id) + 1,
  })));
}

async function requireItem(ctx: MoveWrite, itemId: string, version: number) {
  const [item] = await ctx.tx.select().from(prepItems).where(and(eq(prepItems.id, itemId), eq(prepItems.moveId, ctx.move.id)));
  if (!item) throw new AppError("not_found", "No such item on this move.");
  if (item.version !== version) throw new AppError("stale", `Somebody else has changed this item meanwhile${item.byName ? ` (${item.byName})` : ""}. Look again before you go on.`);
  return item;
}

type Item = Awaited<ReturnType<typeof requireItem>>;
type Change = Partial<typeof prepItems.$inferInsert>;

async function change(ctx: MoveWrite, item: Item, set: Change) {
  await ctx.tx.update(prepItems).set({ ...set, version: item.version + 1 }).where(eq(prepItems.id, item.id));
  return { itemId: item.id, version: item.version + 1 };
}

const detailOf = (item: Item, more: Record<string, unknown> = {}) => ({ itemId: item.id, templateId: item.templateId, action: item.action, phase: item.phase, ...more });

/** Marks an item as done, with the evidence it asks for. */
export async function finishItem(viewer: Viewer, input: FinishItem, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "prep.do" });
    const item = await requireItem(ctx, input.itemId, input.version);
    refuse(denyWork(await unsafeGatherFacts(ctx.tx, ctx.move.id, ctx.at), item));
    refuse(denyFinish(item, input));
    await linkPhotos(ctx, input.photoIds, "prep", item.id);
    const { value, tagNumber, note } = input;
    const done = await change(ctx, item, { state: "done", value, tagNumber, note, skippedWhy: null, byUserId: viewer.userId, byName: viewer.name, at: ctx.at, restoreState: item.restoreAction ? "later" : "none" });
    await ctx.append({ kind: "prep.done", detail: detailOf(item, { value, tagNumber, photos: input.photoIds.length }) });
    return done;
  });
}

/** Says that an item does not apply to this unit, and why. */
export async function skipItem(viewer: Viewer, input: SkipItem, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "prep.do" });
    const item = await requireItem(ctx, input.itemId, input.version);
    refuse(denyWork(await unsafeGatherFacts(ctx.tx, ctx.move.id, ctx.at), item));
    if (item.state !== "to-do") throw new AppError("stale", "Somebody has already worked on this item. Look again.");
    const skipped = await change(ctx, item, { state: "not-applicable", skippedWhy: input.why, byUserId: viewer.userId, byName: viewer.name, at: ctx.at, restoreState: "none" });
    await ctx.append({ kind: "prep.skipped", detail: detailOf(item, { why: input.why }) });
    return skipped;
  });
}

/** Opens an item again; a signature over its phase no longer stands and says why. */
export async function reopenItem(viewer: Viewer, input: ReopenItem, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "prep.do" });
    const item = await requireItem(ctx, input.itemId, input.version);
    refuse(denyWork(await unsafeGatherFacts(ctx.tx, ctx.move.id, ctx.at), item));
    if (item.state === "to-do") throw new AppError("stale", "This item is open already.");
    const reopened = await change(ctx, item, { state: "to-do", skippedWhy: null, byUserId: null, byName: null, at: null, restoreState: "none" });
    await ctx.append({ kind: "prep.reopened", detail: detailOf(item, { why: input.why }) });
    const signature = await unsafeStandingSignature(ctx.tx, ctx.move.id, `prep-${item.phase}`, ctx.move.id);
    if (signature) {
      await liftSignature(ctx.tx, signature.id, `${item.templateId} opened again: ${input.why}`.slice(0, 200), ctx.at);
      await ctx.append({ kind: "prep.signature-lifted", detail: { phase: item.phase, templateId: item.templateId, why: input.why } });
    }
    return reopened;
  });
}

/** The contractor's name under one phase, over exactly the rows that were shown. */
export async function signPhase(viewer: Viewer, input: SignPhase, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const held = ctx.allow({ action: "prep.sign" });
    const facts = await unsafeGatherFacts(ctx.tx, ctx.move.id, ctx.at);
    const phase = input.phase === "where-it-stands" ? facts.standing : facts.coupled;
    refuse(denySign(phase));
    const rows = unsafeSignedRows(await unsafePhaseRows(ctx.tx, ctx.move.id, input.phase));
    if (sha256Hex(canonicalJson(rows)) !== input.rowsHash) throw new AppError("stale", "The list has changed since you opened it. Look it over once more before you sign.");
    const [unit] = await ctx.tx.select({ mark: equipment.mark, number: equipment.number }).from(equipment).where(eq(equipment.moveId, ctx.move.id));
    const statement = statementOf(input.phase, `${unit?.mark ?? ""} ${unit?.number ?? ""}`.trim(), ctx.move.originName);
    const signatureId = await keepSignature(ctx.tx, { moveId: ctx.move.id, kind: `prep-${input.phase}`, subjectId: ctx.move.id, userId: viewer.userId, companyId: held.companyId, name: input.name, statement, rows }, ctx.at);
    await ctx.append({ kind: "prep.signed", detail: { signatureId, phase: input.phase, name: input.name, items: rows.length } });
    return { signatureId };
  });
}

/** After arrival every done item with a way back waits to be put back; takes the transaction that records the arrival. */
export async function openRestore(tx: Tx, moveId: string): Promise<void> {
  await tx.update(prepItems).set({ restoreState: "to-restore" }).where(and(eq(prepItems.moveId, moveId), eq(prepItems.state, "done"), eq(prepItems.restoreState, "later")));
}

async function requireTwin(ctx: MoveWrite, itemId: string, version: number) {
  const item = await requireItem(ctx, itemId, version);
  const all = await ctx.tx.select({ templateId: prepItems.templateId, state: prepItems.state, restoreState: prepItems.restoreState }).from(prepItems).where(eq(prepItems.moveId, ctx.move.id));
  const [arrival] = await ctx.tx.select({ id: arrivals.id }).from(arrivals).where(eq(arrivals.moveId, ctx.move.id));
  return { item, all, arrived: Boolean(arrival) };
}

/** Puts back what was done for the tow. */
export async function restoreItem(viewer: Viewer, input: RestoreItem, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "restore.do" });
    const { item, all, arrived } = await requireTwin(ctx, input.itemId, input.version);
    refuse(denyRestore(arrived, item, all));
    await linkPhotos(ctx, input.photoIds, "restore", item.id);
    const restored = await change(ctx, item, { restoreState: "restored", restoreNote: input.note, restoredByUserId: viewer.userId, restoredByName: viewer.name, restoredAt: ctx.at });
    await ctx.append({ kind: "restore.done", detail: detailOf(item, { restoreAction: item.restoreAction, note: input.note, photos: input.photoIds.length }) });
    return restored;
  });
}

/** The receiver keeps an item as it is, for instance on a display piece; anything may be kept before what it waits for. */
export async function keepItem(viewer: Viewer, input: KeepItem, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "restore.keep" });
    const { item, arrived } = await requireTwin(ctx, input.itemId, input.version);
    refuse(denyRestore(arrived, item, []));
    const kept = await change(ctx, item, { restoreState: "kept", restoreNote: input.why, restoredByUserId: viewer.userId, restoredByName: viewer.name, restoredAt: ctx.at });
    await ctx.append({ kind: "restore.kept", detail: detailOf(item, { restoreAction: item.restoreAction, why: input.why }) });
    return kept;
  });
}

/** Takes back a restored or kept mark that was wrong. */
export async function reopenRestore(viewer: Viewer, input: ReopenItem, attempt: Attempt) {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "restore.do" });
    const { item } = await requireTwin(ctx, input.itemId, input.version);
    if (item.restoreState !== "restored" && item.restoreState !== "kept") throw new AppError("stale", "This item waits to be put back already.");
    const reopened = await change(ctx, item, { restoreState: "to-restore", restoreNote: input.why, restoredByUserId: null, restoredByName: null, restoredAt: null });
    await ctx.append({ kind: "restore.reopened", detail: detailOf(item, { why: input.why }) });
    return reopened;
  });
}
