import type { EnteredFor } from "@/lib/access/types";
import { PART_LABELS, type Part } from "@/lib/access/vocabulary";
import { formatDay } from "@/lib/moves/when";
import type { Sentence, SentencePart } from "./types";

/** The strong stretch of a sentence. */
export const strong = (text: string): SentencePart => ({ text, strong: true });

/** A sentence of stretches; what is null or false is left out. */
export const say = (...parts: readonly (string | SentencePart | null | false)[]): SentencePart[] =>
  parts.flatMap((part) => (!part ? [] : typeof part === "string" ? [{ text: part }] : [part]));

export const sentence = (parts: SentencePart[], more: Omit<Sentence, "parts"> = {}): Sentence => ({ parts, ...more });

export const plainText = (parts: readonly SentencePart[]) => parts.map((part) => part.text).join("");

export const many = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`;

/** Words after a colon or comma begin small, unless they are a code. */
export const lower = (text: string) => (/^[A-Z][a-z ]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text);

const SOURCE_WORDS: Record<EnteredFor["source"], string> = { paper: "a paper", "e-mail": "an e-mail", phone: "a phone call" };

/** A carrier's step that somebody else wrote down: who, from what, and who at the carrier said it. Never the carrier's signature. */
export function enteredWords(by: string, { carrierName, source, heardOn, saidBy, reference }: EnteredFor): string {
  return `entered by ${by} for ${carrierName} from ${SOURCE_WORDS[source]}, ${formatDay(heardOn)}, as ${saidBy} said${reference ? ` (${reference})` : ""}`;
}

const PART_WORDS: Partial<Record<Part, string>> = { owner: "owner", contractor: "contractor", receiver: "receiver", payer: "named payer" };

/** Who did it: the person, and their company or part. */
export function byWords({ by, company, part }: { by: string; company: string | null; part: Part | null }): string {
  const role = part ? (PART_WORDS[part] ?? PART_LABELS[part].replace("Carrier’s ", "")) : null;
  return [by, company, role && company ? null : role].filter(Boolean).join(", ");
}
