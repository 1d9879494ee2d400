import type { MigrationMeta } from "drizzle-orm/migrator";
import type { Connection, RowDataPacket } from "mysql2/promise";

/** The table in which Drizzle's own tools look for what was migrated. */
const DONE = "__drizzle_migrations";
/** How far an unfinished migration came, so that one that was killed goes on where it stopped. */
const STEPS = "__migration_steps";

/** Tables that belong to the migration itself; the application has no right on them. */
export const MIGRATION_TABLES: readonly string[] = [DONE, STEPS];

/**
 * Errors that say "this was done already": table, column, key or constraint there, or gone. MariaDB commits each change
 * of structure at once, so a process killed right after one could not note it.
 */
const ALREADY_DONE = [1050, 1051, 1060, 1061, 1091, 1826];

/** A statement that the database refused. */
export class MigrationFault extends Error {
  constructor(statement: string, fault: unknown) {
    const { errno, sqlMessage, message } = fault as { errno?: number; sqlMessage?: string; message?: string };
    super(`The migration stopped at error ${errno ?? "unknown"}: ${sqlMessage ?? message ?? String(fault)}\n${statement.trim()}`, { cause: fault });
  }
}

/** Runs the migrations that the database has not seen, and says how many those were. */
export async function runMigrations(connection: Connection, migrations: MigrationMeta[]): Promise<number> {
  await connection.query(`create table if not exists ${DONE} (id serial primary key, hash text not null, created_at bigint)`);
  await connection.query(`create table if not exists ${STEPS} (hash char(64) character set ascii collate ascii_bin primary key, done int unsigned not null)`);
  const [seen] = await connection.query<RowDataPacket[]>(`select hash from ${DONE}`);
  const hashes = new Set(seen.map((row) => String(row.hash)));
  const waiting = migrations.filter((migration) => !hashes.has(migration.hash));
  for (const migration of waiting) await runMigration(connection, migration);
  return waiting.length;
}

async function runMigration(connection: Connection, { hash, sql, folderMillis }: MigrationMeta): Promise<void> {
  await connection.query(`insert ignore into ${STEPS} (hash, done) values (?, 0)`, [hash]);
  const [rows] = await connection.query<RowDataPacket[]>(`select done from ${STEPS} where hash = ?`, [hash]);
  const first = Number(rows[0]?.done ?? 0);
  for (let index = first; index < sql.length; index += 1) {
    await runStatement(connection, sql[index] ?? "", index === first);
    await connection.query(`update ${STEPS} set done = ? where hash = ?`, [index + 1, hash]);
    await connection.query("commit");
  }
  await connection.beginTransaction();
  await connection.query(`insert into ${DONE} (hash, created_at) values (?, ?)`, [hash, folderMillis]);
  await connection.query(`delete from ${STEPS} where hash = ?`, [hash]);
  await connection.commit();
}

/** Opens the transaction in which a change of rows is noted; a change of structure ends it by itself. */
async function runStatement(connection: Connection, statement: string, mayBeDone: boolean): Promise<void> {
  if (statement.trim() === "") return;
  await connection.beginTransaction();
  try {
    await connection.query(statement);
  } catch (fault) {
    if (mayBeDone && ALREADY_DONE.includes((fault as { errno?: number }).errno ?? 0)) return;
    await connection.rollback();
    throw new MigrationFault(statement, fault);
  }
}
