import { describe, expect, it } from "vitest";
import type { LimitShape, LimitVersion } from "../model";
import { type LimitStretch, limitCourse } from "./limit-course";

const DAY = 86_400_000;
const at = (text: string) => Date.parse(`${text}T00:00:00Z`);

let version = 0;
const aVersion = (shape: LimitShape, from: number, more: Partial<LimitVersion> = {}): LimitVersion => ({
  id: ++version,
  version,
  effectiveFromAt: from,
  effectiveToAt: null,
  shape,
  suspended: null,
  ...more,
});
const level = (low: number, high: number): LimitShape => ({
  kind: "constant",
  bounds: { toleranceLow: low, toleranceHigh: high },
});

/** What a chart shows at a moment: a straight line from the piece's start to its end. */
function drawn(
  course: readonly LimitStretch[],
  moment: number,
  name: "toleranceLow" | "target",
): number | null {
  const piece = course.find((each) => each.fromAt <= moment && moment < each.toAt);
  if (piece?.state !== "in-force") return null;
  const from = piece.start[name];
  const to = piece.end[name];
  if (from === undefined || to === undefined) return null;
  return from + ((to - from) * (moment - piece.fromAt)) / (piece.toAt - piece.fromAt);
}

describe("the course of limits", () => {
  // worked by hand: half of 92 days is half of 4 degrees
  it("draws a ramp from 12 to 16 °C over 92 days through 14 °C on day 46", () => {
    const begin = at("2026-03-01");
    const ramp: LimitShape = {
      kind: "ramp",
      knots: [
        { at: begin, bounds: { target: 12, toleranceLow: 11 } },
        { at: begin + 92 * DAY, bounds: { target: 16, toleranceLow: 15 } },
      ],
    };
    const course = limitCourse([aVersion(ramp, begin)], begin - 10 * DAY, begin + 120 * DAY, "Europe/London");
    expect(drawn(course, begin + 46 * DAY, "target")).toBeCloseTo(14, 9);
    expect(drawn(course, begin + 46 * DAY, "toleranceLow")).toBeCloseTo(13, 9);
    expect(drawn(course, begin + 100 * DAY, "target")).toBe(16);
    expect(drawn(course, begin - DAY, "target")).toBeNull();
  });

  it("leaves a hole where limits were suspended, and says why", () => {
    const from = at("2026-01-01");
    const course = limitCourse(
      [
        aVersion(level(7.8, 8.4), from, { effectiveToAt: from + 10 * DAY }),
        aVersion(level(0, 0), from + 10 * DAY, {
          effectiveToAt: from + 20 * DAY,
          suspended: { reason: "no animals" },
        }),
        aVersion(level(7.9, 8.3), from + 20 * DAY),
      ],
      from,
      from + 30 * DAY,
      "UTC",
    );
    expect(course.map((each) => each.state)).toEqual(["in-force", "suspended", "in-force"]);
    expect(drawn(course, from + 15 * DAY, "toleranceLow")).toBeNull();
    expect(course[1]).toMatchObject({ reason: "no animals", fromAt: from + 10 * DAY, toAt: from + 20 * DAY });
  });

  it("has no piece before the first version and none where the last has ended", () => {
    const from = at("2026-01-01");
    const versions = [aVersion(level(1, 2), from + 5 * DAY, { effectiveToAt: from + 6 * DAY })];
    const course = limitCourse(versions, from, from + 30 * DAY, "UTC");
    expect(course.map(({ fromAt, toAt }) => [fromAt, toAt])).toEqual([[from + 5 * DAY, from + 6 * DAY]]);
    expect(limitCourse([], from, from + DAY, "UTC")).toEqual([]);
  });

  it("follows the season of every year, round the turn of the year", () => {
    const season: LimitShape = {
      kind: "season",
      knots: [
        { monthDay: "02-01", bounds: { target: 10 } },
        { monthDay: "08-01", bounds: { target: 18 } },
      ],
    };
    const course = limitCourse([aVersion(season, 0)], at("2024-06-01"), at("2026-06-01"), "UTC");
    for (const year of ["2025", "2026"])
      expect(drawn(course, at(`${year}-02-01`), "target")).toBeCloseTo(10, 9);
    expect(drawn(course, at("2025-08-01"), "target")).toBeCloseTo(18, 9);
    // 184 days from 1 August to 1 February; 92 of them lead to 1 November
    expect(drawn(course, at("2025-11-01"), "target")).toBeCloseTo(14, 9);
  });

  it("joins what goes on unchanged, and breaks at a new version", () => {
    const from = at("2026-01-01");
    const versions = [aVersion(level(1, 2), from - DAY), aVersion(level(1, 2), from + DAY)];
    expect(limitCourse(versions, from, from + 9 * DAY, "UTC")).toHaveLength(2);
  });
});
