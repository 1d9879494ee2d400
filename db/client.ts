import "server-only";
import { drizzle, type MySql2Database } from "drizzle-orm/mysql2";
import { createPool, type Pool } from "mysql2/promise";
import { env } from "@/lib/env";

type Kept = { towfolioPool?: Pool };

/** One pool per process, kept over the dev server's reloads. */
function pool(): Pool {
  const kept = globalThis as Kept;
  return (kept.towfolioPool ??= createPool({
    uri: env().DATABASE_URL,
    timezone: "Z",
    charset: "utf8mb4",
    connectionLimit: env().DATABASE_POOL,
    // A full queue means a slow database: better a 503 than a pile of waiting requests.
    queueLimit: env().DATABASE_POOL * 20,
    connectTimeout: 3000,
    enableKeepAlive: true,
    multipleStatements: false,
  }));
}

export type Db = MySql2Database;
export type Tx = Parameters<Parameters<Db["transaction"]>[0]>[0];
/** What a read can run on: the pool, or a transaction that must see its own writes. */
export type Reader = Pick<Db, "select" | "selectDistinct">;

let known: Db | undefined;

export const db = (): Db => (known ??= drizzle({ client: pool() }));

/** For scripts and tests that must end. */
export async function closeDb(): Promise<void> {
  const kept = globalThis as Kept;
  await kept.towfolioPool?.end();
  delete kept.towfolioPool;
  known = undefined;
}
