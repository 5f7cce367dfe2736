import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { atLeast, atMost, nearlyEqual } from "./nearly";

describe("nearly", () => {
  it("a converted value that equals the limit but for rounding is on the limit", () => {
    expect(atMost(18.000000000000007, 18)).toBe(true);
    expect(atLeast(17.999999999999993, 18)).toBe(true);
    expect(nearlyEqual(0.1 + 0.2, 0.3)).toBe(true);
    expect(nearlyEqual(0.1 + 0.2 - 0.3, 0)).toBe(true);
  });

  it("a difference somebody could have typed is a difference", () => {
    expect(atMost(18.0001, 18)).toBe(false);
    expect(atLeast(17.9999, 18)).toBe(false);
    expect(nearlyEqual(0.0075, 0.00751)).toBe(false);
    expect(nearlyEqual(1e-6, 2e-6)).toBe(false);
    expect(nearlyEqual(35, 35.000001)).toBe(false);
  });

  it("nothing equals NaN, and infinities equal only themselves", () => {
    expect(nearlyEqual(Number.NaN, Number.NaN)).toBe(false);
    expect(atMost(Number.NaN, 1)).toBe(false);
    expect(nearlyEqual(Number.POSITIVE_INFINITY, 1e308)).toBe(false);
    expect(nearlyEqual(Number.POSITIVE_INFINITY, Number.POSITIVE_INFINITY)).toBe(true);
  });

  it("of two numbers at least one is at most the other, and both only when they are nearly equal", () => {
    const finite = fc.double({ noNaN: true, noDefaultInfinity: true });
    fc.assert(
      fc.property(finite, finite, (a, b) => {
        expect(atMost(a, b) || atLeast(a, b)).toBe(true);
        expect(atMost(a, b) && atLeast(a, b)).toBe(nearlyEqual(a, b));
        expect(nearlyEqual(a, b)).toBe(nearlyEqual(b, a));
      }),
    );
  });
});
