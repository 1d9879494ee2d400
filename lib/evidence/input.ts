import { z } from "zod";
import { idOf, line } from "@/lib/access/input";
import { BYTES_WORDS, EMPTY_WORDS, PIXELS_WORDS, TYPE_WORDS } from "./rules";
import { PHOTO_MAX_BYTES, PHOTO_MAX_PIXELS, PHOTO_TYPES } from "./vocabulary";

const side = z.int({ error: "Whole pixels." }).min(1, "At least 1 pixel.").max(PHOTO_MAX_PIXELS, PIXELS_WORDS);

/** What a phone says of a photo before it sends it. */
export const announcePhotoInput = z
  .strictObject({
    moveId: idOf,
    /** Made on the phone; the same one again finds its photo. */
    clientId: z.uuid({ error: "Not an id that a phone makes." }),
    name: line("The file has no name."),
    type: z.enum(PHOTO_TYPES, { error: TYPE_WORDS }),
    sizeBytes: z.int({ error: EMPTY_WORDS }).min(1, EMPTY_WORDS).max(PHOTO_MAX_BYTES, BYTES_WORDS),
    sha256: z.string().regex(/^[0-9a-f]{64}$/, "Not a SHA-256 in lower-case hex."),
    widthPx: side,
    heightPx: side,
  })
  .refine(({ widthPx, heightPx }) => widthPx * heightPx <= PHOTO_MAX_PIXELS, { path: ["widthPx"], error: PIXELS_WORDS });
export type AnnouncePhoto = z.output<typeof announcePhotoInput>;
