import { CARRIER_WORKS, PART_LABELS, type SeatPart } from "@/lib/access/vocabulary";
import type { Works } from "./types";

const WORK_WORDS = { inspector: "inspector", billing: "billing clerk", desk: "transport desk" } as const;
const WORK_KEYS = { inspector: "inspects", billing: "bills", desk: "dispatches" } as const;

/** The works of somebody at a carrier, in words: "inspector and transport desk". */
export function worksWords(works: Works): string {
  const words = CARRIER_WORKS.filter((work) => works[WORK_KEYS[work]]).map((work) => WORK_WORDS[work]);
  return words.length < 2 ? (words[0] ?? "") : `${words.slice(0, -1).join(", ")} and ${words.at(-1) ?? ""}`;
}

type Stretch = { seq: number; fromPlace: string; toPlace: string };

export const legWords = ({ seq, fromPlace, toPlace }: Stretch) => `leg ${seq}, ${fromPlace} to ${toPlace}`;

/** A part as a sentence names it: "carrier of leg 2, Ardell to Quill Creek (inspector)". */
export function partWords(part: SeatPart | null, leg: Stretch | null, works: Works): string {
  if (part === null) return "a colleague";
  const doing = part === "carrier" ? worksWords(works) : "";
  return `${PART_LABELS[part].toLowerCase()}${leg ? ` of ${legWords(leg)}` : ""}${doing ? ` (${doing})` : ""}`;
}

/** A part as a label. */
export const partLabelOf = (part: SeatPart | null) => (part === null ? "Colleague" : PART_LABELS[part]);
