import { describe, expect, it } from "vitest";
import { PARAMETER_CATALOGUE } from "../catalogue.data";
import { toCanonical } from "./to-canonical";

function parameter(code: string) {
  const found = PARAMETER_CATALOGUE.find((each) => each.code === code);
  if (!found) throw new Error(`no parameter ${code}`);
  return found;
}

function refusal(act: () => unknown): string {
  try {
    act();
  } catch (error) {
    if (error instanceof RangeError) return error.message;
    throw error;
  }
  return "no refusal";
}

describe("a typed value in its canonical unit", () => {
  it("takes any spelling of an accepted unit, and the canonical unit when none is given", () => {
    expect(toCanonical(64.4, "deg F", parameter("temperature"))).toBeCloseTo(18, 12);
    expect(toCanonical(18, null, parameter("temperature"))).toBe(18);
    expect(toCanonical(18, "", parameter("temperature"))).toBe(18);
    expect(toCanonical(35, "ppt", parameter("salinity"))).toBe(35);
    // 34.50823 by EOS-80 (Millero & Poisson 1981), evaluated outside this project
    expect(toCanonical(1.026, "sg 25/25", parameter("salinity"))).toBeCloseTo(34.50823, 3);
    // 35.0671887 by PSS-78 (UNESCO 44), evaluated outside this project
    expect(toCanonical(48, "mS/cm", parameter("salinity"), { sampleTemperatureC: 20 })).toBeCloseTo(
      35.06719,
      5,
    );
  });

  it("refuses what is not accepted, has two meanings, lacks its temperature or is out of range", () => {
    const salinity = parameter("salinity");
    expect(refusal(() => toCanonical(1, "meq/L", salinity))).toContain("“meq/L” is not");
    expect(refusal(() => toCanonical(5, "mg/L", parameter("nitrate")))).toContain("mg/L NO3 or mg/L NO3-N");
    expect(refusal(() => toCanonical(48, "mS/cm", salinity))).toContain(
      "needs the temperature of the sample",
    );
    expect(refusal(() => toCanonical(35, "SG 25/25 °C", salinity))).toContain("outside the range");
    expect(refusal(() => toCanonical(1, "°C", parameter("pump_running")))).toContain("no unit");
    expect(toCanonical(1, null, parameter("pump_running"))).toBe(1);
  });
});
