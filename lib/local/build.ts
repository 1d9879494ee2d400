import { createHash } from "node:crypto";
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from "node:fs";
import { join, relative } from "node:path";
import { lastLines, startProgram, stopProcess } from "./processes";
import { step } from "./progress";
import { Refused } from "./refused";

/** What a build is made from. Tests and the launcher itself are not part of it. */
const SOURCE_FOLDERS = ["app", "components", "db", "emails", "lib", "public"];
const LEFT_OUT = [join("lib", "local"), join("db", "migrations")];
const SOURCE_FILES = /^(package-lock\.json|tsconfig\.json|proxy\.ts|.*\.config\.(ts|mjs|js))$/;
const HASH_FILE = "source-hash";
const BUILD_MILLISECONDS = 15 * 60_000;

/** The Next.js command line, run with this Node so that nothing depends on PATH. */
export const NEXT_PROGRAM = join("node_modules", "next", "dist", "bin", "next");

/** One hash over the names and contents of all that a build is made from. */
export function hashSources(root: string): string {
  const hash = createHash("sha256");
  for (const path of sourceFiles(root)) {
    const content = readFileSync(path);
    hash.update(`${relative(root, path)}\0${content.length}\0`).update(content);
  }
  return hash.digest("hex");
}

/** Whether the build in a folder is missing, unfinished, or made from other sources. */
export function isStale(root: string, buildFolder: string): boolean {
  const kept = join(root, buildFolder, HASH_FILE);
  const finished = existsSync(join(root, buildFolder, "BUILD_ID"));
  return !finished || !existsSync(kept) || readFileSync(kept, "utf8") !== hashSources(root);
}

/** Builds the site into a folder of its own unless the build there is already of these sources. */
export async function buildWhenStale(root: string, buildFolder: string, environment: NodeJS.ProcessEnv, log: string): Promise<void> {
  if (!isStale(root, buildFolder)) return;
  await step("Building the site, which takes about a minute the first time", async () => {
    const hash = hashSources(root);
    rmSync(join(root, buildFolder, HASH_FILE), { force: true });
    const env = { ...environment, NODE_ENV: "production" as const, NEXT_DIST_DIR: buildFolder };
    const running = await startProgram(process.execPath, [NEXT_PROGRAM, "build"], log, { cwd: root, env });
    const limit = setTimeout(() => void stopProcess(running.pid, 2_000), BUILD_MILLISECONDS);
    const code = await running.ended;
    clearTimeout(limit);
    if (code !== 0) throw new Refused(`The site could not be built. The end of ${log}:\n${lastLines(log, 40)}`);
    writeFileSync(join(root, buildFolder, HASH_FILE), hash);
  });
}

function sourceFiles(root: string): string[] {
  const single = readdirSync(root, { withFileTypes: true }).filter((entry) => entry.isFile() && SOURCE_FILES.test(entry.name));
  const inFolders = SOURCE_FOLDERS.filter((folder) => existsSync(join(root, folder))).flatMap((folder) => filesBelow(root, join(root, folder)));
  return [...single.map((entry) => join(root, entry.name)), ...inFolders].sort();
}

function filesBelow(root: string, folder: string): string[] {
  if (LEFT_OUT.includes(relative(root, folder))) return [];
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return filesBelow(root, path);
    return entry.isFile() ? [path] : [];
  });
}
