import { Refusal } from "../http";
import { signUrl, type Token } from "./signing";
import type { Storage, StoredFile } from "./storage";

type Body = Record<string, unknown>;

const DEFAULT_ACCESS_SECONDS = 300;
const LONGEST_ACCESS_SECONDS = 7 * 24 * 3600;
const ALLOWANCE_BYTES = 2 * 1024 ** 3;

/** The calls that the application's server makes about stored files, by the last part of their address under /v6. */
export function openApi(storage: Storage, token: Token, urlOf: (id: string) => string): Record<string, (body: Body) => unknown> {
  return {
    deleteFiles(body) {
      const files = wanted(storage, body);
      for (const file of files) storage.remove(file.key);
      return { success: true, deletedCount: files.length };
    },
    listFiles(body) {
      const [offset, limit] = [count(body.offset, 0), count(body.limit, 500)];
      const all = storage.files.all().sort((a, b) => b.uploadedAt - a.uploadedAt);
      const files = all.slice(offset, offset + limit).map(({ key, customId, name, size, uploadedAt }) => ({ id: key, customId, key, name, size, uploadedAt, status: "Uploaded" }));
      return { hasMore: offset + limit < all.length, files };
    },
    renameFiles(body) {
      for (const [file, update] of updates(storage, body)) {
        if (typeof update.newName !== "string" || !update.newName) throw new Refusal(400, "Missing newName");
        storage.files.put(file.key, { ...file, name: update.newName });
      }
      return { success: true };
    },
    updateACL(body) {
      for (const [file, update] of updates(storage, body)) {
        if (update.acl !== "private" && update.acl !== "public-read") throw new Refusal(400, "Invalid acl");
        storage.files.put(file.key, { ...file, acl: update.acl });
      }
      return { success: true };
    },
    getFileUrl: (body) => ({ data: wanted(storage, body).map((file) => ({ key: file.key, url: urlOf(file.key) })) }),
    requestFileAccess(body) {
      const file = one(storage, body);
      const seconds = count(body.expiresIn, DEFAULT_ACCESS_SECONDS);
      if (seconds > LONGEST_ACCESS_SECONDS) throw new Refusal(400, "expiresIn must be less than 7 days");
      const ufsUrl = signUrl(urlOf(file.key), token.apiKey, seconds);
      return { url: ufsUrl, ufsUrl };
    },
    getUsageInfo() {
      const files = storage.files.all();
      const totalBytes = files.reduce((sum, file) => sum + file.size, 0);
      return { totalBytes, appTotalBytes: totalBytes, filesUploaded: files.length, limitBytes: ALLOWANCE_BYTES };
    },
  };
}

/** The files that are named by keys or by own ids; unknown ones are left out. */
function wanted(storage: Storage, { fileKeys, customIds }: Body): StoredFile[] {
  const names: unknown = fileKeys ?? customIds;
  if (!Array.isArray(names)) throw new Refusal(400, "Missing fileKeys or customIds");
  const find = fileKeys ? storage.files.get : storage.findByCustomId;
  return names.map((name) => find(String(name))).filter((file) => file !== undefined);
}

function one(storage: Storage, { fileKey, customId }: Body): StoredFile {
  const file = typeof fileKey === "string" ? storage.files.get(fileKey) : typeof customId === "string" ? storage.findByCustomId(customId) : undefined;
  if (!file) throw new Refusal(404, "File not found");
  return file;
}

function updates(storage: Storage, body: Body): [StoredFile, Body][] {
  if (!Array.isArray(body.updates)) throw new Refusal(400, "Missing updates");
  return body.updates.map((update: Body) => [one(storage, update), update]);
}

function count(value: unknown, otherwise: number): number {
  if (value === undefined || value === null) return otherwise;
  if (typeof value !== "number" || !Number.isInteger(value) || value < 0) throw new Refusal(400, "Not a whole number");
  return value;
}
