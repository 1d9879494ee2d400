import { PREP_PHASES, type PrepPhase } from "@/lib/prep/vocabulary";
import type { RecordKind } from "@/lib/record/vocabulary";
import { numberOf, oneOf, textOf, type Detail } from "../detail";
import { lower, many, say, sentence, strong } from "../words";
import type { Told } from "./told";

const PHASE_WORDS: Record<PrepPhase, string> = { "where-it-stands": "where it stands", "when-coupled": "when coupled" };

const phaseOf = (detail: Detail) => {
  const phase = oneOf(PREP_PHASES, detail.phase);
  return phase ? `, ${PHASE_WORDS[phase]}` : "";
};

const item = (detail: Detail) => strong(textOf(detail, "templateId") ?? "Item");
const what = (detail: Detail, key = "action") => {
  const text = textOf(detail, key);
  return text ? `, ${lower(text)}` : null;
};

const evidence = (detail: Detail) => [textOf(detail, "value"), textOf(detail, "tagNumber") && `tag ${textOf(detail, "tagNumber")}`].filter(Boolean).join(", ") || null;

const told = (plain: string, tell: Told["tell"], folded?: Told["folded"]): Told => ({ area: "prep", place: "prep", plain, tell, ...(folded && { folded }) });

/** Sentences of the prep list and of putting things back. */
export const PREP_SENTENCES = {
  "prep.done": told("Worked off a prep item", (d) => sentence(say("Did ", item(d), what(d)), { note: evidence(d) }), (n) => `Worked off ${many(n, "prep item")}`),
  "prep.skipped": told("Marked a prep item as not applicable", (d) => sentence(say(item(d), what(d), ": does not apply"), { note: textOf(d, "why") })),
  "prep.reopened": told("Opened a prep item again", (d) => sentence(say("Opened ", item(d), " again", what(d)), { note: textOf(d, "why") })),
  "prep.signed": told("Signed the prep", (d) => {
    const items = numberOf(d, "items");
    const name = textOf(d, "name");
    return sentence(say(strong("Prep signed"), phaseOf(d), items === null ? null : `: ${many(items, "item")}`, name ? `, by ${name}` : null), { state: { tone: "verdigris", word: "Signed" } });
  }),
  "prep.signature-lifted": told("The signature under the prep no longer stands", (d) => sentence(say("The signature under the prep", phaseOf(d), " no longer stands"), { note: textOf(d, "why"), state: { tone: "oxide", word: "Lifted" } })),
  "restore.done": told("Put something back", (d) => sentence(say("Put back ", item(d), what(d, "restoreAction")), { note: textOf(d, "note") }), (n) => `Put back ${many(n, "item")}`),
  "restore.kept": told("Kept something as it is", (d) => sentence(say("Kept as it is: ", item(d), what(d, "restoreAction")), { note: textOf(d, "why") })),
  "restore.reopened": told("Opened a restore item again", (d) => sentence(say("Opened ", item(d), " again", what(d, "restoreAction")), { note: textOf(d, "why") })),
} as const satisfies Partial<Record<RecordKind, Told>>;
