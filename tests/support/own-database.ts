import { mkdtempSync, rmSync } from "node:fs";
import { createServer, type AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { closeDb } from "@/db/client";
import { databaseUrls, makeAccounts } from "@/lib/local/accounts";
import { startDatabase, type LocalDatabase } from "@/lib/local/database";
import { keepKeys } from "@/lib/local/keys";
import { migrateDatabase } from "@/lib/local/migrate";
import { TEST_ENVIRONMENT } from "./environment";

/** A port that nobody listens on at the moment. */
export async function freePort(): Promise<number> {
  const probe = createServer();
  await new Promise<void>((resolve) => probe.listen(0, "127.0.0.1", resolve));
  const { port } = probe.address() as AddressInfo;
  await new Promise<void>((resolve) => probe.close(() => resolve()));
  return port;
}

/** A whole MariaDB of the caller's own, with the product's settings, tables and grants: one that may be killed. */
export type OwnDatabase = {
  appUrl: string;
  /** Ends the program without asking it, and waits until it is gone. */
  kill: () => Promise<void>;
  /** Starts it again on the same folder and port. */
  start: () => Promise<void>;
  /** Runs statements as the server's root, which the application is not. */
  asRoot: (statement: string, values?: unknown[]) => Promise<unknown>;
  close: () => Promise<void>;
};

/** Makes the server, migrates, and points DATABASE_URL at it. */
export async function openOwnDatabase(more: Record<string, string> = {}): Promise<OwnDatabase> {
  const folder = mkdtempSync(join(tmpdir(), "towfolio-own-"));
  const port = await freePort();
  const begin = () => startDatabase(join(folder, "database"), port);
  const keys = keepKeys(folder);
  let server: LocalDatabase = await begin();
  const root = await server.connectAsRoot();
  await makeAccounts(root, keys);
  await root.end();
  const { app, admin } = databaseUrls(keys, port);
  await migrateDatabase(admin, app);
  Object.assign(process.env, TEST_ENVIRONMENT, { DATABASE_URL: app }, more);
  return {
    appUrl: app,
    kill: async () => {
      process.kill(server.pid, "SIGKILL");
      await server.ended;
    },
    start: async () => void (server = await begin()),
    asRoot: async (statement, values = []) => {
      const connection = await server.connectAsRoot();
      try {
        return (await connection.query(`use towfolio`), await connection.query(statement, values))[0];
      } finally {
        await connection.end();
      }
    },
    close: async () => {
      await closeDb();
      await server.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
