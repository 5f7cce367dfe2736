import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  conductivityMsPerCm,
  conductivityRatio,
  PRACTICAL_SALINITY_RANGE,
  practicalSalinity,
  practicalSalinityFromRatio,
} from "./salinity";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const temperature = between(
  PRACTICAL_SALINITY_RANGE.temperatureC.min,
  PRACTICAL_SALINITY_RANGE.temperatureC.max,
);

describe("practical salinity", () => {
  it("comes back from the conductivity it gives, above and below the join at 2", () => {
    fc.assert(
      fc.property(
        fc.oneof(between(0.001, 1.99), between(2.001, 41.99)),
        temperature,
        between(0, 1000),
        (s, t, p) => {
          const conductivity = conductivityMsPerCm({ salinityPsu: s, temperatureC: t, pressureDbar: p });
          const back = practicalSalinity({
            conductivityMsPerCm: conductivity,
            temperatureC: t,
            pressureDbar: p,
          });
          expect(Math.abs(back - s)).toBeLessThan(1e-9);
        },
      ),
    );
  });

  it("rises with conductivity from 2 to 42", () => {
    fc.assert(
      fc.property(between(2.001, 41), between(0.01, 0.9), temperature, (s, step, t) => {
        const low = conductivityMsPerCm({ salinityPsu: s, temperatureC: t });
        expect(conductivityMsPerCm({ salinityPsu: s + step, temperatureC: t })).toBeGreaterThan(low);
      }),
    );
  });

  it("steps by less than 5e-4 where the extension of Hill et al. takes over", () => {
    fc.assert(
      fc.property(temperature, (t) => {
        const atTwo = conductivityMsPerCm({ salinityPsu: 2, temperatureC: t });
        const below = practicalSalinity({ conductivityMsPerCm: atTwo * (1 - 1e-9), temperatureC: t });
        expect(Math.abs(below - 2)).toBeLessThan(5e-4);
      }),
    );
  });

  it("is zero in pure water and never negative", () => {
    expect(practicalSalinity({ conductivityMsPerCm: 0, temperatureC: 25 })).toBe(0);
    expect(practicalSalinity({ conductivityMsPerCm: 0.0005, temperatureC: 25 })).toBe(0);
    expect(conductivityMsPerCm({ salinityPsu: 0, temperatureC: 25 })).toBe(0);
  });

  it("says what is outside its range and what the range is", () => {
    expect(() => practicalSalinity({ conductivityMsPerCm: 50, temperatureC: 36 })).toThrow(
      new RangeError("temperatureC is 36 °C; the practical salinity scale holds from -2 to 35 °C."),
    );
    expect(() => practicalSalinity({ conductivityMsPerCm: 90, temperatureC: 25 })).toThrow(
      /salinityPsu is .* 42 psu/,
    );
  });

  it.each([
    ["a negative conductivity", { conductivityMsPerCm: -1, temperatureC: 25 }],
    ["no number", { conductivityMsPerCm: Number.NaN, temperatureC: 25 }],
    ["an infinite conductivity", { conductivityMsPerCm: Number.POSITIVE_INFINITY, temperatureC: 25 }],
    ["water colder than −2 °C", { conductivityMsPerCm: 30, temperatureC: -2.1 }],
    ["a temperature that is no number", { conductivityMsPerCm: 30, temperatureC: Number.NaN }],
    ["a negative pressure", { conductivityMsPerCm: 30, temperatureC: 20, pressureDbar: -1 }],
  ])("refuses %s", (_, input) => {
    expect(() => practicalSalinity(input)).toThrow(RangeError);
  });

  it("refuses salinities outside 0 to 42 in the inverse", () => {
    expect(() => conductivityMsPerCm({ salinityPsu: 42.1, temperatureC: 20 })).toThrow(RangeError);
    expect(() => conductivityMsPerCm({ salinityPsu: -0.1, temperatureC: 20 })).toThrow(RangeError);
    expect(() => conductivityMsPerCm({ salinityPsu: 35, temperatureC: 38 })).toThrow(RangeError);
  });

  it("takes ratios up to 40 °C, as far as the scale is tabulated, and not beyond", () => {
    expect(conductivityRatio({ salinityPsu: 40, temperatureC: 39 })).toBeGreaterThan(1);
    expect(() => practicalSalinityFromRatio({ conductivityRatio: 1, temperatureC: 40.1 })).toThrow(
      RangeError,
    );
  });
});
