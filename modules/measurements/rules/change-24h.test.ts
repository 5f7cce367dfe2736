import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { CHANGE_WINDOW_MS, dependentWindow, greatestChange24h, type TimedValue } from "./change-24h";

const HOUR = 3_600_000;
const DAY_START = Date.UTC(2026, 4, 4);
const at = (hour: number, value: number | null, over: Partial<TimedValue> = {}): TimedValue => ({
  id: `${hour}h`,
  takenAt: DAY_START + hour * HOUR,
  value,
  qualifier: "",
  ...over,
});

describe("the greatest change in 24 h", () => {
  it("is found against any reading in the window, not only the last", () => {
    const found = greatestChange24h(at(18, 25.2), [at(6, 24.0), at(12, 24.6)]);
    expect(found?.change).toBeCloseTo(1.2, 12);
    expect(found?.againstId).toBe("6h");
  });

  it("counts a reading exactly 24.0 h before and none a millisecond older or later in time", () => {
    const reading = at(24, 10);
    expect(greatestChange24h(reading, [at(0, 7)])?.change).toBe(3);
    expect(greatestChange24h(reading, [at(0, 7, { takenAt: DAY_START - 1 })])).toBeNull();
    expect(greatestChange24h(reading, [at(24, 7, { id: "b", takenAt: reading.takenAt + 1 })])).toBeNull();
    expect(greatestChange24h(reading, [at(24, 7, { id: "b" })])?.change).toBe(3);
  });

  it("leaves out itself, qualified values and values without a number, on both sides", () => {
    const others = [
      at(6, 1, { qualifier: "<" }),
      at(7, null, { qualifier: "ND" }),
      at(8, 900, { qualifier: ">" }),
    ];
    expect(greatestChange24h(at(12, 5), [...others, at(12, 99)])).toBeNull();
    expect(greatestChange24h(at(12, 5, { qualifier: "<" }), [at(6, 1)])).toBeNull();
  });

  it("does not depend on the order in which readings arrived", () => {
    const readings = fc.array(
      fc.tuple(fc.integer({ min: -30, max: 12 }), fc.double({ min: 0, max: 40, noNaN: true })),
    );
    fc.assert(
      fc.property(readings, (list) => {
        const others = list.map(([hour, value], index) => at(hour, value, { id: index }));
        const forward = greatestChange24h(at(12, 20), others);
        const backward = greatestChange24h(at(12, 20), [...others].reverse());
        expect(forward?.change).toBe(backward?.change);
        const inWindow = list.filter(([hour]) => hour >= -12).map(([, value]) => Math.abs(20 - value));
        expect(forward?.change ?? null).toBe(inWindow.length === 0 ? null : Math.max(...inWindow));
      }),
    );
  });

  it("names exactly the readings that depend on a late one", () => {
    const late = at(12, 24.6);
    const { fromAt, toAt } = dependentWindow(late.takenAt);
    fc.assert(
      fc.property(fc.integer({ min: -2 * CHANGE_WINDOW_MS, max: 2 * CHANGE_WINDOW_MS }), (offset) => {
        const other = at(0, 20, { id: "other", takenAt: late.takenAt + offset });
        const depends = greatestChange24h(other, [late]) !== null;
        expect(depends).toBe(other.takenAt >= fromAt && other.takenAt <= toAt);
      }),
    );
  });
});
