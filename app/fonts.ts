import localFont from "next/font/local";

/** Weight and width axes; the narrow end (84 %) is for labels, the wide end for the word mark. */
export const archivo = localFont({
  src: "../public/fonts/archivo-latin-standard-normal.woff2",
  variable: "--font-archivo",
  weight: "100 900",
  display: "swap",
  declarations: [{ prop: "font-stretch", value: "62% 125%" }],
});

/** Figures, dates and codes. */
export const plexMono = localFont({
  src: [
    { path: "../public/fonts/ibm-plex-mono-latin-400-normal.woff2", weight: "400", style: "normal" },
    { path: "../public/fonts/ibm-plex-mono-latin-600-normal.woff2", weight: "600", style: "normal" },
  ],
  variable: "--font-plex-mono",
  display: "swap",
});

/** The reporting mark and number of a unit, and nothing else. */
export const sairaStencil = localFont({
  src: "../public/fonts/saira-stencil-one-latin-400-normal.woff2",
  variable: "--font-saira-stencil",
  weight: "400",
  display: "swap",
});
