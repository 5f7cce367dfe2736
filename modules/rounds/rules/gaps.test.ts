import { describe, expect, it } from "vitest";
import { DAY_MS, HOUR_MS } from "@/lib/clock";
import { type DueItem, gapsOfDay } from "./gaps";

const FROM = Date.UTC(2026, 2, 2, 6);
const day = { fromAt: FROM, toAt: FROM + DAY_MS };
const daily: DueItem = {
  pointId: 1,
  parameterId: 2,
  everyDays: 1,
  since: 0,
  endedAt: null,
  systemCode: "KELP-01",
  pointCode: "surface",
  parameterCode: "temperature",
  parameterName: "Temperature",
  lastBeforeAt: null,
};
const gaps = (item: DueItem, moments: number[] = []) => gapsOfDay([item], () => moments, day);

describe("a gap", () => {
  it("stands where a daily item was not read on the day, with when it was last read", () => {
    expect(gaps(daily)).toMatchObject([{ systemCode: "KELP-01", lastAt: null }]);
    expect(gaps({ ...daily, lastBeforeAt: FROM - 1 })).toMatchObject([{ lastAt: FROM - 1 }]);
  });

  it("is closed by a reading from the first moment of the day on, not by one after its end", () => {
    expect(gaps(daily, [FROM])).toEqual([]);
    expect(gaps(daily, [day.toAt - 1])).toEqual([]);
    expect(gaps(daily, [day.toAt])).toHaveLength(1);
  });

  it("of a weekly item comes only when the last reading lies more than six days before the day", () => {
    const weekly = { ...daily, everyDays: 7 };
    expect(gaps({ ...weekly, lastBeforeAt: FROM - 6 * DAY_MS })).toEqual([]);
    expect(gaps({ ...weekly, lastBeforeAt: FROM - 6 * DAY_MS - 1 })).toHaveLength(1);
  });

  it("takes the newest reading in whatever order they come", () => {
    expect(gaps(daily, [FROM + HOUR_MS, FROM - DAY_MS])).toEqual([]);
    expect(gaps(daily, [FROM - DAY_MS, FROM - HOUR_MS])).toMatchObject([{ lastAt: FROM - HOUR_MS }]);
  });

  it("does not stand on a day that the plan did not cover whole", () => {
    expect(gaps({ ...daily, since: FROM + 1 })).toEqual([]);
    expect(gaps({ ...daily, endedAt: day.toAt })).toEqual([]);
    expect(gaps({ ...daily, endedAt: day.toAt + 1 })).toHaveLength(1);
  });
});
