import { existsSync, readFileSync, rmSync } from "node:fs";
import { join } from "node:path";
import { NEXT_PROGRAM } from "@/lib/local/build";
import type { StepName } from "./choice";
import { runCommand } from "./command";
import { addTallies, judge, tallyCheck, tallyPlaywright, tallyVitest, type Tally } from "./reports";

/** What the steps share: where they write, the words for their runner, and the environment that set-up made. */
export type StepPlace = { folder: string; extra: string[]; env: NodeJS.ProcessEnv };

const TYPES_FILE = join("tests", "support", "tsconfig.types.json");
const MODULES = "node_modules";
const MINUTES: Record<StepName, number> = { types: 5, lint: 8, unit: 10, dom: 10, reference: 10, integration: 20, access: 20, e2e: 40 };

/** Runs one step and counts what it found. */
export function runStep(name: StepName, place: StepPlace): Promise<Tally> {
  if (name === "types") return runTypes(place);
  if (name === "lint") return runLint(place);
  if (name === "e2e") return runBrowser(place);
  return runVitest(name, place);
}

async function runTypes({ folder, env }: StepPlace): Promise<Tally> {
  const log = logOf(folder, "types");
  const generated = await runCommand({ args: [NEXT_PROGRAM, "typegen"], env, log: logOf(folder, "typegen"), minutes: MINUTES.types });
  if (generated !== 0) return tallyCheck(generated);
  const args = [join(MODULES, "typescript", "bin", "tsc"), "--noEmit", "--incremental", "false", "-p", TYPES_FILE];
  return tallyCheck(await runCommand({ args, env, log, minutes: MINUTES.types }));
}

async function runLint({ folder, env }: StepPlace): Promise<Tally> {
  const args = [join(MODULES, "eslint", "bin", "eslint.js"), ".", "--max-warnings", "0"];
  return tallyCheck(await runCommand({ args, env, log: logOf(folder, "lint"), minutes: MINUTES.lint }));
}

async function runVitest(project: StepName, { folder, extra, env }: StepPlace): Promise<Tally> {
  const report = reportOf(folder, project);
  const args = [join(MODULES, "vitest", "vitest.mjs"), "run", "--project", project, "--reporter=default", "--reporter=json", `--outputFile.json=${report}`, ...extra];
  const code = await runCommand({ args, env: { ...env, NODE_ENV: "test" }, log: logOf(folder, project), minutes: MINUTES[project] });
  return judge(code, readTally(report, tallyVitest));
}

async function runBrowser({ folder, extra, env }: StepPlace): Promise<Tally> {
  const report = reportOf(folder, "e2e");
  const args = [join(MODULES, "@playwright", "test", "cli.js"), "test", ...extra];
  const code = await runCommand({ args, env: { ...env, NODE_ENV: "test", E2E_REPORT: report }, log: logOf(folder, "e2e"), minutes: MINUTES.e2e });
  return judge(code, readTally(report, tallyPlaywright));
}

function readTally<Report>(path: string, tally: (report: Report) => Tally): Tally {
  if (!existsSync(path)) return addTallies([]);
  return tally(JSON.parse(readFileSync(path, "utf8")) as Report);
}

function logOf(folder: string, name: string): string {
  return join(folder, "logs", `${name}.log`);
}

/** An old report must never be counted again. */
function reportOf(folder: string, name: string): string {
  const path = join(folder, "reports", `${name}.json`);
  rmSync(path, { force: true });
  return path;
}
