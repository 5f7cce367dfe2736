import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { root } from "./installed.mjs";

/** What a build is made of. */
export const BUILD_SOURCES = [
  "app",
  "modules",
  "lib",
  "db",
  "public",
  "docs/handbook",
  "docs/formulas",
  "proxy.ts",
  "instrumentation.ts",
  "instrumentation-client.ts",
  "mdx-components.tsx",
  "next.config.ts",
  "postcss.config.mjs",
  "tsconfig.json",
  "package-lock.json",
];
/** What the demonstration data is made of. */
export const SEED_SOURCES = ["modules", "lib", "db", "tests/support", "app/_server", "package-lock.json"];

const isSource = (file) => !/\.test\.tsx?$/.test(file);

/** One SHA-256 over the names and contents of the given files and folders, so that "changed since" is answered truly. */
export function hashSources(entries, folder = root) {
  const hash = createHash("sha256");
  for (const entry of entries) {
    const start = path.join(folder, entry);
    if (!existsSync(start)) continue;
    for (const file of filesOf(start).filter(isSource).sort()) {
      hash
        .update(`${path.relative(folder, file)}\0`)
        .update(readFileSync(file))
        .update("\0");
    }
  }
  return hash.digest("hex");
}

function filesOf(start) {
  try {
    return readdirSync(start, { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => path.join(entry.parentPath, entry.name));
  } catch (error) {
    if (error.code === "ENOTDIR") return [start];
    throw error;
  }
}
