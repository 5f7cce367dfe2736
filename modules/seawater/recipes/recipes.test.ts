import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { ASTM_D1141 } from "./astm-d1141.data";
import { compoundGPerMol } from "./compound-mass";
import { COMPOUNDS, type Compound } from "./compounds.data";
import { IONS } from "./ions.data";
import { KESTER_1967 } from "./kester-1967.data";
import { leastSquares, nonNegativeLeastSquares, residual } from "./least-squares";
import { recipeTotals } from "./recipe";
import { solveRecipe } from "./recipe-solver";
import { REFERENCE_IONS, referenceConstituent } from "./reference-composition";
import { REFERENCE_COMPOSITION } from "./reference-composition.data";

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const compounds = Object.keys(COMPOUNDS) as Compound[];
const ingredient = fc.record({
  compound: fc.constantFrom(...compounds),
  massG: between(0, 1000),
  hydrationWaters: fc.integer({ min: 0, max: 12 }),
  purityFraction: between(0.5, 1),
});

describe("recipes", () => {
  it("keep mass to 1e-9: salt, crystal water and impurities are what was weighed, the ions are the salt", () => {
    fc.assert(
      fc.property(fc.array(ingredient, { minLength: 1, maxLength: 12 }), (ingredients) => {
        const totals = recipeTotals({ title: "any", per: "kg", ingredients });
        const weighed = ingredients.reduce((sum, { massG }) => sum + massG, 0);
        const whole = totals.saltG + totals.crystalWaterG + totals.impurityG;
        expect(Math.abs(whole - weighed)).toBeLessThanOrEqual(1e-9 * Math.max(1, weighed));
        const ionsG = totals.ions.reduce((sum, { mg }) => sum + mg / 1000, 0);
        expect(Math.abs(ionsG - totals.saltG)).toBeLessThanOrEqual(1e-9 * Math.max(1, weighed));
      }),
    );
  });

  it("are neutral", () => {
    for (const recipe of [ASTM_D1141, KESTER_1967]) {
      expect(Math.abs(recipeTotals(recipe).chargeMmol)).toBeLessThan(1e-9);
    }
  });

  it("refuse negative amounts, purities outside 0 to 1 and negative waters", () => {
    const with1 = (change: object) => () =>
      recipeTotals({ title: "x", per: "L", ingredients: [{ compound: "NaCl", massG: 1, ...change }] });
    expect(with1({ massG: -1 })).toThrow(RangeError);
    expect(with1({ purityFraction: 0 })).toThrow(RangeError);
    expect(with1({ purityFraction: 1.1 })).toThrow(RangeError);
    expect(with1({ hydrationWaters: -1 })).toThrow(RangeError);
    expect(with1({ massG: undefined, amountMol: -1 })).toThrow(RangeError);
    expect(() => compoundGPerMol({ compound: "MgCl2", hydrationWaters: Number.NaN })).toThrow(RangeError);
  });

  it("know compounds that are neutral", () => {
    for (const { ions } of Object.values(COMPOUNDS)) {
      const charge = Object.entries(ions).reduce(
        (sum, [ion, count]) => sum + count * IONS[ion as keyof typeof IONS].charge,
        0,
      );
      expect(charge).toBe(0);
    }
  });
});

describe("the reference composition", () => {
  it("adds up to one in moles and mass, and is neutral", () => {
    const parts = REFERENCE_IONS.map((ion) => ({ ...REFERENCE_COMPOSITION[ion], charge: IONS[ion].charge }));
    expect(parts.reduce((sum, { moleFraction }) => sum + moleFraction, 0)).toBeCloseTo(1, 6);
    expect(parts.reduce((sum, { massFraction }) => sum + massFraction, 0)).toBeCloseTo(1, 6);
    expect(parts.reduce((sum, { moleFraction, charge }) => sum + moleFraction * charge, 0)).toBeCloseTo(0, 6);
  });

  it("refuses an ion that it does not have and salinities outside 0 to 42", () => {
    expect(() => referenceConstituent({ ion: "I", salinityPsu: 35 })).toThrow(
      "ion I is not in the reference composition.",
    );
    expect(() => referenceConstituent({ ion: "Na", salinityPsu: 50 })).toThrow(RangeError);
  });
});

const column = fc.array(between(-5, 5), { minLength: 5, maxLength: 5 });

describe("non-negative least squares", () => {
  it("meets the Karush-Kuhn-Tucker conditions: nothing negative, and no change would help", () => {
    fc.assert(
      fc.property(fc.array(column, { minLength: 1, maxLength: 8 }), column, (columns, b) => {
        const x = nonNegativeLeastSquares(columns, b);
        const rest = residual(columns, b, x);
        columns.forEach((one, j) => {
          const gain = one.reduce((sum, value, i) => sum + value * rest[i]!, 0);
          const size = Math.hypot(...one) * Math.hypot(...b);
          expect(x[j]!).toBeGreaterThanOrEqual(0);
          expect(gain).toBeLessThanOrEqual(1e-8 * size + 1e-12);
          if (x[j]! > 0) expect(Math.abs(gain)).toBeLessThanOrEqual(1e-6 * size + 1e-12);
        });
      }),
    );
  });

  it("finds a mixture that is exactly there", () => {
    fc.assert(
      fc.property(fc.array(between(0, 3), { minLength: 3, maxLength: 3 }), (amounts) => {
        const columns = [
          [1, 0, 0, 1],
          [0, 2, 0, 1],
          [0, 1, 3, 0],
        ];
        const b = [0, 1, 2, 3].map((i) => columns.reduce((sum, one, j) => sum + one[i]! * amounts[j]!, 0));
        nonNegativeLeastSquares(columns, b).forEach((value, j) => {
          expect(Math.abs(value - amounts[j]!)).toBeLessThan(1e-9);
        });
      }),
    );
  });

  it("refuses columns of another length, and says when columns depend on one another", () => {
    expect(() => nonNegativeLeastSquares([[1, 2]], [1])).toThrow(RangeError);
    expect(
      leastSquares(
        [
          [1, 2],
          [2, 4],
        ],
        [1, 1],
      ),
    ).toBeNull();
  });
});

describe("the recipe solver", () => {
  it("shows what the salts on hand cannot reach", () => {
    const solved = solveRecipe({
      salts: [{ compound: "NaCl" }],
      targets: [
        { ion: "Na", mmol: 100 },
        { ion: "Mg", mmol: 50 },
      ],
    });
    expect(solved.ions[1]).toMatchObject({
      ion: "Mg",
      achievedMmol: 0,
      residualMmol: -50,
      residualPercent: -100,
    });
    expect(solved.residualNormPercent).toBeGreaterThanOrEqual(100 - 1e-9);
    expect(solved.untargeted.map(({ ion }) => ion)).toEqual(["Cl"]);
  });

  it("asks for more of an impure or wetter salt, in proportion", () => {
    const targets = [{ ion: "Mg" as const, mmol: 50 }];
    const mass = (salt: object) =>
      solveRecipe({ salts: [{ compound: "MgCl2", ...salt }], targets }).salts[0]!.massG;
    expect(mass({ purityFraction: 0.5 })).toBeCloseTo(2 * mass({}), 9);
    expect(mass({ hydrationWaters: 6 }) / mass({})).toBeCloseTo(203.295 / 95.205, 9);
  });

  it("refuses empty lists, targets of nothing and an ion named twice", () => {
    const salts = [{ compound: "NaCl" as const }];
    expect(() => solveRecipe({ salts: [], targets: [{ ion: "Na", mmol: 1 }] })).toThrow(RangeError);
    expect(() => solveRecipe({ salts, targets: [] })).toThrow(RangeError);
    expect(() => solveRecipe({ salts, targets: [{ ion: "Na", mmol: 0 }] })).toThrow(RangeError);
    expect(() => solveRecipe({ salts, targets: [{ ion: "Na", mmol: 1, weight: 0 }] })).toThrow(RangeError);
    expect(() =>
      solveRecipe({
        salts,
        targets: [
          { ion: "Na", mmol: 1 },
          { ion: "Na", mmol: 2 },
        ],
      }),
    ).toThrow("targets: an ion is named twice.");
  });
});
