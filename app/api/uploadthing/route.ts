import { sending } from "@/lib/entry/sending";
import { unsafeStoreFile } from "@/lib/evidence/commands/arrivals";
import { requireSending } from "@/lib/evidence/queries";
import { routes } from "@/lib/routes";
import { uploadDoor } from "@/lib/uploads/router";

const arrived = (photoId: string, slot: "proof" | "original", file: { key: string }) => unsafeStoreFile(photoId, slot, file, new Date());

export const POST = sending(uploadDoor({ allow: requireSending, arrived }, routes.api.uploads()));
