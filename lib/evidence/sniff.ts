import type { PhotoType } from "./vocabulary";

/** What the first bytes of a file say it is; null for anything that we don't take. */
export type Sniffed = PhotoType | "image/heic" | null;

const HEIC_BRANDS = /^(?:heic|heix|heim|heis|hevc|hevx|hevm|hevs|mif1|msf1)$/;

const ascii = (bytes: Uint8Array, from: number, to: number) => String.fromCharCode(...bytes.subarray(from, to));

/** Type by content; the name and the type that a browser claims say nothing. */
export function sniffType(bytes: Uint8Array): Sniffed {
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return "image/jpeg";
  if (ascii(bytes, 0, 8) === "\x89PNG\r\n\x1a\n") return "image/png";
  if (ascii(bytes, 0, 4) === "RIFF" && ascii(bytes, 8, 12) === "WEBP") return "image/webp";
  if (ascii(bytes, 4, 8) === "ftyp" && HEIC_BRANDS.test(ascii(bytes, 8, 12))) return "image/heic";
  return null;
}

export type Size = { widthPx: number; heightPx: number };

/** Width and height as the header says, so that a picture too large to open is never opened. Null when the header is not in these bytes or makes no sense. */
export function sizeOf(bytes: Uint8Array): Size | null {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const type = sniffType(bytes);
  const size = type === "image/jpeg" ? jpegSize(view) : type === "image/png" ? pngSize(view) : type === "image/webp" ? webpSize(view) : null;
  return size && size.widthPx > 0 && size.heightPx > 0 ? size : null;
}

function pngSize(view: DataView): Size | null {
  if (view.byteLength < 24) return null;
  return { widthPx: view.getUint32(16), heightPx: view.getUint32(20) };
}

function webpSize(view: DataView): Size | null {
  if (view.byteLength < 30) return null;
  const chunk = String.fromCharCode(view.getUint8(12), view.getUint8(13), view.getUint8(14), view.getUint8(15));
  const uint24 = (at: number) => view.getUint16(at, true) + (view.getUint8(at + 2) << 16);
  if (chunk === "VP8X") return { widthPx: uint24(24) + 1, heightPx: uint24(27) + 1 };
  if (chunk === "VP8 ") return { widthPx: view.getUint16(26, true) & 0x3fff, heightPx: view.getUint16(28, true) & 0x3fff };
  if (chunk !== "VP8L") return null;
  const bits = view.getUint32(21, true);
  return { widthPx: (bits & 0x3fff) + 1, heightPx: ((bits >> 14) & 0x3fff) + 1 };
}

type Segment = { marker: number; at: number; length: number };

/** The segments of a JPEG before its picture data (ITU-T T.81 annex B, from memory). */
function* jpegSegments(view: DataView): Generator<Segment> {
  for (let at = 2; at + 4 <= view.byteLength; ) {
    if (view.getUint8(at) !== 0xff) return;
    const marker = view.getUint8(at + 1);
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    if (marker === 0xda || marker === 0xd9) return;
    const length = view.getUint16(at + 2);
    if (length < 2) return;
    yield { marker, at: at + 4, length: length - 2 };
    at += 2 + length;
  }
}

const isFrame = (marker: number) => marker >= 0xc0 && marker <= 0xcf && marker !== 0xc4 && marker !== 0xc8 && marker !== 0xcc;

function jpegSize(view: DataView): Size | null {
  for (const { marker, at } of jpegSegments(view)) {
    if (isFrame(marker) && at + 5 <= view.byteLength) return { widthPx: view.getUint16(at + 3), heightPx: view.getUint16(at + 1) };
  }
  return null;
}

/** APP1 holds EXIF and XMP, APP13 captions, COM free text. */
const TELLING = new Set([0xe1, 0xed, 0xfe]);

/** Whether a JPEG carries anything that tells of place, person or device. */
export function jpegTells(bytes: Uint8Array): boolean {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  return [...jpegSegments(view)].some(({ marker }) => TELLING.has(marker));
}
