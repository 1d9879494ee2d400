import mysql from "mysql2/promise";
import { expect, it } from "vitest";
import { seedMove } from "../../support/factories";
import { withDatabase } from "../../support/database";
import { aStep, compare, takeHere, takeSurely } from "./writers";

const database = withDatabase();

/** Somebody else's transaction that holds a move. */
async function hold(moveId: string): Promise<mysql.Connection> {
  const root = await database.root();
  await root.query("begin");
  await root.query("select id from moves where id = ? for update", [moveId]);
  return root;
}

it("a wait for a row that takes too long undoes the whole transaction, not the last statement alone", async () => {
  const { moveId } = await seedMove();
  const holder = await hold(moveId);
  const app = await mysql.createConnection({ uri: database.appUrl, timezone: "Z" });
  await app.query("set innodb_lock_wait_timeout = 1");
  await app.query("begin");
  await app.query("insert into site_log (id, kind, detail, at) values ('log_half', 'test', '{}', now())");
  await expect(app.query("update moves set search_text = 'changed' where id = ?", [moveId])).rejects.toMatchObject({ errno: 1205 });
  // A program that went on regardless would keep the first half.
  await app.query("commit");
  const [kept] = await app.query("select id from site_log where id = 'log_half'");
  expect(kept).toEqual([]);
  await app.end();
  await holder.end();
});

it("a step on a row that is held is taken once it is let go, whole and once", async () => {
  const move = await seedMove();
  const holder = await hold(move.moveId);
  const step = aStep(move.moveId, 0, 1);
  const waiting = takeSurely(step, takeHere(move.owner));
  await new Promise((resolve) => setTimeout(resolve, 500));
  expect(await compare([move], [])).toMatchObject({ half: 0, doubled: 0 });
  await holder.query("rollback");
  await holder.end();
  expect(await compare([move], [await waiting])).toMatchObject({ acknowledged: 1, lost: 0, half: 0, doubled: 0, brokenChains: 0 });
});
