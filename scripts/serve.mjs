import { spawn } from "node:child_process";
import { createServer } from "node:net";
import { setTimeout as sleep } from "node:timers/promises";
import { root } from "./installed.mjs";

const READY_MS = 60_000;
const STOP_MS = 15_000;

/** Whether nobody listens on this port yet. */
export function portIsFree(port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once("error", () => resolve(false));
    probe.listen(port, () => probe.close(() => resolve(true)));
  });
}

/**
 * A port of 127.0.0.1 that is free now.
 * @returns {Promise<number>}
 */
export function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once("error", reject);
    probe.listen(0, "127.0.0.1", () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

/**
 * Starts the built server as one process, known by its pid.
 * @param {{ port: number, host?: string, env: Record<string, string | undefined>, stdio?: "inherit" | "ignore" | number }} how
 * @returns {import("node:child_process").ChildProcess}
 */
export function spawnServer({ port, host, env, stdio = "inherit" }) {
  const args = ["node_modules/next/dist/bin/next", "start", "-p", String(port)];
  if (host !== undefined) args.push("-H", host);
  return spawn(process.execPath, args, {
    cwd: root,
    stdio: ["ignore", stdio, stdio],
    env: { ...env, NODE_ENV: "production", NEXT_TELEMETRY_DISABLED: "1", PORT: String(port) },
  });
}

/**
 * Waits until the server answers.
 * @param {import("node:child_process").ChildProcess} child
 * @param {string} url
 * @throws Error when it ends first, or is silent for a minute
 */
export async function waitUntilReady(child, url) {
  const started = performance.now();
  while (performance.now() - started < READY_MS) {
    if (child.exitCode !== null || child.signalCode !== null)
      throw new Error("the server ended before it answered");
    try {
      const { status } = await fetch(url, { redirect: "manual", signal: AbortSignal.timeout(5_000) });
      if (status < 500) return;
    } catch {
      // Not listening yet: ask again.
    }
    await sleep(200);
  }
  throw new Error(`the server did not answer at ${url} within ${READY_MS / 1000} s`);
}

/**
 * Asks the process to end, and ends it when it does not within 15 s.
 * @param {import("node:child_process").ChildProcess} child
 * @returns {Promise<void>}
 */
export async function stopServer(child) {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const ended = new Promise((resolve) => child.once("exit", resolve));
  child.kill("SIGTERM");
  const late = AbortSignal.timeout(STOP_MS);
  late.addEventListener("abort", () => child.kill("SIGKILL"));
  await ended;
}

/** The exit code a shell would show for an ended child. */
export const exitCodeOf = (code, signal) =>
  code ?? (signal === "SIGINT" ? 130 : signal === "SIGTERM" ? 143 : 1);
