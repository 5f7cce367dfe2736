import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  type ControlRule,
  controlRuleHits,
  NELSON_RULES,
  pointsOfHit,
  WESTERN_ELECTRIC_RULES,
} from "./control-rules";
import { zoneRuleRunLength } from "./rule-run-length";
import { westgard } from "./westgard";

const RULES = [...WESTERN_ELECTRIC_RULES, ...NELSON_RULES] as const;
const points = fc.array(
  fc.integer({ min: -35, max: 35 }).map((tenths) => tenths / 10),
  { maxLength: 60 },
);

function hits(values: readonly (number | null)[], rule: ControlRule, missing: "break" | "skip" = "break") {
  return controlRuleHits({ values, centre: 0, sigma: 1, rules: [rule], missing })[rule];
}

const side = (z: readonly number[], limit: number) =>
  Math.max(z.filter((v) => v > limit).length, z.filter((v) => v < -limit).length);

/** The rules as their texts say them, looking back over whole windows: slow and plain. */
const PLAIN: Record<ControlRule, (z: readonly number[]) => boolean> = {
  WE1: (z) => Math.abs(z.at(-1)!) > 3,
  N1: (z) => Math.abs(z.at(-1)!) > 3,
  WE2: (z) => someOf(z, 2, 3, 2),
  N5: (z) => someOf(z, 2, 3, 2),
  WE3: (z) => someOf(z, 4, 5, 1),
  N6: (z) => someOf(z, 4, 5, 1),
  WE4: (z) => z.length >= 8 && side(z.slice(-8), 0) === 8,
  N2: (z) => z.length >= 9 && side(z.slice(-9), 0) === 9,
  N3: (z) => {
    const w = z.slice(-6);
    const steps = w.slice(1).map((v, i) => Math.sign(v - w[i]!));
    return w.length === 6 && Math.abs(steps.reduce((a, b) => a + b, 0)) === 5;
  },
  N4: (z) => {
    const w = z.slice(-14);
    const steps = w.slice(1).map((v, i) => Math.sign(v - w[i]!));
    return w.length === 14 && steps.every((s, i) => s !== 0 && (i === 0 || s === -steps[i - 1]!));
  },
  N7: (z) => z.length >= 15 && z.slice(-15).every((v) => Math.abs(v) < 1),
  N8: (z) => {
    const w = z.slice(-8);
    return w.length === 8 && w.every((v) => Math.abs(v) > 1) && w.some((v) => v > 0) && w.some((v) => v < 0);
  },
};

function someOf(z: readonly number[], k: number, m: number, limit: number): boolean {
  const last = z.at(-1)!;
  if (Math.abs(last) <= limit) return false;
  return z.slice(-m).filter((v) => Math.sign(last) * v > limit).length >= k;
}

describe("rules of control charts", () => {
  it.each(RULES)("%s finds what a plain reading of its text finds", (rule) => {
    fc.assert(
      fc.property(points, (z) => {
        const plain = z.flatMap((_, i) => (PLAIN[rule](z.slice(0, i + 1)) ? [i] : []));
        expect(hits(z, rule)).toEqual(plain);
      }),
      { numRuns: 300 },
    );
  });

  it.each(RULES)("%s does not care which side is up, nor about centre and unit", (rule) => {
    fc.assert(
      fc.property(points, (z) => {
        expect(
          hits(
            z.map((value) => -value),
            rule,
          ),
        ).toEqual(hits(z, rule));
        const readings = z.map((value) => 8.1 + 0.05 * value);
        expect(controlRuleHits({ values: readings, centre: 8.1, sigma: 0.05, rules: [rule] })[rule]).toEqual(
          hits(z, rule),
        );
      }),
    );
  });

  it.each(RULES)("%s with gaps skipped finds the same points as without the gaps", (rule) => {
    fc.assert(
      fc.property(points, fc.integer({ min: 2, max: 5 }), (z, every) => {
        const gapped = z.flatMap((value, i) => (i % every === 0 ? [null, value] : [value]));
        const place = gapped.flatMap((value, i) => (value === null ? [] : [i]));
        expect(hits(gapped, rule, "skip")).toEqual(hits(z, rule).map((i) => place[i]));
      }),
    );
  });

  it("with gaps that break, nothing is found that spans a gap", () => {
    expect(hits([2.1, null, 2.2], "N5")).toEqual([]);
    expect(hits([2.1, Number.NaN, 2.2], "N5", "skip")).toEqual([2]);
  });

  it("a converted value that equals a line within the last digits of a double is on the line", () => {
    const values = [((64.4 - 32) * 5) / 9];
    expect(controlRuleHits({ values, centre: 15, sigma: 1, rules: ["N1"] }).N1).toEqual([]);
  });

  it("names the points that make up a hit", () => {
    const values = [0, 2.5, -2.5, 2.2, 0];
    expect(pointsOfHit({ values, centre: 0, sigma: 1, rule: "N5", index: 3 })).toEqual([1, 3]);
    const run = [null, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1, 0.1];
    expect(pointsOfHit({ values: run, centre: 0, sigma: 1, rule: "WE4", index: 8 })).toEqual([
      1, 2, 3, 4, 5, 6, 7, 8,
    ]);
    expect(() => pointsOfHit({ values: run, centre: 0, sigma: 1, rule: "WE4", index: 0 })).toThrow(
      RangeError,
    );
  });

  it("sigma of zero, an infinite value and a run of one are refused", () => {
    expect(() => controlRuleHits({ values: [1], centre: 0, sigma: 0, rules: ["N1"] })).toThrow(/sigma/);
    expect(() => controlRuleHits({ values: [Infinity], centre: 0, sigma: 1, rules: ["N1"] })).toThrow(
      /infinite/,
    );
    expect(() => controlRuleHits({ values: [1], centre: 0, sigma: 1, rules: ["N2"], sidePoints: 1 })).toThrow(
      RangeError,
    );
  });

  it("seven points on one side hit under the seven-point reading", () => {
    const values = Array.from({ length: 7 }, () => 0.1);
    expect(controlRuleHits({ values, centre: 0, sigma: 1, rules: ["N2"], sidePoints: 7 }).N2).toEqual([6]);
  });

  it("every rule added shortens the run in control", () => {
    const alone = zoneRuleRunLength({ rules: ["N1"], shift: 0 });
    const two = zoneRuleRunLength({ rules: ["N1", "N5"], shift: 0 });
    const four = zoneRuleRunLength({ rules: ["N1", "N2", "N5", "N6"], shift: 0 });
    expect(two).toBeLessThan(alone);
    expect(four).toBeLessThan(two);
    expect(() => zoneRuleRunLength({ rules: [], shift: 0 })).toThrow(RangeError);
  });
});

describe("Westgard rules", () => {
  it("an all-rules flow never accepts what the gated flow rejects", () => {
    const z = fc.integer({ min: -33, max: 33 }).map((tenths) => tenths / 10);
    fc.assert(
      fc.property(fc.array(fc.tuple(z, z), { maxLength: 15 }), (runs) => {
        const gate = westgard({ runs, flow: "gate" }).decisions;
        const all = westgard({ runs, flow: "all" }).decisions;
        gate.forEach((decision, i) => {
          if (decision === "reject") expect(all[i]).toBe("reject");
        });
      }),
    );
  });

  it("a single material never meets a rule across materials", () => {
    const runs = Array.from({ length: 10 }, () => [1.2]);
    expect(westgard({ runs }).hits.some((hit) => hit.scope === "across materials")).toBe(false);
  });

  it("a result that is not a number is refused with its place", () => {
    expect(() => westgard({ runs: [[0.1], [Number.NaN]] })).toThrow(/Run 1, material 0/);
  });
});
