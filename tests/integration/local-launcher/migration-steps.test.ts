import { randomBytes } from "node:crypto";
import mysql, { type Connection, type RowDataPacket } from "mysql2/promise";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { runMigrations } from "@/lib/local/migration-steps";

const FIRST = {
  sql: ["create table yards (id int primary key, name varchar(20))", "insert into yards values (1, 'ZVRX north')", "alter table yards add column tracks int not null default 4", "update yards set tracks = tracks + 1"],
  bps: true,
  folderMillis: 1,
  hash: "a".repeat(64),
};
const SECOND = { sql: ["create index yards_name on yards (name)"], bps: true, folderMillis: 2, hash: "b".repeat(64) };
const BROKEN = { sql: ["alter table yards add column length_ft int", "alter table nowhere add column x int"], bps: true, folderMillis: 3, hash: "c".repeat(64) };

const schema = `towfolio_${randomBytes(6).toString("hex")}`;
let connection: Connection;

const connect = (database?: string) => mysql.createConnection({ uri: process.env.TEST_DATABASE_ADMIN_URL ?? "", database });

beforeEach(async () => {
  const admin = await connect("");
  await admin.query(`create database \`${schema}\``);
  await admin.end();
  connection = await connect(schema);
});

afterEach(async () => {
  await connection.query(`drop database \`${schema}\``);
  await connection.end();
});

async function yards(): Promise<unknown> {
  const [rows] = await connection.query<RowDataPacket[]>("select id, name, tracks from yards");
  return rows.map((row) => ({ ...row }));
}

/** Stands for a process killed at its nth statement, counted over everything that it sends: before it ran, or right after. */
async function runKilledAt(nth: number, after: boolean): Promise<boolean> {
  const victim = await connect(schema);
  let sent = 0;
  const counting = async (statement: string, values: unknown[] = []): Promise<unknown> => {
    sent += 1;
    if (sent === nth && !after) throw new Error("killed");
    const answer = await victim.query(statement, values);
    if (sent === nth) throw new Error("killed");
    return answer;
  };
  const watched = new Proxy(victim, {
    get: (target, name) => {
      if (name === "query") return counting;
      if (name === "beginTransaction") return () => counting("start transaction");
      if (name === "commit") return () => counting("commit");
      if (name === "rollback") return () => Promise.resolve();
      const value: unknown = Reflect.get(target, name);
      return typeof value === "function" ? (value.bind(target) as unknown) : value;
    },
  });
  try {
    await runMigrations(watched, [FIRST, SECOND]);
    return false;
  } catch {
    return true;
  } finally {
    victim.destroy();
  }
}

describe("migrations", () => {
  it("run once, in order", async () => {
    expect(await runMigrations(connection, [FIRST, SECOND])).toBe(2);
    expect(await runMigrations(connection, [FIRST, SECOND])).toBe(0);
    expect(await yards()).toEqual([{ id: 1, name: "ZVRX north", tracks: 5 }]);
  });

  it("name the error and the statement when one is refused, and go on behind what was done", async () => {
    await expect(runMigrations(connection, [FIRST, BROKEN])).rejects.toThrow(/error 1146[\s\S]*alter table nowhere/);
    const mended = { ...BROKEN, sql: [BROKEN.sql[0] ?? "", "alter table yards add column x int"] };
    expect(await runMigrations(connection, [FIRST, mended])).toBe(1);
  });

  it.each([
    ["before it was sent", false],
    ["after it was done", true],
  ])("killed at any statement, %s, complete when they are run again, doing nothing twice", async (_, after) => {
    let nth = 1;
    while (await runKilledAt(nth, after)) {
      await runMigrations(connection, [FIRST, SECOND]);
      expect(await yards(), `killed at statement ${nth}`).toEqual([{ id: 1, name: "ZVRX north", tracks: 5 }]);
      await connection.query("drop table yards, __drizzle_migrations, __migration_steps");
      nth += 1;
    }
    expect(nth).toBeGreaterThan(20);
  });
});
