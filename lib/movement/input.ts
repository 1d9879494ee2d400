import { z } from "zod";
import { dayOf, dayOrNull, enteredForOrNull, idOf, line, lineOrNull, lines, linesOrNull, wallTime, zoneOf } from "@/lib/access/input";
import { SIGHTING_KINDS } from "./vocabulary";

const onLeg = { moveId: idOf, legId: idOf, enteredFor: enteredForOrNull };
const photoIds = z.array(idOf).max(20, "At most 20 photos.").default([]);

export const giveInstructionInput = z.strictObject({
  ...onLeg,
  billNumber: line("Enter the bill-of-lading number that the unit moves under.", 60),
  clearanceNumber: lineOrNull(60),
  train: lineOrNull(40),
  pickupFrom: dayOrNull,
  text: linesOrNull(2000),
});
export type GiveInstruction = z.output<typeof giveInstructionInput>;

export const withdrawInstructionInput = z.strictObject({ moveId: idOf, instructionId: idOf, why: line("Say why the instruction is withdrawn."), enteredFor: enteredForOrNull });
export type WithdrawInstruction = z.output<typeof withdrawInstructionInput>;

export const releaseUnitInput = z.strictObject({ moveId: idOf, name: line("Type your name."), note: linesOrNull(1000) });
export type ReleaseUnit = z.output<typeof releaseUnitInput>;

export const makeSightingInput = z.strictObject({
  ...onLeg,
  kind: z.enum(SIGHTING_KINDS, { error: "Choose what happened." }),
  place: line("Say where."),
  zone: zoneOf,
  occurredAt: wallTime("Enter the day and time by the clock there."),
  train: lineOrNull(40),
  note: linesOrNull(1000),
  photoIds,
  /** The sighting that this one corrects; it is retracted in the same step. */
  corrects: idOf.nullish().transform((given) => given ?? null),
});
export type MakeSighting = z.output<typeof makeSightingInput>;

export const retractSightingInput = z.strictObject({ moveId: idOf, sightingId: idOf, why: line("Say why it is retracted."), enteredFor: enteredForOrNull });
export type RetractSighting = z.output<typeof retractSightingInput>;

export const recordArrivalInput = z.strictObject({
  moveId: idOf,
  arrivedOn: dayOf("Enter the day on which you looked the unit over."),
  condition: lines("Say in what condition it arrived, compared with the photos from departure."),
  missing: linesOrNull(2000),
  name: line("Type your name."),
  photoIds: photoIds.refine((ids) => ids.length > 0, "Add at least one photo: the same views as at departure."),
});
export type RecordArrival = z.output<typeof recordArrivalInput>;

export const closeMoveInput = z.strictObject({ moveId: idOf, name: line("Type your name.") });
export type CloseMove = z.output<typeof closeMoveInput>;
