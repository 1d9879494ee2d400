import type { Config } from "tailwindcss";
import plugin from "tailwindcss/plugin";
import { asVariables, PALETTES, PRINT_PALETTE, TOKENS } from "./components/ui/palette";

const colors = Object.fromEntries(TOKENS.map((token) => [token, `var(--${token})`]));

function forced(token: string): string {
  if (/^(card|sheet|manila|bar|band|photo-plate)$|^on-|-wash$/.test(token)) return "Canvas";
  if (token === "tie") return "GrayText";
  return token === "focus" ? "Highlight" : "CanvasText";
}

/** Windows and other systems with colours forced by their user: every token falls back to a system colour, drawings included. */
const FORCED = Object.fromEntries(TOKENS.map((token) => [`--${token}`, forced(token)]));

const palettes = plugin(({ addBase }) => {
  addBase({ ":root": asVariables(PALETTES.light) });
  addBase({ "@media (prefers-color-scheme: dark)": { ":root": asVariables(PALETTES.dark) } });
  addBase({ "@media (prefers-contrast: more)": { ":root": asVariables(PALETTES.lightMore) } });
  addBase({ "@media (prefers-contrast: more) and (prefers-color-scheme: dark)": { ":root": asVariables(PALETTES.darkMore) } });
  addBase({ "@media (forced-colors: active)": { ":root": FORCED } });
  addBase({ "@media print": { ":root": asVariables(PRINT_PALETTE) } });
});

/** Replaces the framework's own colours, sizes, corners and shadows, so that a class outside the look does not exist. */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    colors: { transparent: "transparent", current: "currentColor", inherit: "inherit", ...colors },
    fontFamily: {
      sans: ["var(--font-archivo)", "system-ui", "sans-serif"],
      mono: ["var(--font-plex-mono)", "ui-monospace", "monospace"],
      stencil: ["var(--font-saira-stencil)", "var(--font-archivo)", "sans-serif"],
    },
    fontSize: {
      11: ["11px", "1.2"],
      13: ["13px", "1.4"],
      14: ["14px", "1.42"],
      15: ["15px", "1.45"],
      17: ["17px", "1.3"],
      21: ["21px", "1.2"],
      28: ["28px", "1.15"],
      46: ["46px", "1"],
    },
    borderRadius: { none: "0", sm: "2px", DEFAULT: "3px" },
    boxShadow: {},
    dropShadow: {},
  },
  plugins: [palettes],
};

export default config;
