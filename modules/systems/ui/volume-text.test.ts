import { describe, expect, it } from "vitest";
import { plainVolume, shownVolume } from "./volume-text";

// Source: JCGM 100:2008, 7.2.6: an uncertainty is given with at most two significant digits, and the estimate is rounded to
// agree with it; figures by hand, the expanded uncertainty being twice the standard one.
describe("a volume on screen", () => {
  it.each([
    [1000, 5, "L", { value: 1000, expanded: 10, decimals: 0 }],
    [1000.44, 0.55, "L", { value: 1000.4, expanded: 1.1, decimals: 1 }],
    [303_185, 1937.5, "L", { value: 303_200, expanded: 3900, decimals: 0 }],
    [0, 0, "L", { value: 0, expanded: 0, decimals: 0 }],
    [310_432, 3050, "m³", { value: 310.4, expanded: 6.1, decimals: 1 }],
  ] as const)("%d L with a standard uncertainty of %d L in %s", (value, standardUncertainty, unit, shown) => {
    expect(shownVolume({ value, standardUncertainty }, unit)).toEqual(shown);
  });

  it("without an uncertainty shows four figures", () => {
    expect([310.44, 27_812, 1.5, 0.0024].map((value) => plainVolume(value).value)).toEqual([
      310.4, 27_810, 1.5, 0.002,
    ]);
    expect(plainVolume(310.44).decimals).toBe(1);
  });
});
