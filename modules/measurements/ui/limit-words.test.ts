import { describe, expect, it } from "vitest";
import { boundsWords, monthDayWords, shapeLines } from "./limit-words";

describe("limits in words", () => {
  it("name what is limited, with open sides left out", () => {
    expect(
      boundsWords({ target: 12, watchLow: 11, watchHigh: 13, toleranceHigh: 14, greatestChange24h: 1 }, 1),
    ).toEqual([
      "target 12.0",
      "watch 11.0 to 13.0",
      "tolerance up to 14.0",
      "change at most 1.0 in any 24\u00a0h",
    ]);
    expect(boundsWords({ toleranceLow: 6.5 }, 1)).toEqual(["tolerance from 6.5"]);
    expect(boundsWords({}, 1)).toEqual([]);
  });

  it("never hide digits that a limit has", () => {
    expect(boundsWords({ toleranceHigh: 0.0075 }, 3)).toEqual(["tolerance up to 0.0075"]);
  });

  it("stand a line for each day of a ramp or a season, in the facility's calendar", () => {
    const ramp = {
      kind: "ramp" as const,
      knots: [{ at: Date.UTC(2026, 4, 31, 23), bounds: { target: 12 } }],
    };
    // London is an hour ahead of UTC in summer (IANA tz database)
    expect(shapeLines(ramp, 1, "Europe/London")).toEqual([{ when: "1 Jun 2026", words: "target 12.0" }]);
    const season = { kind: "season" as const, knots: [{ monthDay: "02-20", bounds: { target: 8 } }] };
    expect(shapeLines(season, 1, "Europe/London")).toEqual([{ when: "20 Feb", words: "target 8.0" }]);
    expect(monthDayWords("12-01")).toBe("1 Dec");
  });
});
