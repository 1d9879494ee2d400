import { mkdirSync, readdirSync, rmSync } from "node:fs";
import { join } from "node:path";
import { databaseUrls } from "@/lib/local/accounts";
import { databaseLeftRunning } from "@/lib/local/database";
import { keepFolder, logFile } from "@/lib/local/folder";
import { takeLock, type Lock } from "@/lib/local/lock";
import { BROWSER_NEEDS, DATABASE_NEEDS, ensurePackages } from "@/lib/local/packages";
import { Parts } from "@/lib/local/parts";
import { requireFreePort, type Ports } from "@/lib/local/ports";
import { say } from "@/lib/local/progress";
import { Refused } from "@/lib/local/refused";
import { openDatabase, prepareSite, serveSite, type SitePlace } from "@/lib/local/site";
import type { StepName } from "./choice";

const NEEDS_DATABASE: StepName[] = ["integration", "access", "e2e"];

/** Old logs can still be read while a run goes on; the mark is this run's own. */
const KEPT = ["logs", "running.json"];

/** A folder of the tests, made anew for each run, and what runs in it. */
export type TestRun = { place: SitePlace; parts: Parts; lock: Lock; env: NodeJS.ProcessEnv };

/** Makes the folders of a run, and refuses when another run is using them or its ports. */
export async function openRun(place: SitePlace, steps: StepName[]): Promise<TestRun> {
  const { folder, ports } = place;
  keepFolder(folder);
  const lock = await takeLock(folder);
  if (lock.clearedUp !== null) say(lock.clearedUp);
  for (const name of readdirSync(folder)) if (!KEPT.includes(name)) clear(folder, name);
  mkdirSync(join(folder, "reports"));
  const parts = new Parts((pids) => lock.remember(pids));
  if (steps.some((step) => NEEDS_DATABASE.includes(step))) {
    await requireFreePort(ports.database, "the database of the tests");
    await ensurePackages(DATABASE_NEEDS, logFile(folder, "packages"));
  }
  if (steps.includes("e2e")) {
    for (const name of Object.keys(ports) as (keyof Ports)[]) await requireFreePort(ports[name], "the tests");
    await ensurePackages(BROWSER_NEEDS, logFile(folder, "packages"));
  }
  return { place, parts, lock, env: { ...plain(process.env), NEXT_DIST_DIR: place.buildFolder, NEXT_TELEMETRY_DISABLED: "1" } };
}

/** Makes ready what a step needs beyond the files: a database for some, the whole running site for the browser. */
export function setUpFor(run: TestRun): (step: StepName) => Promise<NodeJS.ProcessEnv> {
  let opened: ReturnType<typeof openDatabase> | undefined;
  return async (step) => {
    if (!NEEDS_DATABASE.includes(step)) return run.env;
    const database = await (opened ??= openDatabase(run.place, run.parts, true));
    const env = { ...run.env, TEST_DATABASE_ADMIN_URL: databaseUrls(database.keys, run.place.ports.database).admin };
    return step === "e2e" ? { ...env, ...(await siteFor(run, database)) } : env;
  };
}

async function siteFor({ place, parts, env }: TestRun, database: Awaited<ReturnType<typeof openDatabase>>): Promise<NodeJS.ProcessEnv> {
  const site = await prepareSite(place, parts, database, withoutServices(env));
  await serveSite(site, parts, false);
  return { ...site.env, MAIL_PAGE_URL: `http://localhost:${place.ports.mailPage}` };
}

/** Logs are read as text, so no program may color its output. */
function plain({ FORCE_COLOR: _, ...env }: NodeJS.ProcessEnv): NodeJS.ProcessEnv {
  return { ...env, NO_COLOR: "1" } as NodeJS.ProcessEnv;
}

/** The tests never reach a hosted service, whatever the shell or a file of settings names. */
function withoutServices(env: NodeJS.ProcessEnv): NodeJS.ProcessEnv {
  const own = /^(APP_URL|PORT|AUTH_SECRET|MAIL_FROM|SMTP_URL|TRUSTED_PROXY_HEADER|DATABASE_.*|UPLOADTHING_.*|STRIPE_.*)$/;
  return Object.fromEntries(Object.entries(env).filter(([name]) => !own.test(name))) as NodeJS.ProcessEnv;
}

function clear(folder: string, name: string): void {
  const path = join(folder, name);
  const pid = name === "database" ? databaseLeftRunning(path) : null;
  if (pid !== null) throw new Refused(`The database of an earlier test run is still running (process ${pid}). Stop it first: kill ${pid}`);
  rmSync(path, { recursive: true });
}
