import { createHash } from "node:crypto";
import { ApiError } from "./api-error";
import type { Books, KeyRecord, Scope } from "./books";

const LONGEST_KEY = 255;
const KEPT_MS = 24 * 3600 * 1000;

/** The slot of a key: the same key of another account is another key. */
export const slotOf = (key: string, scope: Scope) => createHash("sha256").update(`${scope ?? ""}\n${key}`).digest("hex");

/** The kept answer to a call with this key; undefined when the call is to be done. Another call with the key is refused. */
export function recall(books: Books, key: string, scope: Scope, call: { path: string; body: string }, now: number): KeyRecord | undefined {
  if (key.length > LONGEST_KEY) throw new ApiError(400, { message: `Idempotency key is too long: at most ${LONGEST_KEY} characters.` });
  const slot = slotOf(key, scope);
  const kept = books.keys.get(slot);
  if (!kept) return undefined;
  if (kept.at < now - KEPT_MS) {
    books.keys.remove(slot);
    return undefined;
  }
  if (kept.path !== call.path) throw mismatch(`Keys for idempotent requests can only be used for the same endpoint they were first used for ('${call.path}' vs '${kept.path}'). Try using a key other than '${key}' if you meant to execute a different request.`);
  if (kept.body !== call.body) throw mismatch(`Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`);
  return kept;
}

const mismatch = (message: string) => new ApiError(400, { type: "idempotency_error", message });
