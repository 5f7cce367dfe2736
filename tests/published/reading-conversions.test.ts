import { describe, expect, it } from "vitest";
import { type ConversionContext, convertReading } from "@/modules/methods/rules/convert-reading";

/**
 * Values computed outside this project from the published formulas: EOS-80 (Millero & Poisson 1981) and PSS-78
 * (UNESCO 44) evaluated with mpmath to 30 digits.
 */
const CHECKS: readonly (readonly [number, string, string, number, number, ConversionContext])[] = [
  [35, "psu", "SG 20/20 °C", 1.026604156, 1e-6, {}],
  [35, "psu", "SG 25/25 °C", 1.026372709, 1e-6, {}],
  [35, "psu", "SG 60/60 °F", 1.026859475, 1e-6, {}],
  [35, "psu", "SG 77/60 °F", 1.024349791, 1e-6, {}],
  [30, "psu", "SG 20/20 °C", 1.022788215, 1e-6, {}],
  [1.026, "SG 25/25 °C", "psu", 34.50823023, 0.001, {}],
  [1.0264, "SG 20/20 °C", "psu", 34.73282836, 0.001, {}],
  [1.023, "SG 77/60 °F", "psu", 33.21485196, 0.001, {}],
  [48, "mS/cm (salinity)", "psu", 35.0671887, 1e-5, { sampleTemperatureC: 20 }],
  [43, "mS/cm (salinity)", "psu", 35.07525255, 1e-5, { sampleTemperatureC: 15 }],
  [53.16156663, "mS/cm at 25 °C (salinity)", "psu", 35.0671887, 1e-5, {}],
  // 2300 µmol/kg × 1023.343 kg/m³ (UNESCO 44, S 35 at 25 °C IPTS-68)
  [2300, "µmol/kg", "meq/L", 2.3536889, 1e-5, { salinityPsu: 35, sampleTemperatureC: 25 }],
];

describe("readings whose units need more than a factor", () => {
  it.each(CHECKS)("%d %s in %s is %d", (value, from, to, expected, tolerance, context) => {
    const converted = convertReading(value, from, to, context);
    expect(converted.ok && Math.abs(converted.value - expected)).toBeLessThanOrEqual(tolerance);
  });
});
