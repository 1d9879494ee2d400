import { randomBytes } from "node:crypto";
import mysql from "mysql2/promise";
import { afterAll, beforeAll } from "vitest";
import { closeDb } from "@/db/client";
import { migrateDatabase } from "@/lib/local/migrate";
import { TEST_ENVIRONMENT } from "./environment";

/** A schema and an application account of a test file's own. `root` may change what the application may not. */
export type TestDatabase = { schema: string; appUrl: string; adminUrl: string; root: () => Promise<mysql.Connection> };

/** Call once at the top of a test file: makes the schema, migrates, grants per table as in production, points DATABASE_URL at it, and drops it at the end. */
export function withDatabase(more: Record<string, string> = {}): TestDatabase {
  const base = new URL(process.env.TEST_DATABASE_ADMIN_URL ?? "mysql://missing");
  const name = randomBytes(6).toString("hex");
  const schema = `towfolio_${name}`;
  const user = `towfolio_${name}`;
  const password = randomBytes(12).toString("hex");
  const adminUrl = urlWith(base, { pathname: `/${schema}` });
  const appUrl = urlWith(base, { pathname: `/${schema}`, username: user, password });
  Object.assign(process.env, TEST_ENVIRONMENT, { DATABASE_URL: appUrl }, more);
  beforeAll(async () => {
    await asAdmin(base, async (admin) => {
      await admin.query(`create database \`${schema}\` character set utf8mb4 collate utf8mb4_nopad_bin`);
      await admin.query("create user ?@'127.0.0.1' identified by ?", [user, password]);
    });
    await migrateDatabase(adminUrl, appUrl);
  });
  afterAll(async () => {
    await closeDb();
    await asAdmin(base, async (admin) => {
      await admin.query(`drop database if exists \`${schema}\``);
      await admin.query("drop user if exists ?@'127.0.0.1'", [user]);
    });
  });
  return { schema, appUrl, adminUrl, root: () => mysql.createConnection({ uri: adminUrl, timezone: "Z", multipleStatements: true }) };
}

function urlWith(base: URL, parts: Partial<Pick<URL, "pathname" | "username" | "password">>): string {
  return Object.assign(new URL(base), parts).href;
}

async function asAdmin(base: URL, run: (admin: mysql.Connection) => Promise<void>): Promise<void> {
  const admin = await mysql.createConnection({ uri: base.href, timezone: "Z" });
  try {
    await run(admin);
  } finally {
    await admin.end();
  }
}
