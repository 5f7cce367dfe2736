import { describe, expect, it } from "vitest";
import { chartPeriod } from "./chart-period";

const ZONE = "Europe/London";
const now = Date.parse("2026-07-14T08:42:00Z");

describe("the period of a chart", () => {
  it("holds both chosen days whole, in the facility's zone", () => {
    const found = chartPeriod({ from: "2026-03-28", to: "2026-03-29" }, 90, now, ZONE);
    // the clock goes forward on 29 March 2026: that day has 23 hours
    expect(new Date(found.fromAt ?? 0).toISOString()).toBe("2026-03-28T00:00:00.000Z");
    expect(new Date(found.toAt).toISOString()).toBe("2026-03-29T23:00:00.000Z");
    expect(found.isChosen).toBe(true);
  });

  it("goes no further than now", () => {
    expect(chartPeriod({ from: "2026-07-01", to: "2027-01-01" }, 90, now, ZONE).toAt).toBe(now);
  });

  it("is so many days up to now, or everything, where no days were chosen", () => {
    expect(chartPeriod({}, 7, now, ZONE)).toMatchObject({ fromAt: now - 7 * 86_400_000, toAt: now });
    expect(chartPeriod({}, null, now, ZONE).fromAt).toBeNull();
  });

  it("says what is wrong with days that are none or in the wrong order, and shows the preset", () => {
    for (const asked of [
      { from: "2026-02-30" },
      { from: "x", to: "2026-01-01" },
      { from: "2026-03-02", to: "2026-03-01" },
    ]) {
      const found = chartPeriod(asked, 90, now, ZONE);
      expect(found.problem).toMatch(/days?/);
      expect(found.fromAt).toBe(now - 90 * 86_400_000);
    }
  });
});
