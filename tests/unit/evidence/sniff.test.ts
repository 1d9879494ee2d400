import { describe, expect, it } from "vitest";
import { jpegTells, sizeOf, sniffType } from "@/lib/evidence/sniff";
import { aBomb, aHeic, anHtml, anSvg, aPicture } from "../../support/pictures";

describe("type by content", () => {
  it.each(["jpeg", "png", "webp"] as const)("%s", async (type) => {
    expect(sniffType(await aPicture({ type }))).toBe(`image/${type}`);
  });

  it.each([
    ["HEIC", aHeic(), "image/heic"],
    ["SVG", anSvg(), null],
    ["HTML", anHtml(), null],
    ["nothing", Buffer.alloc(0), null],
    ["AVIF", Buffer.from("\0\0\0\x20ftypavif", "latin1"), null],
    ["a RIFF that is sound", Buffer.from("RIFF\0\0\0\0WAVEfmt ", "latin1"), null],
    ["half a PNG signature", Buffer.from("\x89PNG", "latin1"), null],
  ])("%s", (_, bytes, type) => {
    expect(sniffType(bytes)).toBe(type);
  });
});

describe("size by header", () => {
  it.each([
    ["jpeg", 4000, 30],
    ["png", 641, 2],
    ["webp", 1023, 777],
  ] as const)("%s", async (type, width, height) => {
    expect(sizeOf(await aPicture({ type, width, height }))).toEqual({ widthPx: width, heightPx: height });
  });

  it("a JPEG with EXIF before its frame, also from the middle of a buffer", async () => {
    const picture = await aPicture({ width: 320, height: 200, tags: { IFD0: { Make: "Ardell" } } });
    const behind = Buffer.concat([Buffer.alloc(7), picture]).subarray(7);
    expect(sizeOf(behind)).toEqual({ widthPx: 320, heightPx: 200 });
  });

  it("a bomb says what it is", () => {
    expect(sizeOf(aBomb(16_000, 3))).toEqual({ widthPx: 16_000, heightPx: 3 });
  });

  it("reads nothing out of broken headers", async () => {
    const whole = await aPicture();
    for (let cut = 0; cut < 160; cut += 1) expect(() => sizeOf(whole.subarray(0, cut))).not.toThrow();
    for (const type of ["png", "webp"] as const) {
      const other = await aPicture({ type });
      for (let cut = 0; cut < 40; cut += 1) expect(() => sizeOf(other.subarray(0, cut))).not.toThrow();
    }
    expect(sizeOf(whole.subarray(0, 40))).toBeNull();
  });
});

it("knows a JPEG that tells of place or camera from one that does not", async () => {
  expect(jpegTells(await aPicture())).toBe(false);
  expect(jpegTells(await aPicture({ tags: { IFD0: { Make: "Ardell" } } }))).toBe(true);
});
