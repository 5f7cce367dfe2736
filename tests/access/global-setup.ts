import type { TestProject } from "vitest/node";
import { startTestServer, type TestServer } from "../support/test-server";

declare module "vitest" {
  interface ProvidedContext {
    /** Address of the built server, without a slash at its end. */
    serverUrl: string;
    /** Its data folder, a copy of the demonstration's. */
    serverData: string;
    /** The file its log is written to. */
    serverLog: string;
  }
}

let server: TestServer | undefined;

/** Starts the built product once for all access tests. */
export async function setup(project: TestProject): Promise<void> {
  const started = await startTestServer("access");
  server = started;
  // A run that is interrupted does not come to teardown.
  process.once("exit", () => started.child.kill());
  for (const signal of ["SIGINT", "SIGTERM"] as const) process.once(signal, () => process.exit(1));
  project.provide("serverUrl", started.url);
  project.provide("serverData", started.dataFolder);
  project.provide("serverLog", started.logFile);
}

export async function teardown(): Promise<void> {
  await server?.stop();
}
