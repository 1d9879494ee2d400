import { index, int, mysqlTable, varchar } from "drizzle-orm/mysql-core";
import { code, id, instant, label } from "../columns";

/** A party: owner, contractor, carrier, receiver or payer; which of them is a matter of its seats. */
export const companies = mysqlTable("companies", {
  id: id("id").primaryKey(),
  name: label("name").notNull(),
  /** Lower case, NFC, single spaces: doubled companies share it and a site administrator merges them. */
  nameKey: label("name_key").notNull(),
  /** Carrier code (SCAC) or reporting mark, where it has one. */
  mark: code("mark"),
  phone: varchar("phone", { length: 60 }),
  /** Account at the payment service that a carrier is paid to. */
  payeeAccount: code("payee_account"),
  mergedIntoId: id("merged_into_id"),
  createdAt: instant("created_at").notNull(),
  version: int("version").notNull().default(1),
}, (t) => [index("companies_name").on(t.nameKey)]);
