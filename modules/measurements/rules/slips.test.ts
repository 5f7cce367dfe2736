import { describe, expect, it } from "vitest";
import { type SlipInput, suggestSlips, usualBand } from "./slips";

const ph: SlipInput = {
  typed: 81.2,
  typedUnit: "pH",
  canonicalUnit: "pH",
  acceptedUnits: ["pH"],
  decimals: 2,
  recent: [8.1, 8.12, 8.09, 8.11, 8.14, 8.1],
  bounds: null,
  plausible: { low: 4, high: 11 },
};
const what = (input: SlipInput) =>
  suggestSlips(input).map((slip) => (slip.kind === "unit" ? slip.unit : slip.value));

describe("suggested slips", () => {
  it("81.2 for a pH near 8.1 suggests 8.12 and says what is usual", () => {
    const [slip] = suggestSlips(ph);
    expect(slip).toMatchObject({ kind: "decimal-point", value: 8.12, canonical: 8.12 });
    expect(slip?.sentence).toMatch(/^Was 8\.12 meant instead of 81\.2 \(usual here: 7\.94 to 8\.27\)\?$/);
    expect(what({ ...ph, typed: 812 })).toEqual([8.12]);
    expect(what({ ...ph, typed: 0.812 })).toEqual([8.12]);
  });

  it("a usual value is never doubted, nor one with no slip that would explain it", () => {
    expect(what({ ...ph, typed: 8.2 })).toEqual([]);
    expect(what({ ...ph, typed: 7.2 })).toEqual([]);
    expect(what({ ...ph, typed: 0 })).toEqual([]);
  });

  const alkalinity: SlipInput = {
    typed: 7.8,
    typedUnit: "meq/L",
    canonicalUnit: "meq/L",
    acceptedUnits: ["meq/L", "dKH", "mg/L CaCO3"],
    decimals: 2,
    recent: [2.7, 2.8, 2.75, 2.82, 2.78],
    bounds: null,
    plausible: { low: 0, high: 10 },
  };

  it("dKH and mg/L CaCO3 typed as meq/L are recognised", () => {
    // 7.8 dKH = 2.782 meq/L and 138 mg/L CaCO3 = 2.758 meq/L by 2.80385 dKH and 50.043 mg/L per meq/L
    expect(what(alkalinity)).toEqual(["dKH"]);
    expect(suggestSlips(alkalinity)[0]?.canonical).toBeCloseTo(2.782, 3);
    expect(what({ ...alkalinity, typed: 138 })).toEqual(["mg/L CaCO3"]);
    expect(what({ ...alkalinity, typed: 2.8, typedUnit: "dKH" })).toEqual(["meq/L"]);
  });

  it("°F typed as °C, NO3 typed as NO3-N, PO4 as P, µS as mS are recognised", () => {
    const temperature = {
      ...ph,
      canonicalUnit: "°C",
      typedUnit: "°C",
      acceptedUnits: ["°C", "°F"],
      decimals: 1,
    };
    const warm = { ...temperature, recent: [25, 25.2, 24.9, 25.1, 25], plausible: { low: -2, high: 45 } };
    expect(what({ ...warm, typed: 77 })).toEqual(["°F"]);
    expect(what({ ...warm, typed: 2.51 })).toEqual([25.1]);
    const nitrate = {
      ...ph,
      canonicalUnit: "mg/L NO3",
      acceptedUnits: ["mg/L NO3", "mg/L NO3-N"],
      decimals: 1,
    };
    const usual = { ...nitrate, recent: [22, 22.3, 21.8, 22.1, 22], plausible: { low: 0, high: 500 } };
    expect(what({ ...usual, typed: 5, typedUnit: "mg/L NO3" })).toEqual(["mg/L NO3-N"]);
    const phosphate = {
      ...ph,
      canonicalUnit: "mg/L PO4",
      acceptedUnits: ["mg/L PO4", "mg/L PO4-P"],
      decimals: 3,
    };
    const low = { ...phosphate, recent: [0.15, 0.153, 0.151, 0.155, 0.152], plausible: { low: 0, high: 20 } };
    expect(what({ ...low, typed: 0.05, typedUnit: "mg/L PO4" })).toEqual(["mg/L PO4-P"]);
    const conductivity = { ...ph, canonicalUnit: "mS/cm", acceptedUnits: ["mS/cm", "µS/cm"], decimals: 1 };
    const sea = { ...conductivity, recent: [53, 53.1, 52.9, 53, 53.2], plausible: { low: 0, high: 100 } };
    expect(what({ ...sea, typed: 53100, typedUnit: "mS/cm" })).toEqual(["µS/cm"]);
  });

  it("specific gravity typed as salinity is recognised by the conversion handed in", () => {
    const salinity: SlipInput = {
      ...ph,
      typed: 1.0264,
      typedUnit: "psu",
      canonicalUnit: "psu",
      acceptedUnits: ["psu", "SG 20/20 °C"],
      decimals: 1,
      recent: [34.8, 34.9, 34.7, 34.8, 34.7],
      plausible: { low: 0, high: 60 },
    };
    expect(what(salinity)).toEqual([]);
    // 1.0264 at 20/20 °C is S = 34.733 by EOS-80 (Millero & Poisson 1981)
    const toCanonical = (value: number, unit: string) =>
      unit === "SG 20/20 °C" && value === 1.0264 ? 34.733 : null;
    expect(what({ ...salinity, toCanonical })).toEqual(["SG 20/20 °C"]);
  });

  it("with few recent values the limits are the band when both sides are given, else nothing is suggested", () => {
    const few = { ...ph, recent: [8.1], bounds: { toleranceLow: 7.8, toleranceHigh: 8.4 } };
    expect(what(few)).toEqual([8.12]);
    expect(what({ ...few, bounds: { toleranceHigh: 8.4 } })).toEqual([]);
    expect(what({ ...few, bounds: null })).toEqual([]);
  });

  it("a suggestion is never implausible", () => {
    expect(what({ ...ph, plausible: { low: 4, high: 8 } })).toEqual([]);
  });

  it("the band of equal recent values is still as wide as two per cent", () => {
    expect(usualBand({ recent: [10, 10, 10, 10, 10], bounds: null, decimals: 2 })).toEqual({
      low: 9.8,
      high: 10.2,
    });
  });
});
