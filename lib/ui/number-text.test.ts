import { describe, expect, it } from "vitest";
import { numberText } from "./number-text";

describe("a number on screen", () => {
  it("has fixed decimals and a true minus sign", () => {
    expect(numberText(8, 2)).toBe("8.00");
    expect(numberText(-12, 0)).toBe("\u221212");
  });
  it("rounds ties as written, away from zero", () => {
    // 1.005 and 2.675 are the usual traps of toFixed (their doubles lie just below the tie)
    expect(numberText(1.005, 2)).toBe("1.01");
    expect(numberText(2.675, 2)).toBe("2.68");
    expect(numberText(-0.25, 1)).toBe("\u22120.3");
  });
  it("never shows a negative zero", () => {
    expect(numberText(-0, 1)).toBe("0.0");
    expect(numberText(-0.04, 1)).toBe("0.0");
  });
  it("groups from five figures on, without commas (SI brochure 5.4.4)", () => {
    expect(numberText(2781, 0)).toBe("2781");
    expect(numberText(27810, 0)).toBe("27\u202f810");
    expect(numberText(1234567.5, 1)).toBe("1\u202f234\u202f567.5");
  });
  it("writes very small and very large numbers out", () => {
    expect(numberText(1e-7, 8)).toBe("0.00000010");
    expect(numberText(1e21, 0)).toBe("1\u202f000\u202f000\u202f000\u202f000\u202f000\u202f000\u202f000");
  });
  it("refuses what is no number", () => {
    expect(() => numberText(Number.NaN, 1)).toThrow(RangeError);
    expect(() => numberText(1, 1.5)).toThrow(RangeError);
  });
});
