import { chartConstants } from "./chart-constants";
import { mean, standardDeviation, variance } from "./moments";
import { requireValues, type Values } from "./values";

/** A centre line with its control limits. */
export interface ControlLimits {
  readonly centre: number;
  readonly lower: number;
  readonly upper: number;
}

/** Limits of a chart of subgroup means and of the chart of their spread. */
export interface SubgroupLimits {
  /** Size of each subgroup and number of subgroups. */
  readonly n: number;
  readonly subgroups: number;
  readonly sigma: number;
  readonly means: ControlLimits;
  readonly spread: ControlLimits;
}

function subgroupSize(subgroups: readonly Values[]): number {
  if (subgroups.length < 2) throw new RangeError("At least 2 subgroups are needed.");
  const n = subgroups[0]!.length;
  subgroups.forEach((group, index) => {
    requireValues(group, 2, `subgroup ${index}`);
    if (group.length !== n) {
      throw new RangeError(`Subgroup ${index} holds ${group.length} values, the first holds ${n}.`);
    }
  });
  return n;
}

/**
 * The range of a series, greatest less smallest.
 * @example range([3, 1, 7]) // => 6
 */
export function range(values: Values): number {
  requireValues(values, 1);
  let least = values[0]!;
  let most = values[0]!;
  for (let i = 1; i < values.length; i++) {
    least = Math.min(least, values[i]!);
    most = Math.max(most, values[i]!);
  }
  return most - least;
}

/**
 * Limits of a chart of subgroup means with a range chart: sigma from the mean range.
 *
 * Units: those of the values. Domain: equal subgroups of 2 to 25; throws RangeError otherwise.
 * Source: ISO 7870-2; NIST/SEMATECH e-Handbook 6.3.2.1. Checked: Montgomery's piston rings, R package qcc.
 * @example meanAndRangeLimits({ subgroups: [[1, 3], [2, 4]] }).spread.centre // => 2
 */
export function meanAndRangeLimits(input: { readonly subgroups: readonly Values[] }): SubgroupLimits {
  const n = subgroupSize(input.subgroups);
  const k = chartConstants(n);
  const centre = mean(input.subgroups.map(mean));
  const rBar = mean(input.subgroups.map(range));
  return {
    n,
    subgroups: input.subgroups.length,
    sigma: rBar / k.d2,
    means: { centre, lower: centre - k.A2 * rBar, upper: centre + k.A2 * rBar },
    spread: { centre: rBar, lower: k.D3 * rBar, upper: k.D4 * rBar },
  };
}

/**
 * Limits of a chart of subgroup means with a chart of subgroup standard deviations: sigma from their mean. Preferred
 * to ranges for subgroups above about ten.
 *
 * Units, domain, source and check as `meanAndRangeLimits`.
 * @example meanAndDeviationLimits({ subgroups: [[1, 3], [2, 4]] }).means.centre // => 2.5
 */
export function meanAndDeviationLimits(input: { readonly subgroups: readonly Values[] }): SubgroupLimits {
  const n = subgroupSize(input.subgroups);
  const k = chartConstants(n);
  const centre = mean(input.subgroups.map(mean));
  const sBar = mean(input.subgroups.map(standardDeviation));
  return {
    n,
    subgroups: input.subgroups.length,
    sigma: sBar / k.c4,
    means: { centre, lower: centre - k.A3 * sBar, upper: centre + k.A3 * sBar },
    spread: { centre: sBar, lower: k.B3 * sBar, upper: k.B4 * sBar },
  };
}

/**
 * The pooled standard deviation of equal subgroups: the root of their mean variance.
 * @example pooledDeviation([[1, 3], [2, 4]]) // => 1.4142135623730951
 */
export function pooledDeviation(subgroups: readonly Values[]): number {
  subgroupSize(subgroups);
  return Math.sqrt(mean(subgroups.map(variance)));
}

/**
 * Which points lie beyond the limits? Strictly beyond: a point on a limit is inside. Returns 0-based indexes.
 * @example pointsBeyond({ values: [1, 5, 9], lower: 1, upper: 8 }) // => [2]
 */
export function pointsBeyond(input: {
  readonly values: Values;
  readonly lower: number;
  readonly upper: number;
}): number[] {
  const beyond: number[] = [];
  const nearly = 1e-9 * Math.max(Math.abs(input.lower), Math.abs(input.upper));
  const slack = Math.min(nearly, 1e-9 * Math.abs(input.upper - input.lower));
  for (let i = 0; i < input.values.length; i++) {
    const value = input.values[i]!;
    if (value > input.upper + slack || value < input.lower - slack) beyond.push(i);
  }
  return beyond;
}
