import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  conductivityAt25MsPerCm,
  freshConductivityAt25MsPerCm,
  totalDissolvedSolidsMgPerL,
} from "./conductivity-at-25";
import { densityKgPerM3 } from "./density";
import { freezingPointC } from "./freezing";
import { barometricPressureKPa, totalGasPressurePercent } from "./gas-pressure";
import { specificHeatJPerKgK } from "./heat-capacity";
import { oxygenFromSaturationPercentMgPerL, oxygenSaturationMgPerL, oxygenSaturationPercent } from "./oxygen";
import { oxygenSolubility } from "./oxygen-solubility";
import { salinityFromSaltContent, saltContentGPerKg } from "./salt-content";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe("oxygen at saturation", () => {
  it("falls with temperature and salinity, and rises with pressure", () => {
    fc.assert(
      fc.property(between(0, 39), between(0, 39), between(60, 105), between(0.05, 1), (t, s, p, step) => {
        const here = oxygenSaturationMgPerL({ temperatureC: t, salinityPsu: s, pressureKPa: p });
        expect(
          oxygenSaturationMgPerL({ temperatureC: t + step, salinityPsu: s, pressureKPa: p }),
        ).toBeLessThan(here);
        expect(
          oxygenSaturationMgPerL({ temperatureC: t, salinityPsu: s + step, pressureKPa: p }),
        ).toBeLessThan(here);
        expect(
          oxygenSaturationMgPerL({ temperatureC: t, salinityPsu: s, pressureKPa: p + step }),
        ).toBeGreaterThan(here);
      }),
    );
  });

  it("turns percent into mg/L and back", () => {
    fc.assert(
      fc.property(between(0, 40), between(0, 40), between(60, 110), between(0, 300), (t, s, p, percent) => {
        const at = { temperatureC: t, salinityPsu: s, pressureKPa: p };
        const oxygenMgPerL = oxygenFromSaturationPercentMgPerL({ ...at, saturationPercent: percent });
        expect(oxygenSaturationPercent({ ...at, oxygenMgPerL })).toBeCloseTo(percent, 9);
      }),
    );
  });

  it("is the same as Garcia and Gordon's within 0.5 % (their fit of the same data)", () => {
    fc.assert(
      fc.property(between(0, 35), between(0, 40), (temperatureC, salinityPsu) => {
        const perKg = oxygenSolubility({ temperatureC, salinityPsu, unit: "umol/kg" });
        const mgPerL = (perKg * densityKgPerM3({ temperatureC, salinityPsu }) * 31.9988) / 1e6;
        expect(Math.abs(mgPerL / oxygenSaturationMgPerL({ temperatureC, salinityPsu }) - 1)).toBeLessThan(
          0.005,
        );
      }),
    );
  });

  it("refuses what Benson and Krause do not cover", () => {
    expect(() => oxygenSaturationMgPerL({ temperatureC: 41, salinityPsu: 0 })).toThrow(RangeError);
    expect(() => oxygenSaturationMgPerL({ temperatureC: 20, salinityPsu: 41 })).toThrow(RangeError);
    expect(() => oxygenSaturationMgPerL({ temperatureC: 20, salinityPsu: 35, pressureKPa: 760 })).toThrow(
      /kPa/,
    );
    expect(() => oxygenSaturationPercent({ oxygenMgPerL: -1, temperatureC: 20, salinityPsu: 0 })).toThrow(
      RangeError,
    );
    expect(() => oxygenSolubility({ temperatureC: 41, salinityPsu: 0, unit: "mL/L" })).toThrow(RangeError);
  });
});

describe("gas pressure", () => {
  it("is 100 % in balance and refuses an impossible vacuum", () => {
    expect(totalGasPressurePercent({ barometricPressureKPa: 98, excessPressureKPa: 0 })).toBe(100);
    expect(() => totalGasPressurePercent({ barometricPressureKPa: 98, excessPressureKPa: -99 })).toThrow(
      RangeError,
    );
    expect(() => totalGasPressurePercent({ barometricPressureKPa: 0, excessPressureKPa: 1 })).toThrow(
      RangeError,
    );
  });

  it("falls with altitude, and refuses heights above the lowest layer of the air", () => {
    expect(barometricPressureKPa({ altitudeM: 0 })).toBe(101.325);
    expect(barometricPressureKPa({ altitudeM: 1000 })).toBeLessThan(90);
    expect(() => barometricPressureKPa({ altitudeM: 12000 })).toThrow(RangeError);
  });
});

describe("heat capacity and freezing point", () => {
  it("fall with salinity", () => {
    fc.assert(
      fc.property(between(4, 39), between(0, 40), (salinityPsu, temperatureC) => {
        const more = salinityPsu + 1;
        expect(specificHeatJPerKgK({ salinityPsu: more, temperatureC })).toBeLessThan(
          specificHeatJPerKgK({ salinityPsu, temperatureC }),
        );
        expect(freezingPointC({ salinityPsu: more })).toBeLessThan(freezingPointC({ salinityPsu }));
      }),
    );
  });

  it("are refused outside their ranges", () => {
    expect(() => specificHeatJPerKgK({ salinityPsu: 41, temperatureC: 20 })).toThrow(RangeError);
    expect(() => specificHeatJPerKgK({ salinityPsu: 35, temperatureC: -1 })).toThrow(RangeError);
    expect(() => freezingPointC({ salinityPsu: 3 })).toThrow(RangeError);
    expect(() => freezingPointC({ salinityPsu: 35, pressureDbar: 600 })).toThrow(RangeError);
  });
});

describe("conductivity at 25 °C", () => {
  it("is what it was at 25 °C", () => {
    expect(conductivityAt25MsPerCm({ conductivityMsPerCm: 50, temperatureC: 25 })).toBeCloseTo(50, 9);
    expect(freshConductivityAt25MsPerCm({ conductivityMsPerCm: 0.4, temperatureC: 25 })).toBe(0.4);
  });

  it("refuses temperatures and factors that make no sense", () => {
    expect(() => freshConductivityAt25MsPerCm({ conductivityMsPerCm: 1, temperatureC: 60 })).toThrow(
      RangeError,
    );
    expect(() =>
      freshConductivityAt25MsPerCm({ conductivityMsPerCm: 1, temperatureC: 0, coefficientPerC: 0.05 }),
    ).toThrow(RangeError);
    expect(() => totalDissolvedSolidsMgPerL({ conductivityAt25UsPerCm: 100, factor: 0 })).toThrow(RangeError);
    expect(() => totalDissolvedSolidsMgPerL({ conductivityAt25UsPerCm: -1, factor: 0.5 })).toThrow(
      RangeError,
    );
  });
});

describe("salt content", () => {
  it("gives the salinity back on either basis", () => {
    fc.assert(
      fc.property(
        between(0, 42),
        fc.constantFrom("reference" as const, "nominal" as const),
        (salinityPsu, basis) => {
          const content = saltContentGPerKg({ salinityPsu, basis });
          expect(salinityFromSaltContent({ saltContentGPerKg: content, basis })).toBeCloseTo(salinityPsu, 11);
        },
      ),
    );
    expect(() => saltContentGPerKg({ salinityPsu: 43 })).toThrow(RangeError);
    expect(() => salinityFromSaltContent({ saltContentGPerKg: 50 })).toThrow(RangeError);
  });
});
