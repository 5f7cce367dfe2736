import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { defaultAmmoniaFormula, unionizedAmmonia, unionizedFromFraction } from "./ammonia";
import { ammoniumPKa } from "./ammonium-pka";
import { PH_SCALES } from "./ph-scale";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const sample = { totalAmmoniaMgNPerL: 0.2, temperatureC: 20, salinityPsu: 33, pH: 8 };

describe("free ammonia", () => {
  it("rises with pH and temperature on every scale, and is a share", () => {
    fc.assert(
      fc.property(
        between(6, 9.5),
        between(1, 38),
        fc.constantFrom(...PH_SCALES),
        (pH, temperatureC, pHScale) => {
          const at = { ...sample, pH, temperatureC, pHScale };
          const here = unionizedAmmonia(at).fraction;
          expect(here).toBeGreaterThan(0);
          expect(here).toBeLessThan(1);
          expect(unionizedAmmonia({ ...at, pH: pH + 0.1 }).fraction).toBeGreaterThan(here);
          expect(unionizedAmmonia({ ...at, temperatureC: temperatureC + 1 }).fraction).toBeGreaterThan(here);
        },
      ),
    );
  });

  it("says which scale and formula it rests on", () => {
    expect(unionizedAmmonia({ ...sample, pHScale: "total" })).toMatchObject({
      formula: "clegg-whitfield-1995",
      pHScale: "total",
      formulaPHScale: "total",
      concentrationBasis: "mol/kg-water",
    });
    expect(unionizedAmmonia({ ...sample, pHScale: "seawater" })).toMatchObject({
      formula: "yao-millero-1995",
    });
    expect(unionizedAmmonia({ ...sample, pHScale: "nbs" })).toMatchObject({ formula: "epa-1989" });
    expect(defaultAmmoniaFormula({ pHScale: "nbs", salinityPsu: 0.2 })).toBe("emerson-1975");
  });

  it("brings total, free and seawater pH to the formula's own scale", () => {
    const got = unionizedAmmonia({ ...sample, pHScale: "total", formula: "yao-millero-1995" });
    expect(got.formulaPHScale).toBe("seawater");
    expect(got.formulaPH).toBeLessThan(8);
    expect(got.formulaPH).toBeGreaterThan(7.95);
  });

  it("never mixes an NBS pH with a formula of another scale, nor the reverse", () => {
    expect(() => unionizedAmmonia({ ...sample, pHScale: "nbs", formula: "clegg-whitfield-1995" })).toThrow(
      /written for pH on the total or free scale; a pH on the nbs scale would be out by up to 30 %/,
    );
    expect(() => unionizedAmmonia({ ...sample, pHScale: "total", formula: "epa-1989" })).toThrow(RangeError);
    expect(() =>
      ammoniumPKa({ formula: "bell-2008", pHScale: "total", temperatureC: 20, salinityPsu: 33 }),
    ).toThrow(RangeError);
  });

  it("keeps each formula inside its range", () => {
    const nbs = { ...sample, pHScale: "nbs" as const };
    expect(() => unionizedAmmonia({ ...nbs, formula: "emerson-1975" })).toThrow(/salinityPsu is 33 psu/);
    expect(() => unionizedAmmonia({ ...nbs, formula: "bower-bidwell-1978", temperatureC: 26 })).toThrow(
      RangeError,
    );
    expect(() => unionizedAmmonia({ ...nbs, formula: "bower-bidwell-1978", pH: 8.6 })).toThrow(RangeError);
    expect(() => unionizedAmmonia({ ...nbs, formula: "bower-bidwell-1978", salinityPsu: 28 })).toThrow(
      RangeError,
    );
    expect(() => unionizedAmmonia({ ...sample, pHScale: "total", salinityPsu: 41 })).toThrow(RangeError);
    expect(() => unionizedAmmonia({ ...sample, pHScale: "total", pH: 14 })).toThrow(RangeError);
    expect(() => unionizedAmmonia({ ...sample, pHScale: "total", totalAmmoniaMgNPerL: -0.1 })).toThrow(
      RangeError,
    );
  });

  it("never makes more free ammonia than there is nitrogen", () => {
    fc.assert(
      fc.property(between(0, 50), between(0, 1), (totalAmmoniaMgNPerL, fraction) => {
        const { unionizedMgNPerL } = unionizedFromFraction({ totalAmmoniaMgNPerL, fraction });
        expect(unionizedMgNPerL).toBeLessThanOrEqual(totalAmmoniaMgNPerL);
      }),
    );
    expect(() => unionizedFromFraction({ totalAmmoniaMgNPerL: 1, fraction: 1.1 })).toThrow(RangeError);
  });
});
