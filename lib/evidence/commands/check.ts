import "server-only";
import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { moves, photos } from "@/db/schema";
import { examinePicture, type Examined } from "@/lib/uploads/examine";
import { dropOwn, keepFile, withCopy } from "@/lib/uploads/files";
import { fileIdOf } from "@/lib/uploads/file-ids";
import { cameraOf, capturedOf, placeOf } from "../captured";
import { BROKEN_WORDS, COSTLY_WORDS, faultOfArrival, PIXELS_WORDS, storedName } from "../rules";
import { PHOTO_MAX_PIXELS, PREVIEW_MAX_SIDE_PX, type PhotoType } from "../vocabulary";
import { unsafeKeepPhoto, unsafeRefusePhoto } from "./verdicts";

/** Time and memory that one picture may take. 60 megapixels of the costliest kind (interlaced, 16 bits a channel) were seen to take 515 MB. */
const BOUNDS = { maxPixels: PHOTO_MAX_PIXELS, maxSidePx: PREVIEW_MAX_SIDE_PX, seconds: 20, memoryMb: 640 };

const WORDS: Record<Extract<Examined, { ok: false }>["fault"], string> = { broken: BROKEN_WORDS, "too-many-pixels": PIXELS_WORDS, "too-costly": COSTLY_WORDS };

/** No viewer: work from the outbox. Compares an original that arrived with what the phone announced, reads what the picture tells, makes its preview, and keeps or refuses it. Run again it changes nothing. */
export async function unsafeCheckPhoto(photoId: string, now: Date): Promise<void> {
  const [photo] = await db().select({ id: photos.id, state: photos.state, originalKey: photos.originalKey, sha256: photos.sha256, sizeBytes: photos.sizeBytes, type: photos.type, name: photos.name, zone: moves.originZone, caseNumber: moves.caseNumber })
    .from(photos).innerJoin(moves, eq(moves.id, photos.moveId)).where(eq(photos.id, photoId));
  // Refused on an earlier try that ended before the file was gone.
  if (photo?.state === "refused") return dropOwn(fileIdOf(photoId, "original"));
  if (!photo?.originalKey || (photo.state !== "registered" && photo.state !== "proof")) return;
  await withCopy(photo.originalKey, photo.sizeBytes, async (path, arrived) => {
    const fault = faultOfArrival({ ...photo, type: photo.type as PhotoType }, arrived);
    if (fault) return unsafeRefusePhoto(photoId, fault, now);
    const examined = await examinePicture(path, BOUNDS);
    if (!examined.ok) return unsafeRefusePhoto(photoId, WORDS[examined.fault], now);
    const { tags, widthPx, heightPx, preview } = examined;
    const previewKey = await keepFile(preview, { name: storedName(photo.caseNumber, photoId, "preview", "image/jpeg"), type: "image/jpeg", customId: fileIdOf(photoId, "preview") });
    const captured = capturedOf(tags, photo.zone);
    const place = placeOf(tags) ?? { latitude: null, longitude: null };
    await unsafeKeepPhoto(photoId, { widthPx, heightPx, capturedAt: captured?.at ?? null, camera: cameraOf(tags), ...place, previewKey, capturedFrom: captured?.from ?? null }, now);
  });
}
