import "server-only";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { paymentEvents } from "@/db/schema";
import { readCheckout } from "@/lib/payments/stripe";
import type { PaymentNotice } from "../checkout";
import { unsafeFindPayment } from "../queries";
import { unsafeFindPage } from "./pages";
import { unsafeKeepStranger, unsafeSettle } from "./settle";

/** No viewer: the payment service speaks, and the door has checked its signature. What the notice says only tells where to look; booked is what the payment service itself answers now. */
export async function unsafeTakeEvent(notice: PaymentNotice, at: Date): Promise<void> {
  const [known] = await db().select({ id: paymentEvents.eventId }).from(paymentEvents).where(eq(paymentEvents.eventId, notice.eventId));
  if (known) return;
  const payment = await unsafeFindPayment(notice);
  if (!payment) return unsafeKeepStranger(db(), notice, at);
  const sessionId = payment.sessionId ?? notice.sessionId ?? (await unsafeFindPage(payment.id, at));
  if (sessionId === null) return unsafeKeepStranger(db(), notice, at);
  await unsafeSettle(payment, { eventId: notice.eventId, type: notice.type, page: await readCheckout(sessionId), told: notice.told }, at);
}
