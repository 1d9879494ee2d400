import { existsSync, mkdirSync, mkdtempSync, readFileSync, readdirSync, renameSync, rmSync, statSync, writeFileSync } from "node:fs";
import { tmpdir, userInfo } from "node:os";
import { join } from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import mysql, { type Connection } from "mysql2/promise";
import { databaseSettings, type DatabasePlace } from "./database-settings";
import { requireFreePort } from "./ports";
import { commandLine, isAlive, lastLines, startProgram, stopProcess, type Running } from "./processes";
import { Refused } from "./refused";

/** A running private MariaDB. `connectAsRoot` goes by the socket, which only this user of the machine can open. */
export type LocalDatabase = {
  pid: number;
  port: number;
  connectAsRoot: () => Promise<Connection>;
  /** Resolves when the program ends, asked or not. */
  ended: Promise<number>;
  stop: () => Promise<void>;
};

/** Written last when the folder is made: a folder without it is not a whole database. */
const COMPLETE_MARK = "complete";
/** Unix socket paths end at 107 bytes. */
const LONGEST_SOCKET = 100;
const READY_MILLISECONDS = 60_000;
const STOP_MILLISECONDS = 60_000;

/** Starts MariaDB on a folder of its own, which is made first when it is not there yet. */
export async function startDatabase(folder: string, port: number): Promise<LocalDatabase> {
  requireOwnFolder(folder);
  requireNotRunning(folder);
  await requireFreePort(port, "the database");
  if (!existsSync(join(folder, COMPLETE_MARK))) await makeDatabase(folder);
  const { socket, forget } = socketOf(folder);
  const place: DatabasePlace = { folder, port, socket, asRoot: process.getuid?.() === 0 };
  const settings = join(folder, "my.cnf");
  writeFileSync(settings, databaseSettings(place), { mode: 0o600 });
  const running = await startProgram(serverProgram(), [`--defaults-file=${settings}`], join(folder, "database.log"), { cwd: folder });
  await waitUntilReady(running, socket, folder);
  return {
    pid: running.pid,
    port,
    ended: running.ended,
    connectAsRoot: () => connectBySocket(socket),
    stop: async () => {
      await stopProcess(running.pid, STOP_MILLISECONDS);
      forget();
    },
  };
}

/** The path of the server program; it lies in a folder that is not on every user's PATH. */
export function serverProgram(): string {
  return ["/usr/sbin/mariadbd", "/usr/libexec/mariadbd", "/usr/local/sbin/mariadbd"].find((path) => existsSync(path)) ?? "mariadbd";
}

/** The process id of a MariaDB that still runs on this folder, or null. */
export function databaseLeftRunning(folder: string): number | null {
  const mark = join(folder, "database.pid");
  if (!existsSync(mark)) return null;
  const pid = Number(readFileSync(mark, "utf8").trim());
  return Number.isInteger(pid) && pid > 0 && isAlive(pid) && commandLine(pid)?.includes(folder) ? pid : null;
}

function requireOwnFolder(folder: string): void {
  if (!existsSync(folder)) return;
  const owner = statSync(folder).uid;
  const self = process.getuid?.();
  if (self !== undefined && owner !== self) {
    throw new Refused(`The data folder ${folder} belongs to another user of this machine (number ${owner}). Start as that user, or use another copy of the program.`);
  }
  if (!existsSync(join(folder, COMPLETE_MARK)) && readdirSync(folder).length > 0) {
    throw new Refused(`The data folder ${folder} is only half made: its mark "${COMPLETE_MARK}" is missing. If nothing in it is wanted, remove it (rm -r ${folder}) and start again.`);
  }
}

function requireNotRunning(folder: string): void {
  const pid = databaseLeftRunning(folder);
  if (pid !== null) throw new Refused(`A database is already running on ${folder} (process ${pid}). Stop it first: kill ${pid}`);
}

/** Made under another name, so that one that was interrupted is never taken for a database and is simply made anew. */
async function makeDatabase(folder: string): Promise<void> {
  const making = `${folder}.making`;
  rmSync(making, { recursive: true, force: true });
  mkdirSync(join(making, "tmp"), { recursive: true, mode: 0o700 });
  const log = join(making, "database.log");
  const args = ["--no-defaults", `--datadir=${join(making, "data")}`, "--auth-root-authentication-method=socket", `--auth-root-socket-user=${userInfo().username}`, "--skip-test-db"];
  if (process.getuid?.() === 0) args.push("--user=root");
  const running = await startProgram("mariadb-install-db", args, log, { cwd: making });
  if ((await running.ended) !== 0) throw new Refused(`The database folder could not be made. The end of ${log}:\n${lastLines(log, 15)}`);
  writeFileSync(join(making, COMPLETE_MARK), "", { mode: 0o600 });
  // An empty folder of that name would do as well as none.
  rmSync(folder, { recursive: true, force: true });
  renameSync(making, folder);
}

function socketOf(folder: string): { socket: string; forget: () => void } {
  const near = join(folder, "database.sock");
  if (Buffer.byteLength(near) <= LONGEST_SOCKET) return { socket: near, forget: () => undefined };
  const short = mkdtempSync(join(tmpdir(), "towfolio-"));
  return { socket: join(short, "database.sock"), forget: () => rmSync(short, { recursive: true, force: true }) };
}

async function waitUntilReady(running: Running, socket: string, folder: string): Promise<void> {
  const log = join(folder, "database.log");
  const end = Date.now() + READY_MILLISECONDS;
  let stopped = false;
  void running.ended.then(() => (stopped = true));
  while (Date.now() < end && !stopped) {
    try {
      await (await connectBySocket(socket)).end();
      return;
    } catch {
      await sleep(100);
    }
  }
  if (!stopped) await stopProcess(running.pid, STOP_MILLISECONDS);
  throw new Refused(`The database did not start. The end of ${log}:\n${lastLines(log, 15)}`);
}

/** The server knows us by the user who opened the socket, so there is no password; the answer to its question is empty. */
function connectBySocket(socketPath: string): Promise<Connection> {
  return mysql.createConnection({
    socketPath,
    user: userInfo().username,
    timezone: "Z",
    connectTimeout: 5_000,
    authPlugins: { unix_socket: () => () => Buffer.alloc(0) },
  });
}
