import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  brineScaleReadingGPerKg,
  salinityFromBrineScale,
  sodiumChlorideRefractiveIndex,
} from "./brine-scale";
import { refractiveIndex, salinityFromRefractiveIndex } from "./refraction";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe("refractive index", () => {
  it("gives the salinity back with either formula", () => {
    fc.assert(
      fc.property(
        between(0, 35),
        between(0, 30),
        between(500, 700),
        fc.constantFrom("quan-fry-1995" as const, "millard-seaver-1990" as const),
        (salinityPsu, temperatureC, wavelengthNm, formula) => {
          const at = { temperatureC, wavelengthNm, formula };
          const index = refractiveIndex({ ...at, salinityPsu });
          const back = salinityFromRefractiveIndex({ ...at, refractiveIndex: index });
          expect(Math.abs(back - salinityPsu)).toBeLessThan(1e-8);
        },
      ),
    );
  });

  it("is the same within 4e-5 by both formulas near room temperature", () => {
    fc.assert(
      fc.property(between(0, 35), between(10, 30), (salinityPsu, temperatureC) => {
        const one = refractiveIndex({ salinityPsu, temperatureC });
        const other = refractiveIndex({ salinityPsu, temperatureC, formula: "millard-seaver-1990" });
        expect(Math.abs(one - other)).toBeLessThan(4e-5);
      }),
    );
  });

  it("refuses what the formula does not cover", () => {
    expect(() => refractiveIndex({ salinityPsu: 36, temperatureC: 20 })).toThrow(
      /quan-fry-1995 holds from 0 to 35 psu/,
    );
    expect(
      refractiveIndex({ salinityPsu: 40, temperatureC: 20, formula: "millard-seaver-1990" }),
    ).toBeGreaterThan(1.34);
    expect(() => refractiveIndex({ salinityPsu: 30, temperatureC: 31 })).toThrow(RangeError);
    expect(() => refractiveIndex({ salinityPsu: 30, temperatureC: 20, wavelengthNm: 800 })).toThrow(
      RangeError,
    );
    expect(() => salinityFromRefractiveIndex({ refractiveIndex: 1.5, temperatureC: 20 })).toThrow(RangeError);
    expect(() => salinityFromRefractiveIndex({ refractiveIndex: 1.33, temperatureC: 20 })).toThrow(
      RangeError,
    );
  });
});

describe("a sodium chloride scale", () => {
  it("gives the salinity back, and reads 3 to 5 % high in seawater", () => {
    fc.assert(
      fc.property(between(1, 43), (salinityPsu) => {
        const readingGPerKg = brineScaleReadingGPerKg({ salinityPsu });
        const back = salinityFromBrineScale({ readingGPerKg });
        expect(Math.abs(back.salinityPsu - salinityPsu)).toBeLessThan(1e-8);
        expect(readingGPerKg / salinityPsu).toBeGreaterThan(1.03);
        expect(readingGPerKg / salinityPsu).toBeLessThan(1.05);
        expect(back.correctionPsu).toBeCloseTo(salinityPsu - readingGPerKg, 9);
      }),
    );
  });

  it("reads zero in pure water", () => {
    expect(brineScaleReadingGPerKg({ salinityPsu: 0 })).toBe(0);
    expect(salinityFromBrineScale({ readingGPerKg: 0 }).salinityPsu).toBe(0);
  });

  it("refuses readings and strengths beyond the table", () => {
    expect(() => salinityFromBrineScale({ readingGPerKg: 60 })).toThrow(RangeError);
    expect(() => salinityFromBrineScale({ readingGPerKg: -1 })).toThrow(RangeError);
    expect(() => sodiumChlorideRefractiveIndex({ massPercent: 11 })).toThrow(RangeError);
    expect(() => brineScaleReadingGPerKg({ salinityPsu: 44 })).toThrow(RangeError);
  });
});
