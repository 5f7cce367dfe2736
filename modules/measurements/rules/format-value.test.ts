import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { formatNumber, formatPair, formatValue } from "./format-value";
import { parseNumber } from "./parse-number";

describe("numbers as shown", () => {
  it("has fixed decimals, a true minus and no minus zero", () => {
    expect(formatNumber(8.1, 2)).toBe("8.10");
    expect(formatNumber(-1.25, 1)).toBe("\u22121.3");
    expect(formatNumber(-0.04, 1)).toBe("0.0");
    expect(formatNumber(-0, 0)).toBe("0");
    expect(formatNumber(18.000000000000007, 1)).toBe("18.0");
    expect(formatNumber(18.000000000000007, null)).toBe("18");
    expect(formatNumber(1300, null)).toBe("1300");
    expect(formatNumber(0.0075, null)).toBe("0.0075");
  });

  it("rounds half away from zero as the decimal digits say, not as binary has them", () => {
    expect(formatNumber(1.005, 2)).toBe("1.01");
    expect(formatNumber(2.675, 2)).toBe("2.68");
    expect(formatNumber(-2.5, 0)).toBe("\u22123");
    expect(formatNumber(1e-7, 2)).toBe("0.00");
  });

  it("refuses what is not finite", () => {
    expect(() => formatNumber(Number.NaN, 1)).toThrow(RangeError);
  });

  it("two different numbers look different", () => {
    expect(formatPair(18.04, 18, 1)).toEqual(["18.04", "18.00"]);
    expect(formatPair(25, 18, 1)).toEqual(["25.0", "18.0"]);
  });

  it("shows qualifiers, keeps the digits of a censored number, and shows texts for what has no number", () => {
    expect(formatValue({ value: 0.05, qualifier: "<", text: "<0,05" }, 1)).toBe("<0.05");
    expect(formatValue({ value: 200, qualifier: ">", text: ">200" }, 0)).toBe(">200");
    expect(formatValue({ value: null, qualifier: "ND", text: "n.d." }, 2)).toBe("ND");
    expect(formatValue({ value: null, qualifier: ">", text: "TNTC" }, 0)).toBe("TNTC");
    expect(formatValue({ value: null, qualifier: "", text: "clear" }, 0)).toBe("clear");
  });

  it("what is shown reads back within half a step of the last digit", () => {
    const values = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(values, fc.integer({ min: 0, max: 4 }), (value, decimals) => {
        const back = parseNumber(formatNumber(value, decimals), ".");
        expect(back.ok && Math.abs(back.value - value)).toBeLessThanOrEqual(0.5 * 10 ** -decimals + 1e-9);
      }),
    );
  });
});
