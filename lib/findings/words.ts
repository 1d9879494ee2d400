import { dayAt, daysBetween, formatDay, formatShortDay, formatWhen } from "@/lib/moves/when";
import type { FindingEntryKind, FindingState, Severity } from "./vocabulary";

/** Number as people say it: F-01. */
export const findingLabel = (number: number) => `F-${String(number).padStart(2, "0")}`;

/** Place and what was added to it in one line. */
export const whereWords = (place: string | null, note: string | null): string | null => [place, note].filter((part) => part !== null).join(", ") || null;

/** What and where in one line, as a heading: `Flat spot, wheel R4, right side`. A place that says the part already stands alone. */
export function titleWords(component: string, where: string | null): string {
  if (!where) return component;
  return where.toLowerCase().startsWith(component.toLowerCase()) ? where : `${component}, ${where.charAt(0).toLowerCase()}${where.slice(1)}`;
}

type Stated = { state: FindingState; sentBack: boolean; stateSince: string; severity: Severity; zone: string };

const waited = (stated: Stated, now: string) => {
  const days = daysBetween(stated.stateSince, now);
  return days === 0 ? "since today" : days === 1 ? "1 day" : `${days} days`;
};

/** State and for how long, in full: `Answered, waiting 4 days`. */
export function stateWords(finding: Stated, now: string): string {
  const day = formatDay(dayAt(finding.stateSince, finding.zone));
  if (finding.state === "cleared") return `Cleared ${day}`;
  if (finding.state === "withdrawn") return `Withdrawn ${day}`;
  if (finding.state === "answered") return `Answered, waiting ${waited(finding, now)}`;
  return `${finding.sentBack ? "Not cleared, open" : "Open"} ${waited(finding, now)}`;
}

/** The same for a table's cell: `Answered, 4 d`. */
export function shortStateWords(finding: Stated, now: string): string {
  const day = formatShortDay(dayAt(finding.stateSince, finding.zone));
  if (finding.state === "cleared") return `Cleared ${day}`;
  if (finding.state === "withdrawn") return `Withdrawn ${day}`;
  const days = daysBetween(finding.stateSince, now);
  return `${finding.state === "answered" ? "Answered" : finding.sentBack ? "Not cleared" : "Open"}, ${days === 0 ? "today" : `${days} d`}`;
}

const SAID: Record<FindingEntryKind, string> = { answer: "was answered", "not-cleared": "was not cleared", cleared: "was cleared", withdrawn: "was withdrawn" };

/** What happened to a finding meanwhile, for whoever comes second. */
export function changeWords(label: string, last: { kind: FindingEntryKind; byName: string; at: string } | null, zone: string): string {
  if (!last) return `${label} has changed since you opened it. Look again before you go on.`;
  return `${label} ${SAID[last.kind]} by ${last.byName} at ${formatWhen(last.at, zone)}. Look again before you go on.`;
}

/** Counts in words, the open ones first: `2 open, 1 answered, 3 cleared`. */
export function countWords(findings: readonly { state: FindingState }[]): string {
  const count = (state: FindingState) => findings.filter((finding) => finding.state === state).length;
  return (["open", "answered", "cleared", "withdrawn"] as const).flatMap((state) => (count(state) > 0 ? [`${count(state)} ${state}`] : [])).join(", ");
}
