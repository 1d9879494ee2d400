import { spawn, type SpawnOptions } from "node:child_process";
import { openSync, closeSync, readFileSync } from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";

const KILL_MILLISECONDS = 5_000;
const started = new Set<number>();

/** Whether a process with this id exists. One of another user counts as well. */
export function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (fault) {
    return (fault as NodeJS.ErrnoException).code === "EPERM";
  }
}

/** The command line of a process, or null when it is gone; tells ours from a stranger that was given the same id later. */
export function commandLine(pid: number): string | null {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, "utf8").replaceAll("\0", " ").trim();
  } catch {
    return null;
  }
}

/** When a process began, counted since the machine was switched on: tells it from a later one with the same id. */
export function beganAt(pid: number): number | null {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, "utf8");
    // The name in brackets may hold spaces; the 22nd field of all is the 20th behind it.
    return Number(stat.slice(stat.lastIndexOf(")") + 2).split(" ")[19]);
  } catch {
    return null;
  }
}

/** Asks a program that we started to stop and waits; after the time it is killed with all that it started itself. */
export async function stopProcess(pid: number, milliseconds: number): Promise<void> {
  signal(pid, "SIGTERM");
  await goneWithin(pid, milliseconds);
  // Each program leads a group of its own, which outlives it when it left something behind.
  signal(-pid, "SIGKILL");
  await goneWithin(pid, KILL_MILLISECONDS);
}

/** Stops what startProgram started and is still running, such as a build that was interrupted. */
export async function stopAllPrograms(): Promise<void> {
  await Promise.all([...started].map((pid) => stopProcess(pid, KILL_MILLISECONDS)));
}

async function goneWithin(pid: number, milliseconds: number): Promise<boolean> {
  const end = Date.now() + milliseconds;
  while (isRunning(pid)) {
    if (Date.now() > end) return false;
    await sleep(50);
  }
  return true;
}

/** A process that has ended but whose parent has not asked yet still has an id, and an empty command line. */
function isRunning(pid: number): boolean {
  return isAlive(pid) && commandLine(pid) !== "";
}

function signal(pid: number, name: NodeJS.Signals): void {
  try {
    process.kill(pid, name);
  } catch {
    // Already gone.
  }
}

/** A started program: its process id, and a promise of the code it ended with. */
export type Running = { pid: number; ended: Promise<number> };

/**
 * Starts a program with its output in a file. It gets a session of its own, so that Ctrl-C in the terminal reaches
 * the launcher alone and the parts can be stopped in order.
 */
export function startProgram(command: string, args: string[], log: string, options: SpawnOptions = {}): Promise<Running> {
  const file = openSync(log, "a", 0o600);
  const child = spawn(command, args, { ...options, detached: true, stdio: ["ignore", file, file] });
  closeSync(file);
  const pid = child.pid ?? 0;
  const ended = new Promise<number>((resolve) =>
    child.once("exit", (code) => {
      started.delete(pid);
      resolve(code ?? 1);
    }),
  );
  return new Promise((resolve, reject) => {
    child.once("error", reject);
    child.once("spawn", () => {
      started.add(pid);
      resolve({ pid, ended });
    });
  });
}

/** The last lines of a log, to show when its program failed. */
export function lastLines(path: string, count: number): string {
  try {
    return readFileSync(path, "utf8").trimEnd().split("\n").slice(-count).join("\n");
  } catch {
    return "";
  }
}
