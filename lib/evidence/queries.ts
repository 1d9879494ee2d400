import "server-only";
import { and, asc, eq, gt, inArray, isNull, lte, or, sql } from "drizzle-orm";
import { db, type Reader } from "@/db/client";
import { companies, moves, photos, photoUses, users } from "@/db/schema";
import { maySee } from "@/lib/access/policy";
import { requireMove } from "@/lib/access/scope";
import type { HeldPart } from "@/lib/access/types";
import { AppError, refuse } from "@/lib/errors";
import { routes } from "@/lib/routes";
import type { Viewer } from "@/lib/viewer/types";
import { denySending, storedName, type OfferedFile } from "./rules";
import type { MovePhoto, PhotoView, Slot } from "./types";
import type { PhotoSubject, PhotoType } from "./vocabulary";

const columns = {
  id: photos.id, moveId: photos.moveId, state: photos.state, refusedWhy: photos.refusedWhy, name: photos.name, type: photos.type, sizeBytes: photos.sizeBytes, sha256: photos.sha256,
  widthPx: photos.widthPx, heightPx: photos.heightPx, capturedAt: photos.capturedAt, camera: photos.camera, latitude: photos.latitude, longitude: photos.longitude,
  takenBy: users.name, takenById: photos.takenBy, takenByCompany: companies.name, createdAt: photos.createdAt, zone: moves.originZone,
};

/** Photos with the names of who took them; the caller adds the condition. */
const select = (reader: Reader) => reader.select(columns).from(photos).innerJoin(users, eq(users.id, photos.takenBy)).innerJoin(companies, eq(companies.id, photos.companyId)).innerJoin(moves, eq(moves.id, photos.moveId));

type Row = Awaited<ReturnType<typeof select>>[number];

function viewOf(row: Row): PhotoView {
  const { takenById: _takenById, createdAt, capturedAt, latitude, longitude, type, ...rest } = row;
  const file = (size: "preview" | "original") => routes.api.photoFile(row.moveId, row.id, size);
  return {
    ...rest,
    // The column holds what the door let in.
    type: type as PhotoType,
    pending: row.state === "registered" || row.state === "proof",
    capturedAt: capturedAt?.toISOString() ?? null,
    place: latitude !== null && longitude !== null ? { latitude: Number(latitude), longitude: Number(longitude) } : null,
    at: createdAt.toISOString(),
    previewUrl: file("preview"),
    originalUrl: row.state === "kept" ? file("original") : null,
  };
}

/** Evidence is seen by those who see preparation or findings; not by a payer or a billing clerk. */
function requireEvidence(parts: readonly HeldPart[]): void {
  if (!maySee(parts, "findings") && !maySee(parts, "prep")) throw new AppError("not_your_part", "Photos are seen by those who prepare, inspect or receive the unit.");
}

/** All photos of a move, oldest first, also those that nothing points to yet. */
export async function listPhotos(viewer: Viewer, moveId: string): Promise<MovePhoto[]> {
  const { parts } = await requireMove(viewer, moveId);
  requireEvidence(parts);
  const rows = await select(db()).where(eq(photos.moveId, moveId)).orderBy(asc(photos.createdAt), asc(photos.id));
  const used = await db().selectDistinct({ id: photoUses.photoId }).from(photoUses).where(eq(photoUses.moveId, moveId));
  const usedIds = new Set(used.map(({ id }) => id));
  return rows.map((row) => ({ ...viewOf(row), used: usedIds.has(row.id), mine: row.takenById === viewer.userId }));
}

/** One photo of a move. */
export async function getPhoto(viewer: Viewer, moveId: string, photoId: string): Promise<PhotoView> {
  const { parts } = await requireMove(viewer, moveId);
  requireEvidence(parts);
  return viewOf(await requireRow(db(), moveId, photoId));
}

async function requireRow(reader: Reader, moveId: string, photoId: string): Promise<Row> {
  const [row] = await select(reader).where(and(eq(photos.id, photoId), eq(photos.moveId, moveId)));
  if (!row) throw new AppError("not_found", "No such photo.");
  return row;
}

/** The view of a photo for a room command that has checked the viewer already; takes its transaction or the pool. */
export async function unsafePhotoView(reader: Reader, moveId: string, photoId: string): Promise<PhotoView> {
  return viewOf(await requireRow(reader, moveId, photoId));
}

/** The key of the file behind a photo's door. The proof stands in for a preview that is not made yet. */
export async function getPhotoKey(viewer: Viewer, moveId: string, photoId: string, size: "preview" | "original"): Promise<string> {
  const { parts } = await requireMove(viewer, moveId);
  requireEvidence(parts);
  const [row] = await db().select({ state: photos.state, proofKey: photos.proofKey, previewKey: photos.previewKey, originalKey: photos.originalKey }).from(photos)
    .where(and(eq(photos.id, photoId), eq(photos.moveId, moveId)));
  const key = size === "preview" ? (row?.previewKey ?? row?.proofKey) : row?.state === "kept" ? row.originalKey : null;
  if (!key) throw new AppError("not_found", size === "original" && row ? "The original is not here yet." : "No such photo.");
  return key;
}

/** The photos of each subject, oldest first, for rooms that have already checked the viewer; takes their transaction or the pool. Every asked subject has a list. */
export async function unsafePhotosOf(reader: Reader, subject: PhotoSubject, subjectIds: readonly string[]): Promise<Map<string, PhotoView[]>> {
  const found = new Map<string, PhotoView[]>(subjectIds.map((id) => [id, []]));
  if (subjectIds.length === 0) return found;
  const uses = await reader.select({ photoId: photoUses.photoId, subjectId: photoUses.subjectId }).from(photoUses)
    .where(and(eq(photoUses.subject, subject), inArray(photoUses.subjectId, [...subjectIds])));
  if (uses.length === 0) return found;
  const rows = await select(reader).where(inArray(photos.id, uses.map(({ photoId }) => photoId))).orderBy(asc(photos.createdAt), asc(photos.id));
  for (const row of rows) {
    for (const use of uses) if (use.photoId === row.id) found.get(use.subjectId)?.push(viewOf(row));
  }
  return found;
}

/** No viewer: the round that looks for files whose arrival was never reported. Photos older than a minute that lack a file; those older than an hour only in the minute of the hour in which they were taken, so that a lost phone costs little. */
export async function unsafeMissingFiles(now: Date, limit = 40) {
  const ageMs = (ms: number) => new Date(now.getTime() - ms);
  const minute = Math.floor(now.getTime() / 60_000) % 60;
  return db().select({ id: photos.id, proofKey: photos.proofKey, originalKey: photos.originalKey }).from(photos)
    .where(and(
      inArray(photos.state, ["registered", "proof"]),
      or(isNull(photos.proofKey), isNull(photos.originalKey)),
      lte(photos.createdAt, ageMs(60_000)),
      gt(photos.createdAt, ageMs(14 * 24 * 3600_000)),
      or(gt(photos.createdAt, ageMs(3600_000)), sql`minute(${photos.createdAt}) = ${minute}`),
    ))
    .orderBy(asc(photos.createdAt)).limit(limit);
}

/** No viewer: the same round's look at originals that arrived long ago and were never checked, because the tries ran out while a service was down. */
export async function unsafeUnchecked(now: Date, limit = 40) {
  return db().select({ id: photos.id, moveId: photos.moveId }).from(photos)
    .where(and(inArray(photos.state, ["registered", "proof"]), lte(photos.originalAt, new Date(now.getTime() - 3600_000)))).limit(limit);
}

/** Refuses unless the viewer may send this file of a photo now; gives the name under which it is stored, which is ours and tells nothing of the phone. */
export async function requireSending(viewer: Viewer, photoId: string, slot: Slot, file: OfferedFile): Promise<{ name: string }> {
  const [photo] = await db().select({ takenBy: photos.takenBy, state: photos.state, type: photos.type, sizeBytes: photos.sizeBytes, proofKey: photos.proofKey, originalKey: photos.originalKey, moveId: photos.moveId })
    .from(photos).where(eq(photos.id, photoId));
  if (!photo) throw new AppError("not_found", "No such photo.");
  refuse(denySending({ ...photo, type: photo.type as PhotoType }, slot, viewer.userId, file));
  const { move } = await requireMove(viewer, photo.moveId);
  return { name: storedName(move.caseNumber, photoId, slot, file.type) };
}
