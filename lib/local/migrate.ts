import { readMigrationFiles } from "drizzle-orm/migrator";
import mysql, { type Connection, type RowDataPacket } from "mysql2/promise";
import { pathToFileURL } from "node:url";
import { GRANTS } from "@/db/grants";
import { rightChanges, rightFaults, rightsHeld, type TableRights } from "./grants";
import { MIGRATION_TABLES, MigrationFault, runMigrations } from "./migration-steps";
import { Refused } from "./refused";

const LOCK_SECONDS = 60;

/** What a migration did: how many were run, and how many tables had their rights changed. */
export type Migrated = { migrations: number; rightChanges: number };

/**
 * Brings the database of `adminUrl` to the newest shape, one caller at a time, and gives the account of `appUrl` exactly the
 * rights in db/grants.ts. Running it again changes nothing; after a kill it goes on where it stopped.
 */
export async function migrateDatabase(adminUrl: string, appUrl: string): Promise<Migrated> {
  const admin = await mysql.createConnection({ uri: adminUrl, timezone: "Z" });
  try {
    const schema = await currentSchema(admin);
    await takeLock(admin, schema);
    const migrations = await runMigrations(admin, readMigrationFiles({ migrationsFolder: "db/migrations" }));
    const changes = await grantTables(admin, schema, appUrl, GRANTS);
    return { migrations, rightChanges: changes };
  } finally {
    await admin.end();
  }
}

async function currentSchema(connection: Connection): Promise<string> {
  const [rows] = await connection.query<RowDataPacket[]>("select database() as name");
  const name: unknown = rows[0]?.name;
  if (typeof name !== "string") throw new Refused("DATABASE_ADMIN_URL names no database: it has to end with /name.");
  return name;
}

/** The lock belongs to the connection and ends with it. */
async function takeLock(connection: Connection, schema: string): Promise<void> {
  const [rows] = await connection.query<RowDataPacket[]>("select get_lock(?, ?) as taken", [`${schema}.migrate`, LOCK_SECONDS]);
  if (Number(rows[0]?.taken) !== 1) throw new Refused(`Another migration of ${schema} has been running for ${LOCK_SECONDS} seconds. Try again when it has ended.`);
}

async function grantTables(admin: Connection, schema: string, appUrl: string, wanted: TableRights): Promise<number> {
  const [rows] = await admin.query<RowDataPacket[]>("select table_name as name from information_schema.tables where table_schema = ?", [schema]);
  const faults = rightFaults(rows.map((row) => String(row.name)).filter((name) => !MIGRATION_TABLES.includes(name)), wanted);
  if (faults.length > 0) throw new Refused(faults.join("\n"));
  const { account, lines } = await accountOf(appUrl);
  const changes = rightChanges(rightsHeld(lines, schema), wanted);
  for (const { kind, table, rights } of changes) {
    const target = `${admin.escapeId(schema)}.${table === "*" ? "*" : admin.escapeId(table)}`;
    await admin.query(`${kind} ${rights.join(", ")} on ${target} ${kind === "grant" ? "to" : "from"} ${account}`);
  }
  return changes.length;
}

/** The application's account as the server knows it, and its rights. It may have none yet, so it names no schema. */
async function accountOf(appUrl: string): Promise<{ account: string; lines: string[] }> {
  const url = new URL(appUrl);
  url.pathname = "/";
  const app = await mysql.createConnection({ uri: url.href, timezone: "Z" });
  try {
    const [who] = await app.query<RowDataPacket[]>("select current_user() as name");
    const [user = "", host = ""] = String(who[0]?.name).split(/@(?=[^@]*$)/);
    const [grants] = await app.query<RowDataPacket[]>("show grants");
    return { account: `${app.escape(user)}@${app.escape(host)}`, lines: grants.map((row) => String(Object.values(row)[0])) };
  } finally {
    await app.end();
  }
}

async function main(): Promise<void> {
  const { DATABASE_ADMIN_URL, DATABASE_URL } = process.env;
  if (!DATABASE_ADMIN_URL || !DATABASE_URL) {
    throw new Refused("Migrating needs DATABASE_ADMIN_URL (an account that may change tables and grant rights) and DATABASE_URL (the application's account).");
  }
  const { migrations, rightChanges: changes } = await migrateDatabase(DATABASE_ADMIN_URL, DATABASE_URL);
  process.stdout.write(`${migrations} migrations run, rights changed ${changes} times.\n`);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? "").href) {
  main().catch((fault: unknown) => {
    process.stderr.write(`${fault instanceof Refused || fault instanceof MigrationFault ? fault.message : (fault instanceof Error ? fault.stack : String(fault))}\n`);
    process.exitCode = 1;
  });
}
