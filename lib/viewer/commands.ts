import "server-only";
import { eq, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { limitCounters } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { sha256Hex } from "@/lib/ids";
import { LIMITS, type LimitName } from "./limits";

/** No viewer: it also guards doors before anybody has signed in. Counts one try under a key and refuses `too_many` beyond the limit. One statement counts, so parallel tries can't slip by. */
export async function unsafeCountTry(name: LimitName, subject: string, now: Date): Promise<void> {
  const { max, windowSeconds } = LIMITS[name];
  const key = sha256Hex(`${name}:${subject}`);
  const endsMs = now.getTime() + windowSeconds * 1000;
  await db().insert(limitCounters).values({ key, windowEndsMs: endsMs, count: 1 }).onDuplicateKeyUpdate({
    set: {
      // MariaDB assigns from left to right: the count must look at the old window first.
      count: sql`if(${limitCounters.windowEndsMs} <= ${now.getTime()}, 1, ${limitCounters.count} + 1)`,
      windowEndsMs: sql`if(${limitCounters.windowEndsMs} <= ${now.getTime()}, ${endsMs}, ${limitCounters.windowEndsMs})`,
    },
  });
  const [row] = await db().select({ count: limitCounters.count, endsMs: limitCounters.windowEndsMs }).from(limitCounters).where(eq(limitCounters.key, key));
  if (row && row.count > max) {
    const retryAfterSeconds = Math.max(1, Math.ceil((row.endsMs - now.getTime()) / 1000));
    throw new AppError("too_many", `Too many tries. Wait ${retryAfterSeconds < 90 ? `${retryAfterSeconds} seconds` : `${Math.ceil(retryAfterSeconds / 60)} minutes`} and try again.`, { retryAfterSeconds });
  }
}

/** No viewer: forgets the tries under a key after a success, so that an honest person is not locked out. */
export async function unsafeForgetTries(name: LimitName, subject: string): Promise<void> {
  await db().delete(limitCounters).where(eq(limitCounters.key, sha256Hex(`${name}:${subject}`)));
}
