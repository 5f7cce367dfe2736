/**
 * Bundles the process that reads imported files into one file, so that it starts without the rest of the product.
 * Usage: node scripts/build-reader.mjs [FILE]   (default build/reader-process.mjs)
 */
import path from "node:path";
import { fileURLToPath } from "node:url";
import { build } from "esbuild";

const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)));

await build({
  entryPoints: [path.join(root, "modules/imports/reader/reader-process.ts")],
  outfile: path.resolve(process.argv[2] ?? path.join(root, "build/reader-process.mjs")),
  bundle: true,
  platform: "node",
  target: "node20",
  format: "esm",
  alias: { "@": root },
  banner: {
    js: 'import { createRequire } from "node:module";\nconst require = createRequire(import.meta.url);',
  },
  logLevel: "warning",
});
