import { z } from "zod";
import { ENTERED_SOURCES } from "./vocabulary";

// Text that would be stored differently from what was typed, or that could not be shown: lone surrogates and control characters.
const CONTROL = /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F]/;
const sound = (text: string) => !/\p{Cs}/u.test(text) && !CONTROL.test(text);

const text = (max: number, missing: string) =>
  z
    .string({ error: missing })
    .transform((typed) => typed.normalize("NFC").trim())
    .pipe(z.string().min(1, missing).max(max, `At most ${max} characters.`).refine(sound, "Holds characters that can’t be kept."));

/** One required line; trimmed and normalized. */
export const line = (missing: string, max = 200) => text(max, missing).refine((typed) => !/[\n\r]/.test(typed), "One line only.");

/** One line that may be left empty; empty becomes null. */
export const lineOrNull = (max = 200) => z.union([z.null(), z.literal("").transform(() => null), line("", max)]).optional().transform((typed) => typed ?? null);

/** Several lines, required. */
export const lines = (missing: string, max = 4000) => text(max, missing);

/** Several lines that may be left empty; empty becomes null. */
export const linesOrNull = (max = 4000) => z.union([z.null(), z.literal("").transform(() => null), text(max, "")]).optional().transform((typed) => typed ?? null);

/** An id of ours. */
export const idOf = z.string().regex(/^[a-z]{3}_[0-9a-f]{28}$/, "Not an id of ours.");

/** A day as 2026-11-24 that exists. */
export const dayOf = (missing: string) => z.iso.date({ error: missing });
export const dayOrNull = z.union([z.null(), z.literal("").transform(() => null), z.iso.date({ error: "Enter a day that exists." })]).optional().transform((typed) => typed ?? null);

/** Wall-clock time of a place, `2026-11-24T14:05`. */
export const wallTime = (missing: string) => z.string({ error: missing }).regex(/^\d{4}-\d\d-\d\dT\d\d:\d\d$/, missing);

const zones = new Set(Intl.supportedValuesOf("timeZone"));
export const zoneOf = z.string({ error: "Choose the time zone." }).refine((name) => zones.has(name), "Choose the time zone.");

export const emailOf = z
  .string({ error: "Enter an e-mail address." })
  .transform((typed) => typed.normalize("NFC").trim().toLowerCase())
  .pipe(z.email({ error: "Enter an e-mail address such as name@example.org." }).max(254, "At most 254 characters."));

/** How news of an absent carrier came in. The carrier's name is added by the command, not by the person. */
export const enteredForInput = z.strictObject({
  source: z.enum(ENTERED_SOURCES, { error: "Say whether it came on paper, by e-mail or by phone." }),
  heardOn: dayOf("Say on which day you heard it."),
  saidBy: line("Say who at the carrier said it."),
  reference: lineOrNull(),
});
export type EnteredForInput = z.output<typeof enteredForInput>;
export const enteredForOrNull = enteredForInput.nullish().transform((given) => given ?? null);
