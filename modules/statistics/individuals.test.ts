import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { individualsLimits, movingRanges } from "./individuals";

const readings = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 2, maxLength: 60 });

describe("individuals limits", () => {
  it("a shift of every reading shifts the limits and leaves sigma as it is", () => {
    fc.assert(
      fc.property(readings, fc.integer({ min: -1000, max: 1000 }), (values, shift) => {
        const before = individualsLimits({ values });
        const after = individualsLimits({ values: values.map((value) => value + shift) });
        expect(after.sigma).toBeCloseTo(before.sigma, 5);
        expect(after.upper - before.upper).toBeCloseTo(shift, 5);
      }),
    );
  });

  it("the order backwards gives the same limits", () => {
    fc.assert(
      fc.property(readings, (values) => {
        const forward = individualsLimits({ values });
        const backward = individualsLimits({ values: values.toReversed() });
        expect(backward.mrBar).toBeCloseTo(forward.mrBar, 6);
        expect(backward.centre).toBeCloseTo(forward.centre, 6);
      }),
    );
  });

  it("typed arrays and ordinary arrays give the same limits", () => {
    const values = [8.1, 8.2, 8.05, 8.15];
    expect(individualsLimits({ values: Float64Array.from(values) })).toEqual(individualsLimits({ values }));
  });

  it("a left-out reading joins its neighbours", () => {
    expect(Array.from(movingRanges([1, 4, 2]))).toEqual([3, 2]);
    expect(Array.from(movingRanges([1, 2]))).toEqual([1]);
  });

  it("one wild jump moves the mean moving range, not the median one", () => {
    const values = [1, 2, 1, 2, 1, 2, 1, 50, 1, 2, 1, 2];
    expect(individualsLimits({ values }).sigma).toBeGreaterThan(5);
    expect(individualsLimits({ values, spread: "median" }).sigma).toBeCloseTo(1 / 0.9538725524, 9);
  });

  it("a single reading, a reading that is not a number and a width of zero are refused with a reason", () => {
    expect(() => individualsLimits({ values: [8.1] })).toThrow(/at least 2 values/);
    expect(() => individualsLimits({ values: [8.1, Number.NaN] })).toThrow(/entry 1 is not a finite number/);
    expect(() => individualsLimits({ values: [8.1, 8.2], width: 0 })).toThrow(RangeError);
  });
});
