import { randomUUID } from "node:crypto";
import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import {
  correctReading,
  getSeriesFrame,
  listSeriesFileSlice,
  listSeriesSlice,
  recordReadings,
  summariseSeries,
} from "@/modules/measurements";
import { NOON, testBench } from "../../support/database";
import { waterFor } from "../../support/water";

function begin() {
  const bench = testBench(NOON);
  const water = waterFor(bench);
  const reef = waterFor(bench, "REEF");
  const ada = bench.person("Ada Finch", ["aquarist"], [water.areaId]);
  const series = { pointId: water.pointId, parameterId: water.temperatureId };
  water.limit(water.temperatureId, { kind: "constant", bounds: { toleranceLow: 12, toleranceHigh: 16 } });
  const take = (typedText: string, hoursAgo: number, more: Record<string, unknown> = {}) =>
    bench.run(ada, recordReadings, {
      readings: [water.reading(water.temperatureId, typedText, NOON - hoursAgo * HOUR_MS, more)],
    }).readings[0]?.readingId ?? 0;
  return { bench, water, reef, ada, series, take };
}

describe("a series by slices", () => {
  it("comes in the order of time, and goes on exactly after the reading that is named", () => {
    const { bench, ada, series, take } = begin();
    take("14.0", 1);
    const first = take("13.0", 48);
    take("17", 24);
    const whole = bench.ask(ada, listSeriesSlice, series);
    expect(whole).toMatchObject({ values: [13, 17, 14], statuses: ["within", "out", "within"], next: null });
    expect(whole.more).toEqual({ 1: { side: "high" } });
    const rest = bench.ask(ada, listSeriesSlice, { ...series, afterAt: whole.at[0], afterId: first });
    expect(rest.values).toEqual([17, 14]);
  });

  it("marks a corrected reading and holds the corrected value alone", () => {
    const { bench, ada, series, take } = begin();
    const readingId = take("31.0", 1);
    bench.run(ada, correctReading, {
      uuid: randomUUID(),
      readingId,
      typedText: "13.0",
      reason: "digits swapped",
    });
    const slice = bench.ask(ada, listSeriesSlice, series);
    expect(slice.values).toEqual([13]);
    expect(slice.more[0]).toMatchObject({ isCorrected: true });
  });

  it("is not there for somebody of another area", () => {
    const { bench, ada, reef } = begin();
    const elsewhere = { pointId: reef.pointId, parameterId: reef.temperatureId };
    const questions = [
      () => bench.ask(ada, listSeriesSlice, elsewhere),
      () => bench.ask(ada, listSeriesFileSlice, elsewhere),
      () => bench.ask(ada, getSeriesFrame, elsewhere),
    ];
    for (const question of questions) {
      expect(question).toThrowError(expect.objectContaining({ code: "not-found" }));
    }
  });

  it("has the course of its limits around it, from its first reading on", () => {
    const { bench, ada, series, take } = begin();
    take("13.0", 72);
    const frame = bench.ask(ada, getSeriesFrame, series);
    expect(frame).toMatchObject({ firstAt: NOON - 3 * DAY_MS, fromAt: NOON - 3 * DAY_MS, toAt: NOON });
    expect(frame.course).toEqual([
      expect.objectContaining({ state: "in-force", start: { toleranceLow: 12, toleranceHigh: 16 } }),
    ]);
  });
});

describe("a series as a file", () => {
  it("keeps numbers as numbers, names the unit, gives both times, and makes a formula harmless", () => {
    const { bench, ada, series, take } = begin();
    take("<13.5", 2, { note: '=HYPERLINK("x")' });
    const { text } = bench.ask(ada, listSeriesFileSlice, series);
    const { data } = Papa.parse<Record<string, string>>(text.replace(/^\uFEFF/, "").trimEnd(), {
      header: true,
    });
    expect(data).toHaveLength(1);
    expect(data[0]).toMatchObject({
      system: "KELP-01",
      "taken at (Europe/London)": "2026-03-02 07:00:00+00:00",
      "taken at (UTC)": "2026-03-02T07:00:00.000Z",
      qualifier: "<",
      "value (°C)": "13.5",
      "taken by": "Ada Finch",
      note: `'=HYPERLINK("x")`,
    });
  });

  it("brings its head once, with the first slice", () => {
    const { bench, ada, series, take } = begin();
    const afterId = take("13.0", 3);
    take("13.1", 2);
    const next = { ...series, afterAt: NOON - 3 * HOUR_MS, afterId };
    expect(bench.ask(ada, listSeriesFileSlice, next).text).toMatch(/^KELP-01,.*13\.1/);
  });
});

describe("how series did", () => {
  it("weighs by time, counts what was out, and shows nobody another area", () => {
    const { bench, water, reef, ada, take } = begin();
    take("13.0", 24);
    take("17.0", 6);
    expect(bench.ask(ada, summariseSeries, {})).toEqual([
      { pointId: water.pointId, parameterId: water.temperatureId, within: 18 / 24, out: 1, readings: 2 },
    ]);
    const other = bench.person("Bo Reed", ["aquarist"], [reef.areaId]);
    expect(bench.ask(other, summariseSeries, {})).toEqual([]);
  });
});
