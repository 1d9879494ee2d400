import { randomInt } from "node:crypto";
import { mkdirSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";

/** Records on disk, one JSON file each, all of them also in memory. */
export type Shelf<T> = {
  get(id: string): T | undefined;
  /** Written beside the old file and renamed over it, so that a killed process leaves the old record or the new one. */
  put(id: string, record: T): T;
  remove(id: string): boolean;
  /** In the order of their ids. */
  all(): T[];
  clear(): void;
};

// Ids become file names.
const SAFE_ID = /^[A-Za-z0-9_-]{1,200}$/;

/** Opens a folder of records and loads what an earlier run left there. */
export function openShelf<T>(folder: string): Shelf<T> {
  mkdirSync(folder, { recursive: true });
  const records = new Map<string, T>();
  for (const name of readdirSync(folder)) {
    if (name.endsWith(".json")) records.set(name.slice(0, -5), JSON.parse(readFileSync(join(folder, name), "utf8")) as T);
    else if (name.endsWith(".new")) rmSync(join(folder, name), { force: true });
  }
  const fileOf = (id: string) => join(folder, `${id}.json`);
  const remove = (id: string) => {
    if (!records.delete(id)) return false;
    rmSync(fileOf(id), { force: true });
    return true;
  };
  return {
    get: (id) => records.get(id),
    put(id, record) {
      if (!SAFE_ID.test(id)) throw new Error(`Not an id that can be stored: ${id}`);
      writeFileSync(`${fileOf(id)}.new`, JSON.stringify(record));
      renameSync(`${fileOf(id)}.new`, fileOf(id));
      records.set(id, record);
      return record;
    },
    remove,
    all: () => [...records].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, record]) => record),
    clear: () => [...records.keys()].forEach(remove),
  };
}

let countInProcess = 0;

/** An id that sorts by time, also within one millisecond. */
export function timeId(now = Date.now()): string {
  countInProcess = (countInProcess + 1) % 36 ** 4;
  const random = randomInt(36 ** 4);
  return [now.toString(36).padStart(9, "0"), countInProcess.toString(36).padStart(4, "0"), random.toString(36).padStart(4, "0")].join("");
}
