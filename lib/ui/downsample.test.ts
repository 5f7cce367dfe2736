// What must be kept is our own rule (see the file); the oracle here is a plain scan of the whole series.
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { keepExtremes } from "./downsample";

const series = fc
  .array(fc.tuple(fc.integer({ min: 0, max: 50 }), fc.double({ min: -100, max: 100, noNaN: true })), {
    minLength: 1,
    maxLength: 600,
  })
  .map((steps) => {
    let at = 0;
    return steps.map(([step, value]) => {
      at += step;
      return { at, value };
    });
  });

describe("thinning a long series", () => {
  it("keeps both extremes, both ends, the order, and every point beyond a limit", () => {
    fc.assert(
      fc.property(series, fc.integer({ min: 1, max: 40 }), (points, buckets) => {
        const beyond = (p: { value: number }) => p.value > 80 || p.value < -80;
        const kept = keepExtremes(points, { buckets, mustKeep: beyond });
        const values = points.map((p) => p.value);
        expect(Math.max(...kept.map((p) => p.value))).toBe(Math.max(...values));
        expect(Math.min(...kept.map((p) => p.value))).toBe(Math.min(...values));
        expect(kept[0]).toBe(points[0]);
        expect(kept.at(-1)).toBe(points.at(-1));
        expect(kept.filter(beyond)).toEqual(points.filter(beyond));
        const places = kept.map((p) => points.indexOf(p));
        expect(places).toEqual([...places].sort((a, b) => a - b));
      }),
    );
  });

  it("really thins: at most four points of a bucket besides those that must stay", () => {
    const points = Array.from({ length: 100_000 }, (_, i) => ({ at: i * 60_000, value: Math.sin(i / 50) }));
    const kept = keepExtremes(points, { buckets: 300 });
    expect(kept.length).toBeLessThanOrEqual(1200);
    expect(kept.length).toBeGreaterThan(600);
  });

  it("keeps a single spike of one minute in a year", () => {
    const points = Array.from({ length: 200_000 }, (_, i) => ({
      at: i * 60_000,
      value: i === 123_456 ? 9.9 : 8.1,
    }));
    expect(keepExtremes(points, { buckets: 100 }).some((p) => p.value === 9.9)).toBe(true);
  });

  it("gives a short series back whole, and nothing for nothing", () => {
    const points = [
      { at: 0, value: 1 },
      { at: 1, value: 2 },
      { at: 2, value: 3 },
    ];
    expect(keepExtremes(points, { buckets: 1 })).toEqual(points);
    expect(keepExtremes([], { buckets: 5 })).toEqual([]);
  });

  it("works when all points have the same moment", () => {
    const points = Array.from({ length: 50 }, (_, i) => ({ at: 7, value: i }));
    expect(keepExtremes(points, { buckets: 3 }).map((p) => p.value)).toEqual([0, 49]);
  });

  it("refuses no buckets and disorder", () => {
    expect(() => keepExtremes([], { buckets: 0 })).toThrow(RangeError);
    expect(() =>
      keepExtremes(
        [
          { at: 2, value: 1 },
          { at: 1, value: 1 },
        ],
        { buckets: 1 },
      ),
    ).toThrow(RangeError);
  });
});
