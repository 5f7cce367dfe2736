import { describe, expect, it } from "vitest";
import {
  capability,
  chartConstants,
  correctedIndividualsLimits,
  cpInterval,
  cpkInterval,
  cusumChart,
  ewmaChart,
  ewmaHalfWidth,
  individualsLimits,
  leveyJenningsLimits,
  MEDIAN_MOVING_RANGE_PER_SIGMA,
  mean,
  meanAndDeviationLimits,
  meanAndRangeLimits,
  meanVarianceInflation,
  median,
  movingRanges,
  pointsBeyond,
  pooledDeviation,
  range,
  standardDeviation,
} from "@/modules/statistics";
import { caseOf, expectAllNear, expectNear, expectPrinted, titleOf } from "./statistics-cases";

type Numbers = Record<string, number>;

describe("chart factors", () => {
  it(titleOf("constants-2-25"), () => {
    const { expected_computed } = caseOf<unknown, Record<string, Numbers>>("constants-2-25");
    expect(Object.keys(expected_computed)).toHaveLength(24);
    for (const [n, factors] of Object.entries(expected_computed)) {
      const ours = chartConstants(Number(n));
      for (const [name, value] of Object.entries(factors)) {
        expectNear(ours[name as keyof typeof ours], value, 1e-9);
      }
    }
  });

  it(titleOf("constants-median-mr"), () => {
    const { expected_computed } = caseOf<unknown, Numbers>("constants-median-mr");
    expectNear(MEDIAN_MOVING_RANGE_PER_SIGMA, expected_computed.median_abs_diff_over_sigma as number, 1e-14);
    expectNear(3 / MEDIAN_MOVING_RANGE_PER_SIGMA, expected_computed.factor_3_over as number, 1e-13);
  });
});

interface Individuals {
  mean: number;
  mr_bar: number;
  sigma_mr: number;
  ucl_x: number;
  lcl_x: number;
  ucl_mr: number;
  moving_ranges: number[];
  n: number;
  s_sample: number;
  median_mr: number;
}

describe("individuals chart", () => {
  for (const [id, constants] of [
    ["nist-6.3.2.2-imr", "printed"],
    ["nist-6.3.2.2-imr-exact-d2", "exact"],
  ] as const) {
    it(`${titleOf(id)}, ${constants} factors`, () => {
      const { input, expected_computed: want } = caseOf<{ x: number[] }, Individuals>(id);
      const ours = individualsLimits({ values: input.x, constants });
      expectNear(ours.centre, want.mean);
      expectNear(ours.mrBar, want.mr_bar);
      expectNear(ours.sigma, want.sigma_mr);
      expectNear(ours.upper, want.ucl_x);
      expectNear(ours.lower, want.lcl_x);
      expectNear(ours.mrUpper, want.ucl_mr);
      expect(ours.n).toBe(want.n);
      expectAllNear(movingRanges(input.x), want.moving_ranges);
      expectNear(standardDeviation(input.x), want.s_sample);
      expectNear(individualsLimits({ values: input.x, spread: "median" }).mrBar, want.median_mr);
      expectNear(median(movingRanges(input.x)), want.median_mr);
    });
  }

  it("NIST prints the limits of the flow rates to four decimals", () => {
    const id = "nist-6.3.2.2-imr";
    const ours = individualsLimits({
      values: caseOf<{ x: number[] }, unknown>(id).input.x,
      constants: "printed",
    });
    expectPrinted(id, "mean", ours.centre);
    expectPrinted(id, "mr_bar", ours.mrBar);
    expectPrinted(id, "ucl_x", ours.upper);
    expectPrinted(id, "lcl_x", ours.lower);
    expectPrinted(id, "moving_ranges", movingRanges(caseOf<{ x: number[] }, unknown>(id).input.x));
  });

  it(titleOf("autocorrelation-Michelso"), () => {
    const { y } = caseOf<{ y: number[] }, unknown>("strd-Michelso").input;
    const { expected_computed: want } = caseOf<
      unknown,
      Numbers & { out_mr_limits: number[]; out_adjusted: number[] }
    >("autocorrelation-Michelso");
    const ours = correctedIndividualsLimits({ values: y, constants: "printed" });
    expectNear(ours.mrBar, want.mr_bar as number);
    expectNear(ours.uncorrectedSigma, want.sigma_mr as number);
    expectNear(ours.r1, want.r1 as number, 1e-12);
    expectNear(ours.sigma, want.sigma_adjusted as number);
    expectNear(standardDeviation(y), want.sd as number, 1e-13);
    expectNear(ours.r1Limit, want.r1_limit_95 as number, 1e-4);
    expect(ours.warning).toContain("r1 = 0.54");
    expect(pointsBeyond({ values: y, ...ours })).toEqual(want.out_adjusted);
    expect(pointsBeyond({ values: y, ...individualsLimits({ values: y, constants: "printed" }) })).toEqual(
      want.out_mr_limits,
    );
  });
});

describe("EWMA chart", () => {
  interface Ewma {
    x: number[];
    lambda: number;
    start: number;
    s: number;
    k: number;
  }
  it(titleOf("nist-6.3.2.4-ewma"), () => {
    const id = "nist-6.3.2.4-ewma";
    const { input, expected_computed: want } = caseOf<
      Ewma,
      { ewma: number[]; ucl_asymptotic: number; lcl_asymptotic: number; out: number[] }
    >(id);
    const ours = ewmaChart({
      values: input.x,
      lambda: input.lambda,
      centre: input.start,
      sigma: input.s,
      width: input.k,
      limits: "asymptotic",
    });
    expectAllNear(ours.statistic, want.ewma);
    expectNear(ours.upper[0] as number, want.ucl_asymptotic);
    expectNear(ours.lower[19] as number, want.lcl_asymptotic);
    expect(ours.signals).toEqual(want.out);
    expectPrinted(id, "ewma", ours.statistic);
    expectPrinted(id, "ucl_asymptotic", ours.upper[0] as number);
    expectPrinted(id, "lcl_asymptotic", ours.lower[0] as number);
  });

  it(titleOf("nist-ewma-time-varying"), () => {
    const { input, expected_computed: want } = caseOf<
      { lambda: number; L: number; s: number; n: number },
      { half_width: number[] }
    >("nist-ewma-time-varying");
    const ours = want.half_width.map((_, i) =>
      ewmaHalfWidth({ lambda: input.lambda, sigma: input.s, width: input.L, point: i + 1 }),
    );
    expect(ours).toHaveLength(input.n);
    expectAllNear(ours, want.half_width);
    const chart = ewmaChart({ values: [50, 50], lambda: 0.3, centre: 50, sigma: input.s });
    expectNear((chart.upper[1] as number) - 50, want.half_width[1] as number);
  });
});

/** Montgomery, Introduction to Statistical Quality Control, table 9.1 (from memory). */
const MONTGOMERY_9_1 = [
  9.45, 7.99, 9.29, 11.66, 12.16, 10.18, 8.04, 11.46, 9.2, 10.34, 9.03, 11.47, 10.51, 9.4, 10.08, 9.37, 10.62,
  10.31, 8.52, 10.84, 10.9, 9.33, 12.29, 11.5, 10.6, 11.08, 10.38, 11.62, 11.31, 10.52,
];

describe("tabular CUSUM", () => {
  it(titleOf("nist-6.3.2.3-cusum"), () => {
    const id = "nist-6.3.2.3-cusum";
    const { input, expected_computed: want } = caseOf<
      { x: number[]; target: number; k: number; h: number },
      {
        S_hi: number[];
        S_lo: number[];
        cumulative_deviation: number[];
        signal_hi: number[];
        signal_lo: number[];
      }
    >(id);
    const ours = cusumChart({ values: input.x, target: input.target, slack: input.k, decision: input.h });
    expectAllNear(ours.high, want.S_hi, 1e-8);
    expectAllNear(ours.low, want.S_lo, 1e-8);
    expectAllNear(ours.cumulativeDeviation, want.cumulative_deviation, 1e-8);
    expect(ours.signalsHigh).toEqual(want.signal_hi);
    expect(ours.signalsLow).toEqual(want.signal_lo);
    expect(ours.signalsHigh[0]).toBe(13);
    expectPrinted(id, "S_hi", ours.high);
    expectPrinted(id, "S_lo", ours.low);
    expectPrinted(id, "cumulative_deviation", ours.cumulativeDeviation);
  });

  it("Montgomery table 9.1: CUSUM signals at period 29 with 5.28, EWMA 0.1/2.7 at periods 29 and 30 (from memory)", () => {
    const cusum = cusumChart({ values: MONTGOMERY_9_1, target: 10, slack: 0.5, decision: 5 });
    expect(cusum.signalsHigh[0]).toBe(28);
    expect(cusum.high[28]).toBeCloseTo(5.28, 9);
    const ewma = ewmaChart({ values: MONTGOMERY_9_1, lambda: 0.1, centre: 10, sigma: 1, width: 2.7 });
    expect(ewma.signals).toEqual([28, 29]);
  });
});

describe("subgroups", () => {
  it(titleOf("pistonrings-xbar-r-s"), () => {
    const id = "pistonrings-xbar-r-s";
    const { input, expected_computed: want } = caseOf<
      { subgroups: number[][]; phase1: number },
      Numbers & { out_x_R: number[]; out_R: number[]; phase2_out_R_based: number[] }
    >(id);
    const subgroups = input.subgroups.slice(0, input.phase1);
    const byRange = meanAndRangeLimits({ subgroups });
    const bySd = meanAndDeviationLimits({ subgroups });
    const pairs: [number, string][] = [
      [byRange.subgroups, "subgroups"],
      [byRange.n, "n"],
      [byRange.means.centre, "grand_mean"],
      [byRange.spread.centre, "R_bar"],
      [bySd.spread.centre, "S_bar"],
      [byRange.sigma, "sigma_R"],
      [bySd.sigma, "sigma_S"],
      [byRange.means.upper, "ucl_x_R"],
      [byRange.means.lower, "lcl_x_R"],
      [byRange.spread.upper, "ucl_R"],
      [byRange.spread.lower, "lcl_R"],
      [bySd.means.upper, "ucl_x_S"],
      [bySd.means.lower, "lcl_x_S"],
      [bySd.spread.upper, "ucl_S"],
      [bySd.spread.lower, "lcl_S"],
      [pooledDeviation(subgroups), "pooled_s"],
    ];
    for (const [ours, name] of pairs) expectNear(ours, want[name] as number);
    for (const [ours, name] of pairs) {
      if (caseOf(id).published?.[name]) expectPrinted(id, name, ours);
    }
    expect(pointsBeyond({ values: subgroups.map(mean), ...byRange.means })).toEqual(want.out_x_R);
    expect(pointsBeyond({ values: subgroups.map(range), ...byRange.spread })).toEqual(want.out_R);
    const all = pointsBeyond({ values: input.subgroups.map(mean), ...byRange.means });
    expect(all.filter((index) => index >= input.phase1)).toEqual(want.phase2_out_R_based);
  });
});

describe("control samples and capability", () => {
  it(titleOf("qc-sample-limits"), () => {
    const { input, expected_computed: want } = caseOf<
      { sets: { mean: number; s: number }[] },
      Record<string, { ucl: number; uwl: number; lwl: number; lcl: number }>
    >("qc-sample-limits");
    input.sets.forEach(({ mean: centre, s }, index) => {
      const ours = leveyJenningsLimits({ mean: centre, sd: s });
      const set = want[`set${index + 1}`];
      expect([ours.upper, ours.upperWarning, ours.lowerWarning, ours.lower]).toEqual([
        set?.ucl,
        set?.uwl,
        set?.lwl,
        set?.lcl,
      ]);
    });
  });

  it(titleOf("nist-6.1.6-capability"), () => {
    const id = "nist-6.1.6-capability";
    const { input, expected_computed: want } = caseOf<Numbers, Numbers>(id);
    const ours = capability({
      mean: input.mean as number,
      sigma: input.s as number,
      lower: input.lsl as number,
      upper: input.usl as number,
    });
    const pairs: [number, string][] = [
      [ours.cp ?? Number.NaN, "Cp"],
      [ours.cpUpper ?? Number.NaN, "Cpu"],
      [ours.cpLower ?? Number.NaN, "Cpl"],
      [ours.cpk, "Cpk"],
      [ours.offCentre ?? Number.NaN, "k"],
    ];
    for (const [value, name] of pairs) {
      expectNear(value, want[name] as number);
      expectPrinted(id, name, value);
    }
    expectNear((1 - (ours.offCentre ?? 0)) * (ours.cp ?? 0), want.Cpk_from_k as number);
  });

  it(titleOf("capability-ci"), () => {
    const { input, expected_computed: want } = caseOf<Numbers, Numbers>("capability-ci");
    const common = { n: input.n as number, confidence: input.confidence as number };
    const cp = cpInterval({ cp: input.Cp as number, ...common });
    const cpk = cpkInterval({ cpk: input.Cpk as number, ...common });
    expectNear(cp.lower, want.Cp_lo as number);
    expectNear(cp.upper, want.Cp_hi as number);
    expectNear(cpk.lower, want.Cpk_lo as number);
    expectNear(cpk.upper, want.Cpk_hi as number);
  });

  it("the mean of autocorrelated values varies as (1 + phi)/(1 - phi) [case autocorrelation-individuals]", () => {
    const { input, expected_computed: want } = caseOf<{ phi: number[] }, Record<string, number[]>>(
      "autocorrelation-individuals",
    );
    expectAllNear(
      input.phi.map(meanVarianceInflation),
      want["var_of_mean_inflation_(1+phi)/(1-phi)"] as number[],
    );
  });
});
