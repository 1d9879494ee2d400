import { announcePhoto } from "@/lib/evidence/commands";
import { getPhoto, getPhotoKey, listPhotos, requireSending } from "@/lib/evidence/queries";
import { sha256Hex } from "@/lib/ids";
import { anAttempt } from "../../support/factories";
import { query, step } from "../build";
import { seatedBut, SEE_WORK } from "../personas";
import { photographed } from "../steps";

const picture = { name: "front.jpg", type: "image/jpeg" as const, sizeBytes: 1000, widthPx: 800, heightPx: 600 };

export const evidenceRows = [
  query({ name: "listPhotos", right: SEE_WORK, run: (viewer, { moveId }) => listPhotos(viewer, moveId) }),
  query({ name: "getPhoto", right: SEE_WORK, run: (viewer, { moveId, photoId }) => getPhoto(viewer, moveId, photoId) }),
  query({ name: "getPhotoKey", as: "of the original", right: SEE_WORK, shows: { what: /file’s key/, to: SEE_WORK }, run: (viewer, { moveId, photoId }) => getPhotoKey(viewer, moveId, photoId, "original") }),
  query({ name: "getPhotoKey", as: "of the preview", right: SEE_WORK, shows: { what: /file’s key/, to: SEE_WORK }, run: (viewer, { moveId, photoId }) => getPhotoKey(viewer, moveId, photoId, "preview") }),
  step({ name: "announcePhoto", right: SEE_WORK, seed: async () => ({}), run: (viewer, { moveId }) => announcePhoto(viewer, { ...picture, moveId, clientId: crypto.randomUUID(), sha256: sha256Hex("front") }, anAttempt()) }),
  step({
    name: "requireSending", right: ["contractor"], hidden: seatedBut("contractor"), own: true,
    seed: async (of) => ({ photoId: await photographed(of, of.people.contractor, { state: "registered", proofKey: null, originalKey: null, previewKey: null }) }),
    run: (viewer, { photoId }) => requireSending(viewer, photoId, "original", { type: picture.type, size: picture.sizeBytes }),
  }),
];
