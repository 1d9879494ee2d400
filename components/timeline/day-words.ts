import { formatDay, formatShortDay, toWall, zoneName } from "@/lib/moves/when";

const WEEKDAYS = ["Sun", "Mon", "Tue", "Wed", "Thu", "Fri", "Sat"] as const;

/** A day as the rail shows it: `Tue 24 Nov`, with its year when that is not the year of reading. */
export function dayWords(day: string, readAt: string): string {
  const weekday = WEEKDAYS[new Date(`${day}T00:00:00Z`).getUTCDay()] ?? "";
  return `${weekday} ${day.slice(0, 4) === readAt.slice(0, 4) ? formatShortDay(day) : formatDay(day)}`;
}

/** The clock of a place, with its zone. */
export const clockAt = (iso: string, zone: string) => `${toWall(iso, zone).slice(11)} ${zoneName(zone, new Date(iso))}`;
