import { closeSync, existsSync, openSync, readFileSync, renameSync, rmSync, writeFileSync, writeSync } from "node:fs";
import { join } from "node:path";
import { beganAt, isAlive, stopProcess } from "./processes";
import { Refused } from "./refused";

/** A process and when it began, which together name it for good. */
type Named = { pid: number; began: number };
type Mark = { launcher: Named; programs: Named[] };

const STOP_MILLISECONDS = 60_000;

/** Held while one launcher runs on a data folder; remembers what it started, so that a later one can tell what a killed one left. */
export type Lock = {
  remember: (pids: number[]) => void;
  release: () => void;
  /** What had to be cleared up after a launcher that was killed, in one sentence; null when the last one stopped in order. */
  clearedUp: string | null;
};

/** Takes the folder for this process. Refuses while another launcher runs on it; what a killed one left running is stopped. */
export async function takeLock(folder: string): Promise<Lock> {
  const path = join(folder, "running.json");
  const clearedUp = existsSync(path) ? await clearUp(path) : null;
  const launcher = named(process.pid);
  create(path, { launcher, programs: [] });
  return {
    clearedUp,
    remember: (pids) => {
      writeFileSync(`${path}.new`, JSON.stringify({ launcher, programs: pids.map(named) } satisfies Mark), { mode: 0o600 });
      renameSync(`${path}.new`, path);
    },
    release: () => rmSync(path, { force: true }),
  };
}

async function clearUp(path: string): Promise<string> {
  const mark = readMark(path);
  if (mark && isSame(mark.launcher)) {
    throw new Refused(`It is already running (process ${mark.launcher.pid}). Stop that one first: kill ${mark.launcher.pid}`);
  }
  const left = (mark?.programs ?? []).filter(isSame);
  // The database was started first and is stopped last.
  for (const { pid } of left.toReversed()) await stopProcess(pid, STOP_MILLISECONDS);
  rmSync(path, { force: true });
  const who = mark ? `process ${mark.launcher.pid} is gone` : "its mark was half written";
  const stopped = left.length > 0 ? `; what it had left running (${left.length === 1 ? "1 program" : `${left.length} programs`}) has been stopped` : "";
  return `The last run was killed before it could stop in order (${who})${stopped}.`;
}

function readMark(path: string): Mark | null {
  try {
    return JSON.parse(readFileSync(path, "utf8")) as Mark;
  } catch {
    return null;
  }
}

function create(path: string, mark: Mark): void {
  try {
    const file = openSync(path, "wx", 0o600);
    writeSync(file, JSON.stringify(mark));
    closeSync(file);
  } catch (fault) {
    if ((fault as NodeJS.ErrnoException).code === "EEXIST") throw new Refused("Another start began at the same moment; this one gives way.");
    throw fault;
  }
}

function named(pid: number): Named {
  return { pid, began: beganAt(pid) ?? 0 };
}

function isSame({ pid, began }: Named): boolean {
  return isAlive(pid) && beganAt(pid) === began;
}
