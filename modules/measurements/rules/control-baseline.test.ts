import { describe, expect, it } from "vitest";
import { beyondControl, type ChartedReading, controlBaseline, isChartable } from "./control-baseline";

const DAY = 86_400_000;
const series = (values: readonly number[]): ChartedReading[] =>
  values.map((value, index) => ({ at: index * DAY, value, qualifier: "", status: "within" }));

/** 10, 12, 10, 12 …: every moving range is 2, the mean is 11. */
const zigzag = series(Array.from({ length: 40 }, (_, index) => (index % 2 === 0 ? 10 : 12)));

describe("the baseline of a control chart", () => {
  it("gives centre ± 2.66 times the mean moving range", () => {
    // ISO 7870-2: the factor 3 / d2 with d2 = 1.128 is 2.66
    const found = controlBaseline(zigzag, 0, 40 * DAY);
    if (!found.ok) throw new Error(found.sentence);
    expect(found.limits.centre).toBe(11);
    expect(found.limits.upper).toBeCloseTo(11 + 2.66 * 2, 2);
    expect(found.limits.lower).toBeCloseTo(11 - 2.66 * 2, 2);
  });

  it("refuses fewer than 20 readings, and says how many there are", () => {
    const found = controlBaseline(zigzag, 0, 18 * DAY);
    expect(found).toMatchObject({ ok: false, sentence: expect.stringContaining("holds 19 readings") });
    expect(controlBaseline(zigzag, 0, 19 * DAY).ok).toBe(true);
  });

  it("refuses a baseline in which nothing moves", () => {
    const found = controlBaseline(series(new Array(30).fill(5)), 0, 40 * DAY);
    expect(found).toMatchObject({ ok: false, sentence: expect.stringContaining("the same") });
  });

  it("leaves out what is only known as less than, and what cannot be true", () => {
    const odd: ChartedReading[] = [
      { at: 1, value: 900, qualifier: "", status: "implausible" },
      { at: 2, value: 0.05, qualifier: "<", status: "unjudged" },
      { at: 3, value: null, qualifier: "ND", status: "within" },
    ];
    expect(odd.filter(isChartable)).toEqual([]);
    const found = controlBaseline([...odd, ...zigzag.slice(5)], 0, 40 * DAY);
    expect(found).toMatchObject({ ok: true, limits: { n: 35 } });
  });

  it("warns where neighbours resemble each other, and where they swing", () => {
    const drift = series(Array.from({ length: 40 }, (_, index) => index + (index % 2)));
    const found = controlBaseline(drift, 0, 40 * DAY);
    expect(found).toMatchObject({ warning: expect.stringContaining("understate") });
    expect(controlBaseline(zigzag, 0, 40 * DAY)).toMatchObject({
      warning: expect.stringContaining("overstate"),
    });
    // by hand: r1 of 40 values in turn is −39/40, and √1.975 = 1.405
    expect(controlBaseline(zigzag, 0, 40 * DAY)).toMatchObject({
      warning: expect.stringContaining("41 % too far"),
    });
  });
});

describe("points beyond control", () => {
  it("are named with their side; a point on the line is not beyond it, an implausible one is not judged", () => {
    const limits = { centre: 10, sigma: 1, lower: 7, upper: 13, mrBar: 1.128, mrUpper: 3.7, n: 40 };
    const readings = series([10, 13, 13.1, 6.9, 7]);
    expect(beyondControl(readings, limits)).toEqual([
      { index: 2, side: "upper" },
      { index: 3, side: "lower" },
    ]);
    const implausible = readings.map((each) => ({ ...each, status: "implausible" as const }));
    expect(beyondControl(implausible, limits)).toEqual([]);
  });
});
