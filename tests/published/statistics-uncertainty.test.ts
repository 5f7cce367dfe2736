import { describe, expect, it } from "vitest";
import {
  acceptanceLimit,
  combineUncertainty,
  conformanceProbability,
  decide,
  expandedUncertainty,
  falseAcceptChance,
  globalRisks,
  propagate,
  rectangularUncertainty,
  triangularUncertainty,
} from "@/modules/statistics";
import { caseOf, expectAllNear, expectNear, expectPrinted, titleOf } from "./statistics-cases";

type Numbers = Record<string, number>;

describe("uncertainty", () => {
  it(titleOf("eurachem-a1"), () => {
    const id = "eurachem-a1";
    const { input, expected_computed: want } = caseOf<Numbers, Numbers>(id);
    const volumeU = combineUncertainty({
      inputs: [{ u: triangularUncertainty(0.1) }, { u: 0.02 }, { u: rectangularUncertainty(0.084) }],
      sensitivities: [1, 1, 1],
    }).u;
    const concentration = (u: number, purityU: number) =>
      propagate({
        model: (values) => (1000 * (values[0] as number) * (values[1] as number)) / (values[2] as number),
        inputs: [
          { value: input.m_mg as number, u: input.u_m as number },
          { value: input.P as number, u: purityU },
          { value: input.V_mL as number, u },
        ],
      });
    const rounded = concentration(input.u_V as number, input.u_P as number);
    const exact = concentration(volumeU, rectangularUncertainty(0.0001));
    expectNear(rounded.value, want.c as number);
    expectNear(rounded.u, want.u_c_rounded_inputs as number);
    expectNear(volumeU, want.u_V_unrounded as number);
    expectNear(exact.u, want.u_c_unrounded as number);
    expectPrinted(id, "c", rounded.value);
    expectPrinted(id, "u_c_rounded_inputs", rounded.u);
    expectPrinted(id, "u_V_unrounded", volumeU);
    expectPrinted(id, "u_c_unrounded", exact.u);
    expectPrinted(id, "U_k2", 2 * 0.9);
  });

  it(titleOf("gum-h1"), () => {
    const id = "gum-h1";
    const { input, expected_computed: want } = caseOf<{ l_s_nm: number; d_nm: number }, Numbers>(id);
    const inputs = [
      { value: input.l_s_nm, u: 25, df: 18 },
      { value: input.d_nm, u: 5.8, df: 24 },
      { value: 0, u: 3.9, df: 5 },
      { value: 0, u: 6.7, df: 8 },
      { value: 0, u: 0.029, df: 2 },
      { value: 0, u: 0.58e-6, df: 50 },
    ];
    const sum = propagate({
      model: (v) =>
        (v[0] as number) +
        (v[1] as number) +
        (v[2] as number) +
        (v[3] as number) -
        input.l_s_nm * (11.5e-6 * (v[4] as number) + (v[5] as number) * -0.1),
      inputs,
    });
    const difference = combineUncertainty({ inputs: inputs.slice(1, 4), sensitivities: [1, 1, 1] });
    const expanded = expandedUncertainty({ u: sum.u, df: sum.df, confidence: 0.99 });
    const pairs: [number, string][] = [
      [sum.value, "l_nm"],
      [sum.u, "u_c_nm"],
      [sum.df, "nu_eff"],
      [difference.u, "u_d_nm"],
      [difference.df, "nu_d"],
      [expanded.k, "t99_16"],
    ];
    for (const [ours, name] of pairs) {
      expectNear(ours, want[name] as number, 1e-8);
      expectPrinted(id, name, ours);
    }
    expect(expanded.df).toBe(16);
    const kept = expandedUncertainty({ u: sum.u, df: sum.df, confidence: 0.99, wholeDf: "keep" });
    expect(kept.k).toBeLessThan(expanded.k);
    expectPrinted(id, "U99_nm", expanded.expanded);
  });

  it("GUM H.1 prints 93 nm from u rounded to 32 nm and 16 degrees of freedom [case gum-h1]", () => {
    const { expected_computed: want } = caseOf<unknown, Numbers>("gum-h1");
    const ours = expandedUncertainty({ u: 32, df: 16.6, confidence: 0.99 });
    expectNear(ours.expanded, want.U99_nm as number);
    expectPrinted("gum-h1", "U99_nm", ours.expanded);
  });

  it("GUM H.2, resistance, reactance and impedance with correlated inputs (JCGM 100:2008 H.2, from memory)", () => {
    const inputs = [
      { value: 4.999, u: 0.0032 },
      { value: 0.019661, u: 0.0000095 },
      { value: 1.04446, u: 0.00075 },
    ];
    const correlations = [
      { between: [0, 1], r: -0.36 },
      { between: [0, 2], r: 0.86 },
      { between: [1, 2], r: -0.65 },
    ] as const;
    const at = (v: readonly number[], i: number) => v[i] as number;
    const resistance = (v: readonly number[]) => (at(v, 0) / at(v, 1)) * Math.cos(at(v, 2));
    const reactance = (v: readonly number[]) => (at(v, 0) / at(v, 1)) * Math.sin(at(v, 2));
    const impedance = (v: readonly number[]) => at(v, 0) / at(v, 1);
    const r = propagate({ model: resistance, inputs, correlations });
    const x = propagate({ model: reactance, inputs, correlations });
    const z = propagate({ model: impedance, inputs, correlations });
    expect(r.value).toBeCloseTo(127.732, 2);
    expect(x.value).toBeCloseTo(219.847, 2);
    expect(z.value).toBeCloseTo(254.26, 2);
    expect(Math.abs(r.u - 0.071)).toBeLessThan(0.002);
    expect(Math.abs(x.u - 0.295)).toBeLessThan(0.003);
    expect(Math.abs(z.u - 0.236)).toBeLessThan(0.003);
    expect(propagate({ model: resistance, inputs }).u).toBeGreaterThan(2 * r.u);
  });
});

describe("decisions", () => {
  it(titleOf("ilac-g8-guard-band"), () => {
    const { input, expected_computed: want } = caseOf<
      { r: number[]; k: number },
      { pfa_k2: number[]; "pfa_w_eq_U_k1.96": number }
    >("ilac-g8-guard-band");
    const ours = input.r.map((guard) => falseAcceptChance({ guard, k: input.k }));
    want.pfa_k2.forEach((value, i) => expect((ours[i] as number) / value).toBeCloseTo(1, 9));
    // The reference figure belongs to the 97.5 % quantile at six decimals, 1.959964, not to 1.96 itself.
    expectNear(falseAcceptChance({ guard: 1, k: 1.959964 }), want["pfa_w_eq_U_k1.96"]);
    const printed = [0.5, 0.05, 0.025, 0.0016, 1e-6];
    printed.forEach((most, i) => expect(ours[i]).toBeLessThanOrEqual(most));
  });

  it(titleOf("decision-rule-upper-limit"), () => {
    const { input, expected_computed: want } = caseOf<
      { TL: number; U: number },
      {
        AL: number;
        rows: { y: number; simple: string; guard: string; non_binary: string; p_nonconform: number }[];
      }
    >("decision-rule-upper-limit");
    const common = { limit: input.TL, side: "upper", expanded: input.U } as const;
    expectNear(acceptanceLimit({ ...common, guard: 1 }), want.AL, 1e-14);
    for (const row of want.rows) {
      const ours = decide({ ...common, value: row.y });
      expect([ours.simple, ours.guarded, ours.nonBinary]).toEqual([row.simple, row.guard, row.non_binary]);
      expectNear(ours.chanceNonconforming, row.p_nonconform);
      const mirrored = decide({ ...common, limit: -input.TL, side: "lower", value: -row.y });
      expect([mirrored.simple, mirrored.guarded, mirrored.nonBinary]).toEqual([
        row.simple,
        row.guard,
        row.non_binary,
      ]);
    }
  });

  it(titleOf("jcgm106-zener"), () => {
    const id = "jcgm106-zener";
    const { input, expected_computed: want } = caseOf<{ limit: number; y: number; u: number }, Numbers>(id);
    const ours = conformanceProbability({ value: input.y, u: input.u, upper: input.limit });
    expectNear(ours, want.p_conform as number);
    expectPrinted(id, "p_conform", ours);
  });

  it(titleOf("global-risk-1"), () => {
    const { input, expected_computed: want } = caseOf<
      { prior_mean: number; prior_sd: number; u: number; TL: number; AL: number[] },
      Record<string, Numbers>
    >("global-risk-1");
    for (const acceptance of input.AL) {
      const ours = globalRisks({
        priorMean: input.prior_mean,
        priorSd: input.prior_sd,
        u: input.u,
        limit: input.TL,
        acceptance,
      });
      const theirs = want[`AL${acceptance.toFixed(1)}`] as Numbers;
      expectAllNear(
        [ours.nonconforming, ours.consumer, ours.producer],
        [
          theirs.p_nonconforming as number,
          theirs.global_consumer_risk as number,
          theirs.global_producer_risk as number,
        ],
      );
    }
  });
});
