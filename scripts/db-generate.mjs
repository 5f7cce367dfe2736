// There is one migration until the first release: it is made anew from the tables (modules/*/schema.ts, db/*.schema.ts).
import { spawnSync } from "node:child_process";
import { mkdirSync, readdirSync, rmSync } from "node:fs";
import path from "node:path";
import { root } from "./installed.mjs";

const folder = path.join(root, "db/migrations");
mkdirSync(folder, { recursive: true });
for (const name of readdirSync(folder)) rmSync(path.join(folder, name), { recursive: true });
const { status } = spawnSync(
  process.execPath,
  ["node_modules/drizzle-kit/bin.cjs", "generate", "--name", "init"],
  {
    cwd: root,
    stdio: ["ignore", "inherit", "inherit"],
  },
);
process.exitCode = status ?? 1;
