import { describe, expect, it } from "vitest";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import { correctReading, planWatch, recordReadings, voidReading } from "@/modules/measurements";
import { getDaySheet, listDaySheets, reviewDays } from "@/modules/rounds";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

function begin() {
  const bench = testBench(NOON - 3 * DAY_MS);
  const water = waterFor(bench);
  const ines = bench.person("Ines Marlow", ["lead"]);
  bench.run(ines, planWatch, {
    pointId: water.pointId,
    items: [{ parameterId: water.temperatureId, everyDays: 1 }],
  });
  bench.clock.set(NOON + DAY_MS + HOUR_MS);
  const joe = bench.person("Joe Okafor", ["aquarist"], [water.areaId]);
  const read = (text: string, at: number) =>
    bench.run(joe, recordReadings, { readings: [water.reading(water.temperatureId, text, at)] }).readings[0]
      ?.readingId ?? 0;
  const list = (days: string, who = ines) => bench.ask(who, listDaySheets, { days });
  return { bench, water, ines, joe, read, list };
}

describe("day sheets in a list", () => {
  it("are the same sheets, hash for hash, as each one asked for alone", () => {
    const { bench, water, ines, read, list } = begin();
    read("13.4", NOON);
    read("13.6", NOON + DAY_MS);
    const rows = list("2026-03-03,2026-03-02,2026-03-01");
    expect(rows.map((row) => [row.onDay, row.counts.readings, row.counts.gaps])).toEqual([
      ["2026-03-03", 1, 0],
      ["2026-03-02", 1, 0],
      ["2026-03-01", 0, 1],
    ]);
    for (const row of rows) {
      const alone = bench.ask(ines, getDaySheet, { areaId: water.areaId, onDay: row.onDay });
      expect(row.contentHash).toBe(alone.sheet.contentHash);
      expect(row.counts).toEqual(alone.counts);
    }
  });

  it("know the order of the round, whatever the order in which the lines are signed", () => {
    const { bench, water, ines, joe } = begin();
    bench.run(ines, planWatch, {
      pointId: water.pointId,
      items: [
        { parameterId: water.temperatureId, everyDays: 1 },
        { parameterId: water.ammoniaId, everyDays: 1 },
      ],
    });
    bench.run(joe, recordReadings, {
      readings: [
        water.reading(water.ammoniaId, "0.02", NOON),
        water.reading(water.temperatureId, "13.4", NOON),
      ],
    });
    const shown = () => {
      const { sheet, places } = bench.ask(ines, getDaySheet, { areaId: water.areaId, onDay: "2026-03-02" });
      const walked = sheet.lines.toSorted((a, b) => (places[a.readingId] ?? 9) - (places[b.readingId] ?? 9));
      return { hash: sheet.contentHash, order: walked.map((line) => line.parameterId) };
    };
    const before = shown();
    expect(before.order).toEqual([water.temperatureId, water.ammoniaId]);
    bench.run(ines, planWatch, {
      pointId: water.pointId,
      items: [
        { parameterId: water.ammoniaId, everyDays: 1 },
        { parameterId: water.temperatureId, everyDays: 1 },
      ],
    });
    // A new plan shows the lines in a new order and breaks no signature.
    expect(shown()).toEqual({ hash: before.hash, order: [water.ammoniaId, water.temperatureId] });
  });

  it("say which day is over, and which was reviewed", () => {
    const { bench, ines, read, list } = begin();
    read("13.4", NOON);
    const [, before] = list("2026-03-03,2026-03-02");
    expect(before).toMatchObject({ isOver: true, state: "waiting" });
    expect(list("2026-03-03")[0]?.isOver).toBe(false);
    const { areaId = 0, onDay = "", contentHash = "" } = before ?? {};
    bench.run(ines, reviewDays, {
      outcome: "reviewed",
      comment: "",
      sheets: [{ areaId, onDay, contentHash }],
    });
    expect(list("2026-03-02")[0]).toMatchObject({ state: "reviewed", reviewedBy: ines.personId });
  });

  it("are signed many in one act, or none of them where one has changed", () => {
    const { bench, ines, read, list } = begin();
    read("13.4", NOON);
    read("13.6", NOON + DAY_MS);
    const sheets = list("2026-03-03,2026-03-02").map(({ areaId, onDay, contentHash }) => ({
      areaId,
      onDay,
      contentHash,
    }));
    read("13.5", NOON + HOUR_MS);
    const sign = (all: typeof sheets) =>
      bench.run(ines, reviewDays, { outcome: "reviewed", comment: "", sheets: all });
    expect(() => sign(sheets)).toThrow("has changed since you opened it");
    expect(list("2026-03-03,2026-03-02").map((row) => row.state)).toEqual(["waiting", "waiting"]);
    const fresh = list("2026-03-03,2026-03-02").map(({ areaId, onDay, contentHash }) => ({
      areaId,
      onDay,
      contentHash,
    }));
    expect(sign(fresh)).toEqual({ sheets: 2, outcome: "reviewed" });
  });

  it("lie near each other: days of different years are refused, and so is what is no day", () => {
    const { list } = begin();
    expect(() => list("2026-03-01,2025-03-01")).toThrow();
    expect(() => list("yesterday")).toThrow();
  });

  it("of areas that somebody is not bound to are left out", () => {
    const { bench, list } = begin();
    const reef = waterFor(bench, "REEF");
    const bo = bench.person("Bo Lind", ["aquarist"], [reef.areaId]);
    expect(list("2026-03-02", bo).map((row) => row.areaCode)).toEqual(["REEF"]);
  });
});

describe("one day sheet", () => {
  it("holds the old value of a correction and what was struck out, with why", () => {
    const { bench, water, ines, joe, read } = begin();
    const [first, second] = [read("13.4", NOON), read("99", NOON + HOUR_MS)];
    bench.run(joe, correctReading, {
      readingId: first,
      uuid: crypto.randomUUID(),
      typedText: "13.9",
      reason: "misread",
    });
    bench.run(joe, voidReading, { readingId: second, reason: "typed for the wrong tank" });
    const shown = bench.ask(ines, getDaySheet, { areaId: water.areaId, onDay: "2026-03-02" });
    expect(shown.sheet.lines).toMatchObject([
      { typedText: "13.9", supersedesId: first, correctionReason: "misread" },
    ]);
    expect(shown.oldValues[first]).toMatchObject({ typedText: "13.4" });
    expect(shown.struckOut).toMatchObject([{ typedText: "99", reason: "typed for the wrong tank" }]);
  });
});
