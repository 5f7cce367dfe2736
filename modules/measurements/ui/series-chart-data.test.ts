import { describe, expect, it } from "vitest";
import type { LimitStretch } from "../rules/limit-course";
import type { SeriesReading } from "../series-model";
import { chartBand, chartPoints, MOST_FLAGS, seriesControl, seriesMarks } from "./series-chart-data";

const DAY = 86_400_000;

const aReading = (more: Partial<SeriesReading> = {}): SeriesReading => ({
  id: 1,
  at: 0,
  value: 8.1,
  qualifier: "",
  status: "within",
  side: null,
  isCorrected: false,
  answer: null,
  typedText: "",
  takenBy: 1,
  methodId: null,
  instrumentId: null,
  note: null,
  ...more,
});
const NO_NAMES = { methods: new Map<number, string>(), instruments: new Map<number, string>() };

describe("the points of a chart", () => {
  it("leave out what has no number, and say what was corrected or only known as less than", () => {
    const readings = [
      aReading({ value: null, qualifier: "ND" }),
      aReading({ at: DAY, value: 0.05, qualifier: "<", isCorrected: true }),
    ];
    expect(chartPoints(readings, [])).toEqual([
      { at: DAY, value: 0.05, status: "within", kind: "less than this, corrected" },
    ]);
  });

  it("are flagged where they lie beyond control, unless so many do that the line would be hidden", () => {
    const readings = Array.from({ length: MOST_FLAGS + 1 }, (_, index) => aReading({ id: index, at: index }));
    const beyond = readings.map((_, index) => ({ index, side: "upper" as const }));
    expect(chartPoints(readings, beyond.slice(0, 1))[0]?.flag).toBe("beyond the upper control limit");
    expect(chartPoints(readings, beyond).some((point) => point.flag !== undefined)).toBe(false);
  });
});

describe("the band of a chart", () => {
  it("has no piece where limits were suspended", () => {
    const course: LimitStretch[] = [
      {
        state: "in-force",
        version: 1,
        fromAt: 0,
        toAt: DAY,
        start: { toleranceLow: 12, watchHigh: 15 },
        end: { toleranceLow: 13, watchHigh: 16 },
      },
      { state: "suspended", version: 2, fromAt: DAY, toAt: 2 * DAY, reason: "no animals" },
    ];
    expect(chartBand(course)).toEqual([
      expect.objectContaining({ from: 0, to: DAY, low: 12, lowAtEnd: 13, high: null, watchHighAtEnd: 16 }),
    ]);
  });
});

describe("the marks of a chart", () => {
  it("tell a change of instrument, not its first use, and a note", () => {
    const readings = [
      aReading({ at: 1, instrumentId: 4 }),
      aReading({ at: 2, instrumentId: 4, note: "probe cleaned" }),
      aReading({ at: 3, instrumentId: null }),
      aReading({ at: 4, instrumentId: 7 }),
    ];
    const names = { ...NO_NAMES, instruments: new Map([[7, "PH-02"]]) };
    const incident = { at: 0, label: "incident 26-0001" };
    expect(seriesMarks(readings, [], names, [incident]).marks).toEqual([
      incident,
      { at: 2, label: "probe cleaned" },
      { at: 4, label: "instrument PH-02" },
    ]);
  });

  it("give way to the line when there are too many, and are counted instead", () => {
    const readings = Array.from({ length: 60 }, (_, index) => aReading({ at: index, note: "seen" }));
    const found = seriesMarks(readings, [], NO_NAMES, [{ at: 5, label: "incident 26-0001" }]);
    expect(found).toEqual({ marks: [{ at: 5, label: "incident 26-0001" }], leftOut: ["60 notes"] });
  });
});

describe("control limits over a chart", () => {
  it("run from the beginning of the baseline to the last reading, and judge nothing before it", () => {
    const readings = Array.from({ length: 60 }, (_, index) =>
      aReading({
        id: index,
        at: index * DAY,
        value: index === 2 || index === 50 ? 99 : 8 + (index % 2) / 10,
      }),
    );
    const control = seriesControl(readings, 10 * DAY, 40 * DAY);
    expect(control.segments).toEqual([expect.objectContaining({ from: 10 * DAY, to: 59 * DAY })]);
    expect(control.beyond).toEqual([{ index: 50, side: "upper" }]);
  });

  it("are absent, with the reason, where the baseline is too short", () => {
    const control = seriesControl([aReading()], 0, DAY);
    expect(control).toMatchObject({ segments: [], beyond: [], baseline: { ok: false } });
  });
});
