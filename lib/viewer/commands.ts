import "server-only";
import { randomBytes, scrypt, timingSafeEqual } from "node:crypto";
import { eq, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { limitCounters, users } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { sha256Hex } from "@/lib/ids";
import { LIMITS, type LimitName } from "./limits";

// OWASP Password Storage Cheat Sheet (from memory): scrypt with N = 2^17 or 2^16, r = 8, p = 1 to 2. 2^16 takes 64 MB and about 0.1 s here.
const LOG2_N = 16;
const R = 8;
const P = 1;
const KEY_BYTES = 32;

/** No viewer: it also guards doors before anybody has signed in. Counts one try under a key and refuses `too_many` beyond the limit. One statement counts, so parallel tries can't slip by. */
export async function unsafeCountTry(name: LimitName, subject: string, now: Date): Promise<void> {
  const { max, windowSeconds } = LIMITS[name];
  const key = sha256Hex(`${name}:${subject}`);
  const endsMs = now.getTime() + windowSeconds * 1000;
  const counted = limitCounters.count;
  const ends = limitCounters.windowEndsMs;
  const [col, endsCol] = [sql.identifier(counted.name), sql.identifier(ends.name)];
  // MariaDB assigns from left to right: the count must look at the old window first. RETURNING gives this try its own number, however many run at once.
  const [rows] = (await db().execute(sql`
    insert into ${limitCounters} (${sql.identifier(limitCounters.key.name)}, ${endsCol}, ${col}) values (${key}, ${endsMs}, 1)
    on duplicate key update ${col} = if(${endsCol} <= ${now.getTime()}, 1, ${col} + 1), ${endsCol} = if(${endsCol} <= ${now.getTime()}, ${endsMs}, ${endsCol})
    returning ${col} as count, ${endsCol} as endsMs`)) as unknown as [{ count: number; endsMs: number }[]];
  const row = rows[0];
  if (row && row.count > max) {
    const retryAfterSeconds = Math.max(1, Math.ceil((row.endsMs - now.getTime()) / 1000));
    throw new AppError("too_many", `Too many tries. Wait ${retryAfterSeconds < 90 ? `${retryAfterSeconds} seconds` : `${Math.ceil(retryAfterSeconds / 60)} minutes`} and try again.`, { retryAfterSeconds });
  }
}

/** No viewer: forgets the tries under a key after a success, so that an honest person is not locked out. */
export async function unsafeForgetTries(name: LimitName, subject: string): Promise<void> {
  await db().delete(limitCounters).where(eq(limitCounters.key, sha256Hex(`${name}:${subject}`)));
}

function derive(password: string, salt: Buffer, log2N: number, r: number, p: number): Promise<Buffer> {
  const options = { N: 2 ** log2N, r, p, maxmem: 256 * 2 ** log2N * r };
  return new Promise((resolve, reject) => {
    scrypt(Buffer.from(password, "utf8"), salt, KEY_BYTES, options, (error, key) => (error ? reject(error) : resolve(key)));
  });
}

/** No viewer: sign-up and reset come before one. Hashes exactly what was typed, without trimming or normalizing; the text names its parameters, so that they can grow later. */
export async function unsafeHashPassword(password: string): Promise<string> {
  const salt = randomBytes(16);
  const key = await derive(password, salt, LOG2_N, R, P);
  return ["scrypt", LOG2_N, R, P, salt.toString("base64url"), key.toString("base64url")].join("$");
}

/** No viewer: sign-in makes one. Whether a password is the one behind a hash; false for a hash in a form that is not ours. */
export async function unsafeVerifyPassword(hash: string, password: string): Promise<boolean> {
  const [kind, log2N, r, p, salt, key] = hash.split("$");
  if (kind !== "scrypt" || !salt || !key || !(Number(log2N) >= 14 && Number(log2N) <= 20)) return false;
  const wanted = Buffer.from(key, "base64url");
  const found = await derive(password, Buffer.from(salt, "base64url"), Number(log2N), Number(r), Number(p));
  return wanted.length === found.length && timingSafeEqual(wanted, found);
}

/** No viewer: a mailed link has just shown that the address is the person's own. */
export async function unsafeNoteProven(userId: string): Promise<void> {
  await db().update(users).set({ emailVerified: true }).where(eq(users.id, userId));
}
