import type { NextConfig } from "next";

const config: NextConfig = {
  // The tests and the development server build into folders of their own, so that neither touches what is being served.
  distDir: process.env.NEXT_DIST_DIR ?? ".next",
  poweredByHeader: false,
  reactStrictMode: true,
  // Photos are served by our own checked door; the optimizer would copy them past it.
  images: { unoptimized: true },
  // `npm run check` and `npm test` hold the types; a build need not repeat them.
  typescript: { ignoreBuildErrors: true },
  // Bundled, it can no longer find the file and zlib readers that it asks for at run time.
  serverExternalPackages: ["exifr"],
};

export default config;
