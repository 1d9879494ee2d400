import { index, mysqlEnum, mysqlTable, unique, varchar } from "drizzle-orm/mysql-core";
import type { EnteredFor } from "@/lib/access/types";
import { SIGHTING_KINDS } from "@/lib/movement/vocabulary";
import { day, id, instant, jsonText, label, words, zone } from "../columns";
import { legs, moves } from "./moves";

/** A transport desk's instruction to move the unit on its leg. */
export const instructions = mysqlTable("instructions", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  /** Bill-of-lading number that the carrier moves it under. */
  billNumber: varchar("bill_number", { length: 60 }).notNull(),
  /** Clearance file number, where the carrier asks for one. */
  clearanceNumber: varchar("clearance_number", { length: 60 }),
  train: varchar("train", { length: 40 }),
  pickupFrom: day("pickup_from"),
  text: words("text"),
  byUserId: id("by_user_id").notNull(),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
  withdrawnAt: instant("withdrawn_at"),
  withdrawnWhy: label("withdrawn_why"),
}, (t) => [index("instructions_leg").on(t.legId, t.withdrawnAt)]);

/** The owner tenders the unit to the first carrier (the trade's meaning of released). */
export const releases = mysqlTable("releases", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  note: words("note"),
  signatureId: id("signature_id").notNull(),
  at: instant("at").notNull(),
}, (t) => [unique("releases_leg").on(t.legId)]);

/** Any report of where the unit was. Never changed: a wrong one is retracted and said anew. */
export const sightings = mysqlTable("sightings", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  kind: mysqlEnum("kind", SIGHTING_KINDS).notNull(),
  place: label("place").notNull(),
  zone: zone("zone").notNull(),
  /** When it happened, which is not when we heard of it. */
  occurredAt: instant("occurred_at").notNull(),
  train: varchar("train", { length: 40 }),
  note: words("note"),
  byUserId: id("by_user_id").notNull(),
  byName: label("by_name").notNull(),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
  retractedAt: instant("retracted_at"),
  retractedWhy: label("retracted_why"),
  /** The sighting that this one corrects. */
  corrects: id("corrects"),
}, (t) => [index("sightings_move").on(t.moveId, t.occurredAt), index("sightings_leg").on(t.legId, t.kind)]);

/** The receiver's look at the unit on arrival. */
export const arrivals = mysqlTable("arrivals", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  arrivedOn: day("arrived_on").notNull(),
  condition: words("condition_text").notNull(),
  missing: words("missing"),
  signatureId: id("signature_id").notNull(),
  byUserId: id("by_user_id").notNull(),
  at: instant("at").notNull(),
}, (t) => [unique("arrivals_move").on(t.moveId)]);
