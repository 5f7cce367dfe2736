import { type KendallResult, kendall, kendallTest } from "./kendall";
import { requireValues, type Values } from "./values";

/**
 * Is there a steady trend with time? The Mann-Kendall test, which asks nothing of the distribution and is not moved
 * by single extremes. Not for autocorrelated series without thinning them out, nor for seasonal ones: see
 * `seasonalMannKendall`. Times equal to one another count as ties.
 *
 * Without `times` the values are taken in their order. Throws RangeError below 4 or above 5,000 values.
 * Source: Mann 1945; Kendall 1975; USEPA 2009 Unified Guidance 17.3. Checked: sulfate example 17-6, S 194, z 5.107322.
 * @example mannKendall({ values: [1, 2, 3, 4] }).s // => 6
 */
export function mannKendall(input: { readonly values: Values; readonly times?: Values }): KendallResult {
  const n = requireValues(input.values, 4);
  const times = input.times ?? Float64Array.from({ length: n }, (_, index) => index);
  return kendall({ x: times, y: input.values });
}

/** The seasonal test: S and its variance summed over seasons. */
export interface SeasonalTrend {
  readonly s: number;
  readonly variance: number;
  readonly z: number;
  readonly pTwoSided: number;
  readonly seasons: readonly { readonly season: number; readonly n: number; readonly s: number }[];
}

/**
 * Is there a trend once each season is compared only with itself? S and its variance are summed over the seasons,
 * which are taken as independent of one another.
 *
 * `seasons` names the season of each value by a whole number (month, weekday, morning or afternoon). A season with a
 * single value adds nothing. Throws RangeError when lengths differ or no season has two values.
 * Source: Hirsch, Slack and Smith 1982, Water Resources Research 18, 107-121.
 * @example seasonalMannKendall({ values: [1, 9, 2, 10], seasons: [1, 2, 1, 2] }).s // => 2
 */
export function seasonalMannKendall(input: {
  readonly values: Values;
  readonly seasons: Values;
}): SeasonalTrend {
  const { values, seasons } = input;
  const n = requireValues(values, 2);
  if (seasons.length !== n) throw new RangeError("Every value needs its season.");
  requireValues(seasons, n, "seasons");
  const bySeason = new Map<number, number[]>();
  for (let i = 0; i < n; i++) {
    const series = bySeason.get(seasons[i]!) ?? [];
    series.push(values[i]!);
    bySeason.set(seasons[i]!, series);
  }
  const parts = [...bySeason]
    .filter(([, series]) => series.length >= 2)
    .sort(([a], [b]) => a - b)
    .map(([season, y]) => ({ season, ...kendall({ x: y.map((_, index) => index), y }) }));
  if (parts.length === 0) throw new RangeError("No season has two values to compare.");
  const s = parts.reduce((total, part) => total + part.s, 0);
  const variance = parts.reduce((total, part) => total + part.variance, 0);
  return {
    s,
    variance,
    ...kendallTest(s, variance),
    seasons: parts.map((part) => ({ season: part.season, n: part.n, s: part.s })),
  };
}
