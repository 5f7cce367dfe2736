import { describe, expect, it } from "vitest";
import { componentVolume } from "@/modules/systems/rules/component-volume";
import { totalVolume } from "@/modules/systems/rules/total-volume";
import { combineCorrelated, combineUncorrelated } from "@/modules/systems/rules/uncertainty";
import { component, measured } from "../support/volume-components";

describe("combined uncertainty", () => {
  // Source: JCGM 100:2008 (GUM), 5.2.2 example: ten 1000 Ω resistors in series, each calibrated against the same standard
  // with u = 100 mΩ: 1 Ω; the GUM gives 0.32 Ω for the (there wrong) treatment as uncorrelated.
  it("of ten resistors in series is 1 Ω fully correlated and 0.32 Ω uncorrelated, as in the GUM", () => {
    const resistors = Array.from({ length: 10 }, () => 0.1);
    expect(combineCorrelated(resistors, 1)).toBeCloseTo(1, 12);
    expect(combineCorrelated(resistors, 0)).toBeCloseTo(0.32, 2);
    expect(
      combineUncorrelated(resistors.map((standardUncertainty) => ({ sensitivity: 1, standardUncertainty }))),
    ).toBeCloseTo(0.32, 2);
  });

  // Source: JCGM 100:2008 (GUM), 5.1.6, equation (12), and NIST TN 1297 appendix A.5: for a product Y = c·X₁^p₁·…, the
  // relative variance is Σ (p_i·u(x_i)/x_i)². Cylinder: p = 2 for the diameter, 1 for the height.
  it("of a product is the root of the summed relative squares, the diameter counting double", () => {
    const round = component({
      shape: "upright-cylinder",
      diameterM: measured(4, 0.02),
      heightM: measured(3, 0.03),
    });
    const { volumeL, standardUncertaintyL } = componentVolume(round);
    expect(standardUncertaintyL / volumeL).toBeCloseTo(Math.hypot(2 * (0.02 / 4), 0.03 / 3), 12);
  });

  // Source: the same equation by hand: 2 × 1 × 0.5 m, u = 1 cm, 1 cm, 0.5 cm: √(0.005² + 0.01² + 0.01²) = 0.015 → 15 L of 1000 L.
  it("of a box of 2 × 1 × 0.5 m with 10, 10 and 5 mm is 15 L in 1,000 L", () => {
    const box = component({
      shape: "box",
      lengthM: measured(2, 0.01),
      widthM: measured(1, 0.01),
      heightM: measured(0.5, 0.005),
    });
    expect(componentVolume(box).standardUncertaintyL).toBeCloseTo(15, 9);
  });

  // Source: JCGM 100:2008, 5.1.2 for a sum (3-4-12-13 right triangles, exact) and 6.2.1: U = k·u_c.
  it("of a sum with rockwork is the root of the squares, and the expanded one is twice that", () => {
    const basin = component(
      { shape: "free-litres", volumeL: measured(10_000, 30) },
      { displacementL: measured(800, 40) },
    );
    const sump = component({ shape: "free-litres", volumeL: measured(500, 120) });
    const total = totalVolume([basin, sump]);
    expect(total.volumeL).toBe(9700);
    expect(total.components[0]?.standardUncertaintyL).toBeCloseTo(50, 12);
    expect(total.standardUncertaintyL).toBeCloseTo(130, 12);
    expect(total.expandedUncertaintyL).toBeCloseTo(260, 12);
  });

  // Source: JCGM 100:2008, 5.2.2, note 1: with r = 1 the combined uncertainty is the plain sum.
  it("of a sum measured with one tape may be told to add up plainly", () => {
    const pieces = [30, 40].map((uncertaintyL) =>
      component({ shape: "free-litres", volumeL: measured(1000, uncertaintyL) }),
    );
    expect(totalVolume(pieces).standardUncertaintyL).toBeCloseTo(50, 12);
    expect(totalVolume(pieces, 1).standardUncertaintyL).toBeCloseTo(70, 12);
    expect(() => totalVolume(pieces, 1.1)).toThrow(RangeError);
  });
});
