import type { Part } from "@/lib/access/vocabulary";
import { daysBetween } from "./when";
import type { DaysShare } from "./types";

const DAY_MS = 86_400_000;
const MAX_PARTS = 4;

/** How long a move waited on whom; `until` is null for the wait that goes on. */
export type Waited = { part: Part; name: string; since: string; until: string | null };

/** A carrier's people wait as one. */
const partOf = (part: Part): Part => (part === "inspector" || part === "billing" || part === "desk" ? "carrier" : part);

/** Days by whom they waited on, the longest first. Time of the same party is added up before it is rounded down, so the shares never exceed the days that passed. */
export function splitDays(waits: readonly Waited[], now: string): DaysShare[] {
  const sums = new Map<string, DaysShare & { ms: number }>();
  for (const wait of waits) {
    const part = partOf(wait.part);
    const share = sums.get(`${part} ${wait.name}`) ?? { part, name: wait.name, days: 0, ms: 0 };
    share.ms += Math.max(0, new Date(wait.until ?? now).getTime() - new Date(wait.since).getTime());
    sums.set(`${part} ${wait.name}`, share);
  }
  return [...sums.values()]
    .map(({ ms, part, name }) => ({ part, name, days: Math.floor(ms / DAY_MS) }))
    .filter((share) => share.days > 0)
    .sort((a, b) => b.days - a.days);
}

const KINDS: Partial<Record<Part, string>> = { carrier: "with carriers", contractor: "with the contractor", owner: "with the owner", payer: "with the payer", receiver: "with the receiver" };

/** `21 with carriers, 40 with the contractor`; empty while nobody has taken a whole day. */
export function daysWords(shares: readonly DaysShare[]): string {
  const sums = new Map<string, number>();
  for (const { part, days } of shares) {
    const words = KINDS[part] ?? "with others";
    sums.set(words, (sums.get(words) ?? 0) + days);
  }
  return [...sums].sort((a, b) => b[1] - a[1]).slice(0, MAX_PARTS).map(([words, days]) => `${days} ${words}`).join(", ");
}

/** How long a case has been open, or was until it ended. */
export const daysOpen = (openedAt: string, endedAt: string | null, now: string) => daysBetween(openedAt, endedAt ?? now);
