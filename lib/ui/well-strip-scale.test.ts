// The layout of the strip is our own design (rules 1 to 4 in the file); expected shares are worked out by hand here.
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { wellStripScale } from "./well-strip-scale";

describe("the scale of a well strip", () => {
  it("puts a two-sided band on the middle 40 % of the tube, whatever the numbers", () => {
    // 12 to 14 is 2 wide, margin 1.5: the tube runs from 10.5 to 15.5
    const scale = wellStripScale({ value: 13, toleranceLow: 12, toleranceHigh: 14, target: 13 });
    expect(scale).toMatchObject({ min: 10.5, max: 15.5, value: 0.5, target: 0.5, beyond: null });
    expect(scale?.band?.from).toBeCloseTo(0.3, 12);
    expect(scale?.band?.to).toBeCloseTo(0.7, 12);
    expect(scale?.band).toMatchObject({ hardFrom: true, hardTo: true });
  });

  it("draws shoulders between watch and tolerance limits only", () => {
    const scale = wellStripScale({
      toleranceLow: 7.8,
      toleranceHigh: 8.4,
      watchLow: 7.9,
      watchHigh: 8.3,
      decimals: 2,
    });
    // tube 7.35 to 8.85, 1.5 wide
    expect(scale?.shoulders).toHaveLength(2);
    expect(scale?.shoulders[0]?.to).toBeCloseTo((7.9 - 7.35) / 1.5, 9);
    expect(scale?.shoulders[1]?.from).toBeCloseTo((8.3 - 7.35) / 1.5, 9);
    expect(wellStripScale({ toleranceLow: 1, toleranceHigh: 2 })?.shoulders).toEqual([]);
  });

  it("says on which side a value lies beyond the tube, and keeps it in the cap", () => {
    const limits = { toleranceLow: 7.8, toleranceHigh: 8.4, decimals: 2 };
    expect(wellStripScale({ ...limits, value: 81.2 })).toMatchObject({ beyond: "high", value: 1 });
    expect(wellStripScale({ ...limits, value: 0.8 })).toMatchObject({ beyond: "low", value: 0 });
  });

  it("leaves the side without a limit open and starts at what is possible", () => {
    const scale = wellStripScale({ toleranceHigh: 0.1, possibleLow: 0, value: 0.02, decimals: 2 });
    expect(scale?.min).toBe(0);
    expect(scale?.band).toMatchObject({ from: 0, hardFrom: false, hardTo: true });
    expect(scale?.band?.to).toBeCloseTo(0.65, 9);
  });

  it("leaves the upper side open for a lower limit alone", () => {
    const scale = wellStripScale({ toleranceLow: 6.5, watchLow: 7, value: 8, possibleLow: 0 });
    expect(scale?.band).toMatchObject({ to: 1, hardFrom: true, hardTo: false });
    expect(scale?.band?.from).toBeCloseTo(0.35, 9);
  });

  it("never shows what cannot be", () => {
    const scale = wellStripScale({ toleranceLow: 0.05, toleranceHigh: 0.5, possibleLow: 0, decimals: 2 });
    expect(scale?.min).toBe(0);
  });

  it("works for limits that meet, for no limits, and for nothing at all", () => {
    expect(wellStripScale({ toleranceLow: 5, toleranceHigh: 5, value: 5 })?.value).toBeCloseTo(0.5, 9);
    const free = wellStripScale({ value: 318, previous: 322, decimals: 0 });
    expect(free?.band).toBeNull();
    expect(free?.beyond).toBeNull();
    expect(wellStripScale({})).toBeNull();
  });

  it("refuses limits the wrong way round and numbers that are none", () => {
    expect(() => wellStripScale({ toleranceLow: 9, toleranceHigh: 8 })).toThrow(RangeError);
    expect(() => wellStripScale({ value: Number.NaN })).toThrow(RangeError);
    expect(() => wellStripScale({ toleranceHigh: Number.POSITIVE_INFINITY })).toThrow(RangeError);
  });

  it("keeps every share inside the tube and the marks few and rising", () => {
    const number = fc.double({ min: -1e4, max: 1e4, noNaN: true });
    fc.assert(
      fc.property(number, number, number, fc.integer({ min: 0, max: 4 }), (a, b, value, decimals) => {
        const scale = wellStripScale({
          toleranceLow: Math.min(a, b),
          toleranceHigh: Math.max(a, b),
          value,
          decimals,
        });
        if (scale === null) throw new Error("limits are known");
        expect(scale.max).toBeGreaterThan(scale.min);
        for (const share of [scale.value, scale.band?.from, scale.band?.to]) {
          expect(share).toBeGreaterThanOrEqual(0);
          expect(share).toBeLessThanOrEqual(1);
        }
        expect(scale.ticks.length).toBeGreaterThanOrEqual(4);
        expect(scale.ticks.length).toBeLessThanOrEqual(16);
        // order on the strip is the order of the numbers
        if (value > Math.max(a, b)) expect(scale.value ?? 0).toBeGreaterThanOrEqual(scale.band?.to ?? 1);
        if (value < Math.min(a, b)) expect(scale.value ?? 1).toBeLessThanOrEqual(scale.band?.from ?? 0);
      }),
    );
  });
});
