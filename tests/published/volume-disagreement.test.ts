import { describe, expect, it } from "vitest";
import { disagreement } from "@/modules/systems/rules/disagreement";
import { measured } from "../support/volume-components";

// Source: the zeta score |x₁ − x₂| / √(u₁² + u₂²) of ISO 13528 with its warning bound 2; figures by hand (3-4-5 triangles).
describe("two determinations of one volume", () => {
  it("agree when they differ by no more than two standard uncertainties of their difference", () => {
    const verdict = disagreement(measured(10_000, 30), measured(10_100, 40));
    expect(verdict).toEqual({ ratio: 2, differenceL: 100, disagrees: false, sentence: null });
  });

  it("are pointed out with a sentence when they differ by more", () => {
    const verdict = disagreement(measured(10_000, 30), measured(10_150, 40));
    expect(verdict.ratio).toBe(3);
    expect(verdict.disagrees).toBe(true);
    expect(verdict.sentence).toContain("differ by 150 L");
    expect(verdict.sentence).toContain("3.0 times the standard uncertainty of their difference (50.0 L)");
  });

  it("contradict each other when both are called exact and differ, and not when they are equal", () => {
    expect(disagreement(measured(5), measured(6))).toMatchObject({ ratio: Infinity, disagrees: true });
    expect(disagreement(measured(5), measured(5))).toMatchObject({ ratio: 0, disagrees: false });
  });

  it("are refused when a volume is not a number or an uncertainty is negative", () => {
    expect(() => disagreement(measured(Number.NaN, 1), measured(6, 1))).toThrow(RangeError);
    expect(() => disagreement(measured(5, -1), measured(6, 1))).toThrow(RangeError);
  });
});
