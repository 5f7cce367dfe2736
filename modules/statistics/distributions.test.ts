import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { chiSquareCdf, chiSquareQuantile } from "./chi-square";
import { findRoot } from "./find-root";
import { fisherFQuantile, fisherFUpperTail } from "./fisher-f";
import { logGamma } from "./gamma";
import { gaussLegendre } from "./gauss-legendre";
import { solveLinearSystem } from "./linear-system";
import { normalCdf, normalQuantile } from "./normal";
import { noncentralTCdf, studentTCdf, studentTQuantile } from "./student-t";

const share = fc.double({ min: 1e-6, max: 1 - 1e-6, noNaN: true });
const df = fc.double({ min: 1, max: 500, noNaN: true });

/** Values of scipy 1.17 (stats.t, chi2, f, nct, norm) and mpmath (log gamma). */
const SCIPY: readonly (readonly [string, number, number])[] = [
  ["t(0.9999, 3)", studentTQuantile(0.9999, 3), 22.203742273205],
  ["t(0.975, 2.5)", studentTQuantile(0.975, 2.5), 3.5746548420036817],
  ["chi2(0.999, 1)", chiSquareQuantile(0.999, 1), 10.827566170662733],
  ["F(0.95, 3, 20)", fisherFQuantile(0.95, 3, 20), 3.098391212140781],
  ["noncentral t cdf(5; 10, 2)", noncentralTCdf(5, 10, 2), 0.9761872541464174],
  ["noncentral t cdf(-1; 4, 1)", noncentralTCdf(-1, 4, 1), 0.0327732953320278],
  ["normal cdf(-8)", normalCdf(-8), 6.22096057427174e-16],
  ["ln gamma(0.3)", logGamma(0.3), 1.0957979948180756],
  ["ln gamma(123.4)", logGamma(123.4), 469.3360974421906],
];

describe("distributions", () => {
  it.each(SCIPY)("%s agrees with scipy or mpmath to 12 digits", (_name, ours, theirs) => {
    expect(ours / theirs).toBeCloseTo(1, 12);
  });

  it("a quantile is where its distribution reaches the share", () => {
    fc.assert(
      fc.property(share, df, (p, n) => {
        expect(normalCdf(normalQuantile(p))).toBeCloseTo(p, 12);
        expect(studentTCdf(studentTQuantile(p, n), n)).toBeCloseTo(p, 11);
        expect(chiSquareCdf(chiSquareQuantile(p, n), n)).toBeCloseTo(p, 11);
        expect(1 - fisherFUpperTail(fisherFQuantile(p, n, 7), n, 7)).toBeCloseTo(p, 10);
      }),
      { numRuns: 40 },
    );
  });

  it("the square of a two-sided t is F with one degree of freedom above", () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 0.99, noNaN: true }), df, (p, n) => {
        const t = studentTQuantile((1 + p) / 2, n);
        expect(fisherFQuantile(p, 1, n) / (t * t)).toBeCloseTo(1, 9);
      }),
      { numRuns: 40 },
    );
  });

  it("infinitely many degrees of freedom give the normal distribution", () => {
    expect(studentTQuantile(0.975, Number.POSITIVE_INFINITY)).toBeCloseTo(normalQuantile(0.975), 13);
    expect(noncentralTCdf(1, 400, 0.5)).toBeCloseTo(normalCdf(0.5), 2);
  });

  it("shares of 0 and 1, and degrees of freedom of zero, are refused", () => {
    for (const p of [0, 1, -0.1, 1.1, Number.NaN]) expect(() => normalQuantile(p)).toThrow(RangeError);
    expect(() => studentTQuantile(0.9, 0)).toThrow(RangeError);
    expect(() => chiSquareQuantile(0.9, -1)).toThrow(RangeError);
    expect(() => fisherFQuantile(0.9, 0, 3)).toThrow(RangeError);
    expect(() => logGamma(0)).toThrow(RangeError);
  });
});

describe("numerical tools", () => {
  it("a Gauss-Legendre rule of n nodes is exact for polynomials of degree 2n - 1", () => {
    const { nodes, weights } = gaussLegendre(5, -1, 3);
    for (let degree = 0; degree <= 9; degree++) {
      const exact = (3 ** (degree + 1) - (-1) ** (degree + 1)) / (degree + 1);
      const ours = nodes.reduce((total, x, i) => total + weights[i]! * x ** degree, 0);
      expect(ours / exact || 1).toBeCloseTo(1, 11);
    }
  });

  it("a solved system gives back its right side", () => {
    const entry = fc.integer({ min: -9, max: 9 });
    fc.assert(
      fc.property(fc.array(fc.tuple(entry, entry, entry, entry), { minLength: 3, maxLength: 3 }), (rows) => {
        const matrix = rows.map(([a, b, c], i) => [a, b, c].map((value, j) => value + (i === j ? 40 : 0)));
        const right = rows.map((row) => row[3]);
        const x = solveLinearSystem(matrix, right);
        matrix.forEach((row, i) =>
          expect(row.reduce((total, value, j) => total + value * x[j]!, 0)).toBeCloseTo(right[i]!, 9),
        );
      }),
    );
  });

  it("a singular system and bounds without a change of sign are refused", () => {
    expect(() =>
      solveLinearSystem(
        [
          [1, 2],
          [2, 4],
        ],
        [1, 2],
      ),
    ).toThrow(RangeError);
    expect(() => findRoot((x) => x * x + 1, -1, 1)).toThrow(/No zero/);
  });
});
