import { formatDay, daysBetween } from "@/lib/moves/when";
import { daysOpen, daysWords } from "@/lib/moves/days-split";
import { BODY_SHAPE_LABELS, BRAKE_SCHEDULE_LABELS } from "@/lib/moves/labels";
import type { CaseFile } from "@/lib/moves/types";
import { BRAKE_SCHEDULES } from "@/lib/moves/vocabulary";
import { waitDetail, waitName } from "@/lib/moves/waits";
import type { CardHeadBox } from "./card-head";

const pounds = (lb: number) => `${lb.toLocaleString("en-US")} lb`;

/** The lines under the mark: what the unit is, how old, under which other names it goes. */
export function describeUnit({ unit }: Pick<CaseFile, "unit">): string[] {
  const brake = BRAKE_SCHEDULES.find((one) => one === unit.brakeSchedule);
  const form = `${unit.axles}-axle ${BODY_SHAPE_LABELS[unit.shape].toLowerCase()}`;
  const lines = [brake ? `${form}, ${BRAKE_SCHEDULE_LABELS[brake]} brake` : form];
  const origin = [unit.model, unit.builtYear ? `built ${unit.builtYear}` : null].filter(Boolean).join(", ");
  if (origin) lines.push(origin);
  if (unit.aliases.length > 0) lines.push(`also known as ${unit.aliases.join(", ")}`);
  return lines;
}

function payerWords({ legs, ownerName }: CaseFile): { label: string; detail: string | null } {
  const named = legs.filter((leg) => leg.payerName);
  if (named.length === legs.length && named.every((leg) => leg.payerName === ownerName)) return { label: "Owner and payer", detail: null };
  const others = legs.filter((leg) => leg.payerName !== ownerName);
  const detail = others.map((leg) => (leg.payerName ? `${leg.payerName} pays leg ${leg.seq}` : `nobody named for leg ${leg.seq}`)).join(", ");
  return { label: "Owner", detail };
}

function dateBox({ unit }: CaseFile): Omit<CardHeadBox, "span"> | null {
  const { airDate, airDateRegister } = unit;
  const shown = airDate ?? airDateRegister;
  if (!shown) return null;
  const detail = airDate && airDateRegister && airDate !== airDateRegister ? `the register shows ${formatDay(airDateRegister)}` : airDate ? "as stencilled" : "as the register shows";
  return { label: "Air brake tested", value: formatDay(shown), detail, mono: true };
}

function openBox(file: CaseFile): Omit<CardHeadBox, "span"> {
  const days = daysOpen(file.openedAt, file.endedAt, file.at);
  const label = file.state === "closed" ? "Was open for" : file.state === "cancelled" ? "Cancelled after" : "Open for";
  return { label, value: days === 0 ? "Under a day" : days === 1 ? "1 day" : `${days} days`, detail: daysWords(file.days) || null, mono: true };
}

function waitingBox(file: CaseFile): Omit<CardHeadBox, "span"> {
  const { waiting, at } = file;
  if (!waiting) return { label: "Waiting on", value: file.state === "open" ? "Nobody" : "Nobody any more" };
  const days = daysBetween(waiting.since, at);
  return { label: "Waiting on", value: waiting.you ? "You" : waiting.yourCompany ? `Your company: ${waitName(waiting)}` : waitName(waiting), detail: waitDetail(waiting, days), tone: "waiting" };
}

/** The ruled boxes of a case's head. What is not known has no box; the rest then has more room. */
export function headBoxes(file: CaseFile): CardHeadBox[] {
  const { unit, origin, destination, towSpeed } = file;
  const first: CardHeadBox[] = [
    { label: "From", value: origin.name, detail: origin.place, span: 3 },
    { label: "To", value: destination.name, detail: destination.place, span: 3 },
    { ...payerWords(file), value: file.ownerName, span: 3 },
    { label: "Contractor", value: file.contractorName ?? "Not invited yet", span: 3 },
  ];
  const known = [
    unit.weightLb === null ? null : { label: "Weight", value: pounds(unit.weightLb), detail: `${Math.round(unit.weightLb / unit.axles).toLocaleString("en-US")} / axle`, mono: true },
    towSpeed && { label: "Tow speed", value: `${towSpeed.mph} mph`, detail: `at most, ${towSpeed.carrierName}`, mono: true },
    dateBox(file),
  ].filter((box) => box !== null);
  const rest = [openBox(file), waitingBox(file)];
  // Twelve columns: three known facts take two each, two or one of them share with the last boxes, none leaves two halves.
  const spans = ({ 0: [6, 6], 1: [4, 4, 4], 2: [3, 3, 3, 3], 3: [2, 2, 2, 3, 3] } as const)[known.length as 0 | 1 | 2 | 3];
  return [...first, ...[...known, ...rest].map((box, at) => ({ ...box, span: spans[at] ?? 3 }))];
}
