import { createHash } from "node:crypto";
import { createReadStream, existsSync, mkdirSync, readdirSync, renameSync, rmSync, statSync } from "node:fs";
import { open } from "node:fs/promises";
import { join } from "node:path";
import { Refusal } from "../http";
import { openShelf, type Shelf } from "../shelf";

/** A file that arrived whole. */
export type StoredFile = {
  key: string;
  customId: string | null;
  name: string;
  size: number;
  type: string;
  acl: "private" | "public-read";
  disposition: string;
  /** MD5 in hex, as the service reports it. */
  hash: string;
  uploadedAt: number;
};

/** The bytes and facts of all files, and the beginnings of files that are still on their way. */
export type Storage = {
  files: Shelf<StoredFile>;
  pathOf(key: string): string;
  /** By key, else by the application's own id. */
  find(id: string): StoredFile | undefined;
  findByCustomId(customId: string): StoredFile | undefined;
  /** Refuses an own id that another file has: they are unique in an application. */
  requireOwn(key: string, customId: string | null): void;
  remove(key: string): void;
  /** How much of a file is here so far. */
  partialSize(key: string): number;
  dropPartial(key: string): void;
  /** Writes pieces from an offset on, forgetting what was there behind it; answers the new length. */
  append(key: string, offset: number, pieces: AsyncIterable<Buffer>): Promise<number>;
  /** Makes the arrived bytes the file. */
  finish(file: Omit<StoredFile, "hash" | "uploadedAt">): Promise<StoredFile>;
};

const PARTIAL_KEPT_MS = 24 * 3600 * 1000;

/** Opens what an earlier run left in the folder; beginnings older than a day go. */
export function openStorage(folder: string): Storage {
  const [whole, partial] = [join(folder, "bytes"), join(folder, "partial")];
  for (const one of [whole, partial]) mkdirSync(one, { recursive: true });
  for (const name of readdirSync(partial)) {
    if (statSync(join(partial, name)).mtimeMs < Date.now() - PARTIAL_KEPT_MS) rmSync(join(partial, name));
  }
  const files = openShelf<StoredFile>(join(folder, "files"));
  const findByCustomId = (customId: string) => files.all().find((file) => file.customId === customId);
  const requireOwn = (key: string, customId: string | null) => {
    const other = customId === null ? undefined : findByCustomId(customId);
    if (other && other.key !== key) throw new Refusal(400, "A file with this customId already exists");
  };
  const pathOf = (key: string) => join(whole, key);
  const partialOf = (key: string) => join(partial, key);
  return {
    files,
    pathOf,
    findByCustomId,
    requireOwn,
    find: (id) => files.get(id) ?? findByCustomId(id),
    remove(key) {
      files.remove(key);
      rmSync(pathOf(key), { force: true });
    },
    partialSize: (key) => (existsSync(partialOf(key)) ? statSync(partialOf(key)).size : 0),
    dropPartial: (key) => rmSync(partialOf(key), { force: true }),
    append: (key, offset, pieces) => append(partialOf(key), offset, pieces),
    async finish(file) {
      const hash = await md5(partialOf(file.key));
      // Asked again: its twin may have arrived meanwhile.
      requireOwn(file.key, file.customId);
      renameSync(partialOf(file.key), pathOf(file.key));
      return files.put(file.key, { ...file, hash, uploadedAt: Date.now() });
    },
  };
}

async function append(path: string, offset: number, pieces: AsyncIterable<Buffer>): Promise<number> {
  const handle = await open(path, existsSync(path) ? "r+" : "w");
  try {
    await handle.truncate(offset);
    let at = offset;
    for await (const piece of pieces) {
      await handle.write(piece, 0, piece.length, at);
      at += piece.length;
    }
    return at;
  } finally {
    await handle.close();
  }
}

async function md5(path: string): Promise<string> {
  const hash = createHash("md5");
  for await (const chunk of createReadStream(path)) hash.update(chunk as Buffer);
  return hash.digest("hex");
}
