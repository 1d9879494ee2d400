import { boolean, int, mysqlEnum, mysqlTable, unique, varchar } from "drizzle-orm/mysql-core";
import { PREP_GROUPS, PREP_PHASES, PREP_STATES, RESTORE_STATES } from "@/lib/prep/vocabulary";
import { code, id, instant, label, words } from "../columns";
import { moves } from "./moves";

/** One thing done to the unit before tow, with its twin that undoes it. Copied from the template, so that a later template changes no open case. */
export const prepItems = mysqlTable("prep_items", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  templateId: code("template_id").notNull(),
  group: mysqlEnum("item_group", PREP_GROUPS).notNull(),
  phase: mysqlEnum("phase", PREP_PHASES).notNull(),
  order: int("item_order").notNull(),
  action: words("action").notNull(),
  why: words("why").notNull(),
  caution: words("caution"),
  needsPhoto: boolean("needs_photo").notNull(),
  needsTag: boolean("needs_tag").notNull(),
  /** Label of the value to be written down; null when none. */
  valueLabel: label("value_label"),
  valueUnit: varchar("value_unit", { length: 20 }),
  /** Whether a published source stands behind the row, or common practice. */
  published: boolean("published").notNull(),
  state: mysqlEnum("state", PREP_STATES).notNull().default("to-do"),
  value: label("value"),
  tagNumber: varchar("tag_number", { length: 40 }),
  note: words("note"),
  /** Why it does not apply to this unit. */
  skippedWhy: label("skipped_why"),
  byUserId: id("by_user_id"),
  byName: label("by_name"),
  at: instant("at"),
  restoreAction: words("restore_action"),
  restoreCaution: words("restore_caution"),
  restoreOrder: int("restore_order").notNull().default(0),
  restoreState: mysqlEnum("restore_state", RESTORE_STATES).notNull().default("none"),
  restoreNote: words("restore_note"),
  restoredByUserId: id("restored_by_user_id"),
  restoredByName: label("restored_by_name"),
  restoredAt: instant("restored_at"),
  version: int("version").notNull().default(1),
}, (t) => [unique("prep_items_once").on(t.moveId, t.templateId)]);
