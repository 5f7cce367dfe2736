// Production: checks the settings, then serves. Refuses to start with a missing or weak secret or an unsafe setting.
import { spawnSync } from "node:child_process";
import { existsSync } from "node:fs";
import path from "node:path";
import { whenAskedToEnd } from "./ending.mjs";
import { requireNode, root } from "./installed.mjs";
import { exitCodeOf, spawnServer, stopServer } from "./serve.mjs";

requireNode();
const envFile = path.join(root, ".env");
if (existsSync(envFile)) process.loadEnvFile(envFile);

const env = { ...process.env, NODE_ENV: "production" };
const checked = spawnSync(
  process.execPath,
  ["--conditions=react-server", "--import", "tsx", "scripts/check-settings.ts"],
  { cwd: root, stdio: ["ignore", "inherit", "inherit"], env },
);
if (checked.status !== 0) process.exit(1);
if (!existsSync(path.join(root, ".next", "BUILD_ID"))) {
  console.error("There is no build yet. Run `npm run build` first.");
  process.exit(1);
}

const server = spawnServer({
  port: Number(env.PORT || 3000),
  host: env.HOST || undefined,
  env: {
    ...env,
    NEXTAUTH_URL: env.NEXTAUTH_URL || env.STILLWELL_URL || `http://localhost:${env.PORT || 3000}`,
  },
});
let stopping = false;
whenAskedToEnd(() => {
  stopping = true;
  void stopServer(server);
});
server.once("exit", (code, signal) => process.exit(stopping ? 0 : exitCodeOf(code, signal)));
