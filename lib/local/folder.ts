import { chmodSync, existsSync, mkdirSync, renameSync, statSync } from "node:fs";
import { join } from "node:path";
import { Refused } from "./refused";

const LONGEST_LOG = 5_000_000;

/** Makes the private folder of a local copy, or checks that the one there is ours and open to nobody else. */
export function keepFolder(folder: string): void {
  if (!existsSync(folder)) {
    try {
      mkdirSync(folder, { recursive: true, mode: 0o700 });
    } catch (fault) {
      throw new Refused(`The data folder ${folder} cannot be made here (${(fault as NodeJS.ErrnoException).code ?? String(fault)}).`, { cause: fault });
    }
  }
  const found = statSync(folder);
  if (!found.isDirectory()) throw new Refused(`${folder} is in the way: it has to be a folder. Move it elsewhere.`);
  const self = process.getuid?.();
  if (self !== undefined && found.uid !== self) {
    throw new Refused(`The data folder ${folder} belongs to another user of this machine (number ${found.uid}). Start as that user, or use another copy of the program.`);
  }
  if ((found.mode & 0o077) !== 0) chmodSync(folder, 0o700);
  mkdirSync(join(folder, "logs"), { recursive: true, mode: 0o700 });
}

/** The path of a log, whose old lines are set aside when they have become many. */
export function logFile(folder: string, name: string): string {
  const path = join(folder, "logs", `${name}.log`);
  if (existsSync(path) && statSync(path).size > LONGEST_LOG) renameSync(path, `${path}.old`);
  return path;
}
