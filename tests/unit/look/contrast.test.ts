import { describe, expect, it } from "vitest";
import { PAIRS, PALETTE_NAMES, PALETTES, PRINT_PALETTE, TOKENS, type Palette } from "@/components/ui/palette";

/** WCAG 2.2, definition of relative luminance: linearised sRGB channels weighted 0.2126, 0.7152, 0.0722. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const channel = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** WCAG 2.2, definition of contrast ratio: (L1 + 0.05) / (L2 + 0.05), the lighter first. */
function contrast(one: string, other: string): number {
  const [light = 0, dark = 0] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return (light + 0.05) / (dark + 0.05);
}

const tooLow = (palette: Palette) =>
  PAIRS.map((pair) => ({ ...pair, found: contrast(palette[pair.over], palette[pair.under]) }))
    .filter((pair) => pair.found < pair.ratio)
    .map((pair) => `${pair.over} on ${pair.under}: ${pair.found.toFixed(2)}, needs ${pair.ratio}`);

describe("contrast", () => {
  it("measures black on white as 21 and a colour on itself as 1", () => {
    expect(contrast("#000000", "#ffffff")).toBeCloseTo(21, 5);
    expect(contrast("#7d7765", "#7d7765")).toBe(1);
  });

  it.each(PALETTE_NAMES)("every pair in the %s palette is readable", (name) => {
    expect(tooLow(PALETTES[name])).toEqual([]);
  });

  it("every pair on paper is readable", () => {
    expect(tooLow(PRINT_PALETTE)).toEqual([]);
  });

  it.each(["lightMore", "darkMore"] as const)("the %s palette reads at 7 to 1 throughout", (name) => {
    const palette = PALETTES[name];
    const words = PAIRS.filter((pair) => pair.ratio >= 4.5 && pair.over !== "on-tone");
    expect(words.filter((pair) => contrast(palette[pair.over], palette[pair.under]) < 7).map((pair) => `${pair.over} on ${pair.under}`)).toEqual([]);
  });

  it("every palette names every token, as a six-digit colour", () => {
    for (const name of PALETTE_NAMES) {
      for (const token of TOKENS) expect(PALETTES[name][token], `${name} ${token}`).toMatch(/^#[0-9a-f]{6}$/);
    }
  });
});
