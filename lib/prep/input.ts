import { z } from "zod";
import { idOf, line, lineOrNull, lines, linesOrNull } from "@/lib/access/input";
import { PREP_PHASES } from "./vocabulary";

const item = { moveId: idOf, itemId: idOf, version: z.number().int() };
const photoIds = z.array(idOf).max(20, "At most 20 photos.").default([]);

export const finishItemInput = z.strictObject({ ...item, value: lineOrNull(), tagNumber: lineOrNull(40), note: linesOrNull(1000), photoIds });
export type FinishItem = z.output<typeof finishItemInput>;

export const skipItemInput = z.strictObject({ ...item, why: line("Say why it does not apply to this unit.") });
export type SkipItem = z.output<typeof skipItemInput>;

export const reopenItemInput = z.strictObject({ ...item, why: line("Say why it is opened again.") });
export type ReopenItem = z.output<typeof reopenItemInput>;

/** `rowsHash` is of the rows that the person saw; other rows are not signed. */
export const signPhaseInput = z.strictObject({ moveId: idOf, phase: z.enum(PREP_PHASES), name: line("Type your name."), rowsHash: z.string().regex(/^[0-9a-f]{64}$/) });
export type SignPhase = z.output<typeof signPhaseInput>;

export const restoreItemInput = z.strictObject({ ...item, note: linesOrNull(1000), photoIds });
export type RestoreItem = z.output<typeof restoreItemInput>;

export const keepItemInput = z.strictObject({ ...item, why: lines("Say why it is kept as it is, for instance that the unit goes on display.", 1000) });
export type KeepItem = z.output<typeof keepItemInput>;
