import { RESTRICTIONS } from "@/lib/acceptance/vocabulary";
import { SEVERITIES, SEVERITY_LABELS, type Severity } from "@/lib/findings/vocabulary";
import { AIR_STATES, type AirState } from "@/lib/inspections/vocabulary";
import { formatDay } from "@/lib/moves/when";
import type { RecordKind } from "@/lib/record/vocabulary";
import { numberOf, oneOf, textOf, textsOf, type Detail } from "../detail";
import { lower, say, sentence, strong } from "../words";
import type { EntryTone } from "../types";
import type { Told } from "./told";

const AIR_WORDS: Record<AirState, string | null> = { on: "with air on the unit", off: "no air on the unit", "not-said": null };
const TONES: Record<Severity, EntryTone> = { "stops-move": "oxide", "answer-before-pickup": "brass", note: "neutral" };

const isDay = (text: string | null): text is string => text !== null && /^\d{4}-\d\d-\d\d$/.test(text);

/** `F-01` as the findings page shows it. */
export function findingLabel(detail: Detail): string {
  const number = numberOf(detail, "number");
  return number === null ? (textOf(detail, "label", "number") ?? "a finding") : `F-${String(number).padStart(2, "0")}`;
}

const finding = (detail: Detail) => strong(findingLabel(detail));

const what = (detail: Detail) => {
  const text = textOf(detail, "componentName", "component", "componentLabel", "what");
  const place = textOf(detail, "placeName", "place", "placeNote");
  return text ? `, ${lower(text)}${place ? `, ${lower(place)}` : ""}` : null;
};

const said = (detail: Detail) => [textOf(detail, "text", "observed", "why", "reason"), textOf(detail, "reading")].filter(Boolean).join(", ") || null;

function visit(detail: Detail) {
  const number = numberOf(detail, "number");
  const air = oneOf(AIR_STATES, detail.air);
  const psi = numberOf(detail, "airPsi");
  const source = textOf(detail, "airSource");
  const airWords = air === "on" && psi !== null ? `air at ${psi} psi${source ? ` from ${source}` : ""}` : air ? AIR_WORDS[air] : null;
  const name = textOf(detail, "inspectorName");
  const day = textOf(detail, "visitedOn");
  const parts = say(strong(number === null ? "Inspected" : `Visit ${number}`), textOf(detail, "carrier", "carrierName") && ` of ${textOf(detail, "carrier", "carrierName")}`, airWords && `, ${airWords}`);
  return sentence(parts, { note: [name && `Inspector ${name}`, textOf(detail, "place"), isDay(day) ? formatDay(day) : null].filter(Boolean).join(", ") || null });
}

function acceptance(detail: Detail) {
  const [carrier, number] = [textOf(detail, "carrier", "carrierName"), textOf(detail, "number", "acceptanceNumber")];
  const limits = textsOf(detail, "restrictions").map((id) => RESTRICTIONS.find((one) => one.id === id)?.label ?? id);
  const note = textOf(detail, "restrictionNote");
  const until = textOf(detail, "validUntil");
  return sentence(say(strong("Accepted"), carrier && ` by ${carrier}`, number && `, no. ${number}`, isDay(until) && `, good until ${formatDay(until)}`), { note: [...limits, note].filter(Boolean).join(", ") || null, state: { tone: "verdigris", word: "Accepted" } });
}

const told = (plain: string, tell: Told["tell"]): Told => ({ area: "findings", place: "findings", plain, tell });

/** Sentences of visits, findings and acceptances. */
export const FINDING_SENTENCES = {
  "inspection.visited": told("Inspected the unit", visit),
  "finding.posted": told("Posted a finding", (d) => {
    const severity = oneOf(SEVERITIES, d.severity);
    return sentence(say("Found ", finding(d), what(d)), { note: said(d), ...(severity && { state: { tone: TONES[severity], word: SEVERITY_LABELS[severity] } }) });
  }),
  "finding.answered": told("Answered a finding", (d) => sentence(say("Answered ", finding(d), what(d)), { note: said(d), state: { tone: "brass", word: "Answered" } })),
  "finding.not-cleared": told("Looked at an answer: not cleared", (d) => sentence(say("Not cleared: ", finding(d), what(d)), { note: [said(d), textOf(d, "wouldSatisfy") && `Would satisfy: ${textOf(d, "wouldSatisfy")}`].filter(Boolean).join(" ") || null, state: { tone: "oxide", word: "Not cleared" } })),
  "finding.cleared": told("Cleared a finding", (d) => sentence(say("Cleared ", finding(d), what(d)), { note: said(d), state: { tone: "verdigris", word: "Cleared" } })),
  "finding.withdrawn": told("Withdrew a finding", (d) => sentence(say("Withdrew ", finding(d), what(d)), { note: said(d), state: { tone: "neutral", word: "Withdrawn" } })),
  "acceptance.signed": told("Signed the acceptance", acceptance),
  "acceptance.withdrawn": told("Withdrew the acceptance", (d) => sentence(say(strong("Acceptance withdrawn"), textOf(d, "carrier", "carrierName") && ` by ${textOf(d, "carrier", "carrierName")}`), { note: textOf(d, "why", "reason"), state: { tone: "oxide", word: "Withdrawn" } })),
} as const satisfies Partial<Record<RecordKind, Told>>;
