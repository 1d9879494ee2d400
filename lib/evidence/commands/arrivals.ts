import "server-only";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { photos } from "@/db/schema";
import { putTask } from "@/lib/outbox/commands";
import { dropFile, findKey, readSmall } from "@/lib/uploads/files";
import { fileIdOf } from "@/lib/uploads/file-ids";
import { unsafeMissingFiles, unsafeUnchecked } from "../queries";
import { faultOfProof } from "../rules";
import type { Slot } from "../types";
import { PROOF_MAX_BYTES } from "../vocabulary";
import { unsafeRefusePhoto } from "./verdicts";

/** No viewer: the file service reports an arrival, under its signature. Notes the file once, however often it is reported; a second file for the same place is deleted. */
export async function unsafeStoreFile(photoId: string, slot: Slot, file: { key: string }, now: Date): Promise<{ stored: boolean }> {
  const fault = slot === "proof" ? await faultOfStored(file.key) : null;
  if (fault) await unsafeRefusePhoto(photoId, fault, now);
  const stored = fault === null && (await note(photoId, slot, file.key, now));
  if (!stored) await dropFile(file.key);
  return { stored };
}

async function faultOfStored(key: string): Promise<string | null> {
  const bytes = await readSmall(key, PROOF_MAX_BYTES);
  return bytes ? faultOfProof(bytes) : "The small picture that was sent first has more than 1 MB.";
}

/** False when the place is taken by another file, or the photo is over and wants none. */
async function note(photoId: string, slot: Slot, key: string, now: Date): Promise<boolean> {
  return db().transaction(async (tx) => {
    const [photo] = await tx.select({ state: photos.state, moveId: photos.moveId, proofKey: photos.proofKey, originalKey: photos.originalKey }).from(photos).where(eq(photos.id, photoId)).for("update");
    if (!photo) return false;
    const there = slot === "proof" ? photo.proofKey : photo.originalKey;
    if (there) return there === key;
    if (photo.state !== "registered" && photo.state !== "proof") return false;
    if (slot === "proof") {
      await tx.update(photos).set({ proofKey: key, proofAt: now, state: "proof" }).where(eq(photos.id, photoId));
      return true;
    }
    await tx.update(photos).set({ originalKey: key, originalAt: now }).where(eq(photos.id, photoId));
    await putTask(tx, { kind: "check-photo", payload: { photoId }, dedupe: `check-photo:${photoId}`, moveId: photo.moveId }, now);
    return true;
  });
}

/** No viewer: asks the file service for files of one photo whose arrival was not reported, and notes them as a report would have. A service that is away changes nothing; false then. */
export async function unsafeSettlePhoto(photoId: string, now: Date): Promise<boolean> {
  const [photo] = await db().select({ state: photos.state, proofKey: photos.proofKey, originalKey: photos.originalKey }).from(photos).where(eq(photos.id, photoId));
  if (!photo || photo.state === "kept" || photo.state === "refused") return true;
  try {
    for (const slot of ["proof", "original"] as const) {
      const key = (slot === "proof" ? photo.proofKey : photo.originalKey) ? null : await findKey(fileIdOf(photoId, slot));
      if (key) await unsafeStoreFile(photoId, slot, { key }, now);
    }
    return true;
  } catch (error) {
    console.warn("file service not asked", photoId, error instanceof Error ? error.message : error);
    return false;
  }
}

/** No viewer: the worker's round, once a minute. Looks for files that arrived unreported, and has originals checked whose check was given up while a service was down. */
export async function unsafeSweepPhotos(now: Date): Promise<void> {
  for (const { id } of await unsafeMissingFiles(now)) {
    // A service that is away for one photo is away for all, and the worker has mail to send.
    if (!(await unsafeSettlePhoto(id, now))) break;
  }
  const hour = now.toISOString().slice(0, 13);
  for (const { id, moveId } of await unsafeUnchecked(now)) {
    await db().transaction((tx) => putTask(tx, { kind: "check-photo", payload: { photoId: id }, dedupe: `check-photo:${id}:${hour}`, moveId }, now));
  }
}
