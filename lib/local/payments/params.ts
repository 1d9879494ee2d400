import { address, currency, email, flag, hash, integer, list, metadata, notPlayed, oneOf, optional, type Reader, text } from "./readers";

const LARGEST_AMOUNT = 99_999_999;

const expand = optional(list(text()));
const created = optional<number | { gt: number | undefined; gte: number | undefined; lt: number | undefined; lte: number | undefined }>((value, at) =>
  typeof value === "string"
    ? integer()(value, at)
    : hash({ gt: optional(integer()), gte: optional(integer()), lt: optional(integer()), lte: optional(integer()) })(value, at),
);

/** What every list can be asked. */
const paging = { limit: optional(integer(1, 100)), starting_after: optional(text()), ending_before: optional(text()), created, expand };

/** Names of the service's own parameters, told apart from names that do not exist. */
function notPlayedNames<const Name extends string>(...names: Name[]): Record<Name, Reader<undefined>> {
  return Object.fromEntries(names.map((name) => [name, notPlayed])) as Record<Name, Reader<undefined>>;
}

const lineItem = hash({
  price_data: hash({
    currency,
    unit_amount: integer(0, LARGEST_AMOUNT),
    product_data: hash({
      name: text(),
      description: optional(text()),
      images: optional(list(address)),
      metadata,
      tax_code: optional(text()),
    }),
    tax_behavior: optional(oneOf("exclusive", "inclusive", "unspecified")),
    ...notPlayedNames("product", "recurring", "unit_amount_decimal"),
  }),
  quantity: integer(1, 999_999),
  metadata,
  ...notPlayedNames("price", "adjustable_quantity", "dynamic_tax_rates", "tax_rates"),
});

const paymentIntentData = hash({
  application_fee_amount: optional(integer(1)),
  capture_method: optional(oneOf("automatic", "automatic_async")),
  description: optional(text()),
  metadata,
  on_behalf_of: optional(text()),
  receipt_email: optional(email),
  statement_descriptor: optional(text(22)),
  statement_descriptor_suffix: optional(text(22)),
  transfer_data: optional(hash({ destination: text(), amount: optional(integer(1)) })),
  transfer_group: optional(text()),
  ...notPlayedNames("setup_future_usage", "shipping"),
});

/** POST /v1/checkout/sessions */
export const sessionParams = hash({
  mode: oneOf("payment"),
  line_items: list(lineItem),
  success_url: address,
  cancel_url: optional(address),
  client_reference_id: optional(text(200)),
  currency: optional(currency),
  customer_email: optional(email),
  expires_at: optional(integer()),
  locale: optional(text(10)),
  metadata,
  payment_intent_data: optional(paymentIntentData),
  allowed_payment_method_types: optional(list(oneOf("card"))),
  submit_type: optional(oneOf("auto", "book", "donate", "pay", "subscribe")),
  ui_mode: optional(oneOf("hosted_page")),
  expand,
  ...notPlayedNames(
    "adaptive_pricing", "after_expiration", "allow_promotion_codes", "automatic_tax", "billing_address_collection",
    "branding_settings", "consent_collection", "custom_fields", "custom_text", "customer", "customer_account", "customer_creation", "customer_update",
    "discounts", "excluded_payment_method_types", "integration_identifier", "invoice_creation", "managed_payments", "name_collection", "optional_items",
    "origin_context", "payment_method_collection", "payment_method_configuration", "payment_method_data", "payment_method_options", "permissions",
    "phone_number_collection", "redirect_on_completion", "return_url", "saved_payment_method_options", "setup_intent_data",
    "shipping_address_collection", "shipping_options", "subscription_data", "tax_id_collection", "wallet_options",
  ),
});

/** POST /v1/refunds */
export const refundParams = hash({
  payment_intent: optional(text()),
  charge: optional(text()),
  amount: optional(integer(1)),
  reason: optional(oneOf("duplicate", "fraudulent", "requested_by_customer")),
  refund_application_fee: optional(flag),
  reverse_transfer: optional(flag),
  metadata,
  expand,
  ...notPlayedNames("currency", "customer", "instructions_email", "origin"),
});

const capability = optional(hash({ requested: flag }));

/** POST /v1/accounts */
export const accountParams = hash({
  type: optional(oneOf("custom", "express", "standard")),
  country: optional(text(2)),
  email: optional(email),
  business_type: optional(oneOf("company", "government_entity", "individual", "non_profit")),
  business_profile: optional(hash({ name: optional(text()), url: optional(address), mcc: optional(text(4)), product_description: optional(text()) })),
  capabilities: optional(hash({ card_payments: capability, transfers: capability })),
  default_currency: optional(currency),
  metadata,
  expand,
  ...notPlayedNames("account_token", "company", "controller", "documents", "external_account", "groups", "individual", "settings", "tos_acceptance"),
});

export const noParams = hash({ expand });
export const sessionListParams = hash({ ...paging, payment_intent: optional(text()), status: optional(oneOf("complete", "expired", "open")) });
export const refundListParams = hash({ ...paging, payment_intent: optional(text()), charge: optional(text()) });
export const eventListParams = hash({ ...paging, type: optional(text()), types: optional(list(text())), delivery_success: optional(flag) });
export const pagingParams = hash(paging);

export type SessionParams = ReturnType<typeof sessionParams>;
export type RefundParams = ReturnType<typeof refundParams>;
export type AccountParams = ReturnType<typeof accountParams>;
export type Paging = ReturnType<typeof pagingParams>;
