import "server-only";
import { eq, inArray, and } from "drizzle-orm";
import { db, type Tx } from "@/db/client";
import { moves, photos } from "@/db/schema";
import { appendRecord, type Speaker } from "@/lib/record/commands";
import { dropFile } from "@/lib/uploads/files";
import type { CapturedFrom } from "../captured";
import type { PhotoFacts } from "../types";

const CHECK: Speaker = { userId: null, name: "Photo check", companyId: null, companyName: null, part: null };

type Open = { moveId: string; name: string; sha256: string; originalKey: string | null };

/** The photo while nobody has decided on it, with its move's row locked so that the record's numbers follow each other. A closed move still takes verdicts: the photo was announced before. */
async function lockUndecided(tx: Tx, photoId: string): Promise<Open | null> {
  const [row] = await tx.select({ moveId: photos.moveId }).from(photos).where(eq(photos.id, photoId));
  if (!row) return null;
  await tx.select({ id: moves.id }).from(moves).where(eq(moves.id, row.moveId)).for("update");
  const [photo] = await tx.select({ moveId: photos.moveId, name: photos.name, sha256: photos.sha256, originalKey: photos.originalKey }).from(photos)
    .where(and(eq(photos.id, photoId), inArray(photos.state, ["registered", "proof"]))).for("update");
  return photo ?? null;
}

/** No viewer: the check's verdict against a photo. Its original is deleted; the row, its hash and the proof stay. */
export async function unsafeRefusePhoto(photoId: string, why: string, now: Date): Promise<void> {
  const key = await db().transaction(async (tx) => {
    const photo = await lockUndecided(tx, photoId);
    if (!photo) return null;
    await tx.update(photos).set({ state: "refused", refusedWhy: why, originalKey: null }).where(eq(photos.id, photoId));
    await appendRecord(tx, photo.moveId, CHECK, { kind: "photo.refused", detail: { photoId, name: photo.name, sha256: photo.sha256, why } }, now);
    return photo.originalKey;
  });
  if (key) await dropFile(key);
}

/** No viewer: the check's verdict for a photo: the original agrees with what was announced. */
export async function unsafeKeepPhoto(photoId: string, facts: PhotoFacts & { previewKey: string; capturedFrom: CapturedFrom | null }, now: Date): Promise<void> {
  const { previewKey, capturedFrom, latitude, longitude, ...rest } = facts;
  await db().transaction(async (tx) => {
    const photo = await lockUndecided(tx, photoId);
    if (!photo) return;
    const place = { latitude: latitude?.toFixed(6) ?? null, longitude: longitude?.toFixed(6) ?? null };
    await tx.update(photos).set({ ...rest, ...place, previewKey, state: "kept", keptAt: now }).where(eq(photos.id, photoId));
    const { name, sha256, moveId } = photo;
    await appendRecord(tx, moveId, CHECK, { kind: "photo.kept", detail: { photoId, name, sha256, capturedAt: facts.capturedAt, capturedFrom, camera: facts.camera } }, now);
  });
}
