import "server-only";
import { and, asc, eq } from "drizzle-orm";
import { db } from "@/db/client";
import { companies, feeLines, legs, payments, quotes, users } from "@/db/schema";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { createCheckout, PaymentServiceError } from "@/lib/payments/stripe";
import { routes } from "@/lib/routes";
import { unsafeCaseHead } from "../queries";
import { serviceAway } from "../rules";
import { FEE_LABELS } from "../vocabulary";
import { unsafeSettle } from "./settle";

type Payment = typeof payments.$inferSelect;

/** No viewer: the caller has checked who pays, or is the worker. Opens the page of a begun payment, or finds the one that an answer was lost for; gives its address. Asked outside of any transaction. */
export async function unsafeOpenPage(paymentId: string, at: Date): Promise<string> {
  const payment = await readPayment(paymentId);
  if (payment.state === "open" && payment.sessionUrl) return payment.sessionUrl;
  if (payment.state !== "begun") throw ended(payment);
  const page = await askForPage(payment, at);
  await db().update(payments).set({ state: "open", sessionId: page.sessionId, sessionUrl: page.url, expiresAt: page.expiresAt ? new Date(page.expiresAt) : payment.expiresAt })
    .where(and(eq(payments.id, payment.id), eq(payments.state, "begun")));
  const now = await readPayment(paymentId);
  if (now.state !== "open" || !now.sessionUrl) throw ended(now);
  return now.sessionUrl;
}

/** No viewer: see `unsafeOpenPage`. The page of a payment whose answer was lost, by its id; null when the payment has ended without one. */
export async function unsafeFindPage(paymentId: string, at: Date): Promise<string | null> {
  const { state } = await readPayment(paymentId);
  if (state === "begun") await unsafeOpenPage(paymentId, at);
  return (await readPayment(paymentId)).sessionId;
}

const ended = ({ state }: Payment) =>
  new AppError("not_yet", state === "paid" || state === "late" ? "This is paid already." : "That payment page has ended. Nothing was paid; start again.");

async function readPayment(paymentId: string): Promise<Payment> {
  const [row] = await db().select().from(payments).where(eq(payments.id, paymentId));
  if (!row) throw new AppError("not_found", "No such payment.");
  return row;
}

async function askForPage(payment: Payment, at: Date) {
  try {
    return await createCheckout(await pageFor(payment));
  } catch (error) {
    if (!(error instanceof PaymentServiceError)) throw error;
    console.warn(`payment ${payment.id}: ${error.kind}: ${error.message}`);
    if (error.kind === "away") throw serviceAway(error);
    await unsafeSettle(payment, { eventId: `own_${payment.id}_refused`, type: "refused", page: null, told: null }, at);
    throw new AppError("busy", "The payment service would not open a page for this. Nothing was charged; try again, and tell the carrier if it stays so.", { cause: error });
  }
}

/** The same for every try of one payment: the service refuses another content under the same key. */
async function pageFor({ id, quoteId, moveId, begunBy, begunAt, expiresAt }: Payment) {
  const [row] = await db().select({ number: quotes.number, carrierName: legs.carrierName, payeeAccount: companies.payeeAccount, email: users.email }).from(quotes)
    .innerJoin(legs, eq(legs.id, quotes.legId)).leftJoin(companies, eq(companies.id, legs.carrierCompanyId)).innerJoin(users, eq(users.id, begunBy)).where(eq(quotes.id, quoteId));
  if (!row) throw new AppError("not_found", "No such quote.");
  const lines = await db().select().from(feeLines).where(eq(feeLines.quoteId, quoteId)).orderBy(asc(feeLines.order));
  const { unit, caseNumber } = await unsafeCaseHead(db(), moveId);
  const site = env().APP_URL;
  return {
    paymentId: id, quoteId, moveId, email: row.email, payeeAccount: row.payeeAccount, expiresAt: expiresAt ?? begunAt,
    lines: lines.map((line) => ({ name: `${FEE_LABELS[line.kind]}: ${line.description}`, amountCents: line.amountCents })),
    description: [`Case ${caseNumber}`, unit, row.carrierName, `quote ${row.number}`].filter(Boolean).join(", "),
    successUrl: `${site}${routes.paid(moveId)}?session={CHECKOUT_SESSION_ID}`,
    cancelUrl: `${site}${routes.fees(moveId)}`,
  };
}
