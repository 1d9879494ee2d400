import "server-only";
import { randomUUID } from "node:crypto";
import { AppError, REFUSALS, type Refusal } from "@/lib/errors";
import { routes } from "@/lib/routes";
import { unsafeErrno } from "@/lib/standing/commands";

/** RFC 9457 problem document. `fields` maps a field's path to what is wrong with it; `missing` lists what would make the step possible. */
export type ProblemDocument = { type: string; status: number; title: string; instance: string; fields?: Record<string, string[]>; missing?: string[] };

/** MariaDB's numbers for: disk or table full, too many connections, shutting down, read-only, connection or statement cut off, rows held by others. */
const BUSY = new Set([1020, 1021, 1040, 1053, 1114, 1203, 1205, 1213, 1226, 1290, 1317, 1836, 1927, 1969, 2006, 2013]);
const NETWORK = new Set(["ECONNREFUSED", "ECONNRESET", "ETIMEDOUT", "EPIPE", "ENOENT"]);

/** Whether the database could not be reached or could not take it now; the person may simply try again. */
function databaseAway(error: unknown): boolean {
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    if ("code" in at && NETWORK.has(String(at.code)) && "syscall" in at) return true;
    if ("code" in at && at.code === "PROTOCOL_CONNECTION_LOST") return true;
    if (/Queue limit reached|Connection lost|closed state/.test(at.message)) return true;
  }
  return BUSY.has(unsafeErrno(error) ?? 0);
}

// Says nothing of what became of the step: the connection may have been cut after the commit. The same key again finds out.
const AWAY = "The case files can’t be reached at the moment. Try again in a few seconds; what was already saved is not saved twice.";
const UNEXPECTED = "That did not go through. Nothing was saved.";

type Told = Omit<ProblemDocument, "type"> & { code: Refusal | "unexpected"; retryAfterSeconds?: number | undefined };

/** What a person is told of an error. A refusal speaks for itself; what nobody expected is logged under the instance and says only that nothing was saved. */
export function tell(error: unknown): Told {
  const instance = `urn:uuid:${randomUUID()}`;
  if (error instanceof AppError) {
    const { code, message: title, fields, missing, retryAfterSeconds } = error;
    return { code, status: REFUSALS[code], title, instance, ...(fields && { fields }), ...(missing && { missing }), retryAfterSeconds };
  }
  if (databaseAway(error)) return { code: "busy", status: REFUSALS.busy, title: AWAY, instance, retryAfterSeconds: 3 };
  console.error("unexpected", instance, error);
  return { code: "unexpected", status: 500, title: UNEXPECTED, instance };
}

/** The answer to a request that failed. */
export function problem(error: unknown): Response {
  const { code, status, title, instance, retryAfterSeconds, ...more } = tell(error);
  const document: ProblemDocument = { type: routes.problems(code.replaceAll("_", "-")), status, title, instance, ...more };
  const headers: Record<string, string> = { "content-type": "application/problem+json; charset=utf-8", "cache-control": "no-store", "x-content-type-options": "nosniff" };
  if (retryAfterSeconds) headers["retry-after"] = String(retryAfterSeconds);
  return new Response(JSON.stringify(document), { status, headers });
}
