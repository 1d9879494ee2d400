import type { Connection } from "mysql2/promise";
import type { Keys } from "./keys";

/** The schema that a local copy keeps its data in. */
export const SCHEMA = "towfolio";
const HOST = "127.0.0.1";
const ADMIN = "towfolio_admin";
const APP = "towfolio_app";

/** The addresses of the database: as the application, with its grants per table, and as the account that migrates. */
export function databaseUrls(keys: Keys, port: number): { app: string; admin: string } {
  const url = (user: string, password: string) => `mysql://${user}:${encodeURIComponent(password)}@${HOST}:${port}/${SCHEMA}`;
  return { app: url(APP, keys.databaseAppPassword), admin: url(ADMIN, keys.databaseAdminPassword) };
}

/** Makes the schema and the two accounts. The application's account gets no right here: the migration grants them table by table. */
export async function makeAccounts(root: Connection, keys: Keys): Promise<void> {
  await root.query(`create database if not exists \`${SCHEMA}\` character set utf8mb4 collate utf8mb4_nopad_bin`);
  for (const [user, password] of [
    [ADMIN, keys.databaseAdminPassword],
    [APP, keys.databaseAppPassword],
  ]) {
    await root.query("create user if not exists ?@? identified by ?", [user, HOST, password]);
    await root.query("alter user ?@? identified by ?", [user, HOST, password]);
  }
  await root.query(`grant all privileges on \`${SCHEMA}\`.* to ?@? with grant option`, [ADMIN, HOST]);
}

/** Lets the migrating account of a test database make and drop schemas beside the usual one, and accounts for them. */
export async function allowTestSchemas(root: Connection): Promise<void> {
  await root.query(`grant all privileges on \`${SCHEMA}\\_%\`.* to ?@? with grant option`, [ADMIN, HOST]);
  await root.query("grant create user on *.* to ?@? with grant option", [ADMIN, HOST]);
}

/** Throws the schema away: only for one whose first filling was interrupted, before anybody could use it. */
export async function dropSchema(root: Connection): Promise<void> {
  await root.query(`drop database if exists \`${SCHEMA}\``);
}
