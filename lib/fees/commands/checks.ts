import "server-only";
import { and, asc, eq, inArray, lte } from "drizzle-orm";
import { db } from "@/db/client";
import { moves, payments, quotes } from "@/db/schema";
import { endCheckout, PaymentServiceError, readCheckout } from "@/lib/payments/stripe";
import { isWaiting, type Checkout } from "../checkout";
import { unsafeFindPage } from "./pages";
import { unsafeSettle } from "./settle";

/** Notices usually come within seconds; after this we ask ourselves. */
const ASK_AFTER_MS = 2 * 60_000;
const AT_ONCE = 50;

/** No viewer: the worker's own. Asks the payment service about one payment that still waits, books what it says, and ends a page whose time, quote or move is over. */
export async function unsafeCheckPayment(paymentId: string, now: Date): Promise<void> {
  const [row] = await db().select({ payment: payments, quoteState: quotes.state, moveState: moves.state }).from(payments).innerJoin(quotes, eq(quotes.id, payments.quoteId)).innerJoin(moves, eq(moves.id, payments.moveId)).where(eq(payments.id, paymentId));
  if (!row || !isWaiting(row.payment.state)) return;
  const { payment, quoteState, moveState } = row;
  const over = quoteState !== "agreed" || moveState !== "open" || (payment.expiresAt !== null && payment.expiresAt <= now);
  // Nobody was ever handed the address of a page that we never learned of, so nobody can pay on it.
  const page = payment.state === "begun" && over ? null : await pageNow(payment, over, now);
  if (page && !page.paid && page.status !== "expired" && !(page.status === "complete" && page.intentDead)) return;
  const seen = page === null ? "over" : page.paid ? "paid" : page.status;
  await unsafeSettle(payment, { eventId: `own_${payment.id}_${seen}`, type: "check", page, told: null }, now);
}

/** The page as it is, ended first when its time is over; null for one that the payment service does not know, once its time is over. */
async function pageNow(payment: { id: string; sessionId: string | null }, over: boolean, now: Date): Promise<Checkout | null> {
  try {
    const sessionId = payment.sessionId ?? (await unsafeFindPage(payment.id, now));
    const seen = sessionId === null ? null : await readCheckout(sessionId);
    return seen && over && seen.status === "open" ? await endCheckout(seen.sessionId) : seen;
  } catch (error) {
    if (over && error instanceof PaymentServiceError && error.kind === "refused") return null;
    throw error;
  }
}

/** No viewer: the worker's own, every few minutes. Asks about the payments whose notice should have come by now; one that fails does not stop the others. */
export async function unsafeCheckOpenPayments(now: Date): Promise<{ asked: number; failed: number }> {
  const rows = await db().select({ id: payments.id }).from(payments)
    .where(and(inArray(payments.state, ["begun", "open"]), lte(payments.begunAt, new Date(now.getTime() - ASK_AFTER_MS)))).orderBy(asc(payments.begunAt)).limit(AT_ONCE);
  let failed = 0;
  for (const { id } of rows) {
    try {
      await unsafeCheckPayment(id, now);
    } catch (error) {
      failed += 1;
      console.warn(`payment ${id} could not be checked: ${error instanceof Error ? error.message : String(error)}`);
    }
  }
  return { asked: rows.length, failed };
}
