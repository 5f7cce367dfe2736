import { beforeAll, describe, expect, it } from "vitest";
import { writeCsv } from "@/lib/csv";
import { suspendPerson } from "@/modules/identity";
import { discardImport, startCommit, withdrawImport } from "@/modules/imports";
import { recordReadings } from "@/modules/measurements";
import { NOON, type TestBench, testBench } from "@/tests/support/database";
import { workbook } from "@/tests/support/import-files";
import { checked, committed, detail, inForce, rows, upload, work } from "@/tests/support/imports";
import { buildReader } from "@/tests/support/reader-script";
import { waterFor } from "@/tests/support/water";

beforeAll(buildReader, 60_000);

const HEADER = ["System", "Parameter", "Value", "Unit", "Taken at"];
const LONG = writeCsv(HEADER, [
  ["KELP-01", "temperature", "12.4", "°C", "2026-03-01 09:00"],
  ["kelp-01", "Temperature", "64.4", "°F", "2026-03-01 10:00"],
  ["KELP-01", "ammonia_n", "<0.05", "mg/L", "2026-03-01 09:00"],
]);

function benchWithAnalyst(): {
  bench: TestBench;
  ada: ReturnType<TestBench["person"]>;
  water: ReturnType<typeof waterFor>;
} {
  const bench = testBench();
  const ada = bench.person("Ada Finch", ["analyst"]);
  return { bench, ada, water: waterFor(bench) };
}

describe("a file of readings", () => {
  it("of the long form becomes readings as typed and in the canonical unit", async () => {
    const { bench, ada } = benchWithAnalyst();
    const done = await committed(bench, ada, "long.csv", LONG);
    expect(done).toMatchObject({ state: "committed", acceptedCount: 3, duplicateCount: 0, refusedCount: 0 });
    const stored = inForce(bench);
    expect(stored.map((row) => [row.typed_text, row.qualifier])).toEqual([
      ["12.4", ""],
      ["<0.05", "<"],
      ["64.4", ""],
    ]);
    // 64.4 °F is 18 °C by definition of the scales.
    expect(stored[2]?.value).toBeCloseTo(18, 9);
    expect(stored[0]?.taken_at).toBe(Date.UTC(2026, 2, 1, 9));
  });

  it("of the wide form gives a reading a filled cell", async () => {
    const { bench, ada } = benchWithAnalyst();
    const file = await workbook([
      ["Date", "System", "Temperature (°C)", "ammonia_n"],
      [new Date(Date.UTC(2026, 1, 3, 8, 30)), "KELP-01", 12.5, null],
      [new Date(Date.UTC(2026, 1, 4, 8, 30)), "KELP-01", 12.75, 0.02],
    ]);
    const done = await committed(bench, ada, "wide.xlsx", file);
    expect(done).toMatchObject({ form: "wide", state: "committed", acceptedCount: 3 });
    expect(inForce(bench).map((row) => row.value)).toEqual([12.5, 12.75, 0.02]);
    expect(inForce(bench)[0]?.taken_at).toBe(Date.UTC(2026, 1, 3, 8, 30));
  });

  it("with decimal commas is read by the file's own sign", async () => {
    const { bench, ada } = benchWithAnalyst();
    const text =
      "System;Parameter;Value;Taken at\nKELP-01;temperature;12,5;2026-03-01 09:00\nKELP-01;temperature;1,234;2026-03-01 10:00\n";
    const done = await committed(bench, ada, "comma.csv", text);
    expect(done).toMatchObject({ state: "committed", acceptedCount: 2 });
    expect(inForce(bench).map((row) => [row.typed_text, row.value])).toEqual([
      ["12,5", 12.5],
      ["1,234", 1.234],
    ]);
  });

  it("says before the commit what will be out of tolerance, and the commit confirms it", async () => {
    const { bench, ada, water } = benchWithAnalyst();
    water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceHigh: 18, watchHigh: 17 } });
    const file = writeCsv(HEADER, [
      ["KELP-01", "temperature", "64.4", "°F", "2026-03-01 09:00"],
      ["KELP-01", "temperature", "18.1", "", "2026-03-01 10:00"],
      ["KELP-01", "temperature", "16", "", "2026-03-01 11:00"],
      ["KELP-01", "temperature", "99", "", "2026-03-01 12:00"],
    ]);
    const before = await checked(bench, ada, "warm.csv", file);
    expect(before.statusCounts).toMatchObject({ out: 1, watch: 1, within: 1, implausible: 1 });
    bench.run(ada, startCommit, { importId: before.id });
    await work(bench);
    expect(inForce(bench).map((row) => row.status)).toEqual(["watch", "out", "within", "implausible"]);
    expect(inForce(bench).every((row) => row.confirmed_by === ada.personId)).toBe(true);
  });

  it("foresees a change in 24 h against the file's own rows, and judges it when all are there", async () => {
    const { bench, ada, water } = benchWithAnalyst();
    water.limit(water.temperatureId, { kind: "constant", bounds: { greatestChange24h: 1 } });
    const at = (value: string, hour: string) => [
      "KELP-01",
      "temperature",
      value,
      "",
      `2026-03-01 ${hour}:00`,
    ];
    const before = await checked(
      bench,
      ada,
      "a.csv",
      writeCsv(HEADER, [at("24.0", "06"), at("24.6", "12"), at("25.2", "18")]),
    );
    expect(before.statusCounts).toMatchObject({ within: 2, out: 1 });
    await work(bench);
    bench.run(ada, discardImport, { importId: before.id });
    // The middle one comes last: what depends on it is judged again after the commit.
    await committed(
      bench,
      ada,
      "b.csv",
      writeCsv(HEADER, [at("24.0", "06"), at("25.2", "18"), at("24.6", "12")]),
    );
    expect(inForce(bench).map((row) => row.status)).toEqual(["within", "within", "out"]);
  });
});

describe("what is there already", () => {
  it("is not added by the same file again, which names the import and when it was committed", async () => {
    const { bench, ada } = benchWithAnalyst();
    const first = await committed(bench, ada, "long.csv", LONG);
    await expect(upload(bench, ada, "renamed.csv", LONG)).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringMatching(new RegExp(`2 Mar 2026, 09:00 as ${first.code}`)),
    });
    expect(inForce(bench)).toHaveLength(3);
  });

  it("is not taken a second time while the same file waits", async () => {
    const { bench, ada } = benchWithAnalyst();
    const first = await checked(bench, ada, "long.csv", LONG);
    await expect(upload(bench, ada, "long.csv", LONG)).rejects.toMatchObject({
      code: "conflict",
      message: expect.stringContaining(first.code),
    });
  });

  it("is a duplicate in another file, also when it was typed by hand", async () => {
    const { bench, ada, water } = benchWithAnalyst();
    const typed = water.reading(water.temperatureId, "12.4", Date.UTC(2026, 2, 1, 9));
    bench.run(ada, recordReadings, { readings: [typed] });
    const done = await committed(bench, ada, "long.csv", LONG);
    expect(done).toMatchObject({ acceptedCount: 2, duplicateCount: 1 });
    const again = await checked(bench, ada, "other.csv", `${LONG}\r\n\r\n`);
    expect(again).toMatchObject({ acceptedCount: 0, duplicateCount: 3 });
    expect(rows(bench, ada, again.id, "duplicate")[1]?.problems[0]?.reason).toContain(done.code);
    expect(() => bench.run(ada, startCommit, { importId: again.id })).toThrow(/nothing to commit/);
    expect(inForce(bench)).toHaveLength(3);
  });

  it("is a duplicate the second time inside one file; another value or moment is not", async () => {
    const { bench, ada } = benchWithAnalyst();
    const at = (value: string, unit: string, when: string) => ["KELP-01", "temperature", value, unit, when];
    const file = writeCsv(HEADER, [
      at("18", "°C", "2026-03-01 09:00"),
      at("64.4", "°F", "2026-03-01 09:00"),
      at("18.1", "°C", "2026-03-01 09:00"),
      at("<18", "°C", "2026-03-01 09:00"),
      at("18", "°C", "2026-03-01 09:01"),
    ]);
    const found = await checked(bench, ada, "twice.csv", file);
    expect(rows(bench, ada, found.id).map((row) => row.outcome)).toEqual([
      "accepted",
      "duplicate",
      "accepted",
      "accepted",
      "accepted",
    ]);
    expect(rows(bench, ada, found.id, "duplicate")[0]?.problems[0]?.reason).toContain("line 2");
  });

  it("stays out when somebody else stores it between check and commit", async () => {
    const { bench, ada, water } = benchWithAnalyst();
    const { id } = await checked(bench, ada, "long.csv", LONG);
    bench.run(ada, recordReadings, {
      readings: [water.reading(water.temperatureId, "12.4", Date.UTC(2026, 2, 1, 9))],
    });
    bench.run(ada, startCommit, { importId: id });
    await work(bench);
    expect(detail(bench, ada, id)).toMatchObject({ state: "committed", acceptedCount: 2, duplicateCount: 1 });
    expect(inForce(bench)).toHaveLength(3);
  });
});

describe("a withdrawn import", () => {
  it("leaves no reading in force, says why, and lets the same file be imported again", async () => {
    const { bench, ada } = benchWithAnalyst();
    const done = await committed(bench, ada, "long.csv", LONG);
    bench.run(ada, withdrawImport, { importId: done.id, reason: "The probe was off." });
    await work(bench);
    expect(inForce(bench)).toEqual([]);
    expect(detail(bench, ada, done.id)).toMatchObject({
      state: "withdrawn",
      withdrawnReason: "The probe was off.",
      withdrawnByName: "Ada Finch",
    });
    const kept = bench.db.reader.sqlite.prepare("select count(*) as n from measurements_reading").get();
    expect(kept).toEqual({ n: 3 });
    expect(await committed(bench, ada, "long.csv", LONG)).toMatchObject({
      state: "committed",
      acceptedCount: 3,
    });
    expect(inForce(bench)).toHaveLength(3);
  });

  it("needs a reason, a role that may withdraw, and something committed", async () => {
    const { bench, ada } = benchWithAnalyst();
    const olu = bench.person("Olu Penrose", ["operator"]);
    const done = await committed(bench, ada, "long.csv", LONG);
    expect(() => bench.run(ada, withdrawImport, { importId: done.id, reason: " " })).toThrow();
    expect(() => bench.run(olu, withdrawImport, { importId: done.id, reason: "No good." })).toThrow(
      /does not allow/,
    );
    expect(inForce(bench)).toHaveLength(3);
    expect(() => bench.run(ada, discardImport, { importId: done.id })).toThrow(/withdrawn/);
    bench.run(ada, withdrawImport, { importId: done.id, reason: "The probe was off." });
    expect(() => bench.run(ada, withdrawImport, { importId: done.id, reason: "Once more." })).toThrow(
      /withdrawn/,
    );
  });
});

describe("who may import", () => {
  it("is refused before a byte is read, where the role does not allow it", async () => {
    const { bench } = benchWithAnalyst();
    for (const role of ["aquarist", "veterinarian", "auditor", "admin", "reader"] as const) {
      const person = bench.person(`Somebody ${role}`, [role]);
      await expect(upload(bench, person, "long.csv", LONG)).rejects.toMatchObject({ code: "not-allowed" });
    }
  });

  it("keeps an operator to the own areas, row by row", async () => {
    const { bench, water } = benchWithAnalyst();
    waterFor(bench, "REEF");
    const olu = bench.person("Olu Penrose", ["operator"], [water.areaId]);
    const file = writeCsv(HEADER, [
      ["KELP-01", "temperature", "12", "", "2026-03-01 09:00"],
      ["REEF-01", "temperature", "24", "", "2026-03-01 09:00"],
    ]);
    const found = await checked(bench, olu, "two.csv", file);
    expect(found).toMatchObject({ acceptedCount: 1, refusedCount: 1 });
    expect(rows(bench, olu, found.id, "refused")[0]?.problems[0]).toMatchObject({
      code: "other-area",
      columnName: "System",
      text: "REEF-01",
    });
    bench.run(olu, startCommit, { importId: found.id });
    await work(bench);
    expect(inForce(bench)).toHaveLength(1);
  });

  it("stops a commit whose person has been suspended, and nothing of it is visible", async () => {
    const { bench, ada } = benchWithAnalyst();
    const { id } = await checked(bench, ada, "long.csv", LONG);
    const olu = bench.person("Olu Penrose", ["lead"]);
    bench.run(ada, startCommit, { importId: id });
    const ends = bench.person("Noor Hale", ["admin"]);
    bench.run(ends, suspendPerson, { personId: ada.personId ?? 0, reason: "Has left." });
    await work(bench);
    expect(detail(bench, olu, id)).toMatchObject({
      state: "failed",
      problem: expect.stringContaining("may not import"),
    });
    expect(inForce(bench)).toEqual([]);
  });
});

it("counts imports within a year", async () => {
  const { bench, ada } = benchWithAnalyst();
  const codes = [];
  for (const value of ["1", "2"]) {
    const file = writeCsv(HEADER, [["KELP-01", "temperature", value, "", "2026-03-01 09:00"]]);
    codes.push((await upload(bench, ada, "one.csv", file)).code);
  }
  bench.clock.set(NOON + 366 * 86_400_000);
  const file = writeCsv(HEADER, [["KELP-01", "temperature", "3", "", "2026-03-01 09:00"]]);
  codes.push((await upload(bench, ada, "one.csv", file)).code);
  expect(codes).toEqual(["I26-0001", "I26-0002", "I27-0001"]);
});
