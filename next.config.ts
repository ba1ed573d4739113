import type { NextConfig } from "next";

const config: NextConfig = {
  ...(process.env.NEXT_DIST_DIR ? { distDir: process.env.NEXT_DIST_DIR } : {}),
  poweredByHeader: false,
  reactStrictMode: true,
  reactCompiler: false,
  // Each loads files beside itself (native code, fonts, wasm), so it has to stay outside the bundle.
  serverExternalPackages: [
    "@libsql/client",
    "libsql",
    "pino",
    "nodemailer",
    "smtp-server",
    "mailparser",
    "@react-pdf/renderer",
    "highs",
    "@zxcvbn-ts/language-common",
  ],
  images: { unoptimized: true, remotePatterns: [] },
  experimental: { serverActions: { bodySizeLimit: "1mb" } },
};

export default config;
