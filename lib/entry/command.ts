import "server-only";
import type { z } from "zod";
import { env } from "@/lib/env";
import { AppError, type FieldErrors } from "@/lib/errors";
import { sha256Hex } from "@/lib/ids";
import { unsafeCountTry } from "@/lib/viewer/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { requireViewer } from "@/lib/viewer/viewer";
import { readJson } from "./body";
import { problem } from "./problem";

/** Cookies travel by themselves, so a write must come from one of our own pages. */
export function requireOurOrigin(headers: Headers): void {
  const site = headers.get("sec-fetch-site");
  const origin = headers.get("origin");
  const ours = origin === new URL(env().APP_URL).origin && (site === null || site === "same-origin");
  if (!ours) throw new AppError("not_from_here", "This must be sent from our own pages.");
}

/** Every field's fault under its path, `legs.1.payer`; faults of the whole form under `form`. */
export function fieldErrors(error: z.ZodError): FieldErrors {
  // Without a prototype: a body may well have a key named "constructor".
  const fields = Object.create(null) as FieldErrors;
  for (const issue of error.issues) {
    const unknown = issue.code === "unrecognized_keys" ? issue.keys.map((key) => [...issue.path, key]) : [issue.path];
    for (const path of unknown) (fields[path.map(String).join(".") || "form"] ??= []).push(issue.code === "unrecognized_keys" ? "Not a field of this form." : issue.message);
  }
  return fields;
}

/** Parses once, at the door; refuses with every field's error. */
export function parse<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw new AppError("bad_input", "Some entries need another look.", { fields: fieldErrors(parsed.error) });
  return parsed.data;
}

function attemptOf(request: Request, text: string): Attempt {
  const key = request.headers.get("idempotency-key") ?? "";
  if (!/^[\w-]{8,80}$/.test(key)) throw new AppError("bad_input", "A write needs an Idempotency-Key of 8 to 80 letters, digits or dashes.", { fields: { "idempotency-key": ["Missing or not usable."] } });
  const door = `${request.method} ${new URL(request.url).pathname}`;
  return { key, door: door.slice(0, 120), bodyHash: sha256Hex(`${door}\n${text}`), at: new Date() };
}

/** The door for a write: our origin, who is asking, is the input sound, then run. Path parameters join the body and win over it. */
export function command<S extends z.ZodType, T>(schema: S, run: (viewer: Viewer, input: z.output<S>, attempt: Attempt) => Promise<T>) {
  return async (request: Request, context: { params: Promise<Record<string, string>> }): Promise<Response> => {
    try {
      requireOurOrigin(request.headers);
      const viewer = await requireViewer();
      const attempt = await readAttempt(request, viewer);
      const input = parse(schema, { ...attempt.value, ...(await context.params) });
      return Response.json((await run(viewer, input, attempt.attempt)) ?? {}, { headers: { "cache-control": "no-store" } });
    } catch (error) {
      return problem(error);
    }
  };
}

async function readAttempt(request: Request, viewer: Viewer) {
  const { value, text } = await readJson(request);
  await unsafeCountTry("write-account", viewer.userId, new Date());
  return { value, attempt: attemptOf(request, text) };
}
