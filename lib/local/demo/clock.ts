import { randomUUID } from "node:crypto";
import { sha256Hex } from "@/lib/ids";
import type { Attempt } from "@/lib/viewer/types";

const DAY_MS = 86_400_000;

/** The scenario's own time: days before today, so that it is always fresh. */
export type DemoClock = { at: (daysAgo: number, hour?: number, minute?: number) => Date; day: (daysAgo: number) => string; attempt: (at: Date) => Attempt };

export function demoClock(now: Date): DemoClock {
  const at = (daysAgo: number, hour = 15, minute = 0) => {
    const that = new Date(now.getTime() - daysAgo * DAY_MS);
    that.setUTCHours(hour, minute, 0, 0);
    return that < now ? that : now;
  };
  return { at, day: (daysAgo) => at(daysAgo).toISOString().slice(0, 10), attempt: (moment) => ({ key: randomUUID(), door: "demo", bodyHash: sha256Hex(randomUUID()), at: moment }) };
}
