// Every check of the product, from a bare clone. Plain Node: it runs before anything is installed.
// `npm test -- --only unit,integration` runs some stages; the whole is what counts.
import { spawn } from "node:child_process";
import { existsSync, mkdirSync, readFileSync, rmSync } from "node:fs";
import path from "node:path";
import { build } from "./build.mjs";
import { whenAskedToEnd } from "./ending.mjs";
import { ensureStrace } from "./ensure-strace.mjs";
import { ensureBrowser } from "./find-browser.mjs";
import { ensureInstalled, requireNode, root } from "./installed.mjs";
import { exitCodeOf } from "./serve.mjs";
import { countOne, countPlaywright, countVitest, runStages } from "./stages.mjs";

const REPORTS = path.join(root, "build", "test-reports");
const STAGE_MS = 30 * 60_000;
const GRACE_MS = 20_000;
const NEXT = "node_modules/next/dist/bin/next";

let running;
whenAskedToEnd((signal) => {
  const end = () => process.exit(exitCodeOf(null, signal));
  if (running === undefined || running.exitCode !== null) end();
  // At SIGINT a tool first stops what it started itself; one that does not end is ended after 20 s.
  running.once("exit", end);
  running.kill("SIGINT");
  setTimeout(() => running.kill("SIGKILL"), GRACE_MS);
});

/** Runs a tool in its own process and answers its exit code; one that takes half an hour is ended. */
function tool(args, env = {}) {
  return new Promise((resolve) => {
    running = spawn(process.execPath, args, {
      cwd: root,
      stdio: ["ignore", "inherit", "inherit"],
      env: { ...process.env, NEXT_TELEMETRY_DISABLED: "1", ...env },
      timeout: STAGE_MS,
    });
    running.once("error", () => resolve(1));
    running.once("exit", (code, signal) => resolve(exitCodeOf(code, signal)));
  });
}

function readReport(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return undefined;
  }
}

const yesNo = (name, ...commands) => ({
  name,
  run: async () => {
    for (const command of commands) {
      const status = await tool(command);
      if (status !== 0) return countOne(status);
    }
    return countOne(0);
  },
});

const vitest = (name, projects, needs = []) => ({
  name,
  needs,
  run: async () => {
    const file = path.join(REPORTS, `${name}.json`);
    const status = await tool([
      "node_modules/vitest/vitest.mjs",
      "run",
      ...projects.flatMap((project) => ["--project", project]),
      "--allowOnly=false",
      "--reporter=default",
      "--reporter=json",
      `--outputFile.json=${file}`,
    ]);
    return countVitest(readReport(file), status);
  },
});

const integration = vitest("integration", ["integration"]);
const runIntegration = integration.run;
// Without strace the test that counts what reaches the disk fails, and says so.
integration.run = () => {
  ensureStrace();
  return runIntegration();
};

const browser = {
  name: "browser",
  needs: ["build"],
  run: async () => {
    const executable = ensureBrowser();
    if (executable === undefined)
      return { passed: 0, failed: 1, note: "no browser was found or could be installed" };
    const file = path.join(REPORTS, "browser.json");
    const status = await tool(
      ["node_modules/@playwright/test/cli.js", "test", "--forbid-only", "--reporter=list,json"],
      { PLAYWRIGHT_JSON_OUTPUT_NAME: file, CHROMIUM_PATH: executable },
    );
    return countPlaywright(readReport(file), status);
  },
};

const STAGES = [
  yesNo("format", ["node_modules/@biomejs/biome/bin/biome", "check", "."]),
  // Types of routes are generated first: a fresh clone has none, and lint that knows types needs them.
  yesNo("lint", [NEXT, "typegen"], ["node_modules/eslint/bin/eslint.js", ".", "--max-warnings", "0"]),
  yesNo("floors", ["scripts/floors.mjs"]),
  yesNo("types", [NEXT, "typegen"], ["node_modules/typescript/bin/tsc", "--noEmit"]),
  vitest("unit", ["unit", "unit-dom"]),
  vitest("published", ["published"]),
  integration,
  vitest("architecture", ["architecture"]),
  { name: "build", run: () => countOne(build() ? 0 : 1) },
  vitest("access", ["access"], ["build"]),
  browser,
];

function chosenStages() {
  const [flag, names, ...rest] = process.argv.slice(2);
  if (flag === undefined) return STAGES;
  const wanted = (names ?? "").split(",");
  const unknown = wanted.filter((name) => !STAGES.some((stage) => stage.name === name));
  if (flag !== "--only" || rest.length > 0 || unknown.length > 0) {
    console.error(`Say --only and stages out of ${STAGES.map((stage) => stage.name).join(",")}.`);
    process.exit(1);
  }
  return STAGES.filter((stage) => wanted.includes(stage.name));
}

requireNode();
const stages = chosenStages();
ensureInstalled();
if (existsSync(REPORTS)) rmSync(REPORTS, { recursive: true });
mkdirSync(REPORTS, { recursive: true });
const { failed } = await runStages(stages, (line) => console.log(line));
process.exitCode = failed > 0 ? 1 : 0;
