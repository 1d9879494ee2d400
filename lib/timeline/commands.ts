import "server-only";
import { eq, sql } from "drizzle-orm";
import { db } from "@/db/client";
import { followLinks } from "@/db/schema";
import { unsafeCountTry } from "@/lib/viewer/commands";
import { unsafeFollow } from "./queries";
import type { FollowView } from "./types";

/** An open page reads itself again every minute; it is one use, not sixty in an hour. */
const SAME_USE_MS = 3 * 60_000;

/** No viewer: a notify party has no account. Counts the try of an address first, so that links can't be guessed in numbers, then the use of the link; null for a link that is not good. */
export async function unsafeOpenFollow(token: string, address: string, now: Date): Promise<FollowView | null> {
  await unsafeCountTry("follow-address", address, now);
  const found = await unsafeFollow(token, now);
  if (!found) return null;
  await db().update(followLinks).set({ uses: sql`${followLinks.uses} + ${found.lastUsedAt && now.getTime() - found.lastUsedAt.getTime() < SAME_USE_MS ? 0 : 1}`, lastUsedAt: now }).where(eq(followLinks.id, found.followId));
  return found.view;
}
