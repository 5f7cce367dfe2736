// One command from a bare clone to a running demonstration. Plain Node: it runs before anything is installed.
import path from "node:path";
import { build, buildIsCurrent } from "./build.mjs";
import { demoSecret, ensureDemoData, ForeignDataError, signInLines } from "./demo-data.mjs";
import { whenAskedToEnd } from "./ending.mjs";
import { ensureInstalled, requireNode, root } from "./installed.mjs";
import { exitCodeOf, portIsFree, spawnServer, stopServer, waitUntilReady } from "./serve.mjs";

const fail = (sentence) => {
  console.error(sentence);
  process.exit(1);
};

const unknown = process.argv.slice(2).filter((argument) => argument !== "--fresh");
if (unknown.length > 0) fail(`The demonstration knows only --fresh, not ${unknown.join(" ")}.`);
const fresh = process.argv.includes("--fresh");
const port = Number(process.env.PORT || 3000);
if (!Number.isInteger(port) || port < 1 || port > 65_535)
  fail(`PORT must be a number from 1 to 65535, not ${process.env.PORT}.`);

requireNode();
if (!(await portIsFree(port))) {
  fail(`Something else listens on port ${port}. Stop it, or choose another: PORT=3100 npm run demo`);
}
process.env.NEXT_TELEMETRY_DISABLED = "1";
ensureInstalled();

const folder = path.resolve(root, process.env.STILLWELL_DATA || "data");
const dataStands = () => {
  try {
    console.log(
      fresh ? "Making the demonstration's data anew …" : "Looking after the demonstration's data …",
    );
    return ensureDemoData(folder, { fresh });
  } catch (error) {
    if (error instanceof ForeignDataError) return fail(error.message);
    throw error;
  }
};
if (dataStands() === "failed") fail("The demonstration's data could not be made; the lines above say why.");

if (!buildIsCurrent()) {
  console.log("Building (about a minute) …");
  if (!build()) fail("The build failed; the lines above say why.");
}

const url = process.env.STILLWELL_URL || `http://localhost:${port}`;
const server = spawnServer({
  port,
  env: {
    ...process.env,
    STILLWELL_DATA: folder,
    STILLWELL_URL: url,
    NEXTAUTH_URL: url,
    NEXTAUTH_SECRET: demoSecret(folder),
  },
});
let stopping = false;
whenAskedToEnd(() => {
  stopping = true;
  void stopServer(server);
});
server.once("exit", (code, signal) => process.exit(stopping ? 0 : exitCodeOf(code, signal)));

try {
  await waitUntilReady(server, `http://127.0.0.1:${port}/`);
  console.log(
    `\nStillwell is ready at ${url}\n\n${signInLines().join("\n")}\n\nCtrl-C ends it; the data stays in ${folder}.`,
  );
} catch (error) {
  await stopServer(server);
  fail(`Stillwell did not start: ${error.message}.`);
}
