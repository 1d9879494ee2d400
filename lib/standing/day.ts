/** The calendar day at a place, as 2026-11-24. */
export const dayThere = (now: Date, zone: string) => new Intl.DateTimeFormat("en-CA", { timeZone: zone, year: "numeric", month: "2-digit", day: "2-digit" }).format(now);
