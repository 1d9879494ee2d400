import { readdirSync } from "node:fs";

/** All files of this name below a folder, as paths from the top of the tree. */
export const filesNamed = (folder: string, name: string): string[] =>
  readdirSync(folder, { recursive: true, withFileTypes: true }).filter((entry) => entry.isFile() && entry.name === name).map((entry) => `${entry.parentPath}/${entry.name}`).sort();
