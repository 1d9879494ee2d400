import { join } from "node:path";
import { requireNode } from "@/lib/local/arguments";
import { portsFrom, TEST_PORTS } from "@/lib/local/ports";
import { stopAllPrograms } from "@/lib/local/processes";
import { say, step } from "@/lib/local/progress";
import { readChoice, type StepName } from "./runner/choice";
import { addTallies, lastLine, type Tally } from "./runner/reports";
import { openRun, setUpFor, type TestRun } from "./runner/set-up";
import { runStep } from "./runner/steps";

const root = process.cwd();
const folder = join(root, ".test");
const tallies: Tally[] = [];
let run: TestRun | undefined;
let ending = false;

async function main(): Promise<void> {
  requireNode(process.versions.node);
  const { steps, extra } = readChoice(process.argv.slice(2));
  const place = { root, folder, ports: portsFrom(TEST_PORTS, process.env.TOWFOLIO_PORT_BASE), buildFolder: ".next-test" };
  run = await openRun(place, steps);
  const setUp = setUpFor(run);
  for (const name of steps) tallies.push(await countStep(name, setUp, extra));
}

/** A step whose set-up fails counts as one failure; the steps after it still run. */
async function countStep(name: StepName, setUp: (step: StepName) => Promise<NodeJS.ProcessEnv>, extra: string[]): Promise<Tally> {
  try {
    const env = await setUp(name);
    const tally = await step(`Test step "${name}"`, () => runStep(name, { folder, extra, env }));
    say(`  ${lastLine(tally).replace(",", " and")}`);
    return tally;
  } catch (fault) {
    sayFault(fault);
    return { passed: 0, failed: 1 };
  }
}

/** Stops what the run started and ends with the count on a line of its own. */
async function end(failedToo: number): Promise<never> {
  if (ending) return new Promise<never>(() => undefined);
  ending = true;
  await run?.parts.stop();
  await stopAllPrograms();
  run?.lock.release();
  const total = addTallies([...tallies, { passed: 0, failed: failedToo }]);
  say(`\nLogs are in ${join(folder, "logs")}\n${lastLine(total)}`);
  process.exit(total.failed === 0 && total.passed > 0 ? 0 : 1);
}

function sayFault(fault: unknown): void {
  if (!ending) say(fault instanceof Error ? fault.message : String(fault));
}

for (const name of ["SIGINT", "SIGTERM", "SIGHUP"] as const) process.on(name, () => void end(1));

main().then(
  () => end(0),
  (fault: unknown) => {
    sayFault(fault);
    return end(1);
  },
);
