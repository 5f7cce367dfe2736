import type { NextConfig } from "next";

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  agentRules: false,
  images: { unoptimized: true },
  // Native addons and packages that load their own files at run time stay outside the bundle.
  serverExternalPackages: ["better-sqlite3", "@node-rs/argon2", "pino", "exceljs", "nodemailer"],
  experimental: {
    agentUpgrade: false,
    // With a proxy.ts, longer bodies are cut silently; the upload route itself refuses what is too large, with a sentence.
    proxyClientMaxBodySize: "256mb",
  },
};

export default config;
