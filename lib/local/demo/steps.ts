import { eq } from "drizzle-orm";
import { findings, payments, quotes } from "@/db/schema";
import { agreeQuote, giveQuote } from "@/lib/fees/commands/quotes";
import { unsafeSettle } from "@/lib/fees/commands/settle";
import { CURRENCY } from "@/lib/fees/checkout";
import { answerFinding, clearFinding, notClearFinding, postFinding } from "@/lib/findings/commands";
import type { Severity } from "@/lib/findings/vocabulary";
import type { FeeKind } from "@/lib/fees/vocabulary";
import { recordVisit } from "@/lib/inspections/commands";
import { giveInstruction, makeSighting, releaseUnit } from "@/lib/movement/commands";
import type { SightingKind } from "@/lib/movement/vocabulary";
import { newId } from "@/lib/ids";
import { toWall } from "@/lib/moves/when";
import type { Viewer } from "@/lib/viewer/types";
import { who, type DemoStage } from "./case";
import { takePhoto } from "./photos";
import type { Picture } from "./pictures";

type Visit = { key: string; moveId: string; legId: string; place: string; zone: string; daysAgo: number; air: "on" | "off"; airSource?: string; airPsi?: number; note?: string };

export async function visit(stage: DemoStage, given: Visit, at: Date): Promise<string> {
  const inspector = who(stage, given.key);
  const { moveId, legId, place, zone, air, airSource = null, airPsi = null, note = null } = given;
  const answer = await recordVisit(inspector, { moveId, legId, visitedOn: stage.clock.day(given.daysAgo), place, zone, inspectorName: inspector.name, air, airSource, airPsi, note, enteredFor: null }, stage.clock.attempt(at));
  return answer.inspectionId;
}

type Found = { key: string; moveId: string; inspectionId: string; componentId: string; placeId: string | null; observed: string; reading?: string; condition?: string; severity: Severity; picture?: Picture; noPhotoReason?: string };

export async function post(stage: DemoStage, given: Found, at: Date): Promise<string> {
  const inspector = who(stage, given.key);
  const { key: _key, picture, reading = null, condition = null, noPhotoReason = null, ...rest } = given;
  const photoIds = picture ? [await takePhoto(stage.clock, inspector, given.moveId, picture, at)] : [];
  const answer = await postFinding(inspector, { ...rest, placeNote: null, reading, condition, noPhotoReason, photoIds, enteredFor: null }, stage.clock.attempt(at));
  return answer.findingId;
}

async function versionOf(stage: DemoStage, findingId: string): Promise<number> {
  const [row] = await stage.db.select({ version: findings.version }).from(findings).where(eq(findings.id, findingId));
  return row?.version ?? 1;
}

type Said = { moveId: string; findingId: string; text: string };

export async function answer(stage: DemoStage, { moveId, findingId, text, reading = null, picture }: Said & { reading?: string | null; picture?: Picture }, at: Date): Promise<void> {
  const contractor = who(stage, "contractor");
  const photoIds = picture ? [await takePhoto(stage.clock, contractor, moveId, picture, at)] : [];
  await answerFinding(contractor, { moveId, findingId, version: await versionOf(stage, findingId), text, reading, photoIds }, stage.clock.attempt(at));
}

export async function reply(stage: DemoStage, key: string, { moveId, findingId, text, wouldSatisfy }: Said & { wouldSatisfy?: string }, at: Date): Promise<void> {
  const base = { moveId, findingId, version: await versionOf(stage, findingId), text, enteredFor: null };
  if (wouldSatisfy) await notClearFinding(who(stage, key), { ...base, wouldSatisfy, photoIds: [] }, stage.clock.attempt(at));
  else await clearFinding(who(stage, key), base, stage.clock.attempt(at));
}

type Line = { kind: FeeKind; description: string; amountCents: number };

/** Quotes a leg, agrees as its payer, and pays on the payment service's page. */
export async function quoteAndPay(stage: DemoStage, { clerk, payer, moveId, legId, lines }: { clerk: string; payer: string; moveId: string; legId: string; lines: Line[] }, days: { quoted: Date; agreed: Date; paid: Date }): Promise<void> {
  const { quoteId } = await giveQuote(who(stage, clerk), { moveId, legId, lines, reference: "Demo price list 7", goodUntil: null, note: null, enteredFor: null }, stage.clock.attempt(days.quoted));
  await agreeQuote(who(stage, payer), { moveId, quoteId }, stage.clock.attempt(days.agreed));
  await settlePast(stage, quoteId, who(stage, payer), days.paid);
}

/** Books a card payment of the past. The payment service opens no page for a day gone by, so what it would have said is given here. */
async function settlePast(stage: DemoStage, quoteId: string, payer: Viewer, at: Date): Promise<void> {
  const [quote] = await stage.db.select({ moveId: quotes.moveId, totalCents: quotes.totalCents }).from(quotes).where(eq(quotes.id, quoteId));
  if (!quote) throw new Error("the demo's quote is gone");
  const id = newId("payment");
  const [sessionId, intentId] = [`cs_demo_${id}`, `pi_demo_${id}`];
  await stage.db.insert(payments).values({ id, moveId: quote.moveId, quoteId, attempt: 1, amountCents: quote.totalCents, state: "open", sessionId, begunBy: payer.userId, begunAt: at });
  const page = { sessionId, status: "complete", paid: true, amountCents: quote.totalCents, currency: CURRENCY, paymentId: id, quoteId, moveId: quote.moveId, intentId, intentDead: false, url: null, expiresAt: null } as const;
  await unsafeSettle({ id, moveId: quote.moveId }, { eventId: `evt_demo_${id}`, type: "checkout.session.completed", page, told: null }, at);
}

export async function quoteOnly(stage: DemoStage, { clerk, moveId, legId, lines }: { clerk: string; moveId: string; legId: string; lines: Line[] }, at: Date): Promise<void> {
  await giveQuote(who(stage, clerk), { moveId, legId, lines, reference: "Demo price list 7", goodUntil: null, note: null, enteredFor: null }, stage.clock.attempt(at));
}

export async function instruct(stage: DemoStage, key: string, moveId: string, legId: string, billNumber: string, at: Date): Promise<void> {
  await giveInstruction(who(stage, key), { moveId, legId, billNumber, clearanceNumber: "C-1187", train: null, pickupFrom: null, text: "Behind the road power, not in a hump yard. Call the desk before the unit is moved by anyone else.", enteredFor: null }, stage.clock.attempt(at));
}

export async function release(stage: DemoStage, moveId: string, at: Date): Promise<void> {
  await releaseUnit(who(stage, "owner"), { moveId, name: "R. Okafor", note: null }, stage.clock.attempt(at));
}

export async function sight(stage: DemoStage, key: string, given: { moveId: string; legId: string; kind: SightingKind; place: string; zone: string; train?: string; note?: string }, at: Date): Promise<void> {
  const { train = null, note = null, ...rest } = given;
  await makeSighting(who(stage, key), { ...rest, occurredAt: toWall(at.toISOString(), given.zone), train, note, photoIds: [], corrects: null, enteredFor: null }, stage.clock.attempt(at));
}
