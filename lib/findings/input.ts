import { z } from "zod";
import { enteredForOrNull, idOf, line, lineOrNull, lines, linesOrNull } from "@/lib/access/input";
import { PHOTOS_PER_SUBJECT } from "@/lib/evidence/vocabulary";
import { lacksPhoto, lacksPlace, NO_PHOTO_WORDS, NO_PLACE_WORDS } from "./rules";
import { SEVERITIES } from "./vocabulary";

const idOrNull = z.union([z.null(), z.literal("").transform(() => null), z.string().max(60, "Choose one of the places.")]).optional().transform((typed) => typed ?? null);

const photoIdsInput = z.array(idOf).max(PHOTOS_PER_SUBJECT, `At most ${PHOTOS_PER_SUBJECT} photos.`).default([]).transform((ids) => [...new Set(ids)]);

/** What was read, with its unit, as typed. */
const readingOrNull = lineOrNull(60);

export const postFindingInput = z
  .strictObject({
    moveId: idOf,
    inspectionId: idOf,
    componentId: line("Choose what the finding is about.", 60),
    placeId: idOrNull,
    placeNote: lineOrNull(),
    observed: lines("Say what was measured or seen."),
    reading: readingOrNull,
    condition: lineOrNull(),
    severity: z.enum(SEVERITIES, { error: "Say what it means for the move." }),
    photoIds: photoIdsInput,
    noPhotoReason: lineOrNull(),
    enteredFor: enteredForOrNull,
  })
  // Said together with the faults of single fields, so that a form comes back once.
  .refine((given) => !lacksPlace(given), { path: ["placeId"], error: NO_PLACE_WORDS, when: () => true })
  .refine((given) => !lacksPhoto(given), { path: ["photoIds"], error: NO_PHOTO_WORDS, when: () => true });
export type PostFinding = z.output<typeof postFindingInput>;

/** `version` is of the finding that the person saw; whoever comes second is told what changed. */
const said = { moveId: idOf, findingId: idOf, version: z.number({ error: "Say which version was seen." }).int() };

export const answerFindingInput = z.strictObject({ ...said, text: lines("Say what was done, or what was found when looking."), reading: readingOrNull, photoIds: photoIdsInput });
export type AnswerFinding = z.output<typeof answerFindingInput>;

export const notClearedInput = z.strictObject({
  ...said,
  text: lines("Say why the answer does not clear it."),
  wouldSatisfy: lines("Say what would satisfy you, so that the next answer can."),
  photoIds: photoIdsInput,
  enteredFor: enteredForOrNull,
});
export type NotCleared = z.output<typeof notClearedInput>;

export const clearFindingInput = z.strictObject({ ...said, text: linesOrNull(), enteredFor: enteredForOrNull });
export type ClearFinding = z.output<typeof clearFindingInput>;

export const withdrawFindingInput = z.strictObject({ ...said, text: lines("Say why it is withdrawn."), enteredFor: enteredForOrNull });
export type WithdrawFinding = z.output<typeof withdrawFindingInput>;
