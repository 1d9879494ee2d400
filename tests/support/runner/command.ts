import { rmSync } from "node:fs";
import { lastLines, startProgram, stopProcess } from "@/lib/local/processes";

/** A command of a test step: its words behind `node`, its environment, its log and how long it may take. */
export type Command = { args: string[]; env: NodeJS.ProcessEnv; log: string; minutes: number };

const STOP_MILLISECONDS = 5_000;
const SHOWN_LINES = 150;

/** Runs a command to its end or to its time limit, and answers its exit code. The log is shown when it failed. */
export async function runCommand({ args, env, log, minutes }: Command): Promise<number> {
  rmSync(log, { force: true });
  const running = await startProgram(process.execPath, args, log, { env });
  let late = false;
  const limit = setTimeout(() => {
    late = true;
    void stopProcess(running.pid, STOP_MILLISECONDS);
  }, minutes * 60_000);
  const code = await running.ended;
  clearTimeout(limit);
  if (code !== 0 || late) {
    process.stdout.write(`${lastLines(log, SHOWN_LINES)}\n`);
    if (late) process.stdout.write(`Stopped after its limit of ${minutes} minutes.\n`);
  }
  return late ? 1 : code;
}
