import { createHmac } from "node:crypto";
import { db } from "@/db/client";
import { sessions } from "@/db/schema";
import { env } from "@/lib/env";
import { newId, newToken } from "@/lib/ids";

/** The cookie of a new session, written as the sign-in library writes it: the token with its HMAC-SHA256 behind a dot, as one encoded value. Quicker than signing in, which hashes a password on purpose slowly. */
export async function signedIn(userId: string): Promise<string> {
  const token = newToken();
  const at = new Date();
  await db().insert(sessions).values({ id: newId("session"), userId, token, expiresAt: new Date(at.getTime() + 3600_000), createdAt: at, updatedAt: at });
  const signature = createHmac("sha256", env().AUTH_SECRET).update(token).digest("base64");
  return `__Host-sid=${encodeURIComponent(`${token}.${signature}`)}`;
}
