import type { ProblemDocument } from "./problem";

/** A refused call, with the words and fields of its problem document. */
export class CallError extends Error {
  override name = "CallError";
  readonly status: number;
  readonly fields: Record<string, string[]>;
  readonly missing: string[];
  constructor(document: Partial<ProblemDocument>, status: number) {
    super(document.title ?? "That did not go through.");
    this.status = status;
    this.fields = document.fields ?? {};
    this.missing = document.missing ?? [];
  }
}

async function answerOf<T>(response: Response): Promise<T> {
  if (!response.ok) {
    const document = (await response.json().catch(() => ({}))) as Partial<ProblemDocument>;
    throw new CallError(document, response.status);
  }
  return (await response.json()) as T;
}

async function send(path: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(path, init);
  } catch {
    throw new CallError({ title: "No connection. Nothing was lost on this page; try again when there is a signal." }, 0);
  }
}

/** Reads from our API. */
export const read = async <T>(path: string, signal?: AbortSignal): Promise<T> => answerOf<T>(await send(path, signal ? { signal } : {}));

/** Writes to our API. Pass the same `key` when trying the same thing again, so that it happens once. */
export async function call<T>(path: string, body: unknown, key: string = crypto.randomUUID(), method: "POST" | "PUT" | "DELETE" = "POST"): Promise<T> {
  return answerOf<T>(await send(path, { method, headers: { "content-type": "application/json", "idempotency-key": key }, body: JSON.stringify(body) }));
}

/** What a form shows of a failed write: the message for a field, those for the summary, and what is missing first. */
export function faultsOf(error: unknown): { field: (name: string) => string | null; list: { name?: string; message: string }[]; missing: string[] } {
  if (!error) return { field: () => null, list: [], missing: [] };
  if (!(error instanceof CallError)) return { field: () => null, list: [{ message: "That did not go through. Nothing was saved." }], missing: [] };
  const fields = Object.entries(error.fields).flatMap(([name, messages]) => messages.map((message) => (name === "form" ? { message } : { name, message })));
  return { field: (name) => error.fields[name]?.join(" ") ?? null, list: fields.length > 0 ? fields : [{ message: error.message }, ...error.missing.map((message) => ({ message }))], missing: error.missing };
}
