import { describe, expect, it } from "vitest";
import { shownVolume, volumeDecimals } from "./volume-text";

// Source: JCGM 100:2008, 7.2.6: an uncertainty is given with at most two significant digits, the estimate to agree with it.
describe("a volume on screen", () => {
  it("shows its expanded uncertainty to two figures and itself to the same decimal", () => {
    const shown = (value: number, standardUncertainty: number, unit: "L" | "m³" = "L") =>
      shownVolume({ value, standardUncertainty }, unit).decimals;
    expect(shown(1000, 5)).toBe(0);
    expect(shown(1000, 0.55)).toBe(1);
    expect(shown(310_400, 3050, "m³")).toBe(1);
    expect(shownVolume({ value: 310_400, standardUncertainty: 3050 }, "m³")).toMatchObject({
      value: 310.4,
      expanded: 6.1,
    });
  });

  it("without an uncertainty shows four figures", () => {
    expect([0, 310.4, 27_810, 1.5, 0.002].map(volumeDecimals)).toEqual([0, 1, 0, 3, 3]);
  });
});
