import type { Part } from "@/lib/access/vocabulary";
import { daysBetween } from "@/lib/moves/when";
import { waitName } from "@/lib/moves/waits";

/** Whole days that went to one party. */
export type DaysOf = { id: string; part: Part; label: string; days: number };

export type Waited = { part: Part; name: string; since: string; until: string | null };

const SHORT: Partial<Record<Part, string>> = { owner: "Owner", contractor: "Contractor", receiver: "Receiver", payer: "Payer" };

/** Whoever there is one of goes by their part; carriers by name and work. */
const labelOf = (wait: Waited) => SHORT[wait.part] ?? waitName(wait);

const ms = (iso: string) => new Date(iso).getTime();

/**
 * Where the days of a case went: whole days by whom it waited on, in the order in which their turn first came. They sum
 * to the days that passed, because what rounding down leaves over goes to those with the largest remainders; days on
 * which the case waited on nobody stay under nobody's name.
 */
export function whereDaysWent(waits: readonly Waited[], openedAt: string, end: string): { total: number; parts: DaysOf[] } {
  const total = daysBetween(openedAt, end);
  const sums = new Map<string, DaysOf & { exact: number }>();
  for (const wait of waits) {
    const label = labelOf(wait);
    const sum = sums.get(label) ?? { id: label, part: wait.part, label, days: 0, exact: 0 };
    sum.exact += Math.max(0, Math.min(ms(wait.until ?? end), ms(end)) - Math.max(ms(wait.since), ms(openedAt))) / 86_400_000;
    sums.set(label, sum);
  }
  const shares = [...sums.values()].map((sum) => ({ ...sum, days: Math.floor(sum.exact) }));
  const waitedDays = Math.min(total, Math.round(shares.reduce((all, share) => all + share.exact, 0)));
  let left = waitedDays - shares.reduce((all, share) => all + share.days, 0);
  for (const share of [...shares].sort((a, b) => b.exact - b.days - (a.exact - a.days))) {
    if (left <= 0) break;
    share.days += 1;
    left -= 1;
  }
  return { total, parts: shares.filter((share) => share.days > 0).map(({ exact: _exact, ...share }) => share) };
}
