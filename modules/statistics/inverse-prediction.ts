import type { CalibrationLine } from "./calibration";
import { studentTQuantile } from "./student-t";
import { requireFinite, requirePositive, requireProbability } from "./values";

/** A content read from a signal, with its standard error and two-sided confidence interval. */
export interface InversePrediction {
  readonly x: number;
  readonly se: number;
  readonly t: number;
  readonly halfWidth: number;
}

/**
 * Which content gave this signal, and how sure is that? Reads a calibration line backwards.
 *
 * Formula: x = (y - intercept) / slope; se = (s / slope) sqrt(1/m + 1/n + (y - y mean)^2 / (slope^2 Sxx)) with m
 * signals averaged (for a weighted line 1/(weight m) with the weight at that signal, on the scale that adds to n).
 * The approximation is poor when the slope is not clearly different from zero.
 * Throws RangeError for a slope of zero, m below 1, a weight of zero or less.
 * Source: Miller and Miller; DIN 32645. Checked: fluorescein, 13.5 gives 6.2072 +- 0.6163; Massart quinine.
 * @example inversePrediction({ line: calibrationLine({ x: [0, 1, 2], y: [1, 3, 5] }), signal: 4 }).x // => 1.5
 */
export function inversePrediction(input: {
  readonly line: CalibrationLine;
  readonly signal: number;
  readonly replicates?: number;
  readonly confidence?: number;
  readonly weight?: number;
}): InversePrediction {
  const { line, replicates = 1, confidence = 0.95, weight = 1 } = input;
  const signal = requireFinite(input.signal, "signal");
  if (line.slope === 0) throw new RangeError("A line without slope cannot be read backwards.");
  if (!(Number.isInteger(replicates) && replicates >= 1)) {
    throw new RangeError("replicates must be a whole number of 1 or more.");
  }
  requirePositive(weight, "weight");
  const x = (signal - line.intercept) / line.slope;
  const distance = (signal - line.yMean) ** 2 / (line.slope ** 2 * line.sxx);
  const spread = Math.sqrt(1 / (weight * replicates) + 1 / line.n + distance);
  const se = (line.residualSd / Math.abs(line.slope)) * spread;
  const t = studentTQuantile(1 - (1 - requireProbability(confidence, "confidence")) / 2, line.df);
  return { x, se, t, halfWidth: t * se };
}
