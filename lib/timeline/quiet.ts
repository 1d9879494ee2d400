import { daysBetween } from "@/lib/moves/when";
import { waitName } from "@/lib/moves/waits";
import type { Waited } from "./days";

/** From so many whole days without an entry on, the rail is broken. */
export const QUIET_DAYS = 3;

export type Quiet = { from: string; to: string; days: number; name: string | null; goesOn: boolean };

const ms = (iso: string) => new Date(iso).getTime();

/** Whom a stretch mostly waited on; null when on nobody. */
function waitedOn(waits: readonly Waited[], from: string, to: string): string | null {
  const sums = new Map<string, number>();
  for (const wait of waits) {
    const shared = Math.min(ms(wait.until ?? to), ms(to)) - Math.max(ms(wait.since), ms(from));
    if (shared > 0) sums.set(waitName(wait), (sums.get(waitName(wait)) ?? 0) + shared);
  }
  return [...sums].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null;
}

/** Stretches without an entry, earliest first. `end` is now for a case that is open, so that the last stretch may still go on; null for one that has ended. */
export function quietStretches(moments: readonly string[], waits: readonly Waited[], end: string | null): Quiet[] {
  const points = [...moments].sort();
  const all = end === null ? points : [...points, end];
  return all.slice(1).flatMap((to, at) => {
    const from = all[at] ?? to;
    const days = daysBetween(from, to);
    return days >= QUIET_DAYS ? [{ from, to, days, name: waitedOn(waits, from, to), goesOn: end !== null && at === all.length - 2 }] : [];
  });
}
