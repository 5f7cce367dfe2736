import { spawnSync } from "node:child_process";
import { mkdtempSync, readFileSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { root } from "../../../scripts/installed.mjs";
import { bundleForNode, commandEnv } from "../../support/commands";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

const COMMITS = 40;

/** Calls of one kind in the summary that `strace -c` writes: "% time seconds usecs/call calls errors syscall". */
const callsOf = (summary: string, name: string): number => {
  const line = summary.split("\n").find((one) => one.trim().endsWith(` ${name}`));
  return line === undefined ? 0 : Number(line.trim().split(/\s+/)[3]);
};

describe("a command that has answered", () => {
  it("has been written through to the disk: at least one fsync or fdatasync a commit", async () => {
    const bench = testBench(NOON);
    const water = waterFor(bench);
    const joe = bench.person("Joe Okafor", ["aquarist"]);
    const script = await bundleForNode("tests/support/keep-reading.ts");
    const folder = mkdtempSync(path.join(tmpdir(), "stillwell-strace-"));
    const summaryFile = path.join(folder, "summary");
    const args = [joe.personId, water.pointId, water.temperatureId, NOON, COMMITS].map(String);
    const { status, stdout, stderr, error } = spawnSync(
      "strace",
      [
        "-f",
        "-c",
        "-e",
        "trace=fsync,fdatasync",
        "-o",
        summaryFile,
        process.execPath,
        "--conditions=react-server",
        script,
        ...args,
      ],
      { cwd: root, env: commandEnv(path.dirname(bench.db.file)), encoding: "utf8", timeout: 100_000 },
    );
    const hint =
      "strace is needed to count what reaches the disk; npm test installs Debian's (apt-get install strace)";
    expect(error, hint).toBeUndefined();
    expect(status, stderr).toBe(0);
    const acknowledged = stdout.trim().split("\n").length;
    const summary = readFileSync(summaryFile, "utf8");
    rmSync(folder, { recursive: true });
    expect(acknowledged).toBe(COMMITS);
    expect(callsOf(summary, "fsync") + callsOf(summary, "fdatasync"), summary).toBeGreaterThanOrEqual(
      COMMITS,
    );
  }, 120_000);
});
