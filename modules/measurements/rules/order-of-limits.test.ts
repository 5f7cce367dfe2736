import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { LimitShape } from "../model";
import { checkBounds, checkLimitShape } from "./order-of-limits";

const codes = (problems: readonly { code: string }[]) => problems.map((problem) => problem.code);

describe("the order of limits", () => {
  it("accepts every side open and limits that meet", () => {
    expect(checkBounds({})).toEqual([]);
    expect(checkBounds({ toleranceHigh: 18 })).toEqual([]);
    expect(checkBounds({ toleranceLow: 5, watchLow: 5, target: 5, watchHigh: 5, toleranceHigh: 5 })).toEqual(
      [],
    );
    expect(
      checkBounds({ toleranceLow: 17.999999999999996, target: 18, watchHigh: 17.999999999999996 }),
    ).toEqual([]);
  });

  it("names the two limits that stand wrong, with their values", () => {
    expect(checkBounds({ watchHigh: 19, toleranceHigh: 18 }, { decimals: 1 })).toEqual([
      {
        code: "wrong-order",
        fields: ["watchHigh", "toleranceHigh"],
        sentence:
          "The upper watch limit (19.0) is above the upper tolerance limit (18.0). Lower the first or raise the second.",
      },
    ]);
    expect(checkBounds({ toleranceLow: 20, toleranceHigh: 18 })[0]?.fields).toEqual([
      "toleranceLow",
      "toleranceHigh",
    ]);
    expect(checkBounds({ target: 9, watchHigh: 8, toleranceHigh: 7 })).toHaveLength(2);
  });

  it("refuses limits beyond the plausible bounds, a change that is not positive, and numbers that are none", () => {
    const plausible = { low: 0, high: 14 };
    expect(codes(checkBounds({ toleranceHigh: 15 }, { plausible }))).toEqual(["outside-plausible"]);
    expect(codes(checkBounds({ toleranceLow: -1 }, { plausible }))).toEqual(["outside-plausible"]);
    expect(codes(checkBounds({ toleranceHigh: 14, toleranceLow: 0 }, { plausible }))).toEqual([]);
    expect(codes(checkBounds({ greatestChange24h: 0 }))).toEqual(["change-not-positive"]);
    expect(codes(checkBounds({ greatestChange24h: Number.NaN }))).toEqual(["not-a-number"]);
  });

  it("a list of bounds is accepted exactly when it is sorted", () => {
    const five = fc.array(fc.integer({ min: -50, max: 50 }), { minLength: 5, maxLength: 5 });
    fc.assert(
      fc.property(five, (values) => {
        const [toleranceLow, watchLow, target, watchHigh, toleranceHigh] = values;
        const sorted = values.every((value, index) => index === 0 || (values[index - 1] ?? 0) <= value);
        const problems = checkBounds({ toleranceLow, watchLow, target, watchHigh, toleranceHigh });
        expect(problems.length === 0).toBe(sorted);
      }),
    );
  });
});

describe("shapes of limits", () => {
  it("a ramp needs two knots in order of time that state the same bounds", () => {
    const knot = (at: number, bounds: object) => ({ at, bounds });
    const ramp = (...knots: { at: number; bounds: object }[]): LimitShape => ({ kind: "ramp", knots });
    expect(checkLimitShape(ramp(knot(1, { toleranceHigh: 1 }), knot(2, { toleranceHigh: 2 })))).toEqual([]);
    expect(codes(checkLimitShape(ramp(knot(1, { target: 1 }))))).toEqual(["no-knots"]);
    expect(codes(checkLimitShape(ramp(knot(2, { target: 1 }), knot(2, { target: 1 }))))).toEqual([
      "knots-out-of-order",
    ]);
    expect(codes(checkLimitShape(ramp(knot(1, { target: 1 }), knot(2, { watchLow: 1 }))))).toEqual([
      "knots-differ",
    ]);
    const wrong = checkLimitShape(
      ramp(knot(1, { target: 1, watchHigh: 2 }), knot(2, { target: 3, watchHigh: 2 })),
    );
    expect(wrong).toMatchObject([{ code: "wrong-order", knot: 1 }]);
  });

  it("a season needs real and different days; constant limits need a bound", () => {
    const season = (...days: string[]): LimitShape => ({
      kind: "season",
      knots: days.map((monthDay) => ({ monthDay, bounds: { target: 1 } })),
    });
    expect(checkLimitShape(season("02-01", "08-01"))).toEqual([]);
    expect(codes(checkLimitShape(season("02-30", "08-01")))).toEqual(["bad-month-day"]);
    expect(codes(checkLimitShape(season("08-01", "08-01")))).toEqual(["knots-out-of-order"]);
    expect(codes(checkLimitShape({ kind: "constant", bounds: {} }))).toEqual(["no-bounds"]);
  });
});
