import "server-only";
import { and, eq, inArray, lte } from "drizzle-orm";
import { db } from "@/db/client";
import { payments } from "@/db/schema";
import { requireMove } from "@/lib/access/scope";
import { refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { PaymentServiceError } from "@/lib/payments/stripe";
import { requireLeg, writeOnMove } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { isWaiting, PAGE_MINUTES } from "../checkout";
import type { QuoteStep } from "../input";
import { denyPay, serviceAway } from "../rules";
import { unsafeCheckPayment } from "./checks";
import { unsafeOpenPage } from "./pages";
import { requireQuote } from "./quotes";

/** Gives the address of the payment page for an agreed quote: of the one that is open, or of a new one. The payment is written down before the payment service is asked. */
export async function payQuote(viewer: Viewer, input: QuoteStep, attempt: Attempt): Promise<{ paymentId: string; url: string }> {
  await endOverdue(viewer, input, attempt.at);
  const { paymentId } = await begin(viewer, input, attempt);
  return { paymentId, url: await unsafeOpenPage(paymentId, attempt.at) };
}

async function begin(viewer: Viewer, input: QuoteStep, attempt: Attempt): Promise<{ paymentId: string }> {
  return writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const quote = await requireQuote(ctx, input.quoteId);
    ctx.allow({ action: "fee.pay", legId: quote.legId });
    refuse(denyPay(quote));
    const before = await ctx.tx.select({ id: payments.id, state: payments.state }).from(payments).where(eq(payments.quoteId, quote.id));
    const waiting = before.find((one) => isWaiting(one.state));
    if (waiting) return { paymentId: waiting.id };
    const leg = await requireLeg(ctx.tx, ctx.move.id, quote.legId);
    const paymentId = newId("payment");
    const number = before.length + 1;
    // The page lives by the clock of the payment service, also where a step is entered with an earlier date.
    const expiresAt = new Date(Math.max(ctx.at.getTime(), Date.now()) + PAGE_MINUTES * 60_000);
    await ctx.tx.insert(payments).values({ id: paymentId, moveId: ctx.move.id, quoteId: quote.id, attempt: number, amountCents: quote.totalCents, begunBy: viewer.userId, begunAt: ctx.at, expiresAt });
    await ctx.append({ kind: "payment.begun", legId: leg.id, detail: { paymentId, quoteId: quote.id, number: quote.number, attempt: number, carrier: leg.carrierName, amountCents: quote.totalCents } });
    return { paymentId };
  });
}

/** A page whose time is over may have been paid in its last minute without our hearing of it; that is asked before another is opened. */
async function endOverdue(viewer: Viewer, { moveId, quoteId }: QuoteStep, now: Date) {
  await requireMove(viewer, moveId);
  const rows = await db().select({ id: payments.id }).from(payments)
    .where(and(eq(payments.moveId, moveId), eq(payments.quoteId, quoteId), inArray(payments.state, ["begun", "open"]), lte(payments.expiresAt, now)));
  try {
    for (const { id } of rows) await unsafeCheckPayment(id, now);
  } catch (error) {
    throw error instanceof PaymentServiceError ? serviceAway(error) : error;
  }
}
