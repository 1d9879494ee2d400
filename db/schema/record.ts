import { index, int, mysqlEnum, mysqlTable, unique } from "drizzle-orm/mysql-core";
import { PARTS } from "@/lib/access/vocabulary";
import type { EnteredFor } from "@/lib/access/types";
import { SIGNATURE_KINDS } from "@/lib/record/vocabulary";
import { code, id, instant, jsonText, label, sha256, words } from "../columns";
import { users } from "./auth";
import { moves } from "./moves";

/** What happened on a move, in order, never changed. The application's database user may only INSERT and SELECT here. */
export const record = mysqlTable("record", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  /** Counts from 1 on each move; two writers of one number is an error, never a fork. */
  seq: int("seq").notNull(),
  kind: code("kind").notNull(),
  /** Null when a service spoke (the payment webhook). */
  byUserId: id("by_user_id"),
  byName: label("by_name").notNull(),
  byCompanyId: id("by_company_id"),
  byCompanyName: label("by_company_name"),
  byPart: mysqlEnum("by_part", PARTS),
  legId: id("leg_id"),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  detail: jsonText<Record<string, unknown>>("detail").notNull(),
  at: instant("at").notNull(),
  /** Hash of the entry before; 64 zeros for the first. */
  previous: sha256("previous").notNull(),
  /** SHA-256 over `previous` and this entry's canonical JSON; see lib/record/chain. */
  hash: sha256("hash").notNull(),
}, (t) => [unique("record_seq").on(t.moveId, t.seq)]);

/** A name under exactly the rows that were shown; a later change lifts it and says why. */
export const signatures = mysqlTable("signatures", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  kind: mysqlEnum("kind", SIGNATURE_KINDS).notNull(),
  /** The acceptance, release or arrival that is signed; the move for prep. */
  subjectId: id("subject_id").notNull(),
  userId: id("user_id").notNull().references(() => users.id),
  companyId: id("company_id").notNull(),
  /** As typed under the statement. */
  name: label("name").notNull(),
  statement: words("statement").notNull(),
  rowsHash: sha256("rows_hash").notNull(),
  enteredFor: jsonText<EnteredFor>("entered_for"),
  at: instant("at").notNull(),
  liftedAt: instant("lifted_at"),
  liftedWhy: label("lifted_why"),
}, (t) => [index("signatures_move").on(t.moveId, t.kind)]);

/** What site administrators and the sign-in did outside of any move; append-only like the record. */
export const siteLog = mysqlTable("site_log", {
  id: id("id").primaryKey(),
  kind: code("kind").notNull(),
  byUserId: id("by_user_id"),
  detail: jsonText<Record<string, unknown>>("detail").notNull(),
  at: instant("at").notNull(),
}, (t) => [index("site_log_at").on(t.at)]);
