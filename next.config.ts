import type { NextConfig } from "next";

const config: NextConfig = {
  // The tests build and serve beside a running copy, so they have a build folder of their own.
  distDir: process.env.NEXT_DIST_DIR || ".next",
  poweredByHeader: false,
  devIndicators: false,
  reactStrictMode: true,
  // Compiled parts, worker files and data files that these packages find by their own place on disk.
  serverExternalPackages: [
    "@node-rs/argon2",
    "bwip-js",
    "exifr",
    "file-type",
    "heic-decode",
    "mysql2",
    "pdfkit",
    "pino",
    "piscina",
    "sharp",
  ],
  experimental: {
    authInterrupts: true,
    // A photograph may have 40 MB. With a proxy in front of the routes Next.js cuts a body off at 10 MB otherwise, without an error.
    proxyClientMaxBodySize: "45mb",
  },
};

export default config;
