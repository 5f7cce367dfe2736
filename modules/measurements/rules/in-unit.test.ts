import { describe, expect, it } from "vitest";
import { numberText } from "@/lib/ui/number-text";
import { aReading, aWatchRow } from "@/tests/support/watch-row";
import { decimalsIn, inUnit, parameterInUnit, preferredUnit, readingInUnit, rowInUnit } from "./in-unit";

const shown = (value: number, decimals: number, from: string, to: string) =>
  numberText(inUnit(value, from, to) ?? Number.NaN, decimalsIn(decimals, from, to));

describe("the unit that a person prefers", () => {
  const water = { unit: "°C", acceptedUnits: ["°C", "°F"] };

  it("is taken where the parameter accepts it", () => {
    expect(preferredUnit({ temperature: "°F" }, water)).toBe("°F");
  });

  it("is not taken where the parameter does not accept it, or the preference is for something else", () => {
    expect(preferredUnit({ temperature: "K" }, water)).toBeNull();
    expect(preferredUnit({ volume: "US gal" }, water)).toBeNull();
    expect(preferredUnit({}, water)).toBeNull();
    expect(preferredUnit({ temperature: "°F" }, { unit: null, acceptedUnits: [] })).toBeNull();
  });

  it("is not taken where it needs more than a factor", () => {
    const salinity = { unit: "psu", acceptedUnits: ["psu", "SG 25/25 °C"] };
    expect(preferredUnit({ salinity: "SG 25/25 °C" }, salinity)).toBeNull();
  });
});

describe("a figure in another unit", () => {
  // Sources: °F = 1.8 × °C + 32 and the US gallon of 231 in³ = 3.785411784 L, the imperial gallon of 4.54609 L
  // (NIST SP 811, appendix B); by hand: 1.8 × 13.4 + 32 = 56.12; 310 700 / 3.785411784 = 82 078.26;
  // 310 700 / 4.54609 = 68 344.45; 2.5 meq/L × 50.0435 / 17.848 = 7.0096 dKH (CaCO3 100.087, CaO 56.077).
  it.each([
    [13.4, 1, "°C", "°F", "56.1"],
    [-1.5, 1, "°C", "°F", "29.3"],
    [310.7, 1, "m³", "US gal", "82\u202f078"],
    [310.7, 1, "m³", "imp gal", "68\u202f344"],
    [310.7, 1, "m³", "L", "310\u202f700"],
    [2.5, 2, "meq/L", "dKH", "7.01"],
  ] as const)("%d with %d decimals: %s in %s is %s", (value, decimals, from, to, text) => {
    expect(shown(value, decimals, from, to)).toBe(text);
  });

  // by hand: 0.1 °C is 0.18 °F; 0.1 m³ is 26 US gal; 1 L is 0.001 m³; 0.1 dKH is 0.036 meq/L
  it.each([
    [1, "°C", "°F", 1],
    [1, "m³", "US gal", 0],
    [0, "L", "m³", 3],
    [1, "dKH", "meq/L", 2],
    [2, "°C", "°C", 2],
    [1, "psu", "SG 25/25 °C", 1],
  ] as const)("keeps the resolution of %d decimals: %s in %s has %d", (decimals, from, to, expected) => {
    expect(decimalsIn(decimals, from, to)).toBe(expected);
  });

  // 0.05 mg/L NH3 × 14.007 / 17.031 = 0.041122 mg/L NH3-N (N 14.007, H 1.008)
  it("writes a detection limit so that it stays true", () => {
    const parameter = { unit: "mg/L NH3" };
    expect(readingInUnit({ value: 0.05, qualifier: "<" }, parameter, "mg/L NH3-N").value).toBe(0.0412);
    expect(readingInUnit({ value: 0.05, qualifier: ">" }, parameter, "mg/L NH3-N").value).toBe(0.0411);
    expect(readingInUnit({ value: 0, qualifier: "<" }, parameter, "mg/L NH3-N").value).toBe(0);
    expect(readingInUnit({ value: null, qualifier: "ND" }, parameter, "mg/L NH3-N").value).toBeNull();
  });
});

describe("a row in another unit", () => {
  const row = aWatchRow({
    acceptedUnits: ["°C", "°F"],
    plausible: { low: -2, high: null },
    bounds: { toleranceLow: 12, target: 13.5, toleranceHigh: 15, greatestChange24h: 1 },
    recent: [aReading({ value: 13.4, takenAt: 1 }), aReading({ value: null, qualifier: "ND", takenAt: 0 })],
  });

  // by hand: 12 °C = 53.6 °F, 13.5 = 56.3, 15 = 59, −2 = 28.4; a difference of 1 °C is 1.8 °F
  it("has its value, its limits and its plausible bounds in that unit, a change as a difference", () => {
    const found = rowInUnit(row, "°F");
    expect(found).toMatchObject({ unit: "°F", parameter: { unit: "°F", decimals: 1 } });
    expect(found.recent[0]?.value).toBeCloseTo(56.12, 9);
    expect(found.recent[1]?.value).toBeNull();
    expect(found.parameter.plausible.low).toBeCloseTo(28.4, 9);
    expect(found.parameter.plausible.high).toBeNull();
    if (found.limits.state !== "in-force") throw new Error("limits hold");
    const { toleranceLow, target, toleranceHigh, greatestChange24h } = found.limits.bounds;
    [toleranceLow, target, toleranceHigh, greatestChange24h].forEach((bound, index) => {
      expect(bound).toBeCloseTo([53.6, 56.3, 59, 1.8][index] ?? Number.NaN, 9);
    });
    expect(found.limits.bounds.watchHigh).toBeUndefined();
  });

  it("stays canonical where nothing is wanted, another kind is wanted, or a factor is not enough", () => {
    expect(rowInUnit(row, null)).toBe(row);
    expect(rowInUnit(row, "dKH")).toBe(row);
    const salinity = aWatchRow({ unit: "psu", acceptedUnits: ["psu", "SG 25/25 °C"] });
    expect(rowInUnit(salinity, "SG 25/25 °C")).toBe(salinity);
    expect(parameterInUnit(aWatchRow({ kind: "text", unit: null }).parameter, "°F").unit).toBeNull();
  });

  it("leaves the canonical row as it was", () => {
    const before = structuredClone(row);
    rowInUnit(row, "°F");
    expect(row).toEqual(before);
  });
});
