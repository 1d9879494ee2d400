import { setTimeout as sleep } from "node:timers/promises";
import { NEXT_PROGRAM } from "./build";
import type { Part } from "./parts";
import { lastLines, startProgram, stopProcess, type Running } from "./processes";
import { Refused } from "./refused";

const READY_MILLISECONDS = 120_000;
const STOP_MILLISECONDS = 8_000;
const TSX_ARGUMENTS = ["--import", "tsx"];

/** How the web server is to run: on the build in a folder, or compiling as it goes. */
export type ServerPlace = { root: string; port: number; buildFolder: string; development: boolean; env: NodeJS.ProcessEnv; log: string };

/** The arguments of Next.js. Unless told otherwise it can be reached from this machine alone. */
export function nextArguments(development: boolean, port: number | string, host = "localhost"): string[] {
  return [NEXT_PROGRAM, development ? "dev" : "start", "-p", String(port), "-H", host];
}

/** The environment that Next.js gets: the address "localhost" has to mean 127.0.0.1 first, where browsers and tools look as well. */
export function nextEnvironment(env: NodeJS.ProcessEnv, buildFolder: string, development: boolean): NodeJS.ProcessEnv {
  return {
    ...env,
    NODE_ENV: development ? "development" : "production",
    NODE_OPTIONS: [env.NODE_OPTIONS, "--dns-result-order=ipv4first"].filter(Boolean).join(" "),
    NEXT_DIST_DIR: buildFolder,
    NEXT_TELEMETRY_DISABLED: "1",
  };
}

/** Starts the web server and waits until it answers. */
export async function startServer({ root, port, buildFolder, development, env, log }: ServerPlace): Promise<Part> {
  const running = await startProgram(process.execPath, nextArguments(development, port), log, { cwd: root, env: nextEnvironment(env, buildFolder, development) });
  await waitUntilAnswering(running, port, log);
  return part(running);
}

/** Starts the worker, which sends what waits and looks after what arrived. */
export async function startWorker(root: string, env: NodeJS.ProcessEnv, log: string): Promise<Part> {
  return part(await startScript(root, "lib/local/worker.ts", env, log));
}

/** Starts one of our own scripts as a program of its own. */
export function startScript(root: string, script: string, env: NodeJS.ProcessEnv, log: string): Promise<Running> {
  return startProgram(process.execPath, [...TSX_ARGUMENTS, script], log, { cwd: root, env: { ...env, TSX_TSCONFIG_PATH: "lib/local/tsconfig.json" } });
}

function part({ pid, ended }: Running): Part {
  return { pid, ended, stop: () => stopProcess(pid, STOP_MILLISECONDS) };
}

async function waitUntilAnswering(running: Running, port: number, log: string): Promise<void> {
  let stopped = false;
  void running.ended.then(() => (stopped = true));
  const end = Date.now() + READY_MILLISECONDS;
  while (!stopped && Date.now() < end) {
    const answer = await fetch(`http://127.0.0.1:${port}/`, { redirect: "manual" }).catch(() => null);
    if (answer && answer.status < 500) return;
    if (answer) await refuseFault(running, answer.status, log);
    await sleep(100);
  }
  await stopProcess(running.pid, STOP_MILLISECONDS);
  throw new Refused(`The web server did not start. The end of ${log}:\n${lastLines(log, 20)}`);
}

async function refuseFault(running: Running, status: number, log: string): Promise<never> {
  await stopProcess(running.pid, STOP_MILLISECONDS);
  throw new Refused(`The web server started, but its first page failed (status ${status}). The end of ${log}:\n${lastLines(log, 20)}`);
}
