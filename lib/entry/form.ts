import "server-only";
import { headers } from "next/headers";
import { unstable_rethrow } from "next/navigation";
import type { z } from "zod";
import type { FieldErrors } from "@/lib/errors";
import { parse, requireOurOrigin } from "./command";
import { tell } from "./problem";

/** What a plain form shows after it was sent: what is wrong, and what was typed (never a password). */
export type FormState = { message: string | null; fields: FieldErrors; values: Record<string, string> };

export const EMPTY_FORM: FormState = { message: null, fields: {}, values: {} };

const SECRET = /password|token/i;

/** For the few forms that must work without script: our origin, parse, run. Returns the form's state, or redirects from within `run`. */
export async function handleForm<S extends z.ZodType>(schema: S, data: FormData, run: (input: z.output<S>) => Promise<FormState | void>): Promise<FormState> {
  const given = Object.fromEntries([...data.entries()].filter((entry): entry is [string, string] => typeof entry[1] === "string" && !entry[0].startsWith("$ACTION")));
  const values = Object.fromEntries(Object.entries(given).filter(([name]) => !SECRET.test(name)));
  try {
    requireOurOrigin(await headers());
    return (await run(parse(schema, given))) ?? EMPTY_FORM;
  } catch (error) {
    unstable_rethrow(error);
    const { title: message, fields = {} } = tell(error);
    // Spread, since what goes to the browser from here must have a prototype, and the faults of fields come without.
    return { message, fields: { ...fields }, values };
  }
}
