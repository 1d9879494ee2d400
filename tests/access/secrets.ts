import { AppError } from "@/lib/errors";
import type { Persona } from "./personas";

/** Something private: any of the texts in an answer gives it away, but to those who may read it. */
export type Secret = { what: string; texts: readonly string[]; may: readonly Persona[] };

/** Cents as a number, and as somebody would read them. */
export const amount = (cents: number): string[] => {
  const [whole, rest] = [Math.floor(cents / 100), String(cents % 100).padStart(2, "0")];
  return [String(cents), `${whole}.${rest}`, `${whole.toLocaleString("en-US")}.${rest}`];
};

const bytesOf = (_key: string, value: unknown) => (value instanceof Map ? [...(value as Map<unknown, unknown>)] : value instanceof Set ? [...(value as Set<unknown>)] : value);

/** Everything that an answer or a refusal says. */
export function saidBy(outcome: PromiseSettledResult<unknown>): string {
  if (outcome.status === "fulfilled") return JSON.stringify(outcome.value ?? null, bytesOf);
  const error: unknown = outcome.reason;
  if (error instanceof AppError) return JSON.stringify([error.message, error.fields, error.missing]);
  return error instanceof Error ? error.message : String(error);
}

/** A sentence for every secret that a persona reads and must not. */
export function leaksIn(outcome: PromiseSettledResult<unknown>, persona: Persona, secrets: readonly Secret[]): string[] {
  const said = saidBy(outcome);
  return secrets.filter(({ may, texts }) => !may.includes(persona) && texts.some((text) => said.includes(text))).map(({ what }) => `${persona} reads ${what}`);
}
