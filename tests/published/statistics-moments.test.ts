import { describe, expect, it } from "vitest";
import {
  algorithmA,
  enClass,
  enScore,
  lagOneAutocorrelation,
  MAD_TO_SIGMA,
  mean,
  median,
  medianAbsoluteDeviation,
  standardDeviation,
  zClass,
  zetaScore,
  zScore,
} from "@/modules/statistics";
import { caseOf, expectAllNear, expectNear, expectPrinted, titleOf } from "./statistics-cases";

interface Univariate {
  mean: number;
  sd: number;
  r1: number;
}

/** 1000000.2 followed by 500 pairs of 1000000.1 and 1000000.3, times ten when whole numbers are wanted. */
function numAcc3(times = 1): Float64Array {
  const series = Float64Array.from({ length: 1001 }, (_, i) => (i === 0 ? 2 : i % 2 === 1 ? 1 : 3));
  return series.map((digit) => (times === 10 ? 10_000_000 + digit : Number(`1000000.${digit}`)));
}

describe("NIST StRD univariate statistics to 13 digits", () => {
  for (const id of ["strd-Michelso", "strd-Lottery", "strd-NumAcc1"] as const) {
    it(titleOf(id), () => {
      const { input, expected_computed: want } = caseOf<{ y: number[]; n: number }, Univariate>(id);
      expect(input.y).toHaveLength(input.n);
      const ours = {
        mean: mean(input.y),
        sd: standardDeviation(input.y),
        r1: lagOneAutocorrelation(input.y),
      };
      for (const name of ["mean", "sd", "r1"] as const) {
        expectPrinted(id, name, ours[name]);
        expectNear(ours[name], want[name], 1e-13);
      }
      const typed = Float64Array.from(input.y);
      expect(standardDeviation(typed)).toBe(ours.sd);
    });
  }

  it(`${titleOf("strd-NumAcc3")}; sd to 1e-9, for 1000000.1 has no exact double`, () => {
    const id = "strd-NumAcc3";
    const { input, expected_computed: want } = caseOf<{ n: number; first_values: string[] }, Univariate>(id);
    const values = numAcc3();
    expect(values).toHaveLength(input.n);
    expect(Array.from(values.slice(0, 5))).toEqual(input.first_values.map(Number));
    expectPrinted(id, "mean", mean(values));
    expectNear(standardDeviation(values), want.sd, 1e-9);
    expectNear(lagOneAutocorrelation(values), want.r1, 1e-9);
  });

  it("NumAcc3 times ten, which doubles hold exactly: sd 1 and r1 -0.999 to 13 digits", () => {
    const values = numAcc3(10);
    expectNear(standardDeviation(values), 1, 1e-13);
    expectNear(lagOneAutocorrelation(values), -0.999, 1e-13);
  });
});

describe("robust statistics", () => {
  it(titleOf("algA-creosote"), () => {
    const id = "algA-creosote";
    const { input, expected_computed: want } = caseOf<
      { x: number[] },
      {
        x_star: number;
        s_star: number;
        trace_x: number[];
        trace_s: number[];
        median: number;
        mad: number;
      }
    >(id);
    const ours = algorithmA({ values: input.x, stop: { relativeChange: 1e-12 } });
    expectNear(ours.mean, want.x_star);
    expectNear(ours.sd, want.s_star);
    expectAllNear(
      ours.trace.slice(0, 12).map((step) => step.mean),
      want.trace_x,
    );
    expectAllNear(
      ours.trace.slice(0, 12).map((step) => step.sd),
      want.trace_s,
    );
    expectNear(median(input.x), want.median);
    expectNear(medianAbsoluteDeviation(input.x), want.mad);
    expectPrinted(id, "x_star", ours.mean);
  });

  it("the third-figure stop rule ends creosote near 1.06 (ISO 13528: no change in the third figure) and says so", () => {
    const { x } = caseOf<{ x: number[] }, unknown>("algA-creosote").input;
    const ours = algorithmA({ values: x, stop: "third-figure" });
    expect(ours.sd).toBeGreaterThan(1.045);
    expect(ours.sd).toBeLessThan(1.0699);
    expect(ours.stop).toBe("no change in the third significant figure");
  });

  it(titleOf("algA-chem"), () => {
    const id = "algA-chem";
    const { input, expected_computed: want } = caseOf<{ x: number[] }, Record<string, number>>(id);
    const ours = algorithmA({ values: input.x, stop: { relativeChange: 1e-12 } });
    const pairs: [number, string][] = [
      [ours.mean, "x_star"],
      [ours.sd, "s_star"],
      [mean(input.x), "mean"],
      [standardDeviation(input.x), "sd"],
    ];
    for (const [value, name] of pairs) {
      expectNear(value, want[name] as number);
      expectPrinted(id, name, value);
    }
    expectNear(median(input.x), want.median as number);
    const scaled = MAD_TO_SIGMA * medianAbsoluteDeviation(input.x);
    expectNear(scaled, want["mad_scaled_1.4826"] as number, 2e-6);
    expectPrinted(id, "mad_scaled_1.4826", scaled);
  });
});

describe("proficiency scores", () => {
  it(titleOf("pt-scores-gear-batch1"), () => {
    const id = "pt-scores-gear-batch1";
    const { input, expected_computed: want } = caseOf<
      { x: number[]; x_ref: number; sigma: number; u_lab: number; u_ref: number; k: number },
      Record<string, number[]>
    >(id);
    const { x_ref: assigned, sigma, u_lab: u, u_ref: uAssigned, k } = input;
    const z = input.x.map((result) => zScore({ result, assigned, sigma }));
    const zeta = input.x.map((result) => zetaScore({ result, assigned, u, uAssigned }));
    const en = input.x.map((result) =>
      enScore({ result, assigned, expanded: k * u, expandedAssigned: k * uAssigned }),
    );
    expectAllNear(z, want.z as number[]);
    expectAllNear(zeta, want.zeta as number[]);
    expectAllNear(en, want.En as number[]);
    expectPrinted(id, "z", z);
    expectPrinted(id, "zeta", zeta);
    expectPrinted(id, "En", en);
  });

  it(titleOf("score-boundaries"), () => {
    const { input, expected_computed: want } = caseOf<
      { z: number[]; En: number[] },
      { z_class: string[]; En_class: string[] }
    >("score-boundaries");
    expect(input.z.map(zClass)).toEqual(want.z_class);
    expect(input.En.map(enClass)).toEqual(want.En_class);
  });
});
