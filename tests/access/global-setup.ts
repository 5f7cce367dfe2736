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
  server = await startTestServer("access");
  project.provide("serverUrl", server.url);
  project.provide("serverData", server.dataFolder);
  project.provide("serverLog", server.logFile);
}

export async function teardown(): Promise<void> {
  await server?.stop();
}
