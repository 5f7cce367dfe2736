import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DENSITY_RANGE, densityKgPerM3, salinityFromDensity } from "./density";
import {
  hydrometerSpecificGravity,
  SIXTY_FAHRENHEIT_C,
  salinityFromHydrometer,
  salinityFromSpecificGravity,
  specificGravity,
} from "./specific-gravity";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const salinity = between(0, 42);
const temperature = between(DENSITY_RANGE.temperatureC.min, DENSITY_RANGE.temperatureC.max);

describe("density", () => {
  it("gives the salinity back", () => {
    fc.assert(
      fc.property(salinity, temperature, (salinityPsu, temperatureC) => {
        const density = densityKgPerM3({ salinityPsu, temperatureC });
        expect(
          Math.abs(salinityFromDensity({ densityKgPerM3: density, temperatureC }) - salinityPsu),
        ).toBeLessThan(1e-9);
      }),
    );
  });

  it("rises with salinity and with pressure", () => {
    fc.assert(
      fc.property(between(0, 41), between(0.01, 1), temperature, between(1, 9000), (s, step, t, p) => {
        const here = densityKgPerM3({ salinityPsu: s, temperatureC: t });
        expect(densityKgPerM3({ salinityPsu: s + step, temperatureC: t })).toBeGreaterThan(here);
        expect(densityKgPerM3({ salinityPsu: s, temperatureC: t, pressureDbar: p })).toBeGreaterThan(here);
      }),
    );
  });

  it("refuses what EOS-80 does not cover", () => {
    expect(() => densityKgPerM3({ salinityPsu: 42.5, temperatureC: 20 })).toThrow(RangeError);
    expect(() => densityKgPerM3({ salinityPsu: -1, temperatureC: 20 })).toThrow(RangeError);
    expect(() => densityKgPerM3({ salinityPsu: 35, temperatureC: 41 })).toThrow(RangeError);
    expect(() => densityKgPerM3({ salinityPsu: Number.NaN, temperatureC: 20 })).toThrow(RangeError);
    expect(() => densityKgPerM3({ salinityPsu: 35, temperatureC: 20, pressureDbar: 10001 })).toThrow(
      RangeError,
    );
  });

  it("refuses a density that no salinity has at that temperature", () => {
    expect(() => salinityFromDensity({ densityKgPerM3: 990, temperatureC: 20 })).toThrow(
      /densityKgPerM3 is 990 kg\/m³/,
    );
    expect(() => salinityFromDensity({ densityKgPerM3: 1040, temperatureC: 20 })).toThrow(RangeError);
  });
});

describe("specific gravity", () => {
  it("gives the salinity back for any pair of temperatures", () => {
    fc.assert(
      fc.property(salinity, temperature, temperature, (salinityPsu, temperatureC, referenceTemperatureC) => {
        const gravity = specificGravity({ salinityPsu, temperatureC, referenceTemperatureC });
        const back = salinityFromSpecificGravity({
          specificGravity: gravity,
          temperatureC,
          referenceTemperatureC,
        });
        expect(Math.abs(back - salinityPsu)).toBeLessThan(1e-9);
      }),
    );
  });

  it("is one in pure water at the reference temperature", () => {
    expect(specificGravity({ salinityPsu: 0, temperatureC: 25, referenceTemperatureC: 25 })).toBe(1);
    expect(
      salinityFromSpecificGravity({ specificGravity: 1, temperatureC: 25, referenceTemperatureC: 25 }),
    ).toBe(0);
  });

  it("differs by 0.0035 for one water of 35 with the pair of temperatures", () => {
    const at = (temperatureC: number, referenceTemperatureC: number) =>
      specificGravity({ salinityPsu: 35, temperatureC, referenceTemperatureC });
    expect(at(SIXTY_FAHRENHEIT_C, SIXTY_FAHRENHEIT_C) - at(25, 4)).toBeCloseTo(0.0035, 4);
  });

  it("refuses a reading far from water", () => {
    const pair = { temperatureC: 25, referenceTemperatureC: 25 };
    expect(() => salinityFromSpecificGravity({ specificGravity: 1.1, ...pair })).toThrow(RangeError);
    expect(() => salinityFromSpecificGravity({ specificGravity: 0, ...pair })).toThrow(RangeError);
    expect(() => salinityFromSpecificGravity({ specificGravity: 0.99, ...pair })).toThrow(RangeError);
  });
});

describe("a glass hydrometer", () => {
  const stem = { calibrationTemperatureC: 20, referenceTemperatureC: 20 };

  it("needs no correction at its own temperature", () => {
    expect(hydrometerSpecificGravity({ reading: 1.0266, sampleTemperatureC: 20, ...stem })).toBe(1.0266);
    expect(salinityFromHydrometer({ reading: 1.0266, sampleTemperatureC: 20, ...stem })).toBeCloseTo(35, 1);
  });

  it("shows too little in warmer and too much in colder water", () => {
    expect(hydrometerSpecificGravity({ reading: 1.025, sampleTemperatureC: 28, ...stem })).toBeLessThan(
      1.025,
    );
    expect(hydrometerSpecificGravity({ reading: 1.025, sampleTemperatureC: 10, ...stem })).toBeGreaterThan(
      1.025,
    );
  });

  it("refuses temperatures outside EOS-80 and a negative expansion", () => {
    expect(() => hydrometerSpecificGravity({ reading: 1.02, sampleTemperatureC: 60, ...stem })).toThrow(
      RangeError,
    );
    expect(() =>
      hydrometerSpecificGravity({ reading: 1.02, sampleTemperatureC: 20, glassExpansionPerK: -1, ...stem }),
    ).toThrow(RangeError);
    expect(() => hydrometerSpecificGravity({ reading: -1, sampleTemperatureC: 20, ...stem })).toThrow(
      RangeError,
    );
  });
});
