import { mean, standardDeviation } from "./moments";
import { requireFinite, requirePositive, type Values } from "./values";

/** Lines of a control-sample chart in the unit of the values. */
export interface LeveyJenningsLimits {
  readonly centre: number;
  readonly sigma: number;
  /** One, two and three standard deviations below and above: zone, warning and control lines. */
  readonly lowerZone: number;
  readonly upperZone: number;
  readonly lowerWarning: number;
  readonly upperWarning: number;
  readonly lower: number;
  readonly upper: number;
}

/**
 * Where should the result of a control sample lie? Warning lines at 2 and control lines at 3 standard deviations of
 * the results themselves (not of their moving ranges) about the mean, or about assigned values.
 *
 * Throws RangeError for a standard deviation of zero or less.
 * Source: Levey and Jennings 1950; Standard Methods 1020 B (from memory). Checked: mean 200, s 4 gives 192..208, 188..212.
 * @example leveyJenningsLimits({ mean: 200, sd: 4 }).upper // => 212
 */
export function leveyJenningsLimits(
  input: { readonly mean: number; readonly sd: number } | { readonly values: Values },
): LeveyJenningsLimits {
  const centre = "values" in input ? mean(input.values) : requireFinite(input.mean, "mean");
  const sigma = requirePositive("values" in input ? standardDeviation(input.values) : input.sd, "sd");
  return {
    centre,
    sigma,
    lowerZone: centre - sigma,
    upperZone: centre + sigma,
    lowerWarning: centre - 2 * sigma,
    upperWarning: centre + 2 * sigma,
    lower: centre - 3 * sigma,
    upper: centre + 3 * sigma,
  };
}
