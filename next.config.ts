import type { NextConfig } from "next";

/** What holds for every answer; the content security policy of pages is made per request in proxy.ts. */
const everywhere = [
  { key: "X-Content-Type-Options", value: "nosniff" },
  { key: "X-Frame-Options", value: "DENY" },
  { key: "Referrer-Policy", value: "same-origin" },
  { key: "Cross-Origin-Opener-Policy", value: "same-origin" },
  { key: "Cross-Origin-Resource-Policy", value: "same-origin" },
  {
    key: "Permissions-Policy",
    value: "camera=(), microphone=(), geolocation=(), payment=(), usb=(), display-capture=()",
  },
];

/** The interface serves data and files, never a page that runs. */
const apiPolicy = "default-src 'none'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'";

const config: NextConfig = {
  poweredByHeader: false,
  // `npm run types` checks the whole tree; the build does not do it a second time.
  typescript: { ignoreBuildErrors: true },
  reactStrictMode: true,
  agentRules: false,
  images: { unoptimized: true },
  // Native addons and packages that load their own files at run time stay outside the bundle.
  serverExternalPackages: ["better-sqlite3", "@node-rs/argon2", "pino", "exceljs", "nodemailer"],
  headers: async () => [
    { source: "/:path*", headers: everywhere },
    { source: "/api/:path*", headers: [{ key: "Content-Security-Policy", value: apiPolicy }] },
  ],
  experimental: {
    agentUpgrade: false,
    // forbidden() answers 403 with the page that says so.
    authInterrupts: true,
    // With a proxy.ts, longer bodies are cut silently; the upload route itself refuses what is too large, with a sentence.
    proxyClientMaxBodySize: "256mb",
  },
};

export default config;
