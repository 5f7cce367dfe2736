import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { densityKgPerM3 } from "../water/density";
import { alkalinityMeqPerL, alkalinityUmolPerKg } from "./alkalinity-per-kg";
import { carbonateSystem } from "./carbonate";
import { lnSeawaterConstant } from "./dissociation";
import { convertPH, PH_SCALES } from "./ph-scale";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const water = {
  alkalinityMeqPerL: 2.4,
  pH: 8.1,
  pHScale: "total" as const,
  temperatureC: 22,
  salinityPsu: 34,
};

describe("the carbonate system", () => {
  it("keeps its parts: DIC is their sum and each stands to the next by its constant", () => {
    fc.assert(
      fc.property(between(1.5, 5), between(7.4, 8.6), between(2, 35), between(19, 42), (a, pH, t, s) => {
        const at = { temperatureC: t, salinityPsu: s };
        const got = carbonateSystem({ ...at, alkalinityMeqPerL: a, pH, pHScale: "total" });
        const sum = got.co2UmolPerKg + got.bicarbonateUmolPerKg + got.carbonateUmolPerKg;
        expect(Math.abs(sum / got.dicUmolPerKg - 1)).toBeLessThan(1e-12);
        const k2 = Math.exp(lnSeawaterConstant({ ...at, constant: "K2" }));
        expect((got.carbonateUmolPerKg * 10 ** -pH) / got.bicarbonateUmolPerKg / k2).toBeCloseTo(1, 9);
        expect(got.omegaCalcite).toBeGreaterThan(got.omegaAragonite);
      }),
    );
  });

  it("has less carbon dioxide and more carbonate at higher pH", () => {
    fc.assert(
      fc.property(between(7.2, 8.6), between(2, 35), (pH, temperatureC) => {
        const here = carbonateSystem({ ...water, pH, temperatureC });
        const higher = carbonateSystem({ ...water, pH: pH + 0.05, temperatureC });
        expect(higher.pco2Uatm).toBeLessThan(here.pco2Uatm);
        expect(higher.omegaAragonite).toBeGreaterThan(here.omegaAragonite);
        expect(higher.dicUmolPerKg).toBeLessThan(here.dicUmolPerKg);
      }),
    );
  });

  it("says the same of one water whose pH is stated on any scale", () => {
    const total = carbonateSystem(water);
    for (const pHScale of PH_SCALES) {
      const pH = convertPH({ ...water, from: "total", to: pHScale });
      const got = carbonateSystem({ ...water, pH, pHScale });
      expect(got.omegaAragonite).toBeCloseTo(total.omegaAragonite, 9);
      expect(got.pHApproximate).toBe(pHScale === "nbs");
    }
  });

  it("takes measured calcium in proportion", () => {
    const half = carbonateSystem({ ...water, calciumMgPerL: 200 });
    const whole = carbonateSystem({ ...water, calciumMgPerL: 400 });
    expect(whole.omegaAragonite / half.omegaAragonite).toBeCloseTo(2, 12);
    expect(half.dicUmolPerKg).toBe(whole.dicUmolPerKg);
  });

  it("counts phosphate and silicate as alkalinity that is not carbonate", () => {
    const plain = carbonateSystem(water);
    const phosphate = carbonateSystem({ ...water, phosphateUmolPerKg: 10 });
    // At pH 8.1 phosphate carries a little over one equivalent per mole (Dickson, Sabine and Christian 2007, ch. 2).
    const lost =
      plain.bicarbonateUmolPerKg +
      2 * plain.carbonateUmolPerKg -
      phosphate.bicarbonateUmolPerKg -
      2 * phosphate.carbonateUmolPerKg;
    expect(lost).toBeGreaterThan(10);
    expect(lost).toBeLessThan(13);
    expect(carbonateSystem({ ...water, silicateUmolPerKg: 100 }).dicUmolPerKg).toBeLessThan(
      plain.dicUmolPerKg,
    );
  });

  it("turns meq/L into µmol/kg and back", () => {
    fc.assert(
      fc.property(between(0.1, 10), between(0, 42), between(0, 40), (meq, salinityPsu, temperatureC) => {
        const density = densityKgPerM3({ salinityPsu, temperatureC });
        const perKg = alkalinityUmolPerKg({ alkalinityMeqPerL: meq, densityKgPerM3: density });
        expect(alkalinityMeqPerL({ alkalinityUmolPerKg: perKg, densityKgPerM3: density })).toBeCloseTo(
          meq,
          12,
        );
      }),
    );
    expect(() => alkalinityMeqPerL({ alkalinityUmolPerKg: 2300, densityKgPerM3: 0 })).toThrow(RangeError);
  });

  it.each([
    ["cold water below 2 °C", { temperatureC: 1 }],
    ["brackish water below 19 psu", { salinityPsu: 18 }],
    ["a pH that is no seawater", { pH: 5 }],
    ["no alkalinity", { alkalinityMeqPerL: 0 }],
    ["an alkalinity too low for its pH", { alkalinityMeqPerL: 0.3, pH: 9.5 }],
    ["negative calcium", { calciumMgPerL: -1 }],
    ["negative phosphate", { phosphateUmolPerKg: -1 }],
    ["negative silicate", { silicateUmolPerKg: -1 }],
    [
      "an NBS pH below 20 psu, where the conversion is not known",
      { salinityPsu: 19.5, pHScale: "nbs" as const },
    ],
  ])("refuses %s", (_, change) => {
    expect(() => carbonateSystem({ ...water, ...change })).toThrow(RangeError);
  });
});

describe("pH scales", () => {
  it("turn into each other and back", () => {
    const scale = fc.constantFrom(...PH_SCALES);
    fc.assert(
      fc.property(between(6, 9), scale, scale, between(0, 40), between(20, 40), (pH, from, to, t, s) => {
        const at = { temperatureC: t, salinityPsu: s };
        const there = convertPH({ pH, from, to, ...at });
        expect(convertPH({ pH: there, from: to, to: from, ...at })).toBeCloseTo(pH, 12);
      }),
    );
  });

  it("stand in the order free above total above seawater", () => {
    const at = { pH: 8, temperatureC: 25, salinityPsu: 35, from: "total" as const };
    expect(convertPH({ ...at, to: "free" })).toBeGreaterThan(8);
    expect(convertPH({ ...at, to: "seawater" })).toBeLessThan(8);
  });
});
