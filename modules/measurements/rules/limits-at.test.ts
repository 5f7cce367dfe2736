import { describe, expect, it } from "vitest";
import type { LimitShape, LimitVersion } from "../model";
import { boundsAt, limitsAt, versionInForce } from "./limits-at";

const DAY = 86_400_000;
const START = Date.UTC(2026, 2, 1);
const version = (over: Partial<LimitVersion> & { id: number }): LimitVersion => ({
  version: over.id,
  effectiveFromAt: START,
  effectiveToAt: null,
  shape: { kind: "constant", bounds: { toleranceHigh: over.id } },
  suspended: null,
  ...over,
});

describe("which version is in force", () => {
  const first = version({ id: 1 });
  const second = version({ id: 2, effectiveFromAt: START + DAY });

  it("begins at its moment and not a millisecond before", () => {
    expect(versionInForce([second, first], START - 1)).toBeNull();
    expect(versionInForce([second, first], START)?.id).toBe(1);
    expect(versionInForce([second, first], START + DAY - 1)?.id).toBe(1);
    expect(versionInForce([second, first], START + DAY)?.id).toBe(2);
  });

  it("ends before its end, and of two that begin together the later version holds", () => {
    const ending = version({ id: 1, effectiveToAt: START + DAY });
    expect(versionInForce([ending], START + DAY - 1)?.id).toBe(1);
    expect(versionInForce([ending], START + DAY)).toBeNull();
    expect(versionInForce([version({ id: 4 }), version({ id: 3 })], START)?.id).toBe(4);
  });

  it("says why nothing holds: none, or suspended with its reason", () => {
    expect(limitsAt([], START, "UTC")).toEqual({ state: "none" });
    const suspended = version({ id: 7, suspended: { reason: "no animals" } });
    expect(limitsAt([suspended], START, "UTC")).toEqual({
      state: "suspended",
      versionId: 7,
      version: 7,
      reason: "no animals",
    });
  });
});

describe("bounds that move", () => {
  const ramp: LimitShape = {
    kind: "ramp",
    knots: [
      { at: START, bounds: { target: 12, toleranceHigh: 13, toleranceLow: 11 } },
      { at: START + 92 * DAY, bounds: { target: 16, toleranceHigh: 17, toleranceLow: 15 } },
    ],
  };

  it("a ramp from 12 to 16 °C over 92 days is at 14 °C after 46 days, and level outside", () => {
    expect(boundsAt(ramp, START + 46 * DAY, "UTC")).toEqual({
      target: 14,
      toleranceHigh: 15,
      toleranceLow: 13,
    });
    expect(boundsAt(ramp, START + 23 * DAY, "UTC").target).toBe(13);
    expect(boundsAt(ramp, START - DAY, "UTC").target).toBe(12);
    expect(boundsAt(ramp, START + 92 * DAY, "UTC").target).toBe(16);
    expect(boundsAt(ramp, START + 500 * DAY, "UTC").target).toBe(16);
  });

  const season: LimitShape = {
    kind: "season",
    knots: [
      { monthDay: "08-01", bounds: { toleranceHigh: 20 } },
      { monthDay: "02-01", bounds: { toleranceHigh: 10 } },
    ],
  };

  it("a season runs linearly between its days and wraps around the year", () => {
    const high = (at: number, zone = "UTC") => boundsAt(season, at, zone).toleranceHigh;
    expect(high(Date.UTC(2025, 1, 1))).toBe(10);
    expect(high(Date.UTC(2025, 7, 1))).toBe(20);
    // 2025-02-01 to 2025-08-01 are 181 days; 2025-08-01 to 2026-02-01 are 184
    expect(high(Date.UTC(2025, 1, 1) + 90.5 * DAY)).toBeCloseTo(15, 12);
    expect(high(Date.UTC(2025, 10, 1))).toBeCloseTo(15, 12);
    expect(high(Date.UTC(2026, 0, 1))).toBeCloseTo(20 - (10 * 153) / 184, 12);
    expect(high(Date.UTC(2024, 11, 31, 23, 59, 59, 999))).toBeCloseTo(high(Date.UTC(2025, 0, 1)) ?? 0, 5);
  });

  it("a season follows the facility's calendar, not UTC", () => {
    const auckland = boundsAt(season, Date.UTC(2025, 0, 31, 11), "Pacific/Auckland").toleranceHigh;
    expect(auckland).toBe(10); // 00:00 on 1 February there
    const losAngeles = boundsAt(season, Date.UTC(2025, 7, 1, 7), "America/Los_Angeles").toleranceHigh;
    expect(losAngeles).toBe(20);
  });

  it("refuses a day that no year has and a shape without knots", () => {
    const bad: LimitShape = { kind: "season", knots: [{ monthDay: "02-30", bounds: {} }] };
    expect(() => boundsAt(bad, START, "UTC")).toThrow("“02-30” is not a day of the year");
    expect(() => boundsAt({ kind: "ramp", knots: [] }, START, "UTC")).toThrow(RangeError);
  });
});
