import type Stripe from "stripe";
import { ApiError } from "./api-error";
import { type Books, type Line, newId, type Scope, type SessionRecord } from "./books";
import type { SessionParams } from "./params";

const HALF_HOUR = 1800;
const DAY = 86_400;
const LARGEST_TOTAL = 99_999_999;
/** Smallest charge in minor units, from memory of the service's table; other currencies are not checked. */
const SMALLEST_TOTALS: Record<string, number> = { usd: 50, cad: 50, eur: 50, gbp: 30, mxn: 1000 };

type Making = { books: Books; scope: Scope; now: number; urlOf(id: string): string };

/** Opens a checkout after the checks that go over several parameters. */
export function createSession({ books, scope, now, urlOf }: Making, params: SessionParams): SessionRecord {
  const money = params.line_items[0]?.price_data.currency;
  if (money === undefined) throw new ApiError(400, { message: "The `line_items` parameter is required in payment mode.", param: "line_items", code: "parameter_missing" });
  if (params.line_items.some((line) => line.price_data.currency !== money) || (params.currency ?? money) !== money) {
    throw new ApiError(400, { message: "All line items must have the same currency.", param: "line_items" });
  }
  const lines = params.line_items.map((line) => lineOf(line, now));
  const total = lines.reduce((sum, line) => sum + line.amount_total, 0);
  checkTotal(total, money);
  checkSplit(books, scope, params, total);
  const expiresAt = params.expires_at ?? now + DAY;
  if (expiresAt < now + HALF_HOUR) throw new ApiError(400, { message: "The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.", param: "expires_at" });
  if (expiresAt > now + DAY) throw new ApiError(400, { message: "The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.", param: "expires_at" });
  const id = newId("cs_test_", 58);
  const object = sessionOf(params, { id, url: urlOf(id), now, total, money, expiresAt });
  return books.sessions.put(id, { object, scope, lines, intentData: params.payment_intent_data });
}

function lineOf({ price_data, quantity, metadata }: SessionParams["line_items"][number], now: number): Line {
  const amount = price_data.unit_amount * quantity;
  return {
    id: newId("li_"), object: "item", adjustable_quantity: null, amount_discount: 0, amount_subtotal: amount, amount_tax: 0, amount_total: amount,
    currency: price_data.currency, description: price_data.product_data.name, metadata, quantity,
    price: {
      id: newId("price_"), object: "price", active: false, billing_scheme: "per_unit", created: now, currency: price_data.currency, custom_unit_amount: null,
      livemode: false, lookup_key: null, metadata: {}, nickname: null, product: newId("prod_", 14), recurring: null,
      tax_behavior: price_data.tax_behavior ?? "unspecified", tiers_mode: null, transform_quantity: null, type: "one_time",
      unit_amount: price_data.unit_amount, unit_amount_decimal: String(price_data.unit_amount),
    },
  };
}

function checkTotal(total: number, money: string): void {
  const smallest = SMALLEST_TOTALS[money] ?? 0;
  if (total < smallest) throw new ApiError(400, { code: "amount_too_small", message: `The Checkout Session's total amount due must add up to at least ${smallest} in the smallest unit of ${money}.`, param: "line_items" });
  if (total > LARGEST_TOTAL) throw new ApiError(400, { code: "amount_too_large", message: `The Checkout Session's total amount must be no more than ${LARGEST_TOTAL}.`, param: "line_items" });
}

/** Who gets which part of the money. */
function checkSplit(books: Books, scope: Scope, params: SessionParams, total: number): void {
  const { application_fee_amount: fee, transfer_data: transfer, on_behalf_of: behalf } = params.payment_intent_data ?? {};
  const at = (name: string) => `payment_intent_data[${name}]`;
  for (const [account, param] of [[transfer?.destination, at("transfer_data][destination")], [behalf, at("on_behalf_of")]] as const) {
    if (account !== undefined && !books.accounts.get(account)) throw new ApiError(400, { code: "resource_missing", message: `No such destination: '${account}'`, param: param ?? "" });
  }
  if (transfer?.amount !== undefined && fee !== undefined) throw new ApiError(400, { message: "You may only provide one of application_fee_amount or transfer_data[amount].", param: at("application_fee_amount") });
  if (fee !== undefined && transfer === undefined && scope === null) {
    throw new ApiError(400, { message: "Can only apply an application_fee_amount when the PaymentIntent is attempting a direct payment (using an OAuth key or Stripe-Account header) or destination payment (using `transfer_data[destination]`).", param: at("application_fee_amount") });
  }
  for (const [amount, param] of [[fee, "application_fee_amount"], [transfer?.amount, "transfer_data][amount"]] as const) {
    if (amount !== undefined && amount > total) throw new ApiError(400, { message: `The amount of ${param} must be less than or equal to the payment's amount.`, param: at(param) });
  }
}

type Facts = { id: string; url: string; now: number; total: number; money: string; expiresAt: number };

function sessionOf(params: SessionParams, { id, url, now, total, money, expiresAt }: Facts): Stripe.Checkout.Session {
  return {
    id, object: "checkout.session", adaptive_pricing: null, after_expiration: null, allow_promotion_codes: null, allowed_payment_method_types: params.allowed_payment_method_types ?? null,
    amount_subtotal: total, amount_total: total, automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: null, cancel_url: params.cancel_url ?? null, client_reference_id: params.client_reference_id ?? null, client_secret: null,
    collected_information: null, consent: null, consent_collection: null, created: now, currency: money, currency_conversion: null, custom_fields: [],
    custom_text: { after_submit: null, shipping_address: null, submit: null, terms_of_service_acceptance: null }, customer: null, customer_account: null,
    customer_creation: "if_required", customer_details: null, customer_email: params.customer_email ?? null, discounts: [], expires_at: expiresAt,
    integration_identifier: null, invoice: null, invoice_creation: null, livemode: false, locale: params.locale ?? null, managed_payments: null,
    metadata: params.metadata, mode: "payment", origin_context: null, payment_intent: null, payment_link: null, payment_method_collection: "if_required",
    payment_method_configuration_details: null, payment_method_options: {}, payment_method_types: params.allowed_payment_method_types ?? ["card"],
    payment_status: "unpaid", permissions: null, recovered_from: null, saved_payment_method_options: null, setup_intent: null,
    shipping_address_collection: null, shipping_cost: null, shipping_options: [], status: "open", submit_type: params.submit_type ?? null,
    subscription: null, success_url: params.success_url, total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: "hosted_page", url, wallet_options: null,
  };
}

/** Ends an open checkout without a payment. */
export function expireSession(books: Books, record: SessionRecord): SessionRecord {
  const { status } = record.object;
  if (status !== "open") {
    throw new ApiError(400, { message: `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of ${status}.` }, true);
  }
  return books.sessions.put(record.object.id, { ...record, object: { ...record.object, status: "expired", url: null } });
}
