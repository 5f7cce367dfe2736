import { mkdirSync, rmSync, writeFileSync } from "node:fs";
import { dirname } from "node:path";
import { findBrowser } from "../../scripts/find-browser.mjs";
import { DEMO_ROLES, SERVER_DATA, SERVER_URL, signedInStateFile } from "../support/browser";
import { demoPerson } from "../support/demo-copy";
import { signIn } from "../support/sign-in";
import { startTestServer } from "../support/test-server";

/** Starts the built product once for all browser tests and signs one person of each role in. */
export default async function globalSetup(): Promise<() => Promise<void>> {
  if (findBrowser() === undefined) throw new Error("no chromium was found: npm test installs Debian's");
  const server = await startTestServer("browser");
  process.env[SERVER_URL] = server.url;
  process.env[SERVER_DATA] = server.dataFolder;
  try {
    for (const role of DEMO_ROLES) await keepSignedIn(server.url, role);
  } catch (error) {
    await server.stop();
    throw error;
  }
  return async () => {
    rmSync(dirname(signedInStateFile("lead")), { recursive: true, force: true });
    await server.stop();
  };
}

async function keepSignedIn(url: string, role: (typeof DEMO_ROLES)[number]): Promise<void> {
  const jar = await signIn(url, demoPerson(role));
  const cookies = jar.entries().map(([name, value]) => ({
    name,
    value,
    domain: new URL(url).hostname,
    path: "/",
    expires: -1,
    httpOnly: true,
    secure: false,
    sameSite: "Lax",
  }));
  const file = signedInStateFile(role);
  mkdirSync(dirname(file), { recursive: true });
  writeFileSync(file, JSON.stringify({ cookies, origins: [] }), { mode: 0o600 });
}
