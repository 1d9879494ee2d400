import { join } from "node:path";
import { databaseUrls } from "./accounts";
import { requireNode, startMode, type StartMode } from "./arguments";
import { readEnvFile } from "./environment";
import { keepFolder, logFile } from "./folder";
import { takeLock, type Lock } from "./lock";
import { migrateDatabase } from "./migrate";
import { MigrationFault } from "./migration-steps";
import { DATABASE_NEEDS, ensurePackages } from "./packages";
import { Parts } from "./parts";
import { portsFrom, requireFreePort, START_PORTS, type Ports } from "./ports";
import { stopAllPrograms } from "./processes";
import { say } from "./progress";
import { Refused } from "./refused";
import { openDatabase, prepareSite, serveSite, type SitePlace } from "./site";

const root = process.cwd();
const folder = join(root, ".data");
const PURPOSES: Record<keyof Ports, string> = {
  app: "the site",
  database: "the database",
  mail: "the local mail service",
  mailPage: "the page of sent e-mails",
  payments: "the local payment service",
  uploads: "the local file service",
};

let lock: Lock | undefined;
let stopping = false;
const parts = new Parts((pids) => lock?.remember(pids));

async function main(): Promise<void> {
  requireNode(process.versions.node);
  const mode = startMode(process.argv.slice(2));
  readEnvFile(root);
  const place = placeFor(mode);
  keepFolder(folder);
  lock = await takeLock(folder);
  // Somebody should know that it happened before anything is written again.
  if (lock.clearedUp !== null) throw new Refused(`${lock.clearedUp} All is cleared up; run npm start again.`);
  for (const name of Object.keys(PURPOSES) as (keyof Ports)[]) await requireFreePort(place.ports[name], PURPOSES[name]);
  await ensurePackages(DATABASE_NEEDS, logFile(folder, "packages"));
  const opened = await openDatabase(place, parts, mode === "database");
  if (mode === "database") {
    await sayDatabase(databaseUrls(opened.keys, place.ports.database));
  } else {
    const site = await prepareSite(place, parts, opened, process.env);
    await serveSite(site, parts, mode === "development");
    const { sayWelcome } = await import("./welcome");
    sayWelcome(site);
  }
  const name = await parts.givenUp;
  throw new Refused(`${name} keeps ending; its log is in ${join(folder, "logs")}. Stopping.`);
}

async function sayDatabase({ app, admin }: { app: string; admin: string }): Promise<void> {
  await migrateDatabase(admin, app);
  say(`\nDATABASE_URL=${app}\nDATABASE_ADMIN_URL=${admin}\nTEST_DATABASE_ADMIN_URL=${admin}\n\nCtrl-C stops it.`);
}

function placeFor(mode: StartMode): SitePlace {
  const ports = portsFrom(START_PORTS, process.env.TOWFOLIO_PORT_BASE);
  const app = process.env.PORT ? Number(process.env.PORT) : ports.app;
  if (!Number.isInteger(app) || app < 1 || app > 65_535) throw new Refused(`PORT is "${process.env.PORT}", which is not a port number.`);
  return { root, folder, ports: { ...ports, app }, buildFolder: mode === "development" ? ".next-dev" : ".next" };
}

/** Stops all parts in order, the database last, and leaves nothing behind. */
async function stop(code: number): Promise<never> {
  stopping = true;
  await parts.stop();
  await stopAllPrograms();
  lock?.release();
  process.exit(code);
}

function onSignal(): void {
  if (stopping) return;
  say("\nStopping ...");
  void stop(0);
}

for (const name of ["SIGINT", "SIGTERM", "SIGHUP"] as const) process.on(name, onSignal);

main().catch((fault: unknown) => {
  // A step that fails because everything is being stopped is no news.
  if (stopping) return;
  const known = fault instanceof Refused || fault instanceof MigrationFault;
  process.stderr.write(`${known ? fault.message : fault instanceof Error ? fault.stack : String(fault)}\n`);
  void stop(1);
});
