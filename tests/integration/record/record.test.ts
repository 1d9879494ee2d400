import { eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { db } from "@/db/client";
import { outbox, record, signatures } from "@/db/schema";
import { unsafeNoteDone, unsafeTakeNext } from "@/lib/outbox/commands";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { keepSignature } from "@/lib/record/commands";
import { unsafeErrno, writeOnMove } from "@/lib/standing/commands";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";

const database = withDatabase();
const DENIED = new Set([1142, 1143]);

async function errnoOf(work: Promise<unknown>): Promise<number | null> {
  return work.then(() => null, (error: unknown) => unsafeErrno(error));
}

it("fifty writers at once leave a chain without gap or fork", async () => {
  const { moveId, owner } = await seedMove();
  await Promise.all(Array.from({ length: 50 }, (_, n) => writeOnMove(owner, anAttempt(), moveId, (ctx) => ctx.append({ kind: "move.changed", detail: { n } }))));
  expect(await unsafeVerifyRecord(moveId)).toMatchObject({ entries: 50, brokenAt: null });
});

it("the application's account can neither change nor remove an entry", async () => {
  const { moveId, owner } = await seedMove();
  await writeOnMove(owner, anAttempt(), moveId, (ctx) => ctx.append({ kind: "move.changed", detail: {} }));
  expect(DENIED).toContain(await errnoOf(db().update(record).set({ kind: "move.closed" }).where(eq(record.moveId, moveId))));
  expect(DENIED).toContain(await errnoOf(db().delete(record).where(eq(record.moveId, moveId))));
});

it.each([
  ["a changed word", "update record set by_name = 'Somebody else' where move_id = ? and seq = 2", 2],
  ["a changed detail", "update record set detail = '{\"n\":99}' where move_id = ? and seq = 1", 1],
  ["a removed entry", "delete from record where move_id = ? and seq = 2", 2],
])("%s by the database's root is found", async (_, statement, brokenAt) => {
  const { moveId, owner } = await seedMove();
  for (const n of [1, 2, 3]) await writeOnMove(owner, anAttempt(), moveId, (ctx) => ctx.append({ kind: "move.changed", detail: { n, ä: "é" } }));
  expect((await unsafeVerifyRecord(moveId)).brokenAt).toBeNull();
  const root = await database.root();
  await root.query(statement, [moveId]);
  await root.end();
  expect((await unsafeVerifyRecord(moveId)).brokenAt).toBe(brokenAt);
});

it("the same key again gets the first answer and writes once; another body is refused", async () => {
  const { moveId, owner } = await seedMove();
  const attempt = anAttempt({ body: "one" });
  const append = () => writeOnMove(owner, attempt, moveId, async (ctx) => ({ entry: await ctx.append({ kind: "move.changed", detail: {} }) }));
  const answers = await Promise.all(Array.from({ length: 20 }, append));
  expect(new Set(answers.map((answer) => answer.entry)).size).toBe(1);
  expect((await unsafeVerifyRecord(moveId)).entries).toBe(1);
  await expect(writeOnMove(owner, { ...attempt, bodyHash: anAttempt({ body: "two" }).bodyHash }, moveId, async () => null)).rejects.toMatchObject({ code: "key_reused" });
});

it("a write that fails half way leaves nothing, and its key can be used again", async () => {
  const { moveId, owner } = await seedMove();
  const attempt = anAttempt({ body: "same" });
  const failing = writeOnMove(owner, attempt, moveId, async (ctx) => {
    await ctx.append({ kind: "move.changed", detail: {} });
    throw new Error("after the first statement");
  });
  await expect(failing).rejects.toThrow("after the first statement");
  expect((await unsafeVerifyRecord(moveId)).entries).toBe(0);
  await writeOnMove(owner, attempt, moveId, (ctx) => ctx.append({ kind: "move.changed", detail: {} }));
  expect((await unsafeVerifyRecord(moveId)).entries).toBe(1);
});

it("an outsider and a removed member learn nothing", async () => {
  const { moveId, outsider, removed } = await seedMove();
  for (const viewer of [outsider, removed]) await expect(writeOnMove(viewer, anAttempt(), moveId, async () => null)).rejects.toMatchObject({ code: "not_found" });
});

it("what is told goes to everybody of the part but the speaker, once", async () => {
  const { moveId, owner, contractor, legIds } = await seedMove();
  const news = { unit: "ZVRX 2783", caseNumber: "99-1", headline: "News", lines: [], actionLabel: "Look", url: "http://localhost/" };
  const say = () => writeOnMove(owner, anAttempt(), moveId, async (ctx) => {
    await ctx.tell({ part: "inspector", legId: legIds[0] }, "finding-answered", news, "said-once");
    await ctx.tell({ part: "owner" }, "finding-answered", news, "said-once");
  });
  await say();
  await say();
  const rows = await db().select({ to: outbox.toAddress, payload: outbox.payload }).from(outbox).where(eq(outbox.moveId, moveId));
  expect(rows).toHaveLength(1);
  expect(rows[0]?.to).not.toBe(contractor.email);
  expect(rows[0]?.payload).not.toContain("ZVRX");
  const taken = await unsafeTakeNext(new Date());
  expect(taken).toMatchObject({ to: rows[0]?.to, job: { kind: "finding-answered", payload: news } });
  expect(await unsafeTakeNext(new Date())).toBeNull();
  if (taken) await unsafeNoteDone(taken.id, new Date());
});

it("a signature can be lifted, not changed", async () => {
  const { moveId, contractor } = await seedMove();
  const id = await db().transaction((tx) => keepSignature(tx, { moveId, kind: "prep-where-it-stands", subjectId: moveId, userId: contractor.userId, companyId: contractor.memberships[0]?.companyId ?? "", name: "T. Ibarra", statement: "Done", rows: [1] }, new Date()));
  expect(DENIED).toContain(await errnoOf(db().update(signatures).set({ name: "Somebody else" }).where(eq(signatures.id, id))));
  await db().update(signatures).set({ liftedAt: new Date(), liftedWhy: "P1 reopened" }).where(eq(signatures.id, id));
});
