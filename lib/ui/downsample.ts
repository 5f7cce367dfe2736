/** A point of a time series; `at` in UTC epoch milliseconds. */
export interface TimePoint {
  at: number;
  value: number;
}

export interface DownsampleOptions<P extends TimePoint> {
  /** The stretch of time is cut into this many equal parts; about one per pixel column pair. */
  buckets: number;
  /** Points that must be drawn whatever their neighbours say: beyond a limit, corrected, questioned. */
  mustKeep?: (point: P) => boolean;
}

/**
 * Which points of a long series must be drawn so that it looks the same? Of each bucket the first, the last, the
 * lowest and the highest, and every point that must be kept; in the order of time. Triangle-based thinning (LTTB) is
 * not used: it drops extremes. A series of no more than 4 × buckets points is given back whole.
 * @throws RangeError when buckets is not a positive integer or the points are not in the order of time
 * @example keepExtremes([{ at: 0, value: 1 }], { buckets: 10 }).length === 1
 */
export function keepExtremes<P extends TimePoint>(
  points: readonly P[],
  { buckets, mustKeep }: DownsampleOptions<P>,
): P[] {
  if (!Number.isInteger(buckets) || buckets < 1) throw new RangeError("buckets must be a positive integer");
  for (let i = 1; i < points.length; i += 1) {
    if ((points[i] as P).at < (points[i - 1] as P).at)
      throw new RangeError("The points are not in the order of time");
  }
  const first = points[0];
  const last = points.at(-1);
  if (first === undefined || last === undefined || points.length <= 4 * buckets) return [...points];
  const width = (last.at - first.at) / buckets || 1;
  const kept = new Set<number>();
  let start = 0;
  while (start < points.length) {
    const bucket = Math.min(buckets - 1, Math.floor(((points[start] as P).at - first.at) / width));
    let end = start;
    let lowest = start;
    let highest = start;
    while (end < points.length) {
      const point = points[end] as P;
      if (Math.min(buckets - 1, Math.floor((point.at - first.at) / width)) !== bucket) break;
      if (point.value < (points[lowest] as P).value) lowest = end;
      if (point.value > (points[highest] as P).value) highest = end;
      if (mustKeep?.(point)) kept.add(end);
      end += 1;
    }
    for (const index of [start, end - 1, lowest, highest]) kept.add(index);
    start = end;
  }
  return [...kept].sort((a, b) => a - b).map((index) => points[index] as P);
}
