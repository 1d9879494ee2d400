import { and, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { billingClearances, legs, moveSeats, outbox, quotes, record } from "@/db/schema";
import { agreeQuote, clearBilling, giveQuote, voidQuote } from "@/lib/fees/commands/quotes";
import { giveQuoteInput } from "@/lib/fees/input";
import { getFees } from "@/lib/fees/queries";
import { audienceOf, type RecordKind } from "@/lib/record/vocabulary";
import { getFacts, unsafeGatherFacts } from "@/lib/standing/queries";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";
import { aQuote } from "./bench";

withDatabase();

const HEARD = { source: "e-mail" as const, heardOn: "2026-11-18", saidBy: "B. Quill", reference: null };

async function offBoard(moveId: string, legId: string) {
  await db().update(moveSeats).set({ removedAt: new Date() }).where(and(eq(moveSeats.moveId, moveId), eq(moveSeats.part, "carrier"), eq(moveSeats.legId, legId)));
}

it("the clerk gives a quote, the payer hears of it, agrees, and it can be voided and given anew", async () => {
  const move = await seedMove();
  const { quoteId } = await giveQuote(move.clerkA, aQuote(move), anAttempt());
  const mails = await db().select({ to: outbox.toAddress }).from(outbox).where(and(eq(outbox.moveId, move.moveId), eq(outbox.kind, "quote-given")));
  expect(mails).toEqual([{ to: move.payer.email }]);
  await expect(giveQuote(move.clerkA, aQuote(move), anAttempt())).rejects.toMatchObject({ code: "not_yet", message: expect.stringContaining("Quote 1 stands") });
  await agreeQuote(move.owner, { moveId: move.moveId, quoteId }, anAttempt());
  await expect(agreeQuote(move.payer, { moveId: move.moveId, quoteId }, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  await voidQuote(move.clerkA, { moveId: move.moveId, quoteId, why: "Wrong route", enteredFor: null }, anAttempt());
  await giveQuote(move.clerkA, aQuote(move), anAttempt());
  const [leg] = (await getFees(move.payer, move.moveId)).legs;
  expect(leg?.quote).toMatchObject({ number: 2, state: "given", totalCents: 418_500, lines: [{ amountCents: 400_000 }, { amountCents: 18_500 }] });
  expect(leg?.voided).toMatchObject([{ number: 1, voidedWhy: "Wrong route" }]);
});

it("twenty quotes at once leave one that stands", async () => {
  const move = await seedMove();
  const tries = await Promise.allSettled(Array.from({ length: 20 }, () => giveQuote(move.clerkA, aQuote(move), anAttempt())));
  expect(tries.filter((one) => one.status === "fulfilled")).toHaveLength(1);
  expect(await db().select().from(quotes).where(eq(quotes.moveId, move.moveId))).toHaveLength(1);
});

it("fees are seen by the owner, the leg's payer and its payee, and by nobody else", async () => {
  const move = await seedMove();
  const [legA, legB] = move.legIds;
  const { quoteId } = await giveQuote(move.clerkA, aQuote(move), anAttempt());
  await giveQuote(move.clerkB, aQuote(move, { legId: legB }), anAttempt());
  const legsOf = async (who: typeof move.owner) => (await getFees(who, move.moveId)).legs.map((leg) => leg.legId);
  expect(await legsOf(move.owner)).toEqual([legA, legB]);
  expect(await legsOf(move.clerkA)).toEqual([legA]);
  expect(await legsOf(move.clerkB)).toEqual([legB]);
  expect(await legsOf(move.payer)).toEqual([legA]);
  for (const who of [move.contractor, move.receiver, move.inspectorA, move.deskB, move.outsider, move.removed]) {
    await expect(getFees(who, move.moveId)).rejects.toMatchObject({ code: "not_found" });
    await expect(agreeQuote(who, { moveId: move.moveId, quoteId }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  }
  await expect(agreeQuote(move.clerkA, { moveId: move.moveId, quoteId }, anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await expect(voidQuote(move.clerkB, { moveId: move.moveId, quoteId, why: "No", enteredFor: null }, anAttempt())).rejects.toMatchObject({ code: "not_found" });
  for (const who of [move.contractor, move.payer, move.clerkB, move.inspectorA]) await expect(giveQuote(who, aQuote(move), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
});

it("a quote waits until its payer is named and invited", async () => {
  const move = await seedMove();
  await db().update(legs).set({ payerCompanyId: null }).where(eq(legs.id, move.legIds[0]));
  await expect(giveQuote(move.clerkA, aQuote(move), anAttempt())).rejects.toMatchObject({ code: "not_yet", message: "Name and invite the payer first." });
});

it("a quote that lapsed is not agreed to", async () => {
  const move = await seedMove();
  const { quoteId } = await giveQuote(move.clerkA, aQuote(move, { goodUntil: "2099-01-01" }), anAttempt());
  const later = anAttempt({ at: new Date("2099-01-02T18:00:00Z") });
  await expect(agreeQuote(move.payer, { moveId: move.moveId, quoteId }, later)).rejects.toMatchObject({ message: expect.stringContaining("good until 1 Jan 2099") });
  // Still the last day where the leg begins.
  await agreeQuote(move.payer, { moveId: move.moveId, quoteId }, anAttempt({ at: new Date("2099-01-02T05:00:00Z") }));
});

it("waits for another quote once the day to agree has passed, without anybody writing", async () => {
  const move = await seedMove({ prepDone: true });
  await giveQuote(move.clerkA, aQuote(move, { goodUntil: "2099-01-01" }), anAttempt());
  const facts = await unsafeGatherFacts(db(), move.moveId, new Date("2099-01-02T18:00:00Z"));
  expect(facts.legs[0]).toMatchObject({ quote: "given", quoteLapsed: true });
  expect((await getFacts(move.owner, move.moveId)).legs[0]).toMatchObject({ quote: "given", quoteLapsed: false });
});

it("is agreed to by whoever has become the payer since, and by nobody while there is none", async () => {
  const move = await seedMove();
  const [legA] = move.legIds;
  const own = move.owner.memberships[0]?.companyId ?? "";
  const { quoteId } = await giveQuote(move.clerkA, aQuote(move), anAttempt());
  await db().update(legs).set({ payerCompanyId: null }).where(eq(legs.id, legA));
  await expect(agreeQuote(move.owner, { moveId: move.moveId, quoteId }, anAttempt())).rejects.toMatchObject({ code: "not_yet", message: expect.stringContaining("Nobody is seated as the payer") });
  await db().update(legs).set({ payerCompanyId: own, payerName: "Vellum Ridge Heritage Line" }).where(eq(legs.id, legA));
  await agreeQuote(move.owner, { moveId: move.moveId, quoteId }, anAttempt());
  const [quote] = (await getFees(move.owner, move.moveId)).legs.map((leg) => leg.quote);
  expect(quote).toMatchObject({ state: "agreed", payerName: "Vellum Ridge Heritage Line" });
});

it("what was heard of a carrier was not heard tomorrow", async () => {
  const move = await seedMove();
  await offBoard(move.moveId, move.legIds[0]);
  const ahead = { ...HEARD, heardOn: "2099-01-01" };
  await expect(giveQuote(move.owner, aQuote(move, { enteredFor: ahead }), anAttempt())).rejects.toMatchObject({ code: "bad_input", fields: { "enteredFor.heardOn": [expect.any(String)] } });
});

it("the owner enters a quote and a credit for a carrier that is not on board, and only then", async () => {
  const move = await seedMove();
  const [legA] = move.legIds;
  await expect(giveQuote(move.owner, aQuote(move, { enteredFor: HEARD }), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await offBoard(move.moveId, legA);
  await expect(giveQuote(move.contractor, aQuote(move, { enteredFor: HEARD }), anAttempt())).rejects.toMatchObject({ code: "not_your_part" });
  await giveQuote(move.owner, aQuote(move, { enteredFor: HEARD }), anAttempt());
  await clearBilling(move.owner, { moveId: move.moveId, legId: legA, note: "Account 4410, $4,185.00", enteredFor: HEARD }, anAttempt());
  const [leg] = (await getFees(move.owner, move.moveId)).legs;
  expect(leg?.quote?.enteredFor).toMatchObject({ carrierName: "Quillan & Sandbar", source: "e-mail" });
  expect(leg?.cleared).toMatchObject({ how: "credit-agreed", enteredFor: { saidBy: "B. Quill" } });
  expect(leg?.may).toMatchObject({ quote: "entered", clear: "entered" });
});

it("credit agreed clears billing once, and others learn only that it is met", async () => {
  const move = await seedMove();
  await giveQuote(move.clerkA, aQuote(move, { note: "Canary note" }), anAttempt());
  const credit = { moveId: move.moveId, legId: move.legIds[0], note: "Account 4410 for $4,185.00", enteredFor: null };
  await Promise.allSettled(Array.from({ length: 10 }, () => clearBilling(move.clerkA, credit, anAttempt())));
  expect(await db().select().from(billingClearances).where(eq(billingClearances.moveId, move.moveId))).toHaveLength(1);
  await expect(clearBilling(move.clerkA, credit, anAttempt())).rejects.toMatchObject({ code: "not_yet" });
  expect((await getFacts(move.contractor, move.moveId)).legs[0]?.billingCleared).toBe(true);
  const entries = await db().select().from(record).where(eq(record.moveId, move.moveId));
  const open = entries.filter((entry) => audienceOf(entry.kind as RecordKind) !== "money");
  expect(open.map((entry) => entry.kind)).toEqual(["billing.cleared"]);
  expect(JSON.stringify(open)).not.toMatch(/418500|4,185|4410|Canary/);
});

it("the form tells every field's fault in words", () => {
  const typed = { moveId: `mov_${"0".repeat(28)}`, legId: `leg_${"0".repeat(28)}`, lines: [{ kind: "line-haul", description: " ", amount: "4.185,00" }, { kind: "gift", description: "x", amount: "12" }] };
  const faults = giveQuoteInput.safeParse(typed).error?.issues.map((issue) => issue.path.join("."));
  expect(faults?.toSorted()).toEqual(["lines.0.amount", "lines.0.description", "lines.1.kind"]);
});
