import { PART_LABELS, PARTS } from "@/lib/access/vocabulary";
import type { RecordKind } from "@/lib/record/vocabulary";
import { changesOf, numberOf, oneOf, textOf, type Detail } from "../detail";
import { many, say, sentence, strong } from "../words";
import { toAll, type Told } from "./told";

const partWords = (detail: Detail) => {
  const part = oneOf(PARTS, detail.part ?? detail.seatPart);
  return part ? PART_LABELS[part].toLowerCase() : null;
};

const companyOf = (detail: Detail) => textOf(detail, "company", "companyName", "carrier", "carrierName");

/** Whom it concerns: the person where one is named, the company, and in which part. */
function whom(detail: Detail): string {
  const [company, part, name] = [companyOf(detail), partWords(detail), textOf(detail, "name")];
  const who = company ? (name ? `${name} of ${company}` : company) : name;
  if (who && part) return `${who} as ${part}`;
  return who ?? (part ? `a ${part}` : "a company");
}

const legWords = (detail: Detail) => {
  const seq = numberOf(detail, "seq", "legSeq");
  return seq === null ? "" : ` of leg ${seq}`;
};

const changed = (detail: Detail): string | null => changesOf(detail).join("; ") || null;

/** Sentences of the case itself, its parties and its evidence. */
export const CASE_SENTENCES = {
  "move.opened": toAll("Opened the move", (d) => {
    const [from, to] = [textOf(d, "from", "origin", "originName"), textOf(d, "to", "destination", "destinationName")];
    return sentence(say(strong("Opened the move"), from && to ? `, ${from} to ${to}` : null));
  }),
  "move.changed": toAll("Changed the head of the case", (d) => sentence(say("Changed the head of the case"), { note: changed(d) })),
  "move.cancelled": toAll("Cancelled the move", (d) => sentence(say(strong("Cancelled the move")), { note: textOf(d, "reason", "why"), state: { tone: "oxide", word: "Cancelled" } })),
  "equipment.changed": { area: "unit", ...toAll("Changed the unit’s facts", (d) => sentence(say("Changed the ", strong("unit’s facts")), { note: changed(d) }), "unit") },
  "leg.changed": toAll("Changed the route", (d) => sentence(say("Changed the route", legWords(d), companyOf(d) ? `, ${companyOf(d)}` : null), { note: changed(d) }), "unit"),
  "party.invited": toAll("Invited a company", (d) => sentence(say(d.again === true ? "Sent a new invitation to " : "Invited ", strong(whom(d)), legWords(d))), "people"),
  "party.joined": toAll("Joined the move", (d) => sentence(say(companyOf(d) && strong(companyOf(d) ?? ""), companyOf(d) ? " joined the move" : "Joined the move", partWords(d) && ` as ${partWords(d)}`, legWords(d))), "people"),
  "party.removed": toAll("Removed a company from the move", (d) => sentence(say("Removed ", strong(whom(d)), " from the move"), { note: textOf(d, "why", "reason") }), "people"),
  "invitation.revoked": toAll("Withdrew an invitation", (d) => sentence(say("Withdrew the invitation of ", strong(whom(d)))), "people"),
  "carrier.named": toAll("Named a carrier", (d) => sentence(say("Named ", strong(companyOf(d) ?? "a carrier"), legWords(d) ? ` as the carrier${legWords(d)}` : null, textOf(d, "before") && `, in place of ${textOf(d, "before")}`), { note: changed(d) }), "unit"),
  "follow.made": toAll("Made a link to follow the move", (d) => sentence(say("Made a link to follow the move", textOf(d, "label") ? ` for ${textOf(d, "label")}` : null)), "people"),
  "follow.ended": toAll("Ended a link to follow the move", (d) => sentence(say("Ended the link to follow the move", textOf(d, "label") ? ` of ${textOf(d, "label")}` : null)), "people"),
  "photo.taken": { ...toAll("Took a photo", () => sentence(say("Took a photo"))), folded: (n) => `Took ${many(n, "photo")}` },
  "photo.kept": { ...toAll("A photo’s original has arrived", () => sentence(say("A photo’s original has arrived and is the one that was announced"))), folded: (n) => `${many(n, "original")} of photos have arrived and are the ones that were announced` },
  "photo.refused": toAll("A photo was refused", (d) => sentence(say("A photo was refused"), { note: textOf(d, "why"), state: { tone: "oxide", word: "Refused" } })),
  "move.closed": toAll("Closed the move", (d) => sentence(say(strong("Closed the move"), textOf(d, "name") ? `, signed by ${textOf(d, "name")}` : null), { state: { tone: "verdigris", word: "Closed" } }), "movement"),
} as const satisfies Partial<Record<RecordKind, Told>>;
