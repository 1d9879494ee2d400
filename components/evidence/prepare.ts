import { BROKEN_WORDS, faultOfFile, HEIC_WORDS } from "@/lib/evidence/rules";
import { sizeOf, sniffType, type Size } from "@/lib/evidence/sniff";
import { PROOF_MAX_BYTES, PROOF_MAX_SIDE_PX, type PhotoType } from "@/lib/evidence/vocabulary";
import { PhotoFault } from "./send-order";

/** A photo that is ready to be sent: its bytes, what they are, their hash, and the small proof that goes first. */
export type Prepared = Size & { name: string; type: PhotoType; original: Blob; sizeBytes: number; sha256: string; proof: Blob };

// A picture's size stands behind its EXIF, which can fill some segments of 64 KB.
const HEAD_BYTES = 1024 * 1024;
// Of a picture turned from HEIC, which then is the original: close to what the camera made.
const TURNED_QUALITY = 0.92;
// From good to poor until a proof is small enough.
const PROOF_TRIES = [[PROOF_MAX_SIDE_PX, 0.8], [PROOF_MAX_SIDE_PX, 0.6], [1200, 0.6], [800, 0.5]] as const;

/** Looks at a chosen file's content, turns HEIC into JPEG where this browser can, hashes it and makes its proof. Throws `PhotoFault` with words. */
export async function preparePhoto(file: File): Promise<Prepared> {
  const given = await headOf(file);
  const turned = given.sniffed === "image/heic";
  const source: Blob = turned ? await turnToJpeg(file) : file;
  const { sniffed, size } = turned ? await headOf(source) : given;
  const fault = faultOfFile({ sniffed, sizeBytes: source.size, pixels: size ? size.widthPx * size.heightPx : null });
  if (fault) throw new PhotoFault(fault);
  if (!size || sniffed === null || sniffed === "image/heic") throw new PhotoFault(BROKEN_WORDS);
  const bytes = await source.arrayBuffer();
  // A copy of the bytes: what a file input hands out can vanish when the gallery is tidied up.
  const original = new Blob([bytes], { type: sniffed });
  const { proof, ...shown } = await makeProof(original, size);
  const name = turned ? `${file.name.replace(/\.\w+$/, "")}.jpg` : file.name;
  return { ...shown, name: name.slice(0, 200) || "photo", type: sniffed, original, sizeBytes: original.size, sha256: await sha256Of(bytes), proof };
}

async function headOf(source: Blob) {
  const head = new Uint8Array(await source.slice(0, HEAD_BYTES).arrayBuffer());
  return { sniffed: sniffType(head), size: sizeOf(head) };
}

async function sha256Of(bytes: ArrayBuffer): Promise<string> {
  const hash = new Uint8Array(await crypto.subtle.digest("SHA-256", bytes));
  return [...hash].map((byte) => byte.toString(16).padStart(2, "0")).join("");
}

async function turnToJpeg(file: Blob): Promise<Blob> {
  const bitmap = await createImageBitmap(file).catch((cause: unknown) => {
    throw new PhotoFault(HEIC_WORDS, { cause });
  });
  try {
    return await drawn(bitmap, Math.max(bitmap.width, bitmap.height), TURNED_QUALITY);
  } finally {
    bitmap.close();
  }
}

async function makeProof(original: Blob, size: Size): Promise<Size & { proof: Blob }> {
  const bitmap = await createImageBitmap(original, { imageOrientation: "from-image" }).catch((cause: unknown) => {
    throw new PhotoFault(BROKEN_WORDS, { cause });
  });
  try {
    // As it is looked at: turned by its orientation.
    const shown = bitmap.width * bitmap.height === size.widthPx * size.heightPx ? { widthPx: bitmap.width, heightPx: bitmap.height } : size;
    for (const [side, quality] of PROOF_TRIES) {
      const proof = await drawn(bitmap, side, quality);
      if (proof.size <= PROOF_MAX_BYTES) return { ...shown, proof };
    }
  } finally {
    bitmap.close();
  }
  throw new PhotoFault(BROKEN_WORDS);
}

/** A JPEG of the picture alone: drawing it anew leaves all metadata behind. */
async function drawn(bitmap: ImageBitmap, maxSide: number, quality: number): Promise<Blob> {
  const scale = Math.min(1, maxSide / Math.max(bitmap.width, bitmap.height));
  const canvas = document.createElement("canvas");
  canvas.width = Math.max(1, Math.round(bitmap.width * scale));
  canvas.height = Math.max(1, Math.round(bitmap.height * scale));
  const pen = canvas.getContext("2d");
  if (!pen) throw new PhotoFault("This browser has no memory left to open the picture. Close other pages and try again.");
  pen.fillStyle = "#ffffff";
  pen.fillRect(0, 0, canvas.width, canvas.height);
  pen.drawImage(bitmap, 0, 0, canvas.width, canvas.height);
  const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, "image/jpeg", quality));
  canvas.width = canvas.height = 0;
  if (!blob) throw new PhotoFault(BROKEN_WORDS);
  return blob;
}
