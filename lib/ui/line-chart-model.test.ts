import { describe, expect, it } from "vitest";
import {
  type ChartPoint,
  chartText,
  isTelling,
  pointText,
  spread,
  timeRange,
  valueRange,
} from "./line-chart-model";

const words = { title: "pH, surface", unit: "", decimals: 2, zone: "UTC" };
const day = (n: number) => Date.UTC(2026, 6, n, 9);
const points: ChartPoint[] = [
  { at: day(1), value: 8.1, status: "within" },
  { at: day(2), value: 7.7, status: "out", direction: "low" },
  { at: day(3), value: 81.2, status: "implausible" },
];

describe("what a chart holds", () => {
  it("gives an implausible value no say in the height", () => {
    const [low, high] = valueRange({ points });
    expect(low).toBeLessThan(7.7);
    expect(high).toBeLessThan(9);
  });
  it("makes room for limits and control lines beyond the points", () => {
    const [low, high] = valueRange({
      points: [],
      band: [{ from: 0, to: 1, low: 7.8, high: 8.4, highAtEnd: 8.6 }],
      control: [{ from: 0, to: 1, lower: 7.5 }],
    });
    expect(low).toBeLessThan(7.5);
    expect(high).toBeGreaterThan(8.6);
  });
  it("has a height and a width even for one point or none", () => {
    for (const few of [[], points.slice(0, 1)]) {
      const [low, high] = valueRange({ points: few });
      const [from, to] = timeRange({ points: few });
      expect(high).toBeGreaterThan(low);
      expect(to).toBeGreaterThan(from);
    }
  });
  it("must draw every point that is off, corrected or part of a rule", () => {
    expect(points.map(isTelling)).toEqual([false, true, true]);
    expect(isTelling({ at: 0, value: 1, kind: "corrected" })).toBe(true);
    expect(isTelling({ at: 0, value: 1, status: "within", flag: "six falling" })).toBe(true);
  });
});

describe("a chart in words", () => {
  it("says how many, from when to when, the extremes, and what is off", () => {
    expect(chartText({ points }, words)).toBe(
      "pH, surface: 3 points from 1 Jul 2026 to 3 Jul 2026, lowest 7.70, highest 81.20. 1 out of tolerance, 1 implausible.",
    );
    expect(chartText({ points: [] }, words)).toBe("pH, surface: no points in this stretch of time.");
  });
  it("names a point by its moment, value and status", () => {
    expect(pointText(points[1] as ChartPoint, { ...words, unit: "mg/L" })).toBe(
      "2 Jul 2026, 09:00: 7.70 mg/L, out of tolerance",
    );
  });
});

describe("labels beside a chart", () => {
  it("do not touch, and keep their order and their places in the list", () => {
    expect(spread([10, 12, 40], 14)).toEqual([10, 24, 40]);
    expect(spread([40, 12, 10], 14)).toEqual([40, 24, 10]);
    expect(spread([], 14)).toEqual([]);
  });
});
