import { performance } from "node:perf_hooks";
import { asc, eq } from "drizzle-orm";
import { db } from "@/db/client";
import { equipment, legs, moves, moveSeats, record } from "@/db/schema";
import { newId } from "@/lib/ids";
import { DEFAULT_FILTER } from "@/lib/moves/list-filter";
import { listMoves } from "@/lib/moves/queries";
import { putMail } from "@/lib/outbox/commands";
import { appendSiteLog } from "@/lib/record/commands";
import { unsafeVerifyRecord } from "@/lib/record/queries";
import { writeOnMove } from "@/lib/standing/commands";
import { anAttempt, seedMove, type SeededMove } from "./factories";
import { openOwnDatabase } from "./own-database";

type Work = () => Promise<unknown>;
/** Two pieces of work of the same run; only how they compare is told, since the time of either is the machine's. A base that can't be run any more is given by its time. */
type Pair = { name: string; base: Work | number; than: string; work: Work; rounds: number };
type Row = { what: string; against: string; "times as long": string; "median ms": string; rounds: number };

const NEWS = { unit: "ZVRX 2783", caseNumber: "99-1", headline: "Changed", lines: [], actionLabel: "Look", url: "http://localhost:4999/" };

async function timeOf(work: Work): Promise<number> {
  const began = performance.now();
  await work();
  return performance.now() - began;
}

const median = (times: number[]): number => times.toSorted((one, other) => one - other)[Math.floor(times.length / 2)] ?? 0;

/** The median of each, run in turn, so that whatever else the machine does meets all alike. */
async function medians(works: Work[], rounds: number): Promise<number[]> {
  const times = works.map((): number[] => []);
  for (let warm = 0; warm < 3; warm += 1) for (const work of works) await work();
  for (let round = 0; round < rounds; round += 1) for (const [at, work] of works.entries()) times[at]?.push(await timeOf(work));
  return times.map(median);
}

async function compare({ name, base, than, work, rounds }: Pair): Promise<Row> {
  const [other = 0, one = 0] = typeof base === "number" ? [...(await medians([work], rounds)), base] : await medians([work, base], rounds);
  return { what: name, against: than, "times as long": (other / one).toFixed(1), "median ms": `${other.toFixed(2)} / ${one.toFixed(2)}`, rounds };
}

const step = ({ owner, moveId }: SeededMove) => writeOnMove(owner, anAttempt(), moveId, async (ctx) => {
  await ctx.append({ kind: "move.changed", detail: { field: "note", from: "one", to: "other" } });
  await putMail(ctx.tx, { kind: "movement", to: "a@example.test", payload: NEWS, dedupe: crypto.randomUUID(), moveId }, ctx.at);
});

/** Further moves of the same owner, with the same legs and seats. */
async function copyMove({ moveId }: SeededMove, times: number): Promise<void> {
  const [move] = await db().select().from(moves).where(eq(moves.id, moveId));
  const [unit] = await db().select().from(equipment).where(eq(equipment.moveId, moveId));
  const oldLegs = await db().select().from(legs).where(eq(legs.moveId, moveId)).orderBy(asc(legs.seq));
  const seats = await db().select().from(moveSeats).where(eq(moveSeats.moveId, moveId));
  if (!move || !unit) throw new Error("There is no move to copy.");
  for (let left = times; left > 0; left -= 200) {
    const copies = Array.from({ length: Math.min(left, 200) }, () => ({ id: newId("move"), legIds: new Map(oldLegs.map((leg) => [leg.id, newId("leg")])) }));
    await db().insert(moves).values(copies.map(({ id, legIds }) => ({ ...move, id, caseNumber: `99-${id.slice(-8)}`, waitingLegId: move.waitingLegId && (legIds.get(move.waitingLegId) ?? null) })));
    await db().insert(equipment).values(copies.map(({ id }) => ({ ...unit, moveId: id })));
    await db().insert(legs).values(copies.flatMap(({ id, legIds }) => oldLegs.map((leg) => ({ ...leg, id: legIds.get(leg.id) ?? "", moveId: id }))));
    await db().insert(moveSeats).values(copies.flatMap(({ id, legIds }) => seats.map((seat) => ({ ...seat, id: newId("seat"), moveId: id, legId: seat.legId && (legIds.get(seat.legId) ?? null), legKey: (seat.legId && legIds.get(seat.legId)) ?? "-" }))));
  }
}

async function prepare(): Promise<Pair[]> {
  const [written, long, few, many] = [await seedMove(), await seedMove(), await seedMove(), await seedMove()];
  for (let n = 0; n < 1000; n += 1) await writeOnMove(long.owner, anAttempt(), long.moveId, (ctx) => ctx.append({ kind: "move.changed", detail: { n } }));
  const list = ({ owner }: SeededMove) => () => listMoves(owner, DEFAULT_FILTER);
  await copyMove(few, 9);
  const [alone = 0] = await medians([list(few)], 30);
  await copyMove(many, 1999);
  const bare = () => appendSiteLog(db(), { kind: "test", byUserId: written.owner.userId, detail: { field: "note" } }, new Date());
  return [
    { name: "a step on a move, with key, record, mail and whose turn it is", base: bare, than: "inserting one row", work: () => step(written), rounds: 60 },
    { name: "the same step on a record of 1,000 entries", base: () => step(written), than: "on a short record", work: () => step(long), rounds: 60 },
    { name: "verifying a record of 1,000 entries", base: () => db().select().from(record).where(eq(record.moveId, long.moveId)).orderBy(asc(record.seq)), than: "reading it", work: () => unsafeVerifyRecord(long.moveId), rounds: 20 },
    { name: "the list of 2,000 moves", base: alone, than: "a list of 10", work: list(many), rounds: 30 },
    { name: "the list of 10 moves beside 2,000 of others", base: alone, than: "on its own", work: list(few), rounds: 30 },
    { name: "the last page of 2,000 moves", base: list(many), than: "the first page", work: () => listMoves(many.owner, { ...DEFAULT_FILTER, page: 80 }), rounds: 30 },
    { name: "searching 2,000 moves for a unit", base: list(many), than: "listing them", work: () => listMoves(many.owner, { ...DEFAULT_FILTER, q: "zvrx 2783" }), rounds: 30 },
  ];
}

/** Measures on a database of its own, made for it and thrown away afterwards. */
async function main(): Promise<void> {
  const database = await openOwnDatabase();
  try {
    const rows: Row[] = [];
    for (const pair of await prepare()) rows.push(await compare(pair));
    console.table(rows);
  } finally {
    await database.close();
  }
}

main().catch((fault: unknown) => {
  process.stderr.write(`${fault instanceof Error ? fault.stack : String(fault)}\n`);
  process.exitCode = 1;
});
