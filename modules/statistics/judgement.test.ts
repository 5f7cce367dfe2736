import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { conformanceProbability, decide, globalRisks } from "./decision-rules";
import { dixonCritical, dixonTest } from "./dixon";
import { generalisedEsd } from "./generalised-esd";
import { grubbsTest } from "./grubbs";
import { kendall } from "./kendall";
import { mannKendall, seasonalMannKendall } from "./mann-kendall";
import { enScore, zScore } from "./proficiency";
import { theilSen } from "./theil-sen";
import { combineUncertainty, expandedUncertainty, propagate } from "./uncertainty";

const series = fc.array(fc.integer({ min: -50, max: 50 }), { minLength: 4, maxLength: 30 });

describe("outliers", () => {
  it("tests do not depend on unit or zero point", () => {
    const values = [10.1, 10.3, 10.2, 10.25, 10.15, 11.4];
    const moved = values.map((value) => 1.8 * value + 32);
    expect(grubbsTest({ values: moved }).g).toBeCloseTo(grubbsTest({ values }).g, 9);
    expect(dixonTest({ values: moved }).q).toBeCloseTo(dixonTest({ values }).q, 9);
  });

  it("two outliers side by side hide from Grubbs' test, not from the generalised ESD", () => {
    const values = [10, 10.2, 9.9, 10.1, 10.05, 9.95, 10.15, 9.85, 10, 10.1, 9.9, 10.05, 14, 14.1];
    expect(grubbsTest({ values }).outlier).toBe(false);
    expect(new Set(generalisedEsd({ values, most: 4 }).outliers)).toEqual(new Set([12, 13]));
  });

  it("calm values hold no outlier; equal values cannot be tested", () => {
    const values = [1, 2, 3, 4, 5, 6, 7, 8];
    expect(generalisedEsd({ values, most: 3 }).outliers).toEqual([]);
    expect(() => grubbsTest({ values: [2, 2, 2] })).toThrow(/equal/);
    expect(() => dixonTest({ values: [2, 2, 2] })).toThrow(/equal/);
    expect(generalisedEsd({ values: [2, 2, 2, 2], most: 2 })).toEqual({ steps: [], outliers: [] });
  });

  it("a named side looks at that side alone", () => {
    const values = [1, 5, 5.1, 5.2, 5.3, 5.4];
    expect(dixonTest({ values, side: "greatest" }).outlier).toBe(false);
    expect(dixonTest({ values, side: "smallest" })).toMatchObject({ outlier: true, suspect: 1 });
    expect(grubbsTest({ values, side: "smallest" }).index).toBe(0);
  });

  it("sizes outside the tests are refused", () => {
    expect(() => dixonCritical({ n: 2, alpha: 0.05 })).toThrow(RangeError);
    expect(() => dixonCritical({ n: 31, alpha: 0.05 })).toThrow(RangeError);
    expect(() => grubbsTest({ values: [1, 2] })).toThrow(RangeError);
    expect(() => generalisedEsd({ values: [1, 2, 3], most: 2 })).toThrow(/at least 4/);
  });
});

describe("trends", () => {
  it("time turned round turns S and slope round", () => {
    fc.assert(
      fc.property(series, (values) => {
        const backward = values.toReversed();
        expect(mannKendall({ values: backward }).s).toBe(-mannKendall({ values }).s + 0);
        const times = values.map((_, i) => i);
        const slope = theilSen({ times, values }).slope;
        expect(theilSen({ times, values: backward }).slope).toBeCloseTo(-slope, 9);
        const tilted = theilSen({ times, values: values.map((value, i) => value + 3 * i) });
        expect(tilted.slope).toBeCloseTo(slope + 3, 9);
        expect(tilted.slopeLower).toBeLessThanOrEqual(tilted.slope + 1e-9);
        expect(tilted.slopeUpper).toBeGreaterThanOrEqual(tilted.slope - 1e-9);
      }),
    );
  });

  it("the variance of S without ties is n(n - 1)(2n + 5)/18, and all values equal give 0", () => {
    expect(mannKendall({ values: [3, 1, 4, 1.5, 9] }).variance).toBeCloseTo((5 * 4 * 15) / 18, 12);
    expect(mannKendall({ values: [2, 2, 2, 2] })).toMatchObject({
      s: 0,
      variance: 0,
      z: 0,
      pTwoSided: 1,
      tauB: 0,
    });
  });

  it("one season is the plain test; two seasons add S and variance (Hirsch, Slack and Smith 1982)", () => {
    const values = [3, 1, 4, 1, 5, 9];
    const one = seasonalMannKendall({ values, seasons: values.map(() => 1) });
    expect(one).toMatchObject({ s: mannKendall({ values }).s, variance: mannKendall({ values }).variance });
    const two = seasonalMannKendall({ values: [1, 50, 2, 51, 3, 52], seasons: [1, 2, 1, 2, 1, 2] });
    expect(two.s).toBe(6);
    expect(two.variance).toBeCloseTo(2 * ((3 * 2 * 11) / 18), 12);
    expect(two.z).toBeCloseTo(5 / Math.sqrt(22 / 3), 12);
    expect(two.seasons).toEqual([
      { season: 1, n: 3, s: 3 },
      { season: 2, n: 3, s: 3 },
    ]);
  });

  it("a swing with the seasons alone is no trend", () => {
    const values = Array.from({ length: 24 }, (_, i) => 10 * (i % 4));
    expect(seasonalMannKendall({ values, seasons: values.map((_, i) => i % 4) }).s).toBe(0);
  });

  it("too few values, no season with two and equal times are refused", () => {
    expect(() => mannKendall({ values: [1, 2, 3] })).toThrow(/at least 4/);
    expect(() => seasonalMannKendall({ values: [1, 2], seasons: [1, 2] })).toThrow(/No season/);
    expect(() => seasonalMannKendall({ values: [1, 2], seasons: [1] })).toThrow(/season/);
    expect(() => theilSen({ times: [1, 1, 1, 1], values: [1, 2, 3, 4] })).toThrow(/All times are equal/);
    expect(() => kendall({ x: new Float64Array(5001), y: new Float64Array(5001) })).toThrow(/At most 5000/);
  });
});

describe("uncertainty", () => {
  it("independent contributions add as squares, fully correlated ones plainly", () => {
    const part = fc.double({ min: 0.001, max: 100, noNaN: true });
    fc.assert(
      fc.property(part, part, (a, b) => {
        const inputs = [{ u: a }, { u: b }];
        const u = (r: number) =>
          combineUncertainty({ inputs, sensitivities: [1, 1], correlations: [{ between: [0, 1], r }] }).u;
        expect(u(0)).toBeCloseTo(Math.hypot(a, b), 9);
        expect(u(1)).toBeCloseTo(a + b, 9);
        expect(u(-1)).toBeCloseTo(Math.abs(a - b), 5);
      }),
    );
  });

  it("a product has the relative uncertainties of its factors added as squares", () => {
    const { value, u, shares } = propagate({
      model: ([a, b]) => (a as number) * (b as number),
      inputs: [
        { value: 5, u: 0.05 },
        { value: 20, u: 0.4 },
      ],
    });
    expect(value).toBe(100);
    expect(u).toBeCloseTo(100 * Math.hypot(0.01, 0.02), 9);
    expect(shares[1]?.contribution).toBeCloseTo(2, 9);
  });

  it("one component alone keeps its degrees of freedom; equal components with equal ones double them", () => {
    expect(combineUncertainty({ inputs: [{ u: 2, df: 7 }], sensitivities: [3] }).df).toBeCloseTo(7, 12);
    const both = combineUncertainty({
      inputs: [
        { u: 1, df: 5 },
        { u: 1, df: 5 },
      ],
      sensitivities: [1, 1],
    });
    expect(both.df).toBeCloseTo(10, 12);
  });

  it("correlations that contradict one another, negative uncertainties and formulas without a result are refused", () => {
    const inputs = [{ u: 1 }, { u: 1 }, { u: 1 }];
    const correlations = [
      { between: [0, 1], r: -1 },
      { between: [1, 2], r: -1 },
      { between: [0, 2], r: -1 },
    ] as const;
    expect(() => combineUncertainty({ inputs, sensitivities: [1, 1, 1], correlations })).toThrow(
      /contradict/,
    );
    expect(() => combineUncertainty({ inputs: [{ u: -1 }], sensitivities: [1] })).toThrow(/zero or more/);
    expect(() => combineUncertainty({ inputs, sensitivities: [1] })).toThrow(/sensitivity/);
    const outside = [{ between: [0, 5], r: 0.1 }] as const;
    expect(() => combineUncertainty({ inputs, sensitivities: [1, 1, 1], correlations: outside })).toThrow(
      /not possible/,
    );
    expect(() => propagate({ model: () => Number.NaN, inputs: [{ value: 1, u: 1 }] })).toThrow(/finite/);
    expect(() => expandedUncertainty({ u: 1, df: 0.5, confidence: 0.95 })).toThrow(RangeError);
  });
});

describe("decisions and scores", () => {
  it("a wider guard band never turns a fail into a pass", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 2, noNaN: true }),
        fc.double({ min: 0, max: 2, noNaN: true }),
        (value, guard) => {
          const given = { value, limit: 1, side: "upper", expanded: 0.2 } as const;
          const narrow = decide({ ...given, guard });
          const wide = decide({ ...given, guard: guard + 0.5 });
          if (narrow.guarded === "fail") expect(wide.guarded).toBe("fail");
          if (narrow.simple === "fail") expect(narrow.guarded).toBe("fail");
        },
      ),
    );
  });

  it("64.4 degF is on a limit of 18 degC and passes", () => {
    const value = ((64.4 - 32) * 5) / 9;
    expect(decide({ value, limit: 18, side: "upper", expanded: 0.1, guard: 0 }).guarded).toBe("pass");
    expect(decide({ value, limit: 18, side: "lower", expanded: 0.1, guard: 0 }).guarded).toBe("pass");
  });

  it("chances of two limits add up to one with what lies beyond them", () => {
    const inside = conformanceProbability({ value: 5, u: 1, lower: 4, upper: 6 });
    const below = 1 - conformanceProbability({ value: 5, u: 1, lower: 4 });
    const above = 1 - conformanceProbability({ value: 5, u: 1, upper: 6 });
    expect(inside + below + above).toBeCloseTo(1, 12);
    expect(() => conformanceProbability({ value: 5, u: 1 })).toThrow(/limit is needed/);
    expect(() => conformanceProbability({ value: 5, u: 1, lower: 6, upper: 4 })).toThrow(RangeError);
  });

  it("a guard band trades the consumer's risk for the producer's", () => {
    const given = { priorMean: 0, priorSd: 1, u: 0.25, limit: 2 };
    const simple = globalRisks({ ...given, acceptance: 2 });
    const guarded = globalRisks({ ...given, acceptance: 1.6 });
    expect(guarded.consumer).toBeLessThan(simple.consumer);
    expect(guarded.producer).toBeGreaterThan(simple.producer);
  });

  it("scores without a spread are refused", () => {
    expect(() => zScore({ result: 1, assigned: 1, sigma: 0 })).toThrow(RangeError);
    expect(() => enScore({ result: 1, assigned: 1, expanded: 0, expandedAssigned: 0 })).toThrow(RangeError);
  });
});

describe("what is not a number is refused, never passed on", () => {
  const none = Number.NaN;
  it.each<[string, () => unknown]>([
    ["a score without an assigned value", () => zScore({ result: 1, assigned: none, sigma: 1 })],
    ["a chance without a value", () => conformanceProbability({ value: none, u: 1, upper: 2 })],
    ["a decision without a limit", () => decide({ value: 1, limit: none, side: "upper", expanded: 1 })],
    [
      "risks without a prior",
      () => globalRisks({ priorMean: none, priorSd: 1, u: 1, limit: 1, acceptance: 1 }),
    ],
    ["a trend without a season", () => seasonalMannKendall({ values: [1, 2], seasons: [none, none] })],
    ["an outlier test", () => grubbsTest({ values: [1, 2, none] })],
    ["an expanded uncertainty", () => expandedUncertainty({ u: none, df: 5, confidence: 0.95 })],
  ])("%s", (_name, ask) => expect(ask).toThrow(RangeError));
});
