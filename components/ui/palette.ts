/** Every colour of the product, in the four palettes that a screen can ask for. Tailwind, the style sheet and the contrast test read this file. */
export const PALETTE_NAMES = ["light", "dark", "lightMore", "darkMore"] as const;
export type PaletteName = (typeof PALETTE_NAMES)[number];

const light = {
  card: "#f4f1e8",
  sheet: "#fdfcf8",
  manila: "#e9e4d6",
  rule: "#c9c3b3",
  "rule-strong": "#7d7765",
  tie: "#c9c3b3",
  ink: "#1c232b",
  "ink-2": "#4a545e",
  "ink-3": "#565d66",
  "on-ink": "#fdfcf8",
  oxide: "#a3331b",
  "oxide-wash": "#f6e3dc",
  brass: "#855600",
  "brass-wash": "#f7ebcd",
  verdigris: "#0f6b58",
  "verdigris-wash": "#dcefe8",
  slate: "#234e7d",
  "slate-wash": "#e0e9f3",
  "on-tone": "#fdfcf8",
  band: "#bfe0d5",
  bar: "#1c232b",
  "bar-ink": "#f4f1e8",
  "bar-ink-2": "#cfcabd",
  "bar-line": "#d9a441",
  focus: "#234e7d",
  "photo-line": "#ffffff",
  "photo-measure": "#ffd766",
  "photo-plate": "#1c232b",
};

export type Token = keyof typeof light;
export type Palette = Record<Token, string>;

const dark: Palette = {
  card: "#13171b",
  sheet: "#1b2025",
  manila: "#262b30",
  rule: "#3d434a",
  "rule-strong": "#8f8975",
  tie: "#3d434a",
  ink: "#efeadd",
  "ink-2": "#bfbbae",
  "ink-3": "#aca99d",
  "on-ink": "#171b20",
  oxide: "#f09a82",
  "oxide-wash": "#3a211b",
  brass: "#e2b355",
  "brass-wash": "#352a14",
  verdigris: "#74c7b0",
  "verdigris-wash": "#16322b",
  slate: "#97bee8",
  "slate-wash": "#1c2c3d",
  "on-tone": "#13171b",
  band: "#245145",
  bar: "#0b0e11",
  "bar-ink": "#f4f1e8",
  "bar-ink-2": "#cfcabd",
  "bar-line": "#d9a441",
  focus: "#97bee8",
  "photo-line": "#ffffff",
  "photo-measure": "#ffd766",
  "photo-plate": "#1c232b",
};

/** For a phone in full sun: every grey is ink and the paper is white. */
const lightMore: Palette = {
  ...light,
  card: "#ffffff",
  sheet: "#ffffff",
  manila: "#f1eee5",
  rule: "#0c1014",
  "rule-strong": "#0c1014",
  tie: "#c4c4c4",
  ink: "#0c1014",
  "ink-2": "#0c1014",
  "ink-3": "#0c1014",
  "on-ink": "#ffffff",
  oxide: "#7c1f0b",
  brass: "#5a3a00",
  verdigris: "#07483a",
  slate: "#12365f",
  "on-tone": "#ffffff",
  bar: "#0c1014",
  "bar-ink": "#ffffff",
  "bar-ink-2": "#ffffff",
  "bar-line": "#f0bd5c",
  focus: "#12365f",
};

const darkMore: Palette = {
  ...dark,
  card: "#000000",
  sheet: "#000000",
  manila: "#1b1f23",
  rule: "#ffffff",
  "rule-strong": "#ffffff",
  tie: "#5c5c5c",
  ink: "#ffffff",
  "ink-2": "#ffffff",
  "ink-3": "#ffffff",
  "on-ink": "#000000",
  oxide: "#ffbba9",
  brass: "#f7d083",
  verdigris: "#a3e6d3",
  slate: "#c2dcf8",
  "on-tone": "#000000",
  bar: "#000000",
  "bar-ink": "#ffffff",
  "bar-ink-2": "#ffffff",
  "bar-line": "#f0bd5c",
  focus: "#c2dcf8",
};

export const PALETTES: Record<PaletteName, Palette> = { light, dark, lightMore, darkMore };

/** Paper to hang in a cab: the light palette without its tinted grounds, so that a printer spends no toner on them. */
export const PRINT_PALETTE: Palette = { ...light, card: "#ffffff", sheet: "#ffffff", manila: "#ffffff", "ink-2": light.ink, "ink-3": light.ink };

export const TOKENS = Object.keys(light) as Token[];

/** The palette as custom properties, one per token. */
export function asVariables(palette: Palette): Record<string, string> {
  return Object.fromEntries(TOKENS.map((token) => [`--${token}`, palette[token]]));
}

/** What stands on what, and the ratio that it needs: WCAG 2.2 1.4.3 (4.5 for text), 1.4.6 (7, our aim for body ink), 1.4.11 (3 for lines that carry meaning). */
export type Pair = { over: Token; under: Token; ratio: 3 | 4.5 | 7 };

const pairs = (ratio: Pair["ratio"], overs: Token[], unders: Token[]): Pair[] => overs.flatMap((over) => unders.map((under) => ({ over, under, ratio })));

const WASHES: Token[] = ["oxide-wash", "brass-wash", "verdigris-wash", "slate-wash"];
const TONES: Token[] = ["oxide", "brass", "verdigris", "slate"];

export const PAIRS: Pair[] = [
  ...pairs(7, ["ink"], ["card", "sheet", "manila", ...WASHES]),
  ...pairs(4.5, ["ink-2", "ink-3"], ["card", "sheet", "manila", ...WASHES]),
  ...pairs(4.5, TONES, ["card", "sheet", "manila"]),
  ...TONES.map((tone, at): Pair => ({ over: tone, under: WASHES[at] ?? "sheet", ratio: 4.5 })),
  ...pairs(4.5, ["on-ink"], ["ink"]),
  ...pairs(4.5, ["on-tone"], TONES),
  ...pairs(7, ["bar-ink"], ["bar"]),
  ...pairs(4.5, ["bar-ink-2", "bar-line"], ["bar"]),
  ...pairs(3, ["rule-strong"], ["card", "sheet", "manila"]),
  ...pairs(3, ["focus"], ["card", "sheet", "manila", ...WASHES]),
  ...pairs(3, ["verdigris", "oxide", "ink"], ["band"]),
  ...pairs(4.5, ["photo-line", "photo-measure"], ["photo-plate"]),
];
