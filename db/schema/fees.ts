import { bigint, boolean, index, int, mysqlEnum, mysqlTable, unique, varchar } from "drizzle-orm/mysql-core";
import type { EnteredFor } from "@/lib/access/types";
import { CLEARED_HOW, FEE_KINDS, LEDGER_ACCOUNTS, PAYMENT_STATES, QUOTE_STATES } from "@/lib/fees/vocabulary";
import { code, day, id, instant, jsonText, label, words } from "../columns";
import { companies } from "./companies";
import { legs, moves } from "./moves";

/** What a carrier asks for its leg; the named payer agrees and pays. Amounts in whole cents of US dollars. */
export const quotes = mysqlTable("quotes", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  /** Counts from 1 on a leg. */
  number: int("number").notNull(),
  reference: label("reference"),
  payerCompanyId: id("payer_company_id").notNull().references(() => companies.id),
  totalCents: bigint("total_cents", { mode: "number" }).notNull(),
  note: words("note"),
  goodUntil: day("good_until"),
  state: mysqlEnum("state", QUOTE_STATES).notNull().default("given"),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  givenBy: id("given_by").notNull(),
  givenAt: instant("given_at").notNull(),
  agreedBy: id("agreed_by"),
  agreedAt: instant("agreed_at"),
  voidedAt: instant("voided_at"),
  voidedWhy: label("voided_why"),
  version: int("version").notNull().default(1),
}, (t) => [unique("quotes_number").on(t.legId, t.number), index("quotes_move").on(t.moveId)]);

export const feeLines = mysqlTable("fee_lines", {
  id: id("id").primaryKey(),
  quoteId: id("quote_id").notNull().references(() => quotes.id),
  order: int("line_order").notNull(),
  kind: mysqlEnum("kind", FEE_KINDS).notNull(),
  description: label("description").notNull(),
  amountCents: bigint("amount_cents", { mode: "number" }).notNull(),
}, (t) => [index("fee_lines_quote").on(t.quoteId)]);

/** One try to pay a quote by card. Written before the payment service is asked, so that a lost answer is found again by its key. */
export const payments = mysqlTable("payments", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  quoteId: id("quote_id").notNull().references(() => quotes.id),
  /** Counts from 1 on a quote; only one may be begun or open at a time. */
  attempt: int("attempt").notNull(),
  amountCents: bigint("amount_cents", { mode: "number" }).notNull(),
  state: mysqlEnum("state", PAYMENT_STATES).notNull().default("begun"),
  /** Checkout session and payment intent at the payment service. */
  sessionId: code("session_id"),
  sessionUrl: varchar("session_url", { length: 1000 }),
  intentId: code("intent_id"),
  begunBy: id("begun_by").notNull(),
  begunAt: instant("begun_at").notNull(),
  expiresAt: instant("expires_at"),
  paidAt: instant("paid_at"),
}, (t) => [unique("payments_attempt").on(t.quoteId, t.attempt), unique("payments_session").on(t.sessionId), index("payments_state").on(t.state, t.begunAt), index("payments_intent").on(t.intentId)]);

/** Events of the payment service that were taken in; a second delivery finds its row. */
export const paymentEvents = mysqlTable("payment_events", {
  eventId: code("event_id").primaryKey(),
  type: code("type").notNull(),
  paymentId: id("payment_id"),
  /** What it changed, or why nothing. */
  outcome: label("outcome").notNull(),
  /** Set when a clerk should look: an amount that differs, money after the fact. */
  flagged: boolean("flagged").notNull().default(false),
  at: instant("at").notNull(),
}, (t) => [index("payment_events_payment").on(t.paymentId)]);

/** Double entry: the postings of one group sum to zero. Never changed; a wrong one is reversed. */
export const ledgerPostings = mysqlTable("ledger_postings", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  /** The payment or reversal that moved the money. */
  groupId: id("group_id").notNull(),
  account: mysqlEnum("account", LEDGER_ACCOUNTS).notNull(),
  amountCents: bigint("amount_cents", { mode: "number" }).notNull(),
  at: instant("at").notNull(),
}, (t) => [unique("ledger_postings_once").on(t.groupId, t.account), index("ledger_postings_leg").on(t.legId)]);

/** That money for a leg is settled or credit agreed; others see that it is met, no amount. */
export const billingClearances = mysqlTable("billing_clearances", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  how: mysqlEnum("how", CLEARED_HOW).notNull(),
  note: label("note"),
  /** Null when the paid ledger said so. */
  byUserId: id("by_user_id"),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
}, (t) => [unique("billing_clearances_leg").on(t.legId)]);
