import type Stripe from "stripe";
import { ApiError } from "./api-error";
import { type Books, type Kept, need, newId, type Scope, type SessionRecord } from "./books";
import type { RefundParams } from "./params";

/** What happened to an object, to be told to the application. */
export type Draft = { type: Stripe.Event.Type; object: object; scope: Scope };

/** Takes the payment of an open checkout; what changed comes back in the order the service tells it. */
export function pay(books: Books, record: SessionRecord, payerEmail: string | null, now: number): Draft[] {
  const { scope } = record;
  const email = record.object.customer_email ?? payerEmail;
  const intent = intentOf(books, record, now);
  const charge = chargeOf(intent, email, now, null);
  const paid: Stripe.PaymentIntent = {
    ...intent, amount_received: intent.amount, last_payment_error: null, latest_charge: charge.id, payment_method: charge.payment_method, status: "succeeded",
  };
  const details = { address: null, business_name: null, email, individual_name: null, name: null, phone: null, tax_exempt: "none" as const, tax_ids: [] };
  const done: Stripe.Checkout.Session = { ...record.object, customer_details: details, payment_intent: paid.id, payment_status: "paid", status: "complete", url: null };
  books.charges.put(charge.id, { object: charge, scope });
  books.intents.put(paid.id, { object: paid, scope });
  books.sessions.put(done.id, { ...record, object: done });
  return [
    { type: "payment_intent.succeeded", object: paid, scope },
    { type: "checkout.session.completed", object: done, scope },
  ];
}

/** Declines the card; the checkout stays open for another try. */
export function decline(books: Books, record: SessionRecord, payerEmail: string | null, now: number): Draft[] {
  const { scope } = record;
  const intent = intentOf(books, record, now);
  const charge = chargeOf(intent, record.object.customer_email ?? payerEmail, now, "Your card was declined.");
  const failed: Stripe.PaymentIntent = {
    ...intent,
    latest_charge: charge.id,
    last_payment_error: { type: "card_error", code: "card_declined", decline_code: "generic_decline", message: "Your card was declined.", charge: charge.id },
  };
  books.charges.put(charge.id, { object: charge, scope });
  books.intents.put(failed.id, { object: failed, scope });
  books.sessions.put(record.object.id, { ...record, object: { ...record.object, payment_intent: failed.id } });
  return [{ type: "payment_intent.payment_failed", object: failed, scope }];
}

function intentOf(books: Books, { object, intentData }: SessionRecord, now: number): Stripe.PaymentIntent {
  const earlier = typeof object.payment_intent === "string" ? books.intents.get(object.payment_intent) : undefined;
  if (earlier) return earlier.object;
  const id = newId("pi_3", 23);
  const { amount_total: amount, currency } = object;
  return {
    id, object: "payment_intent", allowed_payment_method_types: null, amount: amount ?? 0, amount_capturable: 0, amount_received: 0, application: null,
    application_fee_amount: intentData?.application_fee_amount ?? null, automatic_payment_methods: null, canceled_at: null, cancellation_reason: null,
    capture_method: intentData?.capture_method ?? "automatic_async", client_secret: newId(`${id}_secret_`, 25), confirmation_method: "automatic",
    created: now, currency: currency ?? "", customer: null, customer_account: null, description: intentData?.description ?? null,
    excluded_payment_method_types: null, last_payment_error: null, latest_charge: null, livemode: false, managed_payments: null,
    metadata: intentData?.metadata ?? {}, next_action: null, on_behalf_of: intentData?.on_behalf_of ?? null, payment_method: null,
    payment_method_configuration_details: null, payment_method_options: {}, payment_method_types: object.payment_method_types, payment_record: null,
    processing: null, receipt_email: intentData?.receipt_email ?? null, review: null, setup_future_usage: null, shipping: null, source: null,
    statement_descriptor: intentData?.statement_descriptor ?? null, statement_descriptor_suffix: intentData?.statement_descriptor_suffix ?? null,
    status: "requires_payment_method", transfer_data: transferOf(intentData?.transfer_data), transfer_group: intentData?.transfer_group ?? null,
  };
}

const transferOf = (data: { destination: string; amount: number | undefined } | undefined) =>
  data ? { destination: data.destination, ...(data.amount === undefined ? {} : { amount: data.amount }) } : null;

function chargeOf(intent: Stripe.PaymentIntent, email: string | null, now: number, failure: string | null): Stripe.Charge {
  const paid = failure === null;
  const { transfer_data: transfer, application_fee_amount: fee } = intent;
  return {
    id: newId("ch_3", 23), object: "charge", amount: intent.amount, amount_captured: paid ? intent.amount : 0, amount_refunded: 0, application: null,
    application_fee: paid && fee ? newId("fee_") : null, application_fee_amount: fee, balance_transaction: paid ? newId("txn_3", 23) : null,
    billing_details: { address: null, email, name: null, phone: null, tax_id: null }, calculated_statement_descriptor: intent.statement_descriptor,
    captured: paid, created: now, currency: intent.currency, customer: null, description: intent.description, disputed: false,
    failure_balance_transaction: null, failure_code: paid ? null : "card_declined", failure_message: failure, fraud_details: {}, livemode: false,
    metadata: intent.metadata, on_behalf_of: intent.on_behalf_of,
    outcome: {
      advice_code: null, network_advice_code: null, network_decline_code: null, network_status: paid ? "approved_by_network" : "declined_by_network",
      reason: paid ? null : "generic_decline", risk_level: "normal", seller_message: paid ? "Payment complete." : "The bank did not return any further details with this decline.",
      type: paid ? "authorized" : "issuer_declined",
    },
    paid, payment_intent: intent.id, payment_method: newId("pm_1", 23), payment_method_details: null, receipt_email: intent.receipt_email,
    receipt_number: null, receipt_url: null, refunded: false, review: null, shipping: null, source: null, source_transfer: null,
    statement_descriptor: intent.statement_descriptor, statement_descriptor_suffix: intent.statement_descriptor_suffix, status: paid ? "succeeded" : "failed",
    ...(paid && transfer ? { transfer: newId("tr_3", 23) } : {}),
    transfer_data: transfer ? { amount: transfer.amount ?? null, destination: transfer.destination } : null, transfer_group: intent.transfer_group,
  };
}

/** Gives money back, all that is left or a part. */
export function refund(books: Books, scope: Scope, params: RefundParams, now: number): { refund: Stripe.Refund; drafts: Draft[] } {
  const { object: charge } = chargeToRefund(books, scope, params);
  const left = charge.amount - charge.amount_refunded;
  const refuse = (message: string, code?: string, param?: string) => new ApiError(400, { message, ...(code ? { code } : {}), ...(param ? { param } : {}) }, true);
  if (left === 0) throw refuse(`Charge ${charge.id} has already been refunded.`, "charge_already_refunded");
  const amount = params.amount ?? left;
  if (amount > left) throw refuse(`Refund amount (${amount}) is greater than unrefunded amount on charge (${left})`, undefined, "amount");
  if (params.reverse_transfer && !charge.transfer) throw refuse("Cannot reverse transfer on a charge that has no transfer.", undefined, "reverse_transfer");
  if (params.refund_application_fee && !charge.application_fee) throw refuse("Cannot refund application fee on a charge that has none.", undefined, "refund_application_fee");
  const given: Stripe.Refund = {
    id: newId("re_3", 23), object: "refund", amount, balance_transaction: newId("txn_3", 23), charge: charge.id, created: now, currency: charge.currency,
    customer: null, customer_account: null, metadata: params.metadata, payment_intent: charge.payment_intent, payment_method: charge.payment_method,
    reason: params.reason ?? null, receipt_number: null, source_transfer_reversal: null, status: "succeeded",
    transfer_reversal: params.reverse_transfer ? newId("trr_1", 23) : null,
  };
  const changed = { ...charge, amount_refunded: charge.amount_refunded + amount, refunded: amount === left };
  books.refunds.put(given.id, { object: given, scope });
  books.charges.put(charge.id, { object: changed, scope });
  return { refund: given, drafts: [{ type: "charge.refunded", object: changed, scope }] };
}

function chargeToRefund(books: Books, scope: Scope, params: RefundParams): Kept<Stripe.Charge> {
  const { payment_intent: intentId, charge: chargeId } = params;
  if ((intentId === undefined) === (chargeId === undefined)) {
    throw new ApiError(400, { code: "parameter_missing", message: "One of the following params should be provided for this request: payment_intent or charge.", param: "payment_intent" });
  }
  if (chargeId !== undefined) return need(books.charges, chargeId, scope, "charge", "charge");
  const { object: intent } = need(books.intents, intentId ?? "", scope, "payment_intent", "payment_intent");
  if (intent.status !== "succeeded" || typeof intent.latest_charge !== "string") {
    throw new ApiError(400, { message: `This PaymentIntent (${intent.id}) does not have a successful charge to refund.`, param: "payment_intent" }, true);
  }
  return need(books.charges, intent.latest_charge, scope, "charge");
}
