import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import sharp from "sharp";
import { afterAll, describe, expect, it } from "vitest";
import { jpegTells } from "@/lib/evidence/sniff";
import { examinePicture, type Bounds } from "@/lib/uploads/examine";
import { aBomb, aHeic, anHtml, anSvg, aPicture } from "../../support/pictures";

const folder = mkdtempSync(join(tmpdir(), "towfolio-test-"));
afterAll(() => rmSync(folder, { recursive: true }));

const BOUNDS: Bounds = { maxPixels: 60_000_000, maxSidePx: 2048, seconds: 20, memoryMb: 640 };
let n = 0;

function examined(bytes: Uint8Array, bounds: Partial<Bounds> = {}) {
  const path = join(folder, `${(n += 1)}.jpg`);
  writeFileSync(path, bytes);
  return examinePicture(path, { ...BOUNDS, ...bounds });
}

describe("pictures that are taken", () => {
  it.each(["jpeg", "png", "webp"] as const)("a %s gives a JPEG of at most 2048 pixels", async (type) => {
    const answer = await examined(await aPicture({ type, width: 3000, height: 1500 }));
    if (!answer.ok) throw new Error(answer.fault);
    expect([answer.widthPx, answer.heightPx]).toEqual([3000, 1500]);
    expect(await sharp(answer.preview).metadata()).toMatchObject({ format: "jpeg", width: 2048, height: 1024 });
  });

  it("one with EXIF, turned by its orientation, stands upright and tells nothing any more", async () => {
    const tags = { IFD0: { Make: "Ardell", Model: "Ardell P4" }, IFD2: { DateTimeOriginal: "2026:11:24 14:05:33", OffsetTimeOriginal: "-06:00" }, IFD3: { GPSLatitudeRef: "N", GPSLatitude: "41/1 30/1 0/1", GPSLongitudeRef: "W", GPSLongitude: "96/1 15/1 0/1" } };
    const answer = await examined(await aPicture({ width: 800, height: 600, orientation: 6, tags }));
    if (!answer.ok) throw new Error(answer.fault);
    expect([answer.widthPx, answer.heightPx]).toEqual([600, 800]);
    expect(answer.tags).toMatchObject({ Make: "Ardell", Model: "Ardell P4", DateTimeOriginal: "2026:11:24 14:05:33", OffsetTimeOriginal: "-06:00", latitude: 41.5, longitude: -96.25 });
    const { width, height, exif, orientation, xmp } = await sharp(answer.preview).metadata();
    expect({ width, height, exif, orientation, xmp }).toEqual({ width: 600, height: 800, exif: undefined, orientation: undefined, xmp: undefined });
    expect(jpegTells(answer.preview)).toBe(false);
  });

  it("a script behind the picture does not come along", async () => {
    const answer = await examined(Buffer.concat([await aPicture(), Buffer.from("<script>1</script>")]));
    if (!answer.ok) throw new Error(answer.fault);
    expect(answer.preview.includes("<script")).toBe(false);
  });

  it("48 megapixels within the limits of time and memory", async () => {
    expect(await examined(await aPicture({ width: 8000, height: 6000, progressive: true }))).toMatchObject({ ok: true, widthPx: 8000 });
  });
});

describe("pictures that are refused", () => {
  it("one of 256 megapixels, by its header and at once", async () => {
    const bomb = aBomb(16_000, 16_000);
    const start = Date.now();
    expect(await examined(bomb)).toEqual({ ok: false, fault: "too-many-pixels" });
    expect(Date.now() - start).toBeLessThan(3000);
  });

  it.each([
    ["an SVG named .jpg", anSvg()],
    ["HTML named .png", anHtml()],
    ["HEIC named .jpg", aHeic()],
    ["an empty file", Buffer.alloc(0)],
    ["noise", Buffer.from(Array.from({ length: 5000 }, (_, at) => (at * 131 + 17) & 255))],
    ["a GIF", Buffer.from("R0lGODlhAQABAIAAAAAAAP///yH5BAEAAAAALAAAAAABAAEAAAIBRAA7", "base64")],
    ["a header without a picture", Buffer.from([0xff, 0xd8, 0xff, 0xe0])],
  ])("%s", async (_, bytes) => {
    expect(await examined(bytes)).toEqual({ ok: false, fault: "broken" });
  });

  it.each(["jpeg", "png", "webp"] as const)("a %s that breaks off in the middle", async (type) => {
    const whole = await sharp(Buffer.from(Array.from({ length: 300 * 300 * 3 }, (_, at) => (at * 7919) & 255)), { raw: { width: 300, height: 300, channels: 3 } })[type]().toBuffer();
    expect(await examined(whole.subarray(0, whole.length >> 1))).toEqual({ ok: false, fault: "broken" });
  });

  it("one that takes too long: its process is ended and this one goes on", async () => {
    expect(await examined(await aPicture(), { seconds: 0.02 })).toEqual({ ok: false, fault: "too-costly" });
  });

  it("one that takes too much memory: its process is ended and this one goes on", async () => {
    const heavy = await sharp({ create: { width: 7000, height: 7000, channels: 4, background: "#fa0" } }).png({ progressive: true }).toBuffer();
    expect(await examined(heavy, { memoryMb: 40 })).toEqual({ ok: false, fault: "too-costly" });
    expect(await examined(heavy)).toMatchObject({ ok: true });
    expect((await examined(await aPicture())).ok).toBe(true);
  });
});
