import type Stripe from "stripe";
import { type Books, newId } from "./books";
import type { AccountParams } from "./params";

/** Opens a connected account. There is no onboarding here: it can take payments at once. */
export function createAccount(books: Books, params: AccountParams, now: number): Stripe.Account {
  const { card_payments: cards, transfers } = params.capabilities ?? {};
  const profile = params.business_profile;
  const account: Stripe.Account = {
    ...bareAccount(newId("acct_1", 16), now),
    business_profile: {
      annual_revenue: null, estimated_worker_count: null, mcc: profile?.mcc ?? null, minority_owned_business_designation: null, name: profile?.name ?? null,
      product_description: profile?.product_description ?? null, specified_commercial_transactions_act_url: null, support_address: null, support_email: null, support_phone: null, support_url: null,
      url: profile?.url ?? null,
    },
    business_type: params.business_type ?? null,
    capabilities: { ...(cards?.requested ? { card_payments: "active" } : {}), ...(transfers?.requested ? { transfers: "active" } : {}) },
    country: params.country ?? "US",
    default_currency: params.default_currency ?? "usd",
    email: params.email ?? null,
    metadata: params.metadata,
    type: params.type ?? "standard",
  };
  return books.accounts.put(account.id, { object: account, scope: null }).object;
}

/** The platform's own account. */
export const ownAccount = (now: number) => bareAccount("acct_1StandInPlatform", now);

const bareAccount = (id: string, now: number): Stripe.Account => ({
  id,
  object: "account",
  charges_enabled: true,
  country: "US",
  created: now,
  default_currency: "usd",
  details_submitted: true,
  email: null,
  metadata: {},
  payouts_enabled: true,
  type: "standard",
});
