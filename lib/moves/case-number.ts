/** `26-0041`: two digits of the year and a running number that starts anew each year. */
export function caseNumberOf(year: number, running: number): string {
  return `${String(year % 100).padStart(2, "0")}-${String(running).padStart(4, "0")}`;
}
