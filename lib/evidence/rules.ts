import type { Denial } from "@/lib/errors";
import { sniffType, sizeOf, jpegTells, type Sniffed } from "./sniff";
import type { Slot } from "./types";
import { PHOTO_MAX_BYTES, PHOTO_MAX_PIXELS, PHOTOS_PER_SUBJECT, PROOF_MAX_BYTES, PROOF_MAX_SIDE_PX, type PhotoState, type PhotoType } from "./vocabulary";

export const HEIC_WORDS = "This phone saves HEIC pictures that this browser can’t open. Set the camera to Most compatible or choose a JPEG.";
export const TYPE_WORDS = "This is not a JPEG, PNG or WebP picture.";
export const BYTES_WORDS = "The picture has more than 25 MB. Set the camera to a smaller size, or send a smaller copy.";
export const PIXELS_WORDS = "The picture has more than 60 megapixels. Set the camera to a smaller size.";
export const EMPTY_WORDS = "The file is empty.";
export const BROKEN_WORDS = "The picture can’t be opened; the file is damaged.";
export const COSTLY_WORDS = "The picture takes more time or memory to open than a phone’s picture does.";

/** Why a file can't be taken as a photo, judged by its content; null when it can. HEIC counts as good only where it is about to be converted. */
export function faultOfFile(file: { sniffed: Sniffed; sizeBytes: number; pixels: number | null }): string | null {
  if (file.sizeBytes === 0) return EMPTY_WORDS;
  if (file.sniffed === null) return TYPE_WORDS;
  if (file.sniffed === "image/heic") return HEIC_WORDS;
  if (file.sizeBytes > PHOTO_MAX_BYTES) return BYTES_WORDS;
  if (file.pixels !== null && file.pixels > PHOTO_MAX_PIXELS) return PIXELS_WORDS;
  return null;
}

/** Why a small picture that came as a proof is none; null when it is one. Looked at as bytes only, nothing is decoded. */
export function faultOfProof(bytes: Uint8Array): string | null {
  const size = sizeOf(bytes);
  if (bytes.byteLength > PROOF_MAX_BYTES || sniffType(bytes) !== "image/jpeg" || !size) return "The small picture that was sent first is not a JPEG of at most 1 MB.";
  if (Math.max(size.widthPx, size.heightPx) > PROOF_MAX_SIDE_PX) return "The small picture that was sent first is larger than a proof.";
  return jpegTells(bytes) ? "The small picture that was sent first still carries data about place or camera." : null;
}

export type StoredPhoto = { moveId: string; companyId: string; state: PhotoState; name: string };

/** Null when the photos can become evidence for a subject that has `already` some. */
export function denyLink(photos: readonly StoredPhoto[], wanted: number, { moveId, companyIds, already }: { moveId: string; companyIds: readonly string[]; already: number }): Denial | null {
  const faults = photos.flatMap((photo) => {
    if (photo.state === "registered") return [`${photo.name} has not arrived yet. Wait for its proof, or leave it out.`];
    if (photo.state === "refused") return [`${photo.name} was refused. Leave it out and take it again.`];
    return [];
  });
  const strange = photos.length < wanted || photos.some((photo) => photo.moveId !== moveId || !companyIds.includes(photo.companyId));
  if (strange) faults.push("One of the photos is not one of your company’s on this move.");
  if (already + wanted > PHOTOS_PER_SUBJECT) faults.push(`At most ${PHOTOS_PER_SUBJECT} photos can be kept here.`);
  return faults.length > 0 ? { code: "bad_input", message: "Some photos need another look.", fields: { photoIds: faults } } : null;
}

export type AwaitedPhoto = { takenBy: string; state: PhotoState; type: PhotoType; sizeBytes: number; proofKey: string | null; originalKey: string | null };
export type OfferedFile = { type: string; size: number };

/** Null when this person may now send this file of an announced photo. */
export function denySending(photo: AwaitedPhoto, slot: Slot, userId: string, file: OfferedFile): Denial | null {
  if (photo.takenBy !== userId) return { code: "not_found", message: "No such photo." };
  if (photo.state === "refused") return { code: "not_yet", message: "This photo was refused; take it again." };
  if (photo.state === "kept" || (slot === "proof" ? photo.proofKey : photo.originalKey)) return { code: "not_yet", message: "This file is here already." };
  if (slot === "proof" && (file.type !== "image/jpeg" || file.size > PROOF_MAX_BYTES)) return { code: "bad_input", message: "A proof is a JPEG of at most 1 MB." };
  if (slot === "original" && (file.type !== photo.type || file.size !== photo.sizeBytes)) return { code: "bad_input", message: "This is not the file that was announced." };
  return null;
}

/** Why an original that arrived is not the one that was announced; null when it is. */
export function faultOfArrival(announced: { sha256: string; sizeBytes: number; type: PhotoType }, arrived: { sha256: string; sizeBytes: number; head: Uint8Array }): string | null {
  if (arrived.sizeBytes !== announced.sizeBytes) return `The file has ${arrived.sizeBytes} bytes; the phone announced ${announced.sizeBytes}.`;
  if (arrived.sha256 !== announced.sha256) return "The file is not the one that the phone announced: its SHA-256 differs.";
  const sniffed = sniffType(arrived.head);
  const size = sizeOf(arrived.head);
  const fault = faultOfFile({ sniffed, sizeBytes: arrived.sizeBytes, pixels: size ? size.widthPx * size.heightPx : null });
  return fault ?? (sniffed === announced.type ? null : "The file is of another type than the phone announced.");
}

/** Name of a stored file, for somebody who saves it: the case, the photo, and which of its files it is. */
export const storedName = (caseNumber: string, photoId: string, slot: Slot | "preview", type: string) =>
  `${caseNumber}-${photoId.slice(-8)}${slot === "original" ? "" : `-${slot}`}.${type === "image/png" ? "png" : type === "image/webp" ? "webp" : "jpg"}`;
