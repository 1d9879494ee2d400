import { mkdtempSync, rmSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { eq } from "drizzle-orm";
import Stripe from "stripe";
import { POST } from "@/app/api/stripe/webhook/route";
import { db } from "@/db/client";
import { billingClearances, ledgerPostings, outbox, paymentEvents, payments, quotes, record } from "@/db/schema";
import { payQuote } from "@/lib/fees/commands/pay";
import { agreeQuote, giveQuote } from "@/lib/fees/commands/quotes";
import type { GiveQuote } from "@/lib/fees/input";
import { startPaymentService } from "@/lib/local/payments/service";
import { TEST_ENVIRONMENT } from "../../support/environment";
import { anAttempt, seedMove, type SeededMove } from "../../support/factories";

const secretKey = TEST_ENVIRONMENT.STRIPE_SECRET_KEY ?? "";
const webhookSecret = TEST_ENVIRONMENT.STRIPE_WEBHOOK_SECRET ?? "";

type Fault = { kind: string; times?: number; ms?: number };
export type SentEvent = { id: string; type: string; state: string; data: { object: { id: string } } };

/** Our webhook door on a port of its own, and the payment stand-in that calls it. `ahead` moves the stand-in's clock. */
export async function openBench() {
  const statuses: number[] = [];
  const door = createServer((request, response) => {
    void (async () => {
      const chunks: Buffer[] = [];
      for await (const chunk of request as AsyncIterable<Buffer>) chunks.push(chunk);
      const answer = await tellDoor(Buffer.concat(chunks), String(request.headers["stripe-signature"] ?? ""));
      statuses.push(answer.status);
      response.writeHead(answer.status).end();
    })();
  });
  await new Promise<void>((resolve) => door.listen(0, "127.0.0.1", resolve));
  const folder = mkdtempSync(join(tmpdir(), "towfolio-payments-"));
  let aheadMs = 0;
  const webhookUrl = `http://127.0.0.1:${(door.address() as AddressInfo).port}/`;
  const service = await startPaymentService({ port: 0, folder, secretKey, webhookSecret, webhookUrl, retryDelaysMs: [], now: () => Date.now() + aheadMs });
  const { hostname: host, port } = new URL(service.url);
  const post = (path: string, body: BodyInit, type: string) => fetch(`${service.url}${path}`, { method: "POST", body, headers: { "content-type": type }, redirect: "manual" });
  return {
    url: service.url,
    statuses,
    stripe: new Stripe(secretKey, { host, port, protocol: "http", telemetry: false }),
    ahead: (ms: number) => (aheadMs = ms),
    fault: (fault: Fault) => post("/faults", JSON.stringify(fault), "application/json"),
    onPage: (pageUrl: string, action: "pay" | "decline") => post(new URL(pageUrl).pathname, `action=${action}`, "application/x-www-form-urlencoded"),
    deliver: async (eventId: string) => ((await (await post("/deliver", JSON.stringify({ eventId }), "application/json")).json()) as { status: number }).status,
    events: async () => (await (await fetch(`${service.url}/events`)).json()) as SentEvent[],
    close: async () => {
      await service.close();
      await new Promise((resolve) => door.close(resolve));
      rmSync(folder, { recursive: true });
    },
  };
}

/** Sends bytes to the door as the payment service would. */
export const tellDoor = (body: Uint8Array | string, signature: string | null) =>
  POST(new Request("http://localhost/api/stripe/webhook", { method: "POST", body: body as BodyInit, headers: signature === null ? {} : { "stripe-signature": signature } }));

export const sign = (payload: string, given: { secret?: string; timestamp?: number } = {}) => Stripe.webhooks.generateTestHeaderString({ payload, secret: webhookSecret, ...given });

export const aQuote = (move: Pick<SeededMove, "moveId" | "legIds">, given: Partial<GiveQuote> = {}): GiveQuote => ({
  moveId: move.moveId, legId: move.legIds[0], reference: "Q-77", goodUntil: null, note: null, enteredFor: null,
  lines: [{ kind: "line-haul", description: "Sand Hollow to Ardell", amountCents: 400_000 }, { kind: "inspection", description: "Two visits", amountCents: 18_500 }],
  ...given,
});

/** A move with an agreed quote of $4,185.00 on its first leg. */
export async function seedAgreed() {
  const move = await seedMove();
  const { quoteId } = await giveQuote(move.clerkA, aQuote(move), anAttempt());
  await agreeQuote(move.payer, { moveId: move.moveId, quoteId }, anAttempt());
  const step = { moveId: move.moveId, quoteId };
  return { ...move, quoteId, step, pay: (at = new Date()) => payQuote(move.payer, step, anAttempt({ at })) };
}

/** Everything about a quote's money that the database holds. */
export async function stateOf({ moveId, quoteId }: { moveId: string; quoteId: string }) {
  const [quote] = await db().select().from(quotes).where(eq(quotes.id, quoteId));
  const tries = await db().select().from(payments).where(eq(payments.quoteId, quoteId)).orderBy(payments.attempt);
  const postings = await db().select().from(ledgerPostings).where(eq(ledgerPostings.moveId, moveId));
  const cleared = await db().select().from(billingClearances).where(eq(billingClearances.moveId, moveId));
  const mails = await db().select({ kind: outbox.kind, to: outbox.toAddress }).from(outbox).where(eq(outbox.moveId, moveId));
  const entries = await db().select({ kind: record.kind, detail: record.detail, byName: record.byName }).from(record).where(eq(record.moveId, moveId)).orderBy(record.seq);
  const events = (await db().select().from(paymentEvents)).filter((event) => tries.some((one) => one.id === event.paymentId));
  const sums = new Map<string, number>();
  for (const one of postings) sums.set(one.groupId, (sums.get(one.groupId) ?? 0) + one.amountCents);
  return { quote: quote?.state, payments: tries.map((one) => one.state), tries, postings, unbalanced: [...sums.values()].filter((sum) => sum !== 0), cleared, receipts: mails.filter((mail) => mail.kind === "receipt"), entries, events };
}
