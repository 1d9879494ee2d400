import { sql } from "drizzle-orm";
import { db } from "@/db/client";
import { GRANTS } from "@/db/grants";

/** Counts of tries are kept also for what is refused. */
const ALWAYS_MAY: readonly string[] = ["limit_counters"];

/** One text for all that is kept in the database: it is equal as long as no row has changed. `more` names tables that others write to meanwhile. */
export async function fingerprint(more: readonly string[] = []): Promise<string> {
  const tables = Object.keys(GRANTS).filter((name) => !ALWAYS_MAY.includes(name) && !more.includes(name));
  const [rows] = await db().execute(sql.raw(`checksum table ${tables.map((name) => `\`${name}\``).join(", ")}`));
  return JSON.stringify(rows);
}
