import { spawnSync } from "node:child_process";
import path from "node:path";
import { build } from "esbuild";
import { root } from "../../scripts/installed.mjs";

/** How product's own TypeScript is started outside the server. */
export const TSX = ["--conditions=react-server", "--import", "tsx"];

/** The environment of a command-line entry that works on this data folder. */
export const commandEnv = (dataFolder: string): NodeJS.ProcessEnv => ({
  ...process.env,
  NODE_ENV: "test",
  STILLWELL_DATA: dataFolder,
  LOG_LEVEL: "silent",
});

/** Runs a command-line entry to its end, as `npm run` would. */
export function runScript(
  script: string,
  args: readonly string[],
  dataFolder: string,
): { status: number | null; said: string } {
  const { status, stdout, stderr } = spawnSync(process.execPath, [...TSX, script, ...args], {
    cwd: root,
    encoding: "utf8",
    env: commandEnv(dataFolder),
    timeout: 60_000,
  });
  return { status, said: `${stdout}${stderr}` };
}

/** Bundles a script of ours into one file, so that a process with it starts in a moment; answers the file. */
export async function bundleForNode(script: string): Promise<string> {
  const outfile = path.join(root, "build", "test-scripts", `${path.basename(script, ".ts")}.mjs`);
  await build({
    entryPoints: [path.join(root, script)],
    outfile,
    bundle: true,
    platform: "node",
    target: "node20",
    format: "esm",
    alias: { "@": root.replace(/\/$/, ""), "server-only": path.join(root, "tests/support/server-only.ts") },
    external: ["better-sqlite3", "@node-rs/argon2", "pino", "nodemailer"],
    banner: {
      js: 'import { createRequire } from "node:module";\nconst require = createRequire(import.meta.url);',
    },
    logLevel: "warning",
  });
  return outfile;
}
