import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { nearlyEqual } from "@/lib/nearly";
import { type Bounds, type Qualifier, STATUSES } from "../model";
import { type JudgeInput, judgeReading } from "./status";

function judge(value: number | null, bounds: Bounds, over: Partial<JudgeInput>, qualifier: Qualifier = "") {
  return judgeReading({
    kind: "number",
    reading: { value, qualifier, text: String(value) },
    limits: { state: "in-force", versionId: 1, version: 1, bounds },
    change: null,
    plausible: { low: null, high: null },
    mayBeNegative: false,
    decimals: 1,
    unit: "°C",
    ...over,
  });
}
const status = (...input: Parameters<typeof judge>) => judge(...input).status;

describe("laws", () => {
  const optional = fc.option(fc.integer({ min: -20, max: 40 }), { nil: undefined });
  const bounds = fc
    .tuple(
      fc.array(fc.integer({ min: -20, max: 40 }), { minLength: 4, maxLength: 4 }),
      fc.array(fc.boolean(), { minLength: 4, maxLength: 4 }),
    )
    .map(([values, open]) => {
      const [a, b, c, d] = [...values]
        .sort((x, y) => x - y)
        .map((value, index) => (open[index] ? undefined : value));
      return { toleranceLow: a, watchLow: b, watchHigh: c, toleranceHigh: d } satisfies Bounds;
    });
  const plausible = fc.tuple(optional, optional).map(([a, b]) => {
    const swap = a !== undefined && b !== undefined && a > b;
    return { low: (swap ? b : a) ?? null, high: (swap ? a : b) ?? null };
  });
  const values = fc.integer({ min: -60, max: 100 }).map((each) => each / 2);
  const severity = { within: 0, watch: 1, out: 2, implausible: 3, unjudged: -1, none: -1 };

  it("every reading gets exactly one known status, a sentence and at least one reason", () => {
    const qualifiers = fc.constantFrom<Qualifier>("", "<", ">", "ND");
    fc.assert(
      fc.property(
        values,
        qualifiers,
        bounds,
        plausible,
        fc.boolean(),
        (value, qualifier, limits, range, sign) => {
          const number = qualifier === "ND" ? null : value;
          const verdict = judge(number, limits, { plausible: range, mayBeNegative: sign }, qualifier);
          expect(STATUSES).toContain(verdict.status);
          expect(verdict.reasons.length).toBeGreaterThan(0);
          expect(verdict.sentence).toMatch(/\.$/);
        },
      ),
    );
  });

  it("moving a value up from inside the limits never makes it milder, nor moving it down", () => {
    fc.assert(
      fc.property(values, values, bounds, plausible, (one, two, limits, range) => {
        const over = { plausible: range, mayBeNegative: true };
        const judged = [Math.min(one, two), Math.max(one, two)].map((value) => judge(value, limits, over));
        const [low, high] = judged.map(
          (verdict) => severity[verdict.status] * (verdict.side === "low" ? -1 : 1),
        );
        expect(low).toBeLessThanOrEqual(high ?? Number.NaN);
      }),
    );
  });

  it("a censored value has a status only when every possible value has the same, and every such value has it", () => {
    const samples = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 1, maxLength: 20 });
    fc.assert(
      fc.property(
        values,
        fc.constantFrom<Qualifier>("<", ">"),
        bounds,
        plausible,
        samples,
        (x, qualifier, limits, range, parts) => {
          const over = { plausible: range, mayBeNegative: false };
          const verdict = judge(x, limits, over, qualifier);
          const from = range.low ?? 0;
          const to = range.high ?? 1000;
          const possible = parts
            .map((part) => (qualifier === "<" ? from + part * (x - from) : x + part * (to - x)))
            .filter((value) => !nearlyEqual(value, x))
            .filter((value) => (qualifier === "<" ? value < x : value > x) && value >= from && value <= to);
          for (const value of possible) {
            if (verdict.status !== "unjudged")
              expect([value, status(value, limits, over)]).toEqual([value, verdict.status]);
          }
          if (verdict.status === "implausible") expect(possible).toEqual([]);
        },
      ),
      { numRuns: 500 },
    );
  });

  it("a censored value that cannot be judged really leaves two answers open", () => {
    fc.assert(
      fc.property(values, fc.constantFrom<Qualifier>("<", ">"), bounds, (x, qualifier, limits) => {
        const over = { plausible: { low: -100, high: 200 }, mayBeNegative: true };
        if (judge(x, limits, over, qualifier).status !== "unjudged") return;
        const grid = Array.from({ length: 1201 }, (_, index) => -100 + index / 4);
        const possible = grid.filter((value) => (qualifier === "<" ? value < x : value > x));
        expect(new Set(possible.map((value) => status(value, limits, over))).size).toBeGreaterThan(1);
      }),
    );
  });
});
