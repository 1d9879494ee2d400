import { createHash, randomUUID } from "node:crypto";
import sharp from "sharp";
import { announcePhoto } from "@/lib/evidence/commands";
import { unsafeStoreFile } from "@/lib/evidence/commands/arrivals";
import { unsafeCheckPhoto } from "@/lib/evidence/commands/check";
import { fileIdOf } from "@/lib/uploads/file-ids";
import { keepFile } from "@/lib/uploads/files";
import type { Viewer } from "@/lib/viewer/types";
import type { DemoClock } from "./clock";
import { photograph, PICTURE_SIZE, type Picture } from "./pictures";

/** Takes a drawn picture as evidence, by the same steps as a phone: announced, proof, original, checked. Returns its id. */
export async function takePhoto(clock: DemoClock, viewer: Viewer, moveId: string, picture: Picture, at: Date): Promise<string> {
  const bytes = await photograph(picture, at);
  const sha256 = createHash("sha256").update(bytes).digest("hex");
  const { photo } = await announcePhoto(viewer, { moveId, clientId: randomUUID(), name: picture.name, type: "image/jpeg", sizeBytes: bytes.byteLength, sha256, ...PICTURE_SIZE }, clock.attempt(at));
  const proof = Uint8Array.from(await sharp(bytes).resize(800).jpeg({ quality: 70 }).toBuffer());
  for (const [slot, file] of [["proof", proof], ["original", bytes]] as const) {
    const key = await keepFile(file, { name: picture.name, type: "image/jpeg", customId: fileIdOf(photo.id, slot), download: slot === "original" });
    await unsafeStoreFile(photo.id, slot, { key }, at);
  }
  await unsafeCheckPhoto(photo.id, at);
  return photo.id;
}
