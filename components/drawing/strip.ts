import type { Axles, BodyShape } from "@/lib/moves/vocabulary";

/** How far the hand-over to a carrier has come. */
export type HandoverTone = "met" | "waiting" | "ahead" | "stopped";

export type StripEnd = { name: string; note?: string };

export type Handover = {
  id: string;
  /** Who takes the unit over. */
  carrier: string;
  place: string;
  /** Its state in words: "4 of 6 conditions met". */
  note: string;
  tone: HandoverTone;
  /** Leads to that carrier's conditions. */
  href?: string;
  /** Written over the track behind it: "ZQSR, 174 mi". */
  leg?: string;
};

export type Strip = {
  ends: { from: StripEnd; to: StripEnd };
  handovers: readonly Handover[];
  /** Where the unit stands, from 0 at the first end to 1 at the last; `positionOf` gives it. */
  position: number;
  unit: { shape: BodyShape; axles: Axles; mirrored?: boolean };
};

/** The strip is ruled in columns, so that the words under it need no measured place. */
export const COLUMNS = 24;

/** The column line at which a hand-over stands; the stretch before the first is shorter, because there the unit only waits. */
export function columnOf(index: number, count: number): number {
  return Math.round((COLUMNS * (index + 0.7)) / (count + 0.7));
}

/** The same as a part of the whole strip. */
export function handoverAt(index: number, count: number): number {
  return columnOf(index, count) / COLUMNS;
}

/** The position of a unit that has passed so many hand-overs and stands so far (0 to 1) along the stretch behind the last of them. */
export function positionOf({ count, passed, along }: { count: number; passed: number; along: number }): number {
  const start = passed <= 0 ? 0 : handoverAt(passed - 1, count);
  const end = passed >= count ? 1 : handoverAt(passed, count);
  return start + (end - start) * Math.min(1, Math.max(0, along));
}

/** The columns under a hand-over that its words may fill, centred on it. */
export function labelColumns(index: number, count: number): { start: number; span: number } {
  const at = columnOf(index, count);
  const before = index === 0 ? 0 : columnOf(index - 1, count);
  const after = index === count - 1 ? COLUMNS : columnOf(index + 1, count);
  const half = Math.max(1, Math.floor(Math.min(at - before, after - at) / 2));
  return { start: at - half + 1, span: half * 2 };
}

/** How many hand-overs lie at or behind a position. */
export function passedAt(position: number, count: number): number {
  return Array.from({ length: count }, (_, index) => handoverAt(index, count)).filter((at) => at <= position + 0.001).length;
}

/** Where the unit stands, as a sentence. */
export function standingSentence({ ends, handovers, position }: Pick<Strip, "ends" | "handovers" | "position">): string {
  if (position <= 0.001) return `The unit stands at ${ends.from.name}.`;
  if (position >= 0.999) return `The unit stands at ${ends.to.name}.`;
  const passed = passedAt(position, handovers.length);
  const last = handovers[passed - 1];
  const next = handovers[passed];
  const behind = last ? `the hand-over to ${last.carrier}` : ends.from.name;
  const ahead = next ? `the hand-over to ${next.carrier}` : ends.to.name;
  return `The unit is between ${behind} and ${ahead}.`;
}
