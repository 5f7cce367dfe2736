import { describe, expect, it } from "vitest";
import {
  dixonCritical,
  dixonTest,
  generalisedEsd,
  grubbsCritical,
  grubbsTest,
  kendall,
  mannKendall,
  theilSen,
} from "@/modules/statistics";
import { caseOf, expectAllNear, expectNear, expectPrinted, titleOf } from "./statistics-cases";

type Numbers = Record<string, number>;

describe("outliers", () => {
  it(titleOf("grubbs-uranium"), () => {
    const id = "grubbs-uranium";
    const { input, expected_computed: want } = caseOf<
      { x: number[]; alpha: number },
      Numbers & { reject: boolean }
    >(id);
    const ours = grubbsTest({ values: input.x, alpha: input.alpha, side: "greatest" });
    expectNear(ours.g, want.G as number);
    expectNear(ours.critical, want.crit_one_sided as number);
    expectNear(grubbsCritical({ n: 8, alpha: 0.05, side: "either" }), want.crit_two_sided as number);
    expect(ours.index).toBe(want.outlier_index);
    expect(ours.outlier).toBe(want.reject);
    expectPrinted(id, "G", ours.g);
    expectPrinted(id, "crit_one_sided", ours.critical);
  });

  it(titleOf("esd-rosner54"), () => {
    const id = "esd-rosner54";
    const { input, expected_computed: want } = caseOf<
      { x: number[]; r: number; alpha: number },
      { R: number[]; lambda: number[]; removed: number[]; outliers: number }
    >(id);
    const ours = generalisedEsd({ values: input.x, most: input.r, alpha: input.alpha });
    const r = ours.steps.map((step) => step.r);
    const lambda = ours.steps.map((step) => step.critical);
    expectAllNear(r, want.R);
    expectAllNear(lambda, want.lambda);
    expect(ours.steps.map((step) => step.value)).toEqual(want.removed);
    expect(ours.outliers).toHaveLength(want.outliers);
    expect((r[0] as number) < (lambda[0] as number)).toBe(true);
    expectPrinted(id, "R", r);
    expectPrinted(id, "lambda", lambda);
    expectPrinted(id, "outliers", ours.outliers.length);
  });

  for (const [id, printedCritical] of [
    ["dixon-nitrite-4", 0.831],
    ["dixon-nitrite-7", 0.57],
  ] as const) {
    it(titleOf(id), () => {
      const { input, expected_computed: want, published } = caseOf<{ x: number[] }, Numbers>(id);
      const ours = dixonTest({ values: input.x });
      const grubbs = grubbsTest({ values: input.x });
      expectNear(ours.q, want.Q as number);
      expectNear(grubbs.g, want.G as number);
      expectNear(grubbs.critical, want.G_crit_two_sided_5 as number);
      expectPrinted(id, "Q", ours.q);
      expect(published?.Q_crit?.value).toBe(printedCritical);
      expect(Math.abs(ours.critical - printedCritical)).toBeLessThan(0.0015);
      expect(ours.outlier ? "reject" : "keep").toBe(published?.decision?.value);
    });
  }

  it(titleOf("dixon-critical-values"), () => {
    const {
      input,
      expected_computed: want,
      published,
    } = caseOf<
      { n: number[]; alpha_one_sided: number[] },
      { simulated: Record<string, number[]>; two_sided_5pct_simulated: Numbers }
    >("dixon-critical-values");
    const printed = published?.printed?.value as Record<string, number[]>;
    for (const n of input.n) {
      input.alpha_one_sided.forEach((alpha, i) => {
        const ours = dixonCritical({ n, alpha });
        const simulated = want.simulated[n]?.[i] as number;
        expect(Math.abs(ours - simulated), `n ${n}, ${alpha}: simulation`).toBeLessThan(0.0009);
        if (n === 4 && alpha === 0.005) return;
        expect(Math.abs(ours - (printed[n]?.[i] as number)), `n ${n}, ${alpha}: print`).toBeLessThan(0.0065);
      });
      const twoSided = want.two_sided_5pct_simulated[n];
      if (twoSided !== undefined)
        expect(Math.abs(dixonCritical({ n, alpha: 0.025 }) - twoSided)).toBeLessThan(0.0009);
    }
  });

  it("Dixon n 4 at 0.5 % is 0.921 by simulation; the printed 0.926 is a misprint", () => {
    expect(dixonCritical({ n: 4, alpha: 0.005 })).toBeCloseTo(0.921, 3);
  });

  it("for three values Dixon's critical value has a closed form: sin a / (sin a + sin(60 - a)), a = 60 (1 - alpha) degrees", () => {
    for (const alpha of [0.1, 0.05, 0.02, 0.01, 0.005]) {
      const angle = (Math.PI / 3) * (1 - alpha);
      const exact = Math.sin(angle) / (Math.sin(angle) + Math.sin(Math.PI / 3 - angle));
      expect(dixonCritical({ n: 3, alpha })).toBeCloseTo(exact, 5);
    }
  });
});

describe("trends", () => {
  it(titleOf("trend-sulfate"), () => {
    const id = "trend-sulfate";
    const { input, expected_computed: want } = caseOf<{ t: number[]; y: number[] }, Numbers>(id);
    const test = mannKendall({ values: input.y, times: input.t });
    const line = theilSen({ times: input.t, values: input.y });
    const pairs: [number, string][] = [
      [test.n, "n"],
      [test.s, "S"],
      [test.variance, "var_S"],
      [test.z, "Z_continuity"],
      [test.pTwoSided, "p_two_sided"],
      [test.tauA, "tau_a"],
      [line.slope, "sen_slope"],
      [line.intercept, "intercept_conover"],
      [line.pairs, "pairs"],
      [line.slopeLower, "slope_lcl_95"],
      [line.slopeUpper, "slope_ucl_95"],
    ];
    for (const [ours, name] of pairs) expectNear(ours, want[name] as number);
    expect(test.pTwoSided / (want.p_two_sided as number)).toBeCloseTo(1, 9);
    for (const [ours, name] of pairs) if (caseOf(id).published?.[name]) expectPrinted(id, name, ours);
  });

  for (const id of ["kendall-ties-1", "kendall-ties-2"]) {
    it(titleOf(id), () => {
      const { input, expected_computed: want } = caseOf<{ x: number[]; y: number[] }, Numbers>(id);
      const ours = kendall(input);
      const pairs: [number, string][] = [
        [ours.s, "S"],
        [ours.variance, "var_S"],
        [ours.denominator, "D"],
        [ours.tauB, "tau_b"],
      ];
      for (const [value, name] of pairs) expectNear(value, want[name] as number);
      for (const [value, name] of pairs) if (caseOf(id).published?.[name]) expectPrinted(id, name, value);
    });
  }
});
