import { describe, expect, it } from "vitest";
import { type TimedStatus, timeWithin } from "./time-within";

const HOUR = 3_600_000;
const reading = (hour: number, status: TimedStatus["status"]): TimedStatus => ({
  takenAt: hour * HOUR,
  status,
});

describe("time within tolerance", () => {
  it("weighs by time, not by how often somebody looked", () => {
    // 20 h within, then four readings out in 4 h: 20 of 24
    const readings = [reading(0, "within"), ...[20, 21, 22, 23].map((hour) => reading(hour, "out"))];
    expect(timeWithin(readings, 24 * HOUR, 48 * HOUR).share).toBeCloseTo(20 / 24, 12);
  });

  it("counts watch as within, for it lies inside tolerance", () => {
    expect(timeWithin([reading(0, "watch")], 10 * HOUR, 24 * HOUR).share).toBe(1);
  });

  it("does not hold a reading longer than it may speak for", () => {
    const found = timeWithin([reading(0, "within"), reading(100, "out")], 110 * HOUR, 10 * HOUR);
    expect(found).toEqual({ share: 0.5, knownMs: 20 * HOUR });
  });

  it("knows nothing from what is implausible, not judged, or without limits", () => {
    const found = timeWithin(
      [reading(0, "implausible"), reading(1, "unjudged"), reading(2, "none")],
      9 * HOUR,
      HOUR,
    );
    expect(found).toEqual({ share: null, knownMs: 0 });
    expect(timeWithin([], 9 * HOUR, HOUR).share).toBeNull();
  });
});
