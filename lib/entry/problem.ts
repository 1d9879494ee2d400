import "server-only";
import { randomUUID } from "node:crypto";
import { AppError, REFUSALS, type Refusal } from "@/lib/errors";
import { routes } from "@/lib/routes";
import { unsafeErrno } from "@/lib/standing/commands";

/** RFC 9457 problem document. `fields` maps a field's path to what is wrong with it; `missing` lists what would make the step possible. */
export type ProblemDocument = { type: string; status: number; title: string; instance: string; fields?: Record<string, string[]>; missing?: string[] };

const BUSY = new Set([1040, 1203, 2006, 2013]);
const NETWORK = new Set(["ECONNREFUSED", "ECONNRESET", "PROTOCOL_CONNECTION_LOST", "ETIMEDOUT", "EPIPE", "ENOENT"]);

/** Whether the database could not be reached or is full; the person may simply try again. */
function databaseAway(error: unknown): boolean {
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    if ("code" in at && NETWORK.has(String(at.code)) && "syscall" in at) return true;
    if ("code" in at && at.code === "PROTOCOL_CONNECTION_LOST") return true;
    if (/Queue limit reached|Connection lost|closed state/.test(at.message)) return true;
  }
  return BUSY.has(unsafeErrno(error) ?? 0);
}

function answer(code: Refusal | "unexpected", status: number, title: string, more: Partial<ProblemDocument> & { retryAfterSeconds?: number | undefined } = {}) {
  const { retryAfterSeconds, ...rest } = more;
  const document: ProblemDocument = { type: routes.problems(code.replaceAll("_", "-")), status, title, instance: `urn:uuid:${randomUUID()}`, ...rest };
  const headers: Record<string, string> = { "content-type": "application/problem+json; charset=utf-8", "cache-control": "no-store", "x-content-type-options": "nosniff" };
  if (retryAfterSeconds) headers["retry-after"] = String(retryAfterSeconds);
  return new Response(JSON.stringify(document), { status, headers });
}

/** A refusal speaks for itself; anything else is logged under the document's instance and says only that nothing was saved. */
export function problem(error: unknown): Response {
  if (error instanceof AppError) {
    const { fields, missing, retryAfterSeconds } = error;
    return answer(error.code, REFUSALS[error.code], error.message, { ...(fields && { fields }), ...(missing && { missing }), retryAfterSeconds });
  }
  if (databaseAway(error)) return answer("busy", 503, "The case files can’t be reached at the moment. Nothing was saved; try again in a few seconds.", { retryAfterSeconds: 3 });
  const response = answer("unexpected", 500, "That did not go through. Nothing was saved.");
  console.error("unexpected", error);
  return response;
}
