import { bigint, index, int, mysqlEnum, mysqlTable, primaryKey, text, unique, varchar } from "drizzle-orm/mysql-core";
import { OUTBOX_KINDS, OUTBOX_STATES } from "@/lib/outbox/vocabulary";
import { code, id, instant, jsonText, sha256 } from "../columns";

/** What must go out after a commit: written in the same transaction as its cause, sent by the worker one at a time. */
export const outbox = mysqlTable("outbox", {
  id: id("id").primaryKey(),
  /** One event and recipient once; a replay finds its row. */
  dedupe: code("dedupe").notNull(),
  kind: mysqlEnum("kind", OUTBOX_KINDS).notNull(),
  moveId: id("move_id"),
  toAddress: varchar("to_address", { length: 254 }),
  /** JSON sealed with a key of the environment, since links carry secrets; emptied once sent. */
  payload: text("payload").notNull(),
  /** Fixed at writing, so that a repeat after a kill is the same message. */
  messageId: varchar("message_id", { length: 200 }).notNull(),
  state: mysqlEnum("state", OUTBOX_STATES).notNull().default("ready"),
  runAt: instant("run_at").notNull(),
  /** While taken: when another worker may take it over. */
  leaseUntil: instant("lease_until"),
  attempts: int("attempts").notNull().default(0),
  lastError: varchar("last_error", { length: 500 }),
  createdAt: instant("created_at").notNull(),
  doneAt: instant("done_at"),
}, (t) => [unique("outbox_dedupe").on(t.dedupe), index("outbox_open").on(t.state, t.runAt), index("outbox_move").on(t.moveId)]);

/** The first answer to every write, so that a repeat with the same key gets it again. */
export const attempts = mysqlTable("attempts", {
  userId: id("user_id").notNull(),
  key: varchar("key", { length: 80 }).notNull(),
  door: code("door").notNull(),
  bodyHash: sha256("body_hash").notNull(),
  /** Null only inside the write's own transaction. */
  answer: jsonText<unknown>("answer"),
  at: instant("at").notNull(),
}, (t) => [primaryKey({ columns: [t.userId, t.key] }), index("attempts_at").on(t.at)]);

/** How often something was tried in the running window; one row per kind and key. */
export const limitCounters = mysqlTable("limit_counters", {
  key: sha256("key").primaryKey(),
  windowEndsMs: bigint("window_ends_ms", { mode: "number" }).notNull(),
  count: int("count").notNull(),
});
