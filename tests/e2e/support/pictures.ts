import sharp from "sharp";

export type PhotoFile = { name: string; mimeType: string; buffer: Buffer };

/** A photograph as a phone takes it: a real JPEG with noise, so that it has some weight, and with time, camera and place in its EXIF. */
export async function aPhoto(name: string, { width = 1600, height = 1200, seed = name.length } = {}): Promise<PhotoFile> {
  const noise = sharp({ create: { width, height, channels: 3, background: { r: (seed * 53) % 256, g: (seed * 97) % 256, b: 120 }, noise: { type: "gaussian", mean: 120, sigma: 18 } } });
  const taken = { IFD0: { Make: "Test", Model: "Pocket camera" }, IFD2: { DateTimeOriginal: "2026:11:20 14:05:00", OffsetTimeOriginal: "-06:00" } };
  const place = { IFD3: { GPSLatitudeRef: "N", GPSLatitude: "41/1 15/1 30/1", GPSLongitudeRef: "W", GPSLongitude: "96/1 5/1 12/1" } };
  return { name, mimeType: "image/jpeg", buffer: await noise.withExif({ ...taken, ...place }).jpeg({ quality: 80 }).toBuffer() };
}
