import "server-only";
import { and, count, eq, inArray } from "drizzle-orm";
import { db } from "@/db/client";
import { photos, photoUses } from "@/db/schema";
import { requireMove } from "@/lib/access/scope";
import { AppError, refuse } from "@/lib/errors";
import { newId } from "@/lib/ids";
import { writeOnMove, type MoveWrite } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import { unsafeSettlePhoto } from "./commands/arrivals";
import type { AnnouncePhoto } from "./input";
import { unsafePhotoView } from "./queries";
import { denyLink } from "./rules";
import type { Announced } from "./types";
import { PHOTOS_PER_MOVE, type PhotoSubject } from "./vocabulary";

/** Notes a photo and its hash before it is sent. The same photo again finds its row and tells what the server has of it. */
export async function announcePhoto(viewer: Viewer, input: AnnouncePhoto, attempt: Attempt): Promise<Announced> {
  const known = await findAnnounced(viewer, input);
  const photoId = known ?? (await register(viewer, input, attempt));
  // Announced before: a file may be there whose arrival was never reported.
  if (known) await unsafeSettlePhoto(known, attempt.at);
  return announced(input.moveId, photoId);
}

async function announced(moveId: string, photoId: string): Promise<Announced> {
  const [row] = await db().select({ state: photos.state, proofKey: photos.proofKey, originalKey: photos.originalKey }).from(photos).where(eq(photos.id, photoId));
  const over = row?.state === "kept" || row?.state === "refused";
  return { photo: await unsafePhotoView(db(), moveId, photoId), proofHere: over || Boolean(row?.proofKey), originalHere: over || Boolean(row?.originalKey) };
}

const announcedColumns = { id: photos.id, takenBy: photos.takenBy, moveId: photos.moveId, sha256: photos.sha256 };

/** An announcement may be repeated after the move was closed: its original still counts. */
async function findAnnounced(viewer: Viewer, { moveId, clientId, sha256 }: AnnouncePhoto): Promise<string | null> {
  await requireMove(viewer, moveId);
  const [row] = await db().select(announcedColumns).from(photos).where(eq(photos.clientId, clientId));
  if (!row) return null;
  if (row.takenBy !== viewer.userId || row.moveId !== moveId || row.sha256 !== sha256) throw new AppError("bad_input", "This id belongs to another photo.", { fields: { clientId: ["Belongs to another photo."] } });
  return row.id;
}

async function register(viewer: Viewer, input: AnnouncePhoto, attempt: Attempt): Promise<string> {
  const { photoId } = await writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    const { companyId } = ctx.allow({ action: "photo.take" });
    // A twin in another tab may have come first while this one waited for the move's row.
    const [twin] = await ctx.tx.select(announcedColumns).from(photos).where(and(eq(photos.clientId, input.clientId), eq(photos.takenBy, viewer.userId)));
    if (twin) return { photoId: twin.id };
    const [taken] = await ctx.tx.select({ n: count() }).from(photos).where(eq(photos.moveId, input.moveId));
    if ((taken?.n ?? 0) >= PHOTOS_PER_MOVE) throw new AppError("not_yet", `This move holds ${PHOTOS_PER_MOVE} photos already; no more can be added.`);
    const id = newId("photo");
    await ctx.tx.insert(photos).values({ ...input, id, takenBy: viewer.userId, companyId, createdAt: ctx.at });
    await ctx.append({ kind: "photo.taken", detail: { photoId: id, name: input.name, sha256: input.sha256, sizeBytes: input.sizeBytes } });
    return { photoId: id };
  });
  return photoId;
}

/** Makes photos evidence for something, within the command that writes it. Refuses photos of others, refused ones, and those of which nothing has arrived. */
export async function linkPhotos(ctx: MoveWrite, photoIds: readonly string[], subject: PhotoSubject, subjectId: string): Promise<void> {
  const wanted = [...new Set(photoIds)];
  if (wanted.length === 0) return;
  const moveId = ctx.move.id;
  const linked = await ctx.tx.select({ photoId: photoUses.photoId }).from(photoUses).where(and(eq(photoUses.subject, subject), eq(photoUses.subjectId, subjectId)));
  const fresh = wanted.filter((id) => !linked.some(({ photoId }) => photoId === id));
  if (fresh.length === 0) return;
  const rows = await ctx.tx.select({ id: photos.id, moveId: photos.moveId, companyId: photos.companyId, state: photos.state, name: photos.name }).from(photos).where(inArray(photos.id, fresh));
  refuse(denyLink(rows, fresh.length, { moveId, companyIds: ctx.parts.map((part) => part.companyId), already: linked.length }));
  await ctx.tx.insert(photoUses).values(fresh.map((photoId) => ({ photoId, subject, subjectId, moveId, at: ctx.at })));
}
