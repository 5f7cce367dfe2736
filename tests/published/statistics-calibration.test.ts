import { describe, expect, it } from "vitest";
import {
  calibrationLine,
  currieCountLimits,
  currieLimits,
  detectionLimitFromBlanks,
  inversePrediction,
  linearityTest,
  lineDetectionLimits,
  lineThroughOrigin,
  methodDetectionLimit,
  noncentralTCdf,
  quadraticCalibration,
  recoveryPercent,
  relativePercentDifference,
  standardAddition,
  studentTQuantile,
  weightedCalibrationLine,
} from "@/modules/statistics";
import { caseOf, expectAllNear, expectNear, expectPrinted, titleOf } from "./statistics-cases";

type Numbers = Record<string, number>;
interface Pairs {
  x: number[];
  y: number[];
}

function expectLine(line: ReturnType<typeof calibrationLine>, want: Numbers): void {
  const pairs: [number, string][] = [
    [line.n, "n"],
    [line.intercept, "intercept"],
    [line.slope, "slope"],
    [line.residualSd, "s_yx"],
    [line.slopeSe, "s_slope"],
    [line.interceptSe, "s_intercept"],
    [line.xMean, "x_bar"],
    [line.yMean, "y_bar"],
    [line.sxx, "Sxx"],
    [line.correlation, "r"],
  ];
  for (const [ours, name] of pairs) expectNear(ours, want[name] as number);
}

describe("calibration lines", () => {
  it(titleOf("strd-Norris"), () => {
    const id = "strd-Norris";
    const { input, expected_computed: want, published } = caseOf<Pairs, Numbers>(id);
    const line = calibrationLine(input);
    const pairs: [number, string][] = [
      [line.intercept, "B0"],
      [line.slope, "B1"],
      [line.interceptSe, "seB0"],
      [line.slopeSe, "seB1"],
      [line.residualSd, "residual_sd"],
    ];
    for (const [ours, name] of pairs) {
      expectNear(ours, want[name] as number, 1e-12);
      expectPrinted(id, name, ours);
    }
    expectNear(line.correlation ** 2, published?.R2?.value as number, 1e-14);
  });

  it(titleOf("strd-NOINT1"), () => {
    const id = "strd-NOINT1";
    const { input, expected_computed: want } = caseOf<Pairs, Numbers>(id);
    const line = lineThroughOrigin(input);
    const pairs: [number, string][] = [
      [line.slope, "B1"],
      [line.slopeSe, "seB1"],
      [line.residualSd, "residual_sd"],
    ];
    for (const [ours, name] of pairs) {
      expectNear(ours, want[name] as number, 1e-12);
      expectPrinted(id, name, ours);
    }
  });

  it(titleOf("cal-fluorescein"), () => {
    const id = "cal-fluorescein";
    const { input, expected_computed: want } = caseOf<
      Pairs,
      Numbers & {
        inverse: { y0: number; m: number; x0: number; s_x0: number; t: number; half_width: number }[];
      }
    >(id);
    const line = calibrationLine(input);
    expectLine(line, want);
    for (const row of want.inverse) {
      const ours = inversePrediction({ line, signal: row.y0, replicates: row.m });
      expectNear(ours.x, row.x0);
      expectNear(ours.se, row.s_x0);
      expectNear(ours.t, row.t);
      expectNear(ours.halfWidth, row.half_width);
    }
    const printed: [number, string][] = [
      [line.slope, "slope"],
      [line.intercept, "intercept"],
      [line.correlation, "r"],
      [line.residualSd, "s_yx"],
      [line.slopeSe, "s_slope"],
      [line.interceptSe, "s_intercept"],
    ];
    for (const [ours, name] of printed) expectPrinted(id, name, ours);
  });

  it("fluorescein read backwards as printed: 0.72 +- 0.68, 6.21 +- 0.62, 11.13 +- 0.68 (Miller and Miller, from memory)", () => {
    const { input } = caseOf<Pairs, unknown>("cal-fluorescein");
    const line = calibrationLine(input);
    const ours = [2.9, 13.5, 23].map((signal) => inversePrediction({ line, signal }));
    expect(ours.map(({ x, halfWidth }) => `${x.toFixed(2)}+-${halfWidth.toFixed(2)}`)).toEqual([
      "0.72+-0.68",
      "6.21+-0.62",
      "11.13+-0.68",
    ]);
    expect(ours[1]?.x.toFixed(3)).toBe("6.207");
    expect(ours[1]?.se.toFixed(4)).toBe("0.2398");
  });

  it(titleOf("cal-weighted"), () => {
    const id = "cal-weighted";
    const { input, expected_computed: want } = caseOf<
      Pairs & { s: number[] },
      Numbers & { weights: number[] }
    >(id);
    const weighted = weightedCalibrationLine({ x: input.x, y: input.y, sd: input.s });
    const plain = calibrationLine(input);
    const pairs: [number, string][] = [
      [weighted.slope, "w_slope"],
      [weighted.intercept, "w_intercept"],
      [weighted.xMean, "w_xbar"],
      [weighted.yMean, "w_ybar"],
      [weighted.residualSd, "w_s_yx"],
      [plain.slope, "u_slope"],
      [plain.intercept, "u_intercept"],
      [inversePrediction({ line: weighted, signal: 0.1 }).x, "x_at_0.1"],
      [inversePrediction({ line: weighted, signal: 0.6 }).x, "x_at_0.6"],
      [inversePrediction({ line: plain, signal: 0.1 }).x, "u_x_at_0.1"],
      [inversePrediction({ line: plain, signal: 0.6 }).x, "u_x_at_0.6"],
    ];
    for (const [ours, name] of pairs) expectNear(ours, want[name] as number);
    expectAllNear(weighted.weights, want.weights);
    for (const [ours, name] of pairs) if (caseOf(id).published?.[name]) expectPrinted(id, name, ours);
  });

  it(titleOf("cal-massart1"), () => {
    const id = "cal-massart1";
    const { input, expected_computed: want } = caseOf<Pairs, Numbers>(id);
    const line = calibrationLine(input);
    expectLine(line, want);
    const at15 = inversePrediction({ line, signal: 15 });
    const at90 = inversePrediction({ line, signal: 90 });
    const fiveAt90 = inversePrediction({ line, signal: 90, replicates: 5 });
    const pairs: [number, string][] = [
      [at15.x, "x15"],
      [at15.halfWidth, "h15"],
      [at15.se, "s_x15"],
      [at90.x, "x90"],
      [at90.halfWidth, "h90"],
      [at90.se, "s_x90"],
      [fiveAt90.halfWidth, "h90_m5"],
      [fiveAt90.se, "s_x90_m5"],
    ];
    for (const [ours, name] of pairs) {
      expectNear(ours, want[name] as number);
      expectPrinted(id, name, ours);
    }
  });

  it(titleOf("cal-din32645"), () => {
    const id = "cal-din32645";
    const { input, expected_computed: want } = caseOf<
      Pairs & { alpha: number; beta: number; k: number; m: number },
      Numbers
    >(id);
    const line = calibrationLine(input);
    expectLine(line, want);
    const limits = lineDetectionLimits({
      line,
      alpha: input.alpha,
      beta: input.beta,
      k: input.k,
      replicates: input.m,
    });
    const back = inversePrediction({ line, signal: 3500, confidence: 0.99 });
    const pairs: [number, string][] = [
      [limits.critical, "critical_value_x"],
      [limits.detection, "detection_limit_din"],
      [limits.quantification, "quantification_limit"],
      [back.halfWidth, "pred_3500"],
    ];
    for (const [ours, name] of pairs) {
      expectNear(ours, want[name] as number);
      expectPrinted(id, name, ours);
    }
    expectNear(back.x, want.x0_3500 as number);
  });

  it(titleOf("cal-linearity-din"), () => {
    const { input, expected_computed: want } = caseOf<Pairs, Numbers & { linear: boolean }>(
      "cal-linearity-din",
    );
    const test = linearityTest(input);
    const curve = quadraticCalibration(input);
    expectNear(test.lineSd, want.s_y1 as number);
    expectNear(test.quadraticSd, want.s_y2 as number);
    expectNear(test.f, want.F as number);
    expectNear(test.critical, want.F_crit_99 as number);
    expect(test.linear).toBe(want.linear);
    expectNear(curve.c0, want.c0 as number);
    expectNear(curve.c1, want.c1 as number);
    expectNear(curve.c2, want.c2 as number);
  });
});

describe("method detection limit, 40 CFR 136 Appendix B revision 2", () => {
  it(titleOf("mdl-t-values"), () => {
    const id = "mdl-t-values";
    const { input, expected_computed: want } = caseOf<{ replicates: string[] }, Numbers>(id);
    for (const n of input.replicates) {
      const t = studentTQuantile(0.99, Number(n) - 1);
      expect(Math.abs(t - (want[n] as number)), `${n} replicates`).toBeLessThanOrEqual(0.51e-7);
      expectPrinted(id, n, t);
    }
  });

  for (const id of [
    "mdl-all-blanks-numeric",
    "mdl-some-blanks-nd",
    "mdl-no-blank-numeric",
    "mdl-negative-mean",
  ]) {
    it(titleOf(id), () => {
      const { input, expected_computed: want } = caseOf<
        { spikes: number[]; blanks: (number | "ND")[] },
        Omit<Numbers, "MDLb"> & { MDLb: number | null }
      >(id);
      const blanks = input.blanks.map((blank) => (blank === "ND" ? null : blank));
      const ours = methodDetectionLimit({ spikes: input.spikes, blanks });
      expectNear(ours.spikeSd, want.S_spikes as number);
      expectNear(ours.t, want.t_spikes as number);
      expectNear(ours.fromSpikes, want.MDLs as number);
      expectNear(ours.limit, want.MDL as number);
      if (want.MDLb === null) expect(ours.fromBlanks).toBeNull();
      else expectNear(ours.fromBlanks ?? Number.NaN, want.MDLb);
    });
  }

  it(titleOf("mdl-164-blanks"), () => {
    const id = "mdl-164-blanks";
    const { input, expected_computed: want } = caseOf<{ n: number; top_five: number[] }, Numbers>(id);
    const rest = new Array<null>(input.n - input.top_five.length).fill(null);
    const ours = detectionLimitFromBlanks([...rest, ...input.top_five]);
    expect(ours.blankRule).toBe("99th percentile of blanks");
    expect(ours.fromBlanks).toBe(want.MDLb);
    expect(Math.round(0.99 * input.n)).toBe(want.rank);
    expectPrinted(id, "MDLb", ours.fromBlanks ?? Number.NaN);
  });
});

describe("Currie's limits", () => {
  it(titleOf("currie-1968-B100"), () => {
    const id = "currie-1968-B100";
    const { input, expected_computed: want } = caseOf<Numbers, Numbers>(id);
    const common = { blankCounts: input.B as number, alpha: input.alpha, beta: input.beta };
    const paired = currieCountLimits({ ...common, blank: "paired" });
    const known = currieCountLimits({ ...common, blank: "well known" });
    const pairs: [number, string][] = [
      [paired.critical, "LC_paired"],
      [paired.detection, "LD_paired"],
      [paired.quantification, "LQ_paired"],
      [known.critical, "LC_wellknown"],
      [known.detection, "LD_wellknown"],
      [known.quantification, "LQ_wellknown"],
    ];
    for (const [ours, name] of pairs) expectNear(ours, want[name] as number, 3e-8);
    for (const [ours, name] of pairs) if (caseOf(id).published?.[name]) expectPrinted(id, name, ours);
  });

  it(titleOf("currie-1995-t"), () => {
    const id = "currie-1995-t";
    const { input, expected_computed: want } = caseOf<{ nu: number; s0: number }, Numbers>(id);
    const ours = currieLimits({ sd: input.s0, df: input.nu });
    expectNear(ours.critical, want.LC as number);
    expectNear(ours.detection, want.LD as number);
    expectNear(studentTQuantile(0.95, input.nu), want.t as number);
    expectNear(noncentralTCdf(want.t as number, input.nu, want.delta as number), 0.05, 1e-9);
    expectNear(2 * studentTQuantile(0.95, input.nu), want.two_t as number);
    expectPrinted(id, "t", ours.critical);
    expectPrinted(id, "delta", ours.detection);
  });

  it("known standard deviation: 1.645, 3.29 and 10 s (Currie 1995, from memory)", () => {
    const ours = currieLimits({ sd: 2 });
    expect((ours.critical / 2).toFixed(3)).toBe("1.645");
    expect((ours.detection / 2).toFixed(2)).toBe("3.29");
    expect(ours.quantification).toBe(20);
  });
});

describe("duplicates, recoveries, standard addition", () => {
  it(titleOf("rpd-recovery"), () => {
    const { input, expected_computed: want } = caseOf<
      { rpd_pairs: [number, number][]; spikes: { spiked: number; unspiked: number; added: number }[] },
      { rpd: number[]; recovery: number[] }
    >("rpd-recovery");
    want.rpd.forEach((value, i) => {
      const [a, b] = input.rpd_pairs[i] as [number, number];
      expectNear(relativePercentDifference(a, b), value);
    });
    expect(() => relativePercentDifference(0, 0)).toThrow(RangeError);
    expectAllNear(
      input.spikes.map(({ spiked, unspiked, added }) => recoveryPercent({ spiked, unspiked, added })),
      want.recovery,
    );
  });

  it("a spike volume that is not negligible dilutes the sample: 105.2475 % [case rpd-recovery, its note]", () => {
    const ours = recoveryPercent({
      spiked: 0.52,
      unspiked: 0.1,
      added: 0.4,
      volumes: { sampleMl: 100, spikeMl: 1 },
    });
    expect(ours).toBeCloseTo(105.2475, 4);
  });

  it(titleOf("standard-addition-al"), () => {
    const id = "standard-addition-al";
    const { input, expected_computed: want } = caseOf<{ x_mL: number[]; signal: number[] }, Numbers>(id);
    const line = calibrationLine({ x: input.x_mL, y: input.signal });
    expectLine(line, want);
    const given = { added: input.x_mL, signals: input.signal };
    const ours = standardAddition(given);
    const single = standardAddition({ ...given, errorFormula: "line and signal" });
    const ppmPerMl = (300 / 25) * (25 / 3.12) * (100 / 25);
    const pairs: [number, string][] = [
      [ours.intercept, "intercept"],
      [ours.slope, "slope"],
      [ours.content, "x_E"],
      [line.residualSd, "s_yx"],
      [ours.se, "s_xE"],
      [ours.halfWidth, "half_width"],
      [ours.halfWidth / ours.se, "t"],
      [single.se, "s_xE_with_extra_1"],
    ];
    for (const [value, name] of pairs) expectNear(value, want[name] as number);
    for (const [value, name] of pairs) if (caseOf(id).published?.[name]) expectPrinted(id, name, value);
    expectNear(ours.content * ppmPerMl, want.C_ppm as number);
    expectNear(single.se * ppmPerMl, want.s_C_extra_1 as number);
  });
});
