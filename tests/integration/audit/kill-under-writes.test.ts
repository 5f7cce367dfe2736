import { type ChildProcess, spawn } from "node:child_process";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { DAY_MS } from "@/lib/clock";
import { verifyHistory } from "@/modules/audit";
import { root } from "../../../scripts/installed.mjs";
import { bundleForNode, commandEnv } from "../../support/commands";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

const KILLS = 100;
/** Processes that write at the same time. */
const WRITERS = 2;

type Acknowledged = { readingId: number; entryId: number };

/** Waits for the child's first answer, lets it go on for a while, kills it, and gives what it had acknowledged. */
function killAfter(child: ChildProcess, aliveMs: number): Promise<Acknowledged[]> {
  return new Promise((resolve, reject) => {
    let [said, complained] = ["", ""];
    let timer: NodeJS.Timeout | undefined;
    child.stderr?.setEncoding("utf8").on("data", (text: string) => (complained += text));
    child.stdout?.setEncoding("utf8").on("data", (text: string) => {
      said += text;
      timer ??= setTimeout(() => child.kill("SIGKILL"), aliveMs);
    });
    child.once("error", reject);
    child.once("close", (_code, signal) => {
      if (signal !== "SIGKILL") return reject(new Error(`the writer ended by itself: ${complained}`));
      // A line that was cut by the kill was not acknowledged.
      const lines = said.slice(0, said.lastIndexOf("\n")).split("\n");
      resolve(
        lines
          .map((line) => line.split(" ").map(Number))
          .map(([readingId = 0, entryId = 0]) => ({ readingId, entryId })),
      );
    });
  });
}

describe("readings that were acknowledged", () => {
  it(`are there with their entries after each of ${KILLS} SIGKILLs in the middle of writing, and the chain is whole`, async () => {
    const bench = testBench(NOON);
    const water = waterFor(bench);
    const joe = bench.person("Joe Okafor", ["aquarist"]);
    const script = await bundleForNode("tests/support/keep-reading.ts");
    // Each process reads of an older time than the one before it.
    const argsOf = (index: number) =>
      [joe.personId, water.pointId, water.temperatureId, NOON - index * 50 * DAY_MS].map(String);
    const start = (index: number) =>
      spawn(process.execPath, ["--conditions=react-server", script, ...argsOf(index)], {
        cwd: root,
        env: commandEnv(path.dirname(bench.db.file)),
        stdio: ["ignore", "pipe", "pipe"],
      });
    const hasReading = bench.db.reader.sqlite.prepare(
      "select 1 from audit_change c join measurements_reading r on cast(r.id as text) = c.row_key " +
        "join audit_entry e on e.id = c.entry_id where c.entry_id = ? and c.table_name = 'measurements_reading' and r.id = ?",
    );
    const lost: Acknowledged[] = [];
    let acknowledged = 0;
    let killed = 0;
    while (killed < KILLS) {
      const batch = Array.from({ length: WRITERS }, (_, index) =>
        killAfter(start(killed + index), 50 + (((killed + index) * 37) % 250)),
      );
      for (const answers of await Promise.all(batch)) {
        killed += 1;
        acknowledged += answers.length;
        lost.push(...answers.filter(({ readingId, entryId }) => !hasReading.get(entryId, readingId)));
      }
    }
    const { findings, entries } = verifyHistory(bench.db.reader.sqlite);
    expect(killed).toBe(KILLS);
    expect(lost).toEqual([]);
    expect(findings).toEqual([]);
    expect(acknowledged).toBeGreaterThan(KILLS);
    expect(entries).toBeGreaterThanOrEqual(acknowledged);
  }, 300_000); // 100 processes, two at a time, each alive for less than half a second after its start; longer on a busy machine.
});
