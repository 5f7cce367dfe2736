import { beforeAll, describe, expect, it } from "vitest";
import { writeCsv } from "@/lib/csv";
import { verifyHistory } from "@/modules/audit";
import { checkFile, commitReadings, discardImport, startCheck, startCommit } from "@/modules/imports";
import { testBench } from "@/tests/support/database";
import { detail, inForce, rows, upload, work } from "@/tests/support/imports";
import { buildReader } from "@/tests/support/reader-script";
import { waterFor } from "@/tests/support/water";

beforeAll(buildReader, 60_000);

const ROWS = 1700;
/** 1,700 readings a minute apart, every hundredth of them a second time. */
const FILE = writeCsv(
  ["System", "Parameter", "Value", "Taken at"],
  Array.from({ length: ROWS }, (_, index) => {
    const at = index % 100 === 99 ? index - 1 : index;
    const when = new Date(Date.UTC(2026, 1, 1) + at * 60_000).toISOString();
    return ["KELP-01", "temperature", 12, when];
  }),
);
const DUPLICATES = ROWS / 100;

function begin() {
  const bench = testBench();
  waterFor(bench);
  const ada = bench.person("Ada Finch", ["analyst"]);
  const count = (table: string) =>
    (bench.db.reader.sqlite.prepare(`select count(*) as n from ${table}`).get() as { n: number }).n;
  return { bench, ada, count };
}

/** Stops work once a look at the database says so, as a process does that is killed then. */
async function killedWhen(
  isTime: () => boolean,
  perform: (signal: AbortSignal) => Promise<void>,
): Promise<void> {
  const controller = new AbortController();
  const timer = setInterval(() => isTime() && controller.abort(new Error("killed")), 0);
  try {
    await expect(perform(controller.signal)).rejects.toThrow();
  } finally {
    clearInterval(timer);
  }
}

describe("an import that is interrupted", () => {
  it("in the middle of its check goes on behind the last row that was staged, and neither loses nor doubles", async () => {
    const { bench, ada, count } = begin();
    const { importId } = await upload(bench, ada, "many.csv", FILE);
    const staged = () => count("imports_staged_row");
    await killedWhen(
      () => staged() > 500,
      (signal) => checkFile(bench, { importId }, { signal }),
    );
    const before = staged();
    expect(before).toBeGreaterThan(500);
    expect(before).toBeLessThan(ROWS);
    expect(detail(bench, ada, importId).state).toBe("checking");
    await work(bench);
    const found = detail(bench, ada, importId);
    expect(found).toMatchObject({
      state: "checked",
      acceptedCount: ROWS - DUPLICATES,
      duplicateCount: DUPLICATES,
    });
    expect(staged()).toBe(ROWS);
    expect(count("(select distinct line from imports_staged_row)")).toBe(ROWS);
  });

  it("in the middle of its commit shows nothing, then brings in the rest, each reading once", async () => {
    const { bench, ada, count } = begin();
    const { importId } = await upload(bench, ada, "many.csv", FILE);
    await work(bench);
    bench.run(ada, startCommit, { importId });
    const stored = () => count("measurements_reading");
    await killedWhen(
      () => stored() > 300,
      (signal) => commitReadings(bench, { importId }, { signal }),
    );
    expect(stored()).toBeGreaterThan(300);
    expect(stored()).toBeLessThan(ROWS - DUPLICATES);
    expect(inForce(bench)).toEqual([]);
    // The last slices were brought in without being counted: what is written down about them is thrown away.
    bench.db.writer.sqlite.prepare("update imports_progress set committed_id = 0, committed = 0").run();
    await work(bench);
    expect(detail(bench, ada, importId)).toMatchObject({
      state: "committed",
      acceptedCount: ROWS - DUPLICATES,
    });
    expect(inForce(bench)).toHaveLength(ROWS - DUPLICATES);
    expect(stored()).toBe(ROWS - DUPLICATES);
    expect(verifyHistory(bench.db.reader.sqlite).findings).toEqual([]);
  });

  it("by being laid aside stops, and none of it is stored", async () => {
    const { bench, ada, count } = begin();
    const { importId } = await upload(bench, ada, "many.csv", FILE);
    let isAside = false;
    const timer = setInterval(() => {
      if (isAside || count("imports_staged_row") < 500) return;
      isAside = true;
      bench.run(ada, discardImport, { importId });
    }, 0);
    await work(bench);
    clearInterval(timer);
    expect(detail(bench, ada, importId).state).toBe("discarded");
    expect(count("imports_staged_row")).toBeLessThan(ROWS);
    expect(() => bench.run(ada, startCommit, { importId })).toThrow(/discarded/);
    expect(count("measurements_reading")).toBe(0);
  });
});

it("a file that is checked again is staged anew, not on top", async () => {
  const { bench, ada, count } = begin();
  const { importId } = await upload(bench, ada, "many.csv", FILE);
  await work(bench);
  bench.run(ada, startCheck, { importId });
  await work(bench);
  expect(count("imports_staged_row")).toBe(ROWS);
  expect(detail(bench, ada, importId)).toMatchObject({ acceptedCount: ROWS - DUPLICATES, refusedCount: 0 });
  expect(rows(bench, ada, importId, "duplicate")).toHaveLength(DUPLICATES);
});

it("all readings of a commit become visible at one moment, while others look", async () => {
  const { bench, ada } = begin();
  const { importId } = await upload(bench, ada, "many.csv", FILE);
  await work(bench);
  bench.run(ada, startCommit, { importId });
  const seen: number[] = [];
  const timer = setInterval(() => seen.push(inForce(bench).length), 0);
  await work(bench);
  clearInterval(timer);
  expect(seen.length).toBeGreaterThan(3);
  expect(new Set([...seen, inForce(bench).length])).toEqual(new Set([0, ROWS - DUPLICATES]));
});
