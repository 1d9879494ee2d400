import { deflateSync } from "node:zlib";
import sharp from "sharp";

/** A real picture of a colour that varies, so that files differ; `tags` become its EXIF. */
export async function aPicture(given: { type?: "jpeg" | "png" | "webp"; width?: number; height?: number; seed?: number; orientation?: number; tags?: Record<string, Record<string, string>>; progressive?: boolean } = {}): Promise<Buffer<ArrayBuffer>> {
  const { type = "jpeg", width = 640, height = 480, seed = 1, orientation, tags, progressive = false } = given;
  let picture = sharp({ create: { width, height, channels: 3, background: { r: (seed * 53) % 256, g: (seed * 97) % 256, b: 90 } } });
  picture = type === "png" ? picture.png() : type === "webp" ? picture.webp() : picture.jpeg({ progressive });
  if (tags) picture = picture.withExif(tags);
  if (orientation) picture = picture.withMetadata({ orientation });
  if (orientation && tags) picture = picture.withExifMerge(tags);
  return Buffer.from(await picture.toBuffer());
}

const CRC = new Uint32Array(256).map((_, n) => {
  let c = n;
  for (let k = 0; k < 8; k += 1) c = c & 1 ? 0xedb88320 ^ (c >>> 1) : c >>> 1;
  return c;
});

function chunk(type: string, body: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(type, "latin1"), body]);
  let crc = 0xffffffff;
  for (const byte of named) crc = (CRC[(crc ^ byte) & 255] ?? 0) ^ (crc >>> 8);
  const frame = Buffer.alloc(8);
  frame.writeUInt32BE(body.length, 0);
  frame.writeUInt32BE((crc ^ 0xffffffff) >>> 0, 4);
  return Buffer.concat([frame.subarray(0, 4), named, frame.subarray(4)]);
}

/** A PNG of one grey that opens to far more than it weighs. `saysWidth` and `saysHeight` stand in its header. */
export function aBomb(saysWidth: number, saysHeight: number): Buffer<ArrayBuffer> {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(saysWidth, 0);
  header.writeUInt32BE(saysHeight, 4);
  header.set([8, 0, 0, 0, 0], 8);
  const rows = Buffer.alloc((saysWidth + 1) * saysHeight);
  return Buffer.concat([Buffer.from("\x89PNG\r\n\x1a\n", "latin1"), chunk("IHDR", header), chunk("IDAT", deflateSync(rows, { level: 1 })), chunk("IEND", Buffer.alloc(0))]);
}

/** The beginning of a file as an iPhone writes it; no browser of a desk and no decoder of ours opens it. */
export const aHeic = (): Buffer<ArrayBuffer> => Buffer.concat([Buffer.from([0, 0, 0, 0x24]), Buffer.from("ftypheic\0\0\0\0mif1MiHEmiafMiHBheic", "latin1"), Buffer.alloc(2000, 7)]);

export const anSvg = (): Buffer<ArrayBuffer> => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="200" height="200"><script>1</script><image href="http://192.0.2.1/x.png"/></svg>');

export const anHtml = (): Buffer<ArrayBuffer> => Buffer.from("<!doctype html><script>document.title = 1</script>");
