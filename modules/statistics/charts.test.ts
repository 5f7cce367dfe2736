import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { correctedIndividualsLimits, meanVarianceInflation } from "./autocorrelation";
import { capability, cpInterval } from "./capability";
import { chartConstants } from "./chart-constants";
import { cusumChart } from "./cusum";
import { ewmaChart } from "./ewma";
import { leveyJenningsLimits } from "./levey-jennings";
import { autocorrelatedRunLength, cusumRunLength, ewmaRunLength, shewhartRunLength } from "./run-length";
import { meanAndDeviationLimits, meanAndRangeLimits, pointsBeyond } from "./subgroups";

const values = fc.array(fc.double({ min: -50, max: 50, noNaN: true }), { minLength: 1, maxLength: 40 });

describe("EWMA and CUSUM charts", () => {
  it("an EWMA with lambda 1 is the values themselves with limits at 3 sigma", () => {
    fc.assert(
      fc.property(values, (series) => {
        const chart = ewmaChart({ values: series, lambda: 1, centre: 0, sigma: 2 });
        expect(chart.statistic.every((value, i) => value === series[i])).toBe(true);
        expect(chart.upper[0]).toBe(6);
      }),
    );
  });

  it("exact EWMA limits widen from lambda sigma width to the asymptotic ones and never beyond", () => {
    const series = new Float64Array(200);
    const exact = ewmaChart({ values: series, lambda: 0.2, centre: 0, sigma: 1 });
    const final = ewmaChart({ values: series, lambda: 0.2, centre: 0, sigma: 1, limits: "asymptotic" });
    expect(exact.upper[0]).toBeCloseTo(0.6, 12);
    expect(exact.upper[199]).toBeCloseTo(final.upper[0]!, 12);
    exact.upper.forEach((limit, i) => i > 0 && expect(limit).toBeGreaterThanOrEqual(exact.upper[i - 1]!));
  });

  it("a series turned over gives the CUSUM turned over", () => {
    fc.assert(
      fc.property(values, (series) => {
        const given = { target: 0, slack: 0.5, decision: 4 };
        const chart = cusumChart({ values: series, ...given });
        const turned = cusumChart({ values: series.map((value) => -value), ...given });
        expect(turned.signalsLow).toEqual(chart.signalsHigh);
        expect(Array.from(turned.low)).toEqual(Array.from(chart.high));
      }),
    );
  });

  it("a head start signals no later, and restarting begins again at the head start", () => {
    const series = [1.5, 1.5, 1.5, 1.5, 1.5, 1.5, 1.5, 1.5];
    const given = { values: series, target: 0, slack: 0.5, decision: 3 };
    expect(cusumChart(given).signalsHigh[0]).toBe(3);
    expect(cusumChart({ ...given, headStart: 1.5 }).signalsHigh[0]).toBe(1);
    const again = cusumChart({ ...given, headStart: 1.5, afterSignal: "restart" });
    expect(again.signalsHigh).toEqual([1, 3, 5, 7]);
  });

  it("settings outside their range are refused", () => {
    const series = [1, 2];
    expect(() => ewmaChart({ values: series, lambda: 0, centre: 0, sigma: 1 })).toThrow(/lambda/);
    expect(() => ewmaChart({ values: series, lambda: 0.2, centre: 0, sigma: 0 })).toThrow(/sigma/);
    expect(() => cusumChart({ values: series, target: 0, slack: -1, decision: 4 })).toThrow(/slack/);
    expect(() => cusumChart({ values: series, target: 0, slack: 1, decision: 4, headStart: 5 })).toThrow(
      /headStart/,
    );
    expect(() => leveyJenningsLimits({ mean: 1, sd: 0 })).toThrow(RangeError);
  });
});

describe("subgroups", () => {
  it("factors exist for 2 to 25 only and lower factors are never negative", () => {
    for (let n = 2; n <= 25; n++) {
      const { B3, B5, D1, D3 } = chartConstants(n);
      expect(Math.min(B3, B5, D1, D3)).toBeGreaterThanOrEqual(0);
    }
    for (const n of [1, 26, 2.5]) expect(() => chartConstants(n)).toThrow(RangeError);
  });

  it("subgroups of two give the same sigma from ranges and from standard deviations", () => {
    const subgroups = [
      [1, 3],
      [2, 2.5],
      [0, 4],
    ];
    const byRange = meanAndRangeLimits({ subgroups });
    const bySd = meanAndDeviationLimits({ subgroups });
    expect(byRange.sigma).toBeCloseTo(bySd.sigma, 12);
    expect(byRange.means.upper).toBeCloseTo(bySd.means.upper, 12);
  });

  it("subgroups of different sizes are refused with the one that differs", () => {
    expect(() =>
      meanAndRangeLimits({
        subgroups: [
          [1, 2],
          [1, 2, 3],
        ],
      }),
    ).toThrow(/Subgroup 1 holds 3/);
    expect(() => meanAndRangeLimits({ subgroups: [[1, 2]] })).toThrow(/At least 2 subgroups/);
  });

  it("a point on a limit is inside, a hair beyond it is out", () => {
    expect(pointsBeyond({ values: [18.000000000000007, 18.001], lower: 0, upper: 18 })).toEqual([1]);
  });
});

describe("choosing a chart", () => {
  it("run lengths fall as the shift grows, whichever chart", () => {
    for (const length of [
      (shift: number) => shewhartRunLength({ width: 3, shift }),
      (shift: number) => cusumRunLength({ slack: 0.5, decision: 5, shift }),
      (shift: number) => ewmaRunLength({ lambda: 0.2, width: 2.962, shift }),
    ]) {
      const lengths = [0, 0.5, 1, 2, 3].map(length);
      expect(lengths).toEqual(lengths.toSorted((a, b) => b - a));
      expect(length(-1)).toBeCloseTo(length(1), 6);
    }
  });

  it("an EWMA with lambda 1 and an AR(1) process with phi 0 are the plain chart", () => {
    const plain = shewhartRunLength({ width: 3, shift: 0 });
    expect(ewmaRunLength({ lambda: 1, width: 3, shift: 0 })).toBeCloseTo(plain, 6);
    expect(autocorrelatedRunLength({ phi: 0, width: 3 })).toBeCloseTo(plain, 6);
  });

  it("settings outside their range are refused", () => {
    expect(() => shewhartRunLength({ width: 0, shift: 0 })).toThrow(RangeError);
    expect(() => ewmaRunLength({ lambda: 0.001, width: 3, shift: 0 })).toThrow(RangeError);
    expect(() => autocorrelatedRunLength({ phi: 0.99, width: 3 })).toThrow(RangeError);
    expect(() => cusumRunLength({ slack: 0.5, decision: 4, shift: 0, headStart: 9 })).toThrow(RangeError);
  });
});

describe("capability and autocorrelation", () => {
  it("one limit gives Cpk without Cp; no limit and limits the wrong way round are refused", () => {
    expect(capability({ mean: 8, sigma: 0.1, upper: 8.3 })).toMatchObject({ cp: null, cpLower: null });
    expect(() => capability({ mean: 8, sigma: 0.1 })).toThrow(/lower or an upper/);
    expect(() => capability({ mean: 8, sigma: 0.1, lower: 9, upper: 8 })).toThrow(RangeError);
    expect(() => cpInterval({ cp: 1, n: 1 })).toThrow(RangeError);
  });

  it("the interval of Cp closes in on it as values are added", () => {
    const few = cpInterval({ cp: 1.33, n: 10 });
    const many = cpInterval({ cp: 1.33, n: 10_000 });
    expect(few.lower).toBeLessThan(many.lower);
    expect(many.upper - many.lower).toBeLessThan(0.05);
  });

  it("readings that do not depend on one another keep their limits and earn no warning", () => {
    const series = [8.1, 8.12, 8.2, 8.05, 8.08, 8.15, 8.2, 8.1];
    const limits = correctedIndividualsLimits({ values: series });
    expect(limits).toMatchObject({ corrected: false, warning: null });
    expect(limits.sigma).toBe(limits.uncorrectedSigma);
    const always = correctedIndividualsLimits({ values: series, correct: "always" });
    expect(always.sigma).toBeCloseTo(limits.uncorrectedSigma / Math.sqrt(1 - limits.r1), 12);
  });

  it("a smooth drift resembles itself too much to give limits", () => {
    const drift = Float64Array.from({ length: 400 }, (_, i) => i + (i % 2) * 0.01);
    expect(() => correctedIndividualsLimits({ values: drift })).toThrow(/thin them out/);
    expect(() => meanVarianceInflation(1)).toThrow(RangeError);
  });
});
