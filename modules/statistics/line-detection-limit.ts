import type { CalibrationLine } from "./calibration";
import { findRoot } from "./find-root";
import { studentTQuantile } from "./student-t";
import { requirePositive, requireProbability } from "./values";

/** Limits in the unit of the content. */
export interface LineDetectionLimits {
  /** A content read above this is said to be there (critical value, decision limit). */
  readonly critical: number;
  /** A content of this size is missed only with the chance beta. */
  readonly detection: number;
  /** A content of this size is found with a relative uncertainty of 1/k. */
  readonly quantification: number;
}

/**
 * From which content on is something there, surely seen, and sure enough to be given as a number? Limits from a
 * calibration line near zero by DIN 32645.
 *
 * Formula: critical = (s / slope) t(1 - alpha) sqrt(1/m + 1/n + x mean^2 / Sxx), one-sided; detection = critical +
 * (s / slope) t(1 - beta) times the same root, so twice the critical value when alpha = beta; quantification solves
 * x = k t(1 - alpha/2) (s / slope) sqrt(1/m + 1/n + (x - x mean)^2 / Sxx).
 * Throws RangeError for a slope of zero or less, and when the quantification limit does not exist (line too unsure).
 * Source: DIN 32645:2008. Checked: its example, 0.0698, 0.14 and 0.212 with alpha = beta = 0.01, k = 3, m = 1.
 */
export function lineDetectionLimits(input: {
  readonly line: CalibrationLine;
  readonly alpha?: number;
  readonly beta?: number;
  readonly k?: number;
  readonly replicates?: number;
}): LineDetectionLimits {
  const { line, alpha = 0.05, beta = 0.05, k = 3, replicates = 1 } = input;
  requireProbability(alpha, "alpha");
  requireProbability(beta, "beta");
  requirePositive(k, "k");
  if (!(line.slope > 0)) throw new RangeError("The signal must rise with the content.");
  if (!(Number.isInteger(replicates) && replicates >= 1)) {
    throw new RangeError("replicates must be a whole number of 1 or more.");
  }
  const scale = line.residualSd / line.slope;
  const root = (x: number) => Math.sqrt(1 / replicates + 1 / line.n + (x - line.xMean) ** 2 / line.sxx);
  const critical = scale * studentTQuantile(1 - alpha, line.df) * root(0);
  const detection = critical + scale * studentTQuantile(1 - beta, line.df) * root(0);
  const factor = k * studentTQuantile(1 - alpha / 2, line.df) * scale;
  const steepest = factor / Math.sqrt(line.sxx);
  if (steepest >= 1) throw new RangeError("The line is too uncertain to give a limit of quantification.");
  const most = (factor * (root(0) + 1) + line.xMean * steepest) / (1 - steepest) + line.xMean;
  const quantification = factor === 0 ? 0 : findRoot((x) => x - factor * root(x), 0, most);
  return { critical, detection, quantification };
}
