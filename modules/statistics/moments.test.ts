import fc from "fast-check";
import { median as libraryMedian } from "simple-statistics";
import { describe, expect, it } from "vitest";
import { lagOneAutocorrelation, mean, standardDeviation, sum, variance } from "./moments";
import { median, quantile } from "./quantiles";
import { algorithmA, medianAbsoluteDeviation } from "./robust";

const values = fc.array(fc.double({ min: -1000, max: 1000, noNaN: true }), { minLength: 3, maxLength: 50 });

describe("moments", () => {
  it("whole numbers add up exactly, as big integers do", () => {
    fc.assert(
      fc.property(fc.array(fc.maxSafeInteger(), { maxLength: 40 }), (numbers) => {
        const exact = numbers.reduce((total, value) => total + BigInt(value), 0n);
        expect(Math.abs(sum(numbers) - Number(exact))).toBeLessThanOrEqual(
          Math.abs(Number(exact)) * 2 ** -52,
        );
      }),
    );
  });

  it("a large constant added to every value leaves the spread as it is", () => {
    const small = [1, 2, 4, 8, 16];
    const large = small.map((value) => value + 1e9);
    expect(variance(large)).toBe(variance(small));
    expect(lagOneAutocorrelation(large)).toBeCloseTo(lagOneAutocorrelation(small), 14);
  });

  it("a factor scales mean and spread, and leaves the autocorrelation as it is", () => {
    fc.assert(
      fc.property(values, fc.integer({ min: 1, max: 50 }), (series, factor) => {
        const scaled = series.map((value) => value * factor);
        expect(mean(scaled)).toBeCloseTo(factor * mean(series), 6);
        expect(standardDeviation(scaled)).toBeCloseTo(factor * standardDeviation(series), 6);
      }),
    );
  });

  it("the autocorrelation lies between -1 and 1", () => {
    fc.assert(
      fc.property(values, (series) => {
        fc.pre(standardDeviation(series) > 1e-6);
        expect(Math.abs(lagOneAutocorrelation(series))).toBeLessThanOrEqual(1);
      }),
    );
  });

  it("too few values, missing numbers and a series without spread are refused", () => {
    expect(() => mean([])).toThrow(/at least 1/);
    expect(() => variance([1])).toThrow(/at least 2/);
    expect(() => mean([1, Number.POSITIVE_INFINITY])).toThrow(/entry 1/);
    expect(() => lagOneAutocorrelation([5, 5, 5])).toThrow(/undefined/);
  });
});

describe("quantiles and robust estimates", () => {
  it("the median agrees with an independent library and is the quantile at one half", () => {
    fc.assert(
      fc.property(values, (series) => {
        expect(median(series)).toBeCloseTo(libraryMedian(series), 12);
        expect(quantile(series, 0.5)).toBeCloseTo(median(series), 9);
        expect(quantile(series, 0.5, 6)).toBeCloseTo(median(series), 9);
      }),
    );
  });

  it("quantiles of types 6 and 7 agree with NumPy's weibull and linear", () => {
    const series = [3, 1, 4, 1, 5, 9, 2, 6];
    expect(quantile(series, 0.33, 6)).toBeCloseTo(1.9700000000000002, 12);
    expect(quantile(series, 0.33, 7)).toBeCloseTo(2.31, 12);
  });

  it("quantiles rise with their share and end at the extremes", () => {
    fc.assert(
      fc.property(values, fc.double({ min: 0, max: 1, noNaN: true }), (series, p) => {
        expect(quantile(series, p)).toBeGreaterThanOrEqual(quantile(series, p / 2) - 1e-9);
        expect(quantile(series, 0)).toBeCloseTo(Math.min(...series), 12);
        expect(quantile(series, 1)).toBeCloseTo(Math.max(...series), 12);
      }),
    );
    expect(() => quantile([1], 1.5)).toThrow(RangeError);
  });

  it("one wild value hardly moves the robust mean", () => {
    const calm = [8.1, 8.2, 8.15, 8.12, 8.18, 8.14, 8.16];
    const wild = algorithmA({ values: [...calm, 80] });
    expect(Math.abs(wild.mean - mean(calm))).toBeLessThan(0.03);
    expect(medianAbsoluteDeviation([...calm, 80])).toBeLessThan(0.05);
  });

  it("the input is left in its order", () => {
    const series = [3, 1, 2];
    median(series);
    algorithmA({ values: series });
    expect(series).toEqual([3, 1, 2]);
  });

  it("values that are mostly equal give the median with a spread of zero", () => {
    expect(algorithmA({ values: [5, 5, 5, 9] })).toMatchObject({ mean: 5, sd: 0, iterations: 0 });
  });
});
