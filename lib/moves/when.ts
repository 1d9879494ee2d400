import { tzName, tzOffset } from "@date-fns/tz";
import { AppError } from "@/lib/errors";

const MONTHS = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"] as const;
const MINUTE = 60_000;
const DAY = 24 * 60 * MINUTE;

const two = (n: number) => String(n).padStart(2, "0");
const monthOf = (n: number) => MONTHS[n - 1] ?? "";

type Wall = { year: number; month: number; day: number; hour: number; minute: number };

/** The clock of a place at a moment. */
function wallOf(moment: Date, zone: string): Wall {
  const there = new Date(moment.getTime() + tzOffset(zone, moment) * MINUTE);
  return { year: there.getUTCFullYear(), month: there.getUTCMonth() + 1, day: there.getUTCDate(), hour: there.getUTCHours(), minute: there.getUTCMinutes() };
}

/** A calendar day as a person reads it: `24 Nov 2026`. */
export function formatDay(day: string): string {
  const [year = "", month = "", date = ""] = day.split("-");
  return `${Number(date)} ${monthOf(Number(month))} ${year}`;
}

/** The same without its year, for a day that stands near others: `24 Nov`. */
export function formatShortDay(day: string): string {
  const [, month = "", date = ""] = day.split("-");
  return `${Number(date)} ${monthOf(Number(month))}`;
}

/** The calendar day of a moment at a place: `2026-11-24`. */
export function dayAt(iso: string, zone: string): string {
  const { year, month, day } = wallOf(new Date(iso), zone);
  return `${year}-${two(month)}-${two(day)}`;
}

/** A moment by the clock of a place: `24 Nov 16:05 CST`. */
export function formatWhen(iso: string, zone: string): string {
  const moment = new Date(iso);
  const { month, day, hour, minute } = wallOf(moment, zone);
  return `${day} ${monthOf(month)} ${two(hour)}:${two(minute)} ${zoneName(zone, moment)}`;
}

/** The same with its year: `24 Nov 2026 16:05 CST`. */
export function formatFullWhen(iso: string, zone: string): string {
  const moment = new Date(iso);
  const { year, month, day, hour, minute } = wallOf(moment, zone);
  return `${day} ${monthOf(month)} ${year} ${two(hour)}:${two(minute)} ${zoneName(zone, moment)}`;
}

/** The zone's short name at a moment, `CST` or `CDT`; its offset where it has no name of its own. */
export const zoneName = (zone: string, moment: Date) => tzName(zone, moment, "short");

/** A moment as an input of the clock there wants it: `2026-11-24T16:05`. */
export function toWall(iso: string, zone: string): string {
  const { year, month, day, hour, minute } = wallOf(new Date(iso), zone);
  return `${year}-${two(month)}-${two(day)}T${two(hour)}:${two(minute)}`;
}

/**
 * The moment at which a place's clock showed `2026-11-24T14:05`. Refuses a time that the clock skipped.
 * Where the clock showed it twice, in the hour that is set back, the first of the two is meant unless `second` says otherwise.
 */
export function toUtc(wall: string, zone: string, second = false): Date {
  const asUtc = Date.parse(`${wall}:00Z`);
  if (Number.isNaN(asUtc) || new Date(asUtc).toISOString().slice(0, 16) !== wall) throw new AppError("bad_input", "Enter a day and a time that exist.");
  const offsets = new Set([tzOffset(zone, new Date(asUtc - DAY)), tzOffset(zone, new Date(asUtc + DAY))]);
  const moments = [...offsets]
    .map((offset) => new Date(asUtc - offset * MINUTE))
    .filter((moment) => moment.getTime() + tzOffset(zone, moment) * MINUTE === asUtc)
    .sort((a, b) => a.getTime() - b.getTime());
  const found = second ? moments.at(-1) : moments[0];
  if (!found) throw new AppError("bad_input", `The clock at this place never showed ${wall.slice(11)} on ${formatDay(wall.slice(0, 10))}: it was set forward. Enter the time before or after.`);
  return found;
}

/** Whole days of 24 hours from one moment to another; never below zero. */
export function daysBetween(from: string | Date, to: string | Date): number {
  return Math.max(0, Math.floor((new Date(to).getTime() - new Date(from).getTime()) / DAY));
}

/** `1 day`, `61 days`; less than one is `today`. */
export const daysText = (days: number) => (days === 0 ? "today" : days === 1 ? "1 day" : `${days} days`);
