import { spawn } from "node:child_process";
import mysql from "mysql2/promise";
import { readEnv } from "@/lib/env";
import { requireNode } from "./arguments";
import { readEnvFile } from "./environment";
import { isStale } from "./build";
import { Refused } from "./refused";
import { nextArguments, nextEnvironment } from "./server-program";
import { requireSafeDatabase } from "./server-variables";

const CONNECT_MILLISECONDS = 10_000;

/** Serves the built site with services and a database from the environment; refuses when any of it is missing or unsafe. */
async function main(): Promise<void> {
  requireNode(process.versions.node);
  readEnvFile(process.cwd());
  const { env, faults } = readEnv(process.env);
  if (faults) throw new Refused(["The environment is not usable:", ...faults.map((fault) => `  - ${fault}`)].join("\n"));
  await requireSafeServer(env.DATABASE_URL);
  const buildFolder = process.env.NEXT_DIST_DIR ?? ".next";
  if (isStale(process.cwd(), buildFolder)) process.stderr.write("The build may be of other sources than these; npm run build renews it.\n");
  const port = process.env.PORT ?? "3000";
  const server = spawn(process.execPath, nextArguments(false, port, process.env.HOST), { stdio: "inherit", env: nextEnvironment(process.env, buildFolder, false) });
  let asked = false;
  for (const name of ["SIGINT", "SIGTERM"] as const) {
    process.on(name, () => {
      asked = true;
      server.kill("SIGTERM");
    });
  }
  server.once("exit", (code) => process.exit(asked ? 0 : (code ?? 1)));
}

async function requireSafeServer(uri: string): Promise<void> {
  let connection;
  try {
    connection = await mysql.createConnection({ uri, connectTimeout: CONNECT_MILLISECONDS });
  } catch (fault) {
    throw new Refused(`The database of DATABASE_URL cannot be reached: ${fault instanceof Error ? fault.message : String(fault)}`, { cause: fault });
  }
  try {
    await requireSafeDatabase(connection);
  } finally {
    await connection.end();
  }
}

main().catch((fault: unknown) => {
  process.stderr.write(`${fault instanceof Refused ? fault.message : fault instanceof Error ? fault.stack : String(fault)}\n`);
  process.exitCode = 1;
});
