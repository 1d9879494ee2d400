import { randomBytes } from "node:crypto";
import { chmodSync, existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { Refused } from "./refused";

const MAKERS = {
  /** Signs sessions and links. */
  authSecret: () => secret(48),
  databaseAdminPassword: () => secret(24),
  databaseAppPassword: () => secret(24),
  /** The upload library takes only keys that begin so. */
  uploadsApiKey: () => `sk_live_${randomBytes(24).toString("hex")}`,
  uploadsAppId: () => `a${randomBytes(6).toString("hex")}`,
  paymentsSecretKey: () => `sk_test_${randomBytes(24).toString("hex")}`,
  paymentsWebhookSecret: () => `whsec_${randomBytes(24).toString("hex")}`,
};

/** The secrets of one local copy, made at its first start and kept in its data folder. */
export type Keys = Record<keyof typeof MAKERS, string>;

/** Reads the kept secrets, making those that are not there yet. */
export function keepKeys(folder: string): Keys {
  const path = join(folder, "keys.json");
  const kept = existsSync(path) ? readKept(path) : {};
  const keys = Object.fromEntries(Object.entries(MAKERS).map(([name, make]) => [name, kept[name] ?? make()])) as Keys;
  if (Object.keys(keys).some((name) => !(name in kept))) {
    const making = `${path}.new`;
    writeFileSync(making, `${JSON.stringify(keys, null, 2)}\n`, { mode: 0o600 });
    renameSync(making, path);
  }
  chmodSync(path, 0o600);
  return keys;
}

function readKept(path: string): Record<string, string> {
  try {
    const found: unknown = JSON.parse(readFileSync(path, "utf8"));
    if (typeof found === "object" && found !== null) {
      return Object.fromEntries(Object.entries(found).filter((entry): entry is [string, string] => typeof entry[1] === "string" && entry[1] !== ""));
    }
  } catch (fault) {
    throw new Refused(`The secrets in ${path} cannot be read. Put the file back from a copy; if there is none, remove it, and everybody has to sign in again.`, { cause: fault });
  }
  throw new Refused(`${path} does not hold the secrets of this copy. Remove it, and everybody has to sign in again.`);
}

function secret(bytes: number): string {
  return randomBytes(bytes).toString("base64url");
}
