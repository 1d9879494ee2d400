import type { OpenMove } from "@/lib/moves/input";
import { openMoveInput } from "@/lib/moves/input";

/** What a person types to open a move over two carriers; `given` replaces parts of it. */
export const anOpening = (companyId: string, given: Record<string, unknown> = {}): OpenMove =>
  openMoveInput.parse({
    companyId,
    answers: { mark: "ZVRX", number: "2783", shape: "hood", "f-end": "short-hood", axles: "6", weight: "362400", brakes: "26-L", bearings: "roller-rotating-cap", coupler: "alignment-control" },
    aliases: ["VRHL 2783"],
    origin: { name: "Sand Hollow elevator", place: "Sand Hollow", zone: "America/Chicago" },
    destination: { name: "Vellum Ridge shops", place: "Quill Creek", zone: "America/Denver" },
    legs: [
      { carrierName: "Quillan & Sandbar", carrierMark: "ZQSR", toPlace: "Ardell", toZone: "America/Denver", miles: "174", payer: "other", payerName: "Fenn Valley Fund" },
      { carrierName: "Sable Mountain Lines", carrierMark: "ZSML", miles: "398", payer: "ours", payerName: null },
    ],
    ...given,
  });

/** How many statements something takes, counted at the pool. */
export async function countStatements(run: () => Promise<unknown>): Promise<number> {
  const { towfolioPool: pool } = globalThis as { towfolioPool?: { query: (...given: unknown[]) => unknown; execute: (...given: unknown[]) => unknown } };
  if (!pool) throw new Error("no pool yet");
  let count = 0;
  const kept = { query: pool.query, execute: pool.execute };
  pool.query = (...given) => (count++, kept.query.apply(pool, given));
  pool.execute = (...given) => (count++, kept.execute.apply(pool, given));
  try {
    await run();
  } finally {
    Object.assign(pool, kept);
  }
  return count;
}
