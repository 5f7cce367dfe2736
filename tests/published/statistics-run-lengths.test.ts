import { describe, expect, it } from "vitest";
import {
  autocorrelatedRunLength,
  correctedIndividualsLimits,
  cusumRunLength,
  ewmaRunLength,
  individualsLimits,
  normalQuantile,
  oneSidedCusumRunLength,
  shewhartRunLength,
  simulatedRunLength,
  standardDeviation,
  type ZoneRule,
  zoneRuleRunLength,
} from "@/modules/statistics";
import { caseOf, expectAllNear, expectNear, expectPrinted, titleOf } from "./statistics-cases";

/** A seeded AR(1) series with variance 1: each value is phi times the one before plus normal noise. */
function autoregressive(phi: number, n: number): Float64Array {
  let state = 20260101;
  const uniform = () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 4294967296;
  };
  const noise = Math.sqrt(1 - phi * phi);
  let value = 0;
  return Float64Array.from({ length: n }, () => {
    value = phi * value + noise * normalQuantile(uniform());
    return value;
  });
}

type Columns = Record<string, number[]>;

describe("average run lengths", () => {
  it(titleOf("arl-shewhart"), () => {
    const { input, expected_computed: want } = caseOf<
      { k: number; shift: number[] },
      { arl: number[]; arl_2sigma: number; arl_3_09: number }
    >("arl-shewhart");
    expectAllNear(
      input.shift.map((shift) => shewhartRunLength({ width: input.k, shift })),
      want.arl,
    );
    expectNear(shewhartRunLength({ width: 2, shift: 0 }), want.arl_2sigma);
    expectNear(shewhartRunLength({ width: 3.09, shift: 0 }), want.arl_3_09);
  });

  it(titleOf("arl-cusum-h4-h5"), () => {
    const id = "arl-cusum-h4-h5";
    const { input, expected_computed: want } = caseOf<{ k: number; shift: number[] }, Columns>(id);
    const column = (decision: number, headStart = 0) =>
      input.shift.map((shift) => cusumRunLength({ slack: input.k, decision, shift, headStart }));
    const oneSided = (decision: number) =>
      input.shift.map((shift) => oneSidedCusumRunLength({ slack: input.k, decision, shift }));
    for (const [name, ours] of [
      ["h4", column(4)],
      ["h5", column(5)],
      ["h4_fir", column(4, 2)],
    ] as const) {
      expectAllNear(ours, want[name] as number[]);
      expectPrinted(id, name, ours);
    }
    expectAllNear(oneSided(4), want.h4_one_sided as number[]);
    expectAllNear(oneSided(5), want.h5_one_sided as number[]);
  });

  it(titleOf("arl-ewma-lucas-saccucci"), () => {
    const id = "arl-ewma-lucas-saccucci";
    const { input, expected_computed: want } = caseOf<{ shift: number[] }, Columns>(id);
    for (const [name, column] of Object.entries(want)) {
      const [, lambda, width] = /^ewma_l([\d.]+)_L([\d.]+)$/.exec(name) ?? [];
      const ours = input.shift.map((shift) =>
        ewmaRunLength({ lambda: Number(lambda), width: Number(width), shift }),
      );
      expectAllNear(ours, column);
      expectPrinted(id, name, ours);
    }
  });

  it(titleOf("arl-crowder-ewma"), () => {
    const id = "arl-crowder-ewma";
    const { input, expected_computed: want } = caseOf<
      { lambda: number[]; c: number; shift: number[] },
      Columns
    >(id);
    for (const lambda of input.lambda) {
      const ours = input.shift.map((shift) => ewmaRunLength({ lambda, width: input.c, shift }));
      (want[`l${lambda}`] as number[]).forEach((value, i) => {
        expect(Math.abs((ours[i] as number) - value)).toBeLessThanOrEqual(0.00501);
      });
    }
    expectPrinted(
      id,
      "l0.05",
      input.shift.map((shift) => ewmaRunLength({ lambda: 0.05, width: 2, shift })),
    );
  });

  it("Crowder 1987 table 1 at lambda 0.5 but for the known misprint 3.95 at shift 1.25", () => {
    const { input, published } = caseOf<{ shift: number[] }, unknown>("arl-crowder-ewma");
    const printed = published?.["l0.5"]?.value as (number | null)[];
    input.shift.forEach((shift, i) => {
      const value = printed[i];
      if (value == null || value === 3.95) return;
      expect(Math.abs(ewmaRunLength({ lambda: 0.5, width: 2, shift }) - value)).toBeLessThanOrEqual(0.0101);
    });
    expect(ewmaRunLength({ lambda: 0.5, width: 2, shift: 1.25 })).toBeCloseTo(3.59, 2);
  });

  it(titleOf("arl-run-rules-champ-woodall"), () => {
    const id = "arl-run-rules-champ-woodall";
    const { input, expected_computed: want } = caseOf<{ shift: number[] }, Columns>(id);
    const sets: Record<string, ZoneRule[]> = {
      1: ["WE1"],
      12: ["WE1", "WE2"],
      13: ["WE1", "WE3"],
      14: ["WE1", "WE4"],
    };
    for (const [name, rules] of Object.entries(sets)) {
      const ours = input.shift.map((shift) => zoneRuleRunLength({ rules, shift }));
      expectAllNear(ours, want[name] as number[]);
      expectPrinted(id, name, ours);
    }
  });

  it("Champ and Woodall 1987: all four Western Electric rules together, 91.75", () => {
    const rules = ["WE1", "WE2", "WE3", "WE4"] as const;
    expect(zoneRuleRunLength({ rules: [...rules], shift: 0 })).toBeCloseTo(91.75, 2);
    expect(zoneRuleRunLength({ rules: [...rules], shift: 1 })).toBeCloseTo(9.22, 2);
  });

  it(titleOf("arl-rule-sets-simulated"), { timeout: 30_000 }, () => {
    const { expected_computed: want } = caseOf<unknown, Columns>("arl-rule-sets-simulated");
    const errors = want.standard_error as number[];
    const sets = {
      we4: ["WE1", "WE2", "WE3", "WE4"],
      "nelson1-4": ["N1", "N2", "N3", "N4"],
      "nelson1-8": ["N1", "N2", "N3", "N4", "N5", "N6", "N7", "N8"],
    } as const;
    Object.entries(sets).forEach(([name, rules], set) => {
      for (const shift of [0, 1]) {
        const ours = simulatedRunLength({ rules, shift, runs: shift === 0 ? 3000 : 5000, seed: 20240607 });
        const theirs = (want[name] as number[])[shift] as number;
        const spread = Math.hypot(ours.standardError, errors[2 * set + shift] as number);
        expect(Math.abs(ours.mean - theirs), `${name} at ${shift}: ${ours.mean}`).toBeLessThan(3 * spread);
      }
    });
  });

  it(titleOf("autocorrelation-individuals"), () => {
    const { input, expected_computed: want } = caseOf<
      { phi: number[] },
      {
        sigma_MR_over_sigma_x: number[];
        arl_with_MR_limits: number[];
        arl_with_true_sigma_x: Record<string, number>;
      }
    >("autocorrelation-individuals");
    input.phi.forEach((phi, i) => {
      const values = autoregressive(phi, 40_000);
      const { sigma } = individualsLimits({ values });
      const understated = want.sigma_MR_over_sigma_x[i] as number;
      expect(Math.abs(sigma / standardDeviation(values) / understated - 1), `phi ${phi}`).toBeLessThan(0.03);
      const corrected = correctedIndividualsLimits({ values });
      expect(Math.abs(corrected.sigma / standardDeviation(values) - 1), `phi ${phi}`).toBeLessThan(0.03);
    });
    expectAllNear(
      input.phi.map((phi) => autocorrelatedRunLength({ phi, width: 3 * Math.sqrt(1 - phi) })),
      want.arl_with_MR_limits,
      1e-7,
    );
    for (const [phi, value] of Object.entries(want.arl_with_true_sigma_x)) {
      expectNear(autocorrelatedRunLength({ phi: Number(phi), width: 3 }), value);
    }
  });
});
