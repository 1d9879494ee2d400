import type { PrepItem } from "./types";
import type { PrepGroup, PrepPhase } from "./vocabulary";

export const PHASE_LABELS: Record<PrepPhase, string> = { "where-it-stands": "Where it stands", "when-coupled": "When coupled" };

export const GROUP_LABELS: Record<PrepGroup, string> = {
  safety: "Protection first", "power-plant": "Power plant", electrical: "Electrical", "air-brakes": "Air and brakes", "running-gear": "Running gear",
  draft: "Draft", body: "Body and safety", papers: "Papers on the unit", "when-coupled": "With the carrier’s engine coupled",
};

/** What an item asks for as proof, in words: "photo, tag number". */
export function proofWords({ needsPhoto, needsTag, valueLabel }: Pick<PrepItem, "needsPhoto" | "needsTag" | "valueLabel">): string {
  const wanted = [needsPhoto && "photo", valueLabel && "value", needsTag && "tag number"].filter(Boolean);
  return wanted.length > 0 ? `wants ${wanted.join(", ")}` : "no proof needed";
}

/** Items of one phase in their groups, in the order of the work. */
export function byGroup(items: readonly PrepItem[], phase: PrepPhase): { group: PrepGroup; items: PrepItem[]; left: number }[] {
  const groups = new Map<PrepGroup, PrepItem[]>();
  for (const item of items) if (item.phase === phase) groups.set(item.group, [...(groups.get(item.group) ?? []), item]);
  return [...groups].map(([group, own]) => ({ group, items: own, left: own.filter((item) => item.state === "to-do").length }));
}

/** Items with a way back, in the order of putting back; those that do not apply have none. */
export const twinsOf = (items: readonly PrepItem[]) => items.filter((item) => item.restoreState !== "none" && item.state === "done").sort((a, b) => a.restoreOrder - b.restoreOrder);
