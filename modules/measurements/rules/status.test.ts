import { describe, expect, it } from "vitest";
import { convert } from "@/lib/units";
import { type Bounds, type LimitsInForce, type Qualifier } from "../model";
import { greatestChange24h, type TimedValue } from "./change-24h";
import { type JudgeInput, judgeReading } from "./status";

const inForce = (bounds: Bounds): LimitsInForce => ({ state: "in-force", versionId: 1, version: 1, bounds });

function judge(
  value: number | null,
  bounds: Bounds,
  over: Partial<JudgeInput> = {},
  qualifier: Qualifier = "",
) {
  return judgeReading({
    kind: "number",
    reading: { value, qualifier, text: String(value) },
    limits: inForce(bounds),
    change: null,
    plausible: { low: null, high: null },
    mayBeNegative: false,
    decimals: 1,
    unit: "°C",
    ...over,
  });
}
const status = (...input: Parameters<typeof judge>) => judge(...input).status;

describe("a plain value", () => {
  it("64.4 °F is within a limit of at most 18 °C", () => {
    expect(status(convert(64.4, "°F", "°C"), { toleranceHigh: 18 })).toBe("within");
    expect(status(convert(64.4, "°F", "°C"), { toleranceLow: 18 })).toBe("within");
    expect(status(convert(64.5, "°F", "°C"), { toleranceHigh: 18 })).toBe("out");
  });

  const bounds: Bounds = { toleranceLow: 10, watchLow: 12, target: 14, watchHigh: 16, toleranceHigh: 18 };
  it.each([
    [9.9, "out", "low", "below-tolerance"],
    [10, "watch", "low", "below-watch"],
    [11.9, "watch", "low", "below-watch"],
    [12, "within", null, "inside-limits"],
    [16, "within", null, "inside-limits"],
    [16.1, "watch", "high", "above-watch"],
    [18, "watch", "high", "above-watch"],
    [18.1, "out", "high", "above-tolerance"],
  ] as const)("%d is %s, limits being inclusive", (value, expected, side, code) => {
    const verdict = judge(value, bounds);
    expect([verdict.status, verdict.side, verdict.reasons[0]?.code]).toEqual([expected, side, code]);
  });

  it("is implausible beyond the plausible bounds, with or without limits, and a negative where nothing can be", () => {
    const plausible = { low: 5, high: 10 };
    expect(status(81.2, { toleranceHigh: 9 }, { plausible })).toBe("implausible");
    expect(status(81.2, {}, { plausible, limits: { state: "none" } })).toBe("implausible");
    expect(status(10, { toleranceHigh: 9 }, { plausible })).toBe("out");
    expect(status(-0.1, { toleranceHigh: 9 })).toBe("implausible");
    expect(status(-0.1, { toleranceHigh: 9 }, { mayBeNegative: true })).toBe("within");
  });

  it("has no limits when none hold, only a target is named, or they are suspended, and the sentence says which", () => {
    expect(judge(5, {}, { limits: { state: "none" } })).toMatchObject({ status: "none", side: null });
    expect(status(5, { target: 5 })).toBe("none");
    const suspended: LimitsInForce = { state: "suspended", versionId: 1, version: 1, reason: "no animals." };
    expect(judge(5, {}, { limits: suspended })).toMatchObject({
      status: "none",
      reasons: [{ code: "limits-suspended", reason: "no animals." }],
      sentence: "The limits are suspended: no animals.",
    });
  });

  it("says what is off with numbers that look different", () => {
    expect(judge(18.04, { toleranceHigh: 18 }).sentence).toBe(
      "18.04\u00a0°C is above the upper tolerance limit (18.00\u00a0°C).",
    );
    expect(judge(14, bounds).sentence).toBe("14.0\u00a0°C is within its limits.");
  });

  it("refuses to judge a number that is not finite", () => {
    expect(() => judge(Number.NaN, bounds)).toThrow(RangeError);
  });
});

describe("the change in any 24 h", () => {
  const hour = 3_600_000;
  const readings: TimedValue[] = [
    { id: 1, takenAt: 6 * hour, value: 24.0, qualifier: "" },
    { id: 2, takenAt: 12 * hour, value: 24.6, qualifier: "" },
    { id: 3, takenAt: 18 * hour, value: 25.2, qualifier: "" },
  ];
  const judged = (id: number, known: readonly TimedValue[]) => {
    const reading = known.find((each) => each.id === id);
    if (!reading) throw new Error("no such reading");
    return judge(reading.value, { greatestChange24h: 1.0 }, { change: greatestChange24h(reading, known) });
  };

  it("24.0 → 24.6 → 25.2 at 06, 12, 18 h under 1.0 per 24 h is out at 18 h", () => {
    expect(readings.map((each) => judged(Number(each.id), readings).status)).toEqual([
      "within",
      "within",
      "out",
    ]);
    const verdict = judged(3, readings);
    expect(verdict.side).toBe("change");
    expect(verdict.sentence).toBe(
      "25.2\u00a0°C differs by 1.2\u00a0°C from 24.0\u00a0°C read in the preceding 24 h; at most 1.0\u00a0°C is allowed.",
    );
  });

  it("and also when the value of 12 h comes last", () => {
    const [first, middle, last] = readings as [TimedValue, TimedValue, TimedValue];
    expect(judged(3, [first, last]).status).toBe("out");
    const arrived = [first, last, middle];
    expect([1, 2, 3].map((id) => judged(id, arrived).status)).toEqual(["within", "within", "out"]);
  });

  it("a late value in between that makes the step is found when the later one is judged again", () => {
    const before: TimedValue = { id: 1, takenAt: 6 * hour, value: 25, qualifier: "" };
    const late: TimedValue = { id: 2, takenAt: 12 * hour, value: 23.5, qualifier: "" };
    const after: TimedValue = { id: 3, takenAt: 18 * hour, value: 25, qualifier: "" };
    expect(judged(3, [before, after]).status).toBe("within");
    expect(judged(3, [before, after, late]).status).toBe("out");
  });

  it("exactly the greatest change is within, whatever the last binary digit", () => {
    const step = (from: number, to: number) =>
      judge(
        to,
        { greatestChange24h: 0.1 },
        {
          change: {
            change: Math.abs(to - from),
            difference: to - from,
            againstId: 1,
            againstAt: 0,
            againstValue: from,
          },
        },
      ).status;
    expect(0.3 - 0.2).not.toBe(0.1);
    expect(step(0.2, 0.3)).toBe("within");
    expect(step(8.1, 8.2)).toBe("within");
    expect(step(8.1, 8.21)).toBe("out");
  });

  it("is added to a value that is out already, and outweighs a watch", () => {
    const change = { change: 4, difference: 4, againstId: 1, againstAt: 0, againstValue: 15 };
    const bounds = { watchHigh: 16, toleranceHigh: 18, greatestChange24h: 1 };
    expect(judge(19, bounds, { change })).toMatchObject({
      status: "out",
      side: "high",
      reasons: [{ code: "above-tolerance" }, { code: "change-too-great" }],
    });
    expect(judge(17, bounds, { change })).toMatchObject({
      status: "out",
      side: "change",
      reasons: [{ code: "change-too-great" }, { code: "above-watch" }],
    });
  });
});

describe("values with a qualifier", () => {
  it("<0.05 against an upper limit of 0.0075 cannot be judged, and the sentence shows the limit whole", () => {
    const verdict = judge(0.05, { toleranceHigh: 0.0075 }, { decimals: 2, unit: "mg/L" }, "<");
    expect(verdict.status).toBe("unjudged");
    expect(verdict.reasons).toEqual([
      { code: "bound-does-not-decide", bound: "toleranceHigh", limit: 0.0075 },
    ]);
    expect(verdict.sentence).toBe(
      "<0.05\u00a0mg/L cannot be judged against the upper tolerance limit (0.0075\u00a0mg/L): the true value may lie on either side of it.",
    );
  });

  it("<0.05 is within an upper limit of 0.05 and above", () => {
    expect(status(0.05, { toleranceHigh: 0.05 }, {}, "<")).toBe("within");
    expect(status(0.05, { toleranceHigh: 0.1 }, {}, "<")).toBe("within");
  });

  it("<0.05 is out below a lower limit of 0.05, which it proves, and unjudged below 0.01, which it does not", () => {
    expect(judge(0.05, { toleranceLow: 0.05 }, {}, "<")).toMatchObject({ status: "out", side: "low" });
    expect(status(0.05, { toleranceLow: 0.01 }, {}, "<")).toBe("unjudged");
  });

  it("watch is held to the same proof", () => {
    expect(status(0.05, { watchHigh: 0.02, toleranceHigh: 0.1 }, {}, "<")).toBe("unjudged");
    expect(status(0.05, { watchLow: 0.06 }, {}, "<")).toBe("watch");
    expect(status(5, { watchHigh: 5, toleranceHigh: 10 }, { plausible: { low: 0, high: 10 } }, ">")).toBe(
      "watch",
    );
  });

  it(">200 is out above a limit of 200 or 150, unjudged under one of 300", () => {
    expect(status(200, { toleranceHigh: 200 }, {}, ">")).toBe("out");
    expect(status(200, { toleranceHigh: 150 }, {}, ">")).toBe("out");
    expect(status(200, { toleranceHigh: 300 }, {}, ">")).toBe("unjudged");
    expect(status(200, { toleranceLow: 100 }, {}, ">")).toBe("within");
  });

  it("ND is judged by the method's detection limit, and cannot be judged when that is unknown", () => {
    expect(status(null, { toleranceHigh: 0.1 }, {}, "ND")).toBe("unjudged");
    expect(status(null, { toleranceHigh: 0.1 }, { detectionLimit: 0.02 }, "ND")).toBe("within");
    expect(status(null, { toleranceHigh: 0.1 }, { detectionLimit: 0.2 }, "ND")).toBe("unjudged");
    expect(status(null, { toleranceHigh: 35 }, { kind: "count" }, ">")).toBe("unjudged");
  });

  it("a count below 1 is none, so it is within an upper limit of 0", () => {
    expect(status(1, { toleranceHigh: 0 }, { kind: "count" }, "<")).toBe("within");
    expect(status(1, { toleranceHigh: 0 }, { kind: "number" }, "<")).toBe("unjudged");
  });

  it("is implausible only when every possible value is", () => {
    const plausible = { low: 6, high: 9 };
    expect(status(6, { toleranceHigh: 8 }, { plausible }, "<")).toBe("implausible");
    expect(status(9, { toleranceHigh: 8 }, { plausible }, ">")).toBe("implausible");
    expect(status(8.5, { toleranceHigh: 8 }, { plausible }, ">")).toBe("out");
    expect(status(7, { toleranceLow: 5 }, { plausible }, "<")).toBe("within");
  });

  it("has no change: alone that cannot be judged, beside other limits it is said", () => {
    expect(status(0.05, { greatestChange24h: 1 }, {}, "<")).toBe("unjudged");
    const verdict = judge(0.05, { toleranceHigh: 1, greatestChange24h: 1 }, {}, "<");
    expect(verdict.status).toBe("within");
    expect(verdict.reasons.at(-1)).toEqual({ code: "change-not-judged" });
  });
});

describe("answers", () => {
  const answer = (means: JudgeInput["answerMeans"], over: Partial<JudgeInput> = {}) =>
    judge(
      0,
      {},
      {
        kind: "yes-no",
        answerMeans: means,
        limits: { state: "none" },
        reading: { value: 0, qualifier: "", text: "no" },
        ...over,
      },
    );

  it("are judged by what they mean, unless the limits are suspended", () => {
    expect(answer("out")).toMatchObject({ status: "out", reasons: [{ code: "answer", answer: "no" }] });
    expect(answer("watch", { kind: "choice" }).status).toBe("watch");
    expect(answer("within").status).toBe("within");
    expect(answer("none").status).toBe("none");
    expect(answer("out", { kind: "text" }).status).toBe("none");
    const limits: LimitsInForce = { state: "suspended", versionId: 1, version: 1, reason: "drained" };
    expect(answer("out", { limits }).status).toBe("none");
  });
});
