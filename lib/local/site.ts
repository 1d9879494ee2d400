import { existsSync, rmSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import type { Connection, RowDataPacket } from "mysql2/promise";
import { allowTestSchemas, databaseUrls, dropSchema, makeAccounts, SCHEMA } from "./accounts";
import { buildWhenStale } from "./build";
import { startDatabase, type LocalDatabase } from "./database";
import { appUrlOf, missingServices, siteEnvironment, type Hosted } from "./environment";
import { logFile } from "./folder";
import { keepKeys, type Keys } from "./keys";
import { migrateDatabase } from "./migrate";
import type { Parts } from "./parts";
import type { Ports } from "./ports";
import { lastLines } from "./processes";
import { step } from "./progress";
import { Refused } from "./refused";
import { startScript, startServer, startWorker } from "./server-program";
import { requireSafeDatabase } from "./server-variables";

/** Where one copy of the site lives: its program, its data, its ports and its build. */
export type SitePlace = { root: string; folder: string; ports: Ports; buildFolder: string };

/** A copy whose database runs and whose services are there. */
export type PreparedSite = SitePlace & { keys: Keys; env: NodeJS.ProcessEnv; standIns: Hosted[] };

/** Exists while the demo scenario is being loaded; one that is found was left by an interrupted start. */
const DEMO_MARK = "demo-unfinished";

/** Starts the private database, checks that its settings are safe, and makes the accounts. */
export async function openDatabase({ folder, ports }: SitePlace, parts: Parts, forTests: boolean): Promise<{ database: LocalDatabase; keys: Keys }> {
  const keys = keepKeys(folder);
  const database = await step("Starting the database", () => parts.start("The database", () => startDatabase(join(folder, "database"), ports.database)));
  await withRoot(database, async (root) => {
    await requireSafeDatabase(root);
    if (existsSync(join(folder, DEMO_MARK))) await dropSchema(root);
    await makeAccounts(root, keys);
    if (forTests) await allowTestSchemas(root);
  });
  return { database, keys };
}

/** Brings the tables up to date, starts the stand-ins of the services without keys, and loads the demo into an empty database. */
export async function prepareSite(place: SitePlace, parts: Parts, { database, keys }: { database: LocalDatabase; keys: Keys }, given: NodeJS.ProcessEnv): Promise<PreparedSite> {
  const { ports } = place;
  const urls = databaseUrls(keys, ports.database);
  await step("Bringing the tables up to date", () => migrateDatabase(urls.admin, urls.app));
  const standIns = missingServices(given);
  const services = await startServices(place, parts, keys, appUrlOf(given, ports), standIns);
  const env = siteEnvironment(given, keys, ports, services);
  const site = { ...place, keys, env, standIns };
  if (await withRoot(database, hasNoPeople)) await step("Loading the invented demo scenario", () => loadDemoOnce(site));
  return site;
}

/** Builds when the sources changed, then starts the worker and the web server. */
export async function serveSite(site: PreparedSite, parts: Parts, development: boolean): Promise<void> {
  const { root, folder, buildFolder, ports, env } = site;
  if (!development) await buildWhenStale(root, buildFolder, env, logFile(folder, "build"));
  await parts.start("The worker", () => startWorker(root, env, logFile(folder, "worker")));
  const server = { root, port: ports.app, buildFolder, development, env, log: logFile(folder, "server") };
  await step("Starting the web server", () => parts.start("The web server", () => startServer(server)));
}

async function startServices({ folder, ports }: SitePlace, parts: Parts, keys: Keys, appUrl: string, only: Hosted[]): Promise<Record<string, string>> {
  if (only.length === 0) return {};
  const { startStandIns } = await import("./stand-ins");
  const services = await parts.start("The stand-ins", () => startStandIns({ folder, ports, appUrl, keys, only }));
  return services.env;
}

async function loadDemoOnce({ root, folder, env }: PreparedSite): Promise<void> {
  const mark = join(folder, DEMO_MARK);
  const log = logFile(folder, "demo");
  writeFileSync(mark, "", { mode: 0o600 });
  const running = await startScript(root, "lib/local/load-demo.ts", env, log);
  if ((await running.ended) !== 0) throw new Refused(`The demo scenario could not be loaded. The end of ${log}:\n${lastLines(log, 20)}`);
  rmSync(mark);
}

async function hasNoPeople(root: Connection): Promise<boolean> {
  const [rows] = await root.query<RowDataPacket[]>(`select 1 from \`${SCHEMA}\`.users limit 1`);
  return rows.length === 0;
}

async function withRoot<T>(database: LocalDatabase, work: (root: Connection) => Promise<T>): Promise<T> {
  const root = await database.connectAsRoot();
  try {
    return await work(root);
  } finally {
    await root.end();
  }
}
