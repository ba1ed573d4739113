import type { NextConfig } from "next";

/** On every answer, also files and errors; what depends on the request is set in proxy.ts. */
const headers = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  { key: "X-Frame-Options", value: "DENY" },
  { key: "Referrer-Policy", value: "same-origin" },
  { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
  { key: "Cross-Origin-Resource-Policy", value: "same-origin" },
  {
    key: "Permissions-Policy",
    value: "camera=(), microphone=(), payment=(), usb=(), geolocation=(self), browsing-topics=()",
  },
];

/** As proxy.ts has it for data; route files do not pass there. */
const dataPolicy = {
  key: "Content-Security-Policy",
  value: "default-src 'none'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
};

const config: NextConfig = {
  // A trial build beside the real one leaves the types to `npm run typecheck`.
  ...(process.env.NEXT_DIST_DIR ? { distDir: process.env.NEXT_DIST_DIR, typescript: { ignoreBuildErrors: true } } : {}),
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
  headers: async () => [
    { source: "/:path*", headers },
    { source: "/api/gpx/:path*", headers: [dataPolicy] },
  ],
  images: { unoptimized: true, remotePatterns: [] },
  experimental: { serverActions: { bodySizeLimit: "1mb" } },
};

export default config;
