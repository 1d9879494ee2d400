import { execFile, spawn } from "node:child_process";
import { accessSync, appendFileSync, constants, openSync, closeSync } from "node:fs";
import { delimiter, join } from "node:path";
import { promisify } from "node:util";
import { lastLines } from "./processes";
import { step } from "./progress";
import { Refused } from "./refused";

/** A program that a local copy needs, and the Debian package that brings it. */
export type Need = { program: string; package: string };

/** The database alone: no service, no user account, nothing that starts by itself. */
export const DATABASE_NEEDS: Need[] = [
  { program: "mariadbd", package: "mariadb-server-core" },
  { program: "mariadb-install-db", package: "mariadb-server-core" },
  { program: "mariadb", package: "mariadb-client-core" },
];

/** The browser that the end-to-end tests drive. */
export const BROWSER_NEEDS: Need[] = [{ program: "chromium", package: "chromium" }];

const SYSTEM_FOLDERS = ["/usr/sbin", "/usr/bin", "/sbin", "/bin"];
/** Waits for another package run to end rather than fail, and never asks. */
const APT = ["-y", "-q", "-o", "DPkg::Lock::Timeout=120", "-o", "Acquire::Retries=3", "-o", "Acquire::http::Timeout=60", "-o", "Dpkg::Use-Pty=0", "-o", "Dpkg::Options::=--force-confold"];
const APT_ENV = { DEBIAN_FRONTEND: "noninteractive", NEEDRESTART_SUSPEND: "1", APT_LISTCHANGES_FRONTEND: "none" };

/** Installs from Debian what is missing, and nothing when all is there. */
export async function ensurePackages(needs: Need[], log: string): Promise<void> {
  const missing = [...new Set(needs.filter(({ program }) => !hasProgram(program)).map((need) => need.package))];
  if (missing.length === 0) return;
  const manual = `apt-get install --no-install-recommends ${missing.join(" ")}`;
  if (!hasProgram("apt-get")) throw new Refused(`Missing: ${missing.join(", ")}. This machine has no apt-get to install them with; install them by hand.`);
  const prefix = await rightToInstall(missing, manual);
  await step(`Installing ${missing.join(", ")} from Debian`, async () => {
    const install = ["install", "--no-install-recommends", ...missing];
    if (await apt(prefix, install, log)) return;
    // A fresh machine has no package lists yet, or old ones.
    if ((await apt(prefix, ["update"], log)) && (await apt(prefix, install, log))) return;
    throw new Refused(`Installing failed. Try it by hand: ${manual}\nThe end of ${log}:\n${lastLines(log, 12)}`);
  });
  const still = needs.filter(({ program }) => !hasProgram(program));
  if (still.length > 0) throw new Refused(`Installed, but still not found: ${still.map(({ program }) => program).join(", ")}.`);
}

function hasProgram(name: string): boolean {
  const folders = [...(process.env.PATH ?? "").split(delimiter), ...SYSTEM_FOLDERS];
  return folders.some((folder) => {
    try {
      accessSync(join(folder, name), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}

/** How to run the installer: as it is for root, through sudo for others; refuses when neither works. */
async function rightToInstall(missing: string[], manual: string): Promise<string[]> {
  if (process.getuid?.() === 0) return [];
  if (hasProgram("sudo")) {
    const asks = await promisify(execFile)("sudo", ["-n", "true"]).then(() => false, () => true);
    if (!asks) return ["sudo", "-n"];
    // With a person at the terminal, sudo may ask for the password.
    if (process.stdin.isTTY) return ["sudo"];
  }
  throw new Refused(`Missing: ${missing.join(", ")}, and this user may not install them. Run once as root: ${manual}`);
}

function apt(prefix: string[], args: string[], log: string): Promise<boolean> {
  const environment = Object.entries(APT_ENV).map(([name, value]) => `${name}=${value}`);
  const [command = "env", ...rest] = [...prefix, "env", ...environment, "apt-get", ...APT, ...args];
  appendFileSync(log, `\n${[command, ...rest].join(" ")}\n`);
  const file = openSync(log, "a", 0o600);
  return new Promise<boolean>((resolve) => {
    const child = spawn(command, rest, { stdio: [process.stdin.isTTY ? "inherit" : "ignore", file, file] });
    child.once("error", () => resolve(false));
    child.once("close", (code) => resolve(code === 0));
  }).finally(() => closeSync(file));
}
