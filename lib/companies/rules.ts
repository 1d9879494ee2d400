import type { Denial } from "@/lib/errors";

type Member = { userId: string; manager: boolean };

/** Somebody must be left who can admit and remove people; a company without a manager could not be helped by its own. */
export function denyLastManager(members: readonly Member[], userId: string, stays: boolean): Denial | null {
  const others = members.some((one) => one.manager && one.userId !== userId);
  const isManager = members.some((one) => one.manager && one.userId === userId);
  if (!isManager || stays || others) return null;
  return { code: "not_yet", message: "This is the company’s only manager. Make somebody else a manager first." };
}

type Facts = { name: string; mark: string | null; phone: string | null };
const WORDS: Record<keyof Facts, string> = { name: "name", mark: "mark", phone: "phone" };

/** What somebody else made of the company meanwhile, field by field; empty when the given version is the newest in all but number. */
export function changesSince(kept: Facts, given: Facts): Record<string, string[]> {
  const keys = (Object.keys(WORDS) as (keyof Facts)[]).filter((key) => kept[key] !== given[key]);
  return Object.fromEntries(keys.map((key) => [key, [`Somebody else has changed the ${WORDS[key]} to “${kept[key] ?? "nothing"}”.`]]));
}
