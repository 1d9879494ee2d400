import { EVENT_CODES } from "@/lib/movement/event-codes";
import { SIGHTING_KINDS } from "@/lib/movement/vocabulary";
import { formatDay } from "@/lib/moves/when";
import type { RecordKind } from "@/lib/record/vocabulary";
import { oneOf, textOf, type Detail } from "../detail";
import type { EntryTone } from "../types";
import { say, sentence, strong } from "../words";
import type { Told } from "./told";

const TONES: Partial<Record<keyof typeof EVENT_CODES, EntryTone>> = { held: "brass", "bad-ordered": "oxide", notified: "brass", placed: "verdigris", pulled: "verdigris" };

const carrier = (detail: Detail) => textOf(detail, "carrier", "carrierName");

function sighting(detail: Detail) {
  const kind = oneOf(SIGHTING_KINDS, detail.sighting);
  const label = kind ? EVENT_CODES[kind].label : "Seen";
  const [place, train] = [textOf(detail, "place"), textOf(detail, "train")];
  const tone = kind && TONES[kind];
  const parts = say(strong(label), place && `, ${place}`, carrier(detail) && `, ${carrier(detail)}`, train && `, train ${train}`);
  return sentence(parts, { ...(textOf(detail, "corrects") && { note: "Corrects an earlier sighting." }), ...(tone && { state: { tone, word: label } }) });
}

function retracted(detail: Detail) {
  const kind = oneOf(SIGHTING_KINDS, detail.sighting);
  const place = textOf(detail, "place");
  return sentence(say("Took back ", strong(kind ? EVENT_CODES[kind].label.toLowerCase() : "a sighting"), place && `, ${place}`), { note: textOf(detail, "why"), state: { tone: "neutral", word: "Retracted" } });
}

function instruction(detail: Detail) {
  const [bill, clearance, train, from] = [textOf(detail, "billNumber"), textOf(detail, "clearanceNumber"), textOf(detail, "train"), textOf(detail, "pickupFrom")];
  const note = [clearance && `clearance ${clearance}`, train && `train ${train}`, from && /^\d{4}-\d\d-\d\d$/.test(from) ? `pickup from ${formatDay(from)}` : null].filter(Boolean).join(", ");
  return sentence(say(strong("Movement instruction"), carrier(detail) && ` of ${carrier(detail)}`, bill && `, bill of lading ${bill}`), { note: note || null, state: { tone: "verdigris", word: "Given" } });
}

function arrival(detail: Detail) {
  const missing = textOf(detail, "missing");
  const day = textOf(detail, "arrivedOn");
  const parts = say(strong("Looked over on arrival"), day && /^\d{4}-\d\d-\d\d$/.test(day) ? `, ${formatDay(day)}` : null);
  return sentence(parts, { note: [textOf(detail, "condition"), missing && `Missing or damaged: ${missing}`].filter(Boolean).join(" ") || null, ...(missing && { state: { tone: "oxide" as const, word: "Something missing" } }) });
}

const told = (plain: string, tell: Told["tell"]): Told => ({ place: "movement", plain, tell });

/** Sentences of the way itself. */
export const MOVEMENT_SENTENCES = {
  "instruction.given": told("Gave the movement instruction", instruction),
  "instruction.withdrawn": told("Withdrew the movement instruction", (d) => sentence(say(strong("Movement instruction withdrawn"), carrier(d) && ` by ${carrier(d)}`), { note: textOf(d, "why"), state: { tone: "oxide", word: "Withdrawn" } })),
  "unit.released": told("Released the unit", (d) => sentence(say(strong("Released"), carrier(d) && ` to ${carrier(d)}`, textOf(d, "name") && `, signed by ${textOf(d, "name")}`), { state: { tone: "verdigris", word: "Released" } })),
  "sighting.made": told("Recorded a sighting", sighting),
  "sighting.retracted": told("Took back a sighting", retracted),
  "arrival.recorded": { ...told("Looked the unit over on arrival", arrival), area: "findings" },
} as const satisfies Partial<Record<RecordKind, Told>>;
