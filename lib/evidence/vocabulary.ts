/** `registered`: announced by the phone. `proof`: a small picture has arrived, the original is pending. `kept`: the original has arrived and its hash agrees. `refused`: not a picture we take, or its hash differs. */
export const PHOTO_STATES = ["registered", "proof", "kept", "refused"] as const;
export type PhotoState = (typeof PHOTO_STATES)[number];

/** What a photo can be evidence for. */
export const PHOTO_SUBJECTS = ["move", "prep", "restore", "inspection", "finding", "finding-entry", "sighting", "arrival"] as const;
export type PhotoSubject = (typeof PHOTO_SUBJECTS)[number];

export const PHOTO_TYPES = ["image/jpeg", "image/png", "image/webp"] as const;
export type PhotoType = (typeof PHOTO_TYPES)[number];

/** 25 MB and 60 megapixels: any phone of today; beyond it the picture is refused in words. */
export const PHOTO_MAX_BYTES = 25 * 1024 * 1024;
export const PHOTO_MAX_PIXELS = 60_000_000;
/** The small proof that goes up first. */
export const PROOF_MAX_BYTES = 1024 * 1024;
export const PROOF_MAX_SIDE_PX = 1600;
/** What screens show of an original that has been checked. */
export const PREVIEW_MAX_SIDE_PX = 2048;
export const PHOTOS_PER_SUBJECT = 20;
export const PHOTOS_PER_MOVE = 500;
