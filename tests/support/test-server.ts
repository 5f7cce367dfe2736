import type { ChildProcess } from "node:child_process";
import { randomBytes } from "node:crypto";
import { closeSync, existsSync, openSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import path from "node:path";
import { buildIsCurrent } from "../../scripts/build.mjs";
import { root } from "../../scripts/installed.mjs";
import { freePort, spawnServer, stopServer, waitUntilReady } from "../../scripts/serve.mjs";
import { copyDemoData } from "./demo-copy";

/** The built product, serving a copy of the demonstration's data on 127.0.0.1. */
export type TestServer = {
  url: string;
  pid: number;
  child: ChildProcess;
  dataFolder: string;
  /** What the server wrote to its log so far is in this file. */
  logFile: string;
  /** Ends the server by its pid and throws its data away. */
  stop(): Promise<void>;
};

/**
 * Starts the built server on a free port with a fresh copy of the demonstration's data.
 * @throws Error when there is no build of the sources as they are, or the server does not answer
 */
export async function startTestServer(title: string, env: Record<string, string> = {}): Promise<TestServer> {
  if (!existsSync(path.join(root, ".next", "BUILD_ID"))) throw new Error("there is no build: npm run build");
  if (!buildIsCurrent()) throw new Error("the build is older than the sources: npm run build");
  const dataFolder = copyDemoData(title);
  const logFile = path.join(dataFolder, "server.log");
  const port = await freePort();
  const url = `http://127.0.0.1:${port}`;
  const log = openSync(logFile, "a");
  const child = spawnServer({
    port,
    host: "127.0.0.1",
    stdio: log,
    env: {
      ...process.env,
      STILLWELL_DATA: dataFolder,
      STILLWELL_URL: url,
      NEXTAUTH_URL: url,
      NEXTAUTH_SECRET: randomBytes(33).toString("base64"),
      MAIL_TRANSPORT: "file",
      LOG_LEVEL: "info",
      ...env,
    },
  });
  closeSync(log);
  const stop = async () => {
    await stopServer(child);
    rmSync(dataFolder, { recursive: true, force: true });
  };
  try {
    await waitUntilReady(child, `${url}/`);
  } catch (error) {
    const said = readFileSync(logFile, "utf8").slice(-4_000);
    await stop();
    throw new Error(`the server of the tests did not start:\n${said}`, { cause: error });
  }
  writeFileSync(path.join(dataFolder, "server.pid"), String(child.pid));
  return { url, pid: child.pid ?? -1, child, dataFolder, logFile, stop };
}
