import { index, int, mysqlEnum, mysqlTable, unique, varchar } from "drizzle-orm/mysql-core";
import type { EnteredFor } from "@/lib/access/types";
import type { RestrictionId } from "@/lib/acceptance/vocabulary";
import { FINDING_ENTRIES, FINDING_STATES, SEVERITIES } from "@/lib/findings/vocabulary";
import { AIR_STATES } from "@/lib/inspections/vocabulary";
import { code, day, id, instant, jsonText, label, words, zone } from "../columns";
import { legs, moves } from "./moves";

/** A carrier inspector's visit to the unit. */
export const inspections = mysqlTable("inspections", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  /** Counts from 1 on a leg. */
  number: int("number").notNull(),
  visitedOn: day("visited_on").notNull(),
  place: label("place").notNull(),
  zone: zone("zone").notNull(),
  inspectorName: label("inspector_name").notNull(),
  air: mysqlEnum("air", AIR_STATES).notNull(),
  /** From what the air came, such as the contractor's compressor. */
  airSource: label("air_source"),
  airPsi: int("air_psi"),
  note: words("note"),
  byUserId: id("by_user_id").notNull(),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
}, (t) => [unique("inspections_number").on(t.legId, t.number), index("inspections_move").on(t.moveId)]);

/** Something an inspector wrote down against the unit. What was said stays; the state moves on. */
export const findings = mysqlTable("findings", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  inspectionId: id("inspection_id").notNull().references(() => inspections.id),
  /** Counts from 1 on the move; shown as F-01. */
  number: int("number").notNull(),
  componentId: code("component_id").notNull(),
  placeId: code("place_id"),
  /** Where it is, in words, when the outline has no such place or to be more exact. */
  placeNote: label("place_note"),
  observed: words("observed").notNull(),
  /** Reading as typed with its unit, when something was measured. */
  reading: varchar("reading", { length: 60 }),
  /** Under which condition it was seen or measured. */
  condition: label("condition_text"),
  severity: mysqlEnum("severity", SEVERITIES).notNull(),
  noPhotoReason: label("no_photo_reason"),
  state: mysqlEnum("state", FINDING_STATES).notNull().default("open"),
  /** Rounds of answer and reply so far. */
  rounds: int("rounds").notNull().default(0),
  byUserId: id("by_user_id").notNull(),
  byName: label("by_name").notNull(),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
  version: int("version").notNull().default(1),
}, (t) => [unique("findings_number").on(t.moveId, t.number), index("findings_leg").on(t.legId, t.state)]);

/** What was said about a finding: answers, replies, clearing. Written once, never changed. */
export const findingEntries = mysqlTable("finding_entries", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  findingId: id("finding_id").notNull().references(() => findings.id),
  round: int("round").notNull(),
  kind: mysqlEnum("kind", FINDING_ENTRIES).notNull(),
  text: words("text").notNull(),
  reading: varchar("reading", { length: 60 }),
  /** What would satisfy the inspector, when not cleared. */
  wouldSatisfy: words("would_satisfy"),
  byUserId: id("by_user_id").notNull(),
  byName: label("by_name").notNull(),
  byCompanyName: label("by_company_name").notNull(),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
}, (t) => [index("finding_entries_finding").on(t.findingId, t.at)]);

/** An inspector's word that the unit is mechanically fit to go on one leg. Money has no say in it. */
export const acceptances = mysqlTable("acceptances", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  legId: id("leg_id").notNull().references(() => legs.id),
  /** The carrier's own number for it. */
  number: varchar("number", { length: 60 }),
  restrictions: jsonText<RestrictionId[]>("restrictions").notNull(),
  restrictionNote: words("restriction_note"),
  validUntil: day("valid_until"),
  signatureId: id("signature_id").notNull(),
  at: instant("at").notNull(),
  withdrawnAt: instant("withdrawn_at"),
  withdrawnWhy: label("withdrawn_why"),
}, (t) => [index("acceptances_leg").on(t.legId, t.withdrawnAt)]);
