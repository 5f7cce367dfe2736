import { calibrationLine } from "./calibration";
import { studentTQuantile } from "./student-t";
import { requireProbability, type Values } from "./values";

/** Which published error formula is used for an extrapolated content. */
export type StandardAdditionError = "line" | "line and signal";

/** The content found by extrapolating the line of additions to signal zero, in the unit of the additions. */
export interface StandardAddition {
  readonly content: number;
  readonly se: number;
  readonly halfWidth: number;
  readonly slope: number;
  readonly intercept: number;
  readonly errorFormula: StandardAdditionError;
}

/**
 * How much was in the sample before known amounts were added? Extrapolates the line of signals to zero.
 *
 * Formula: content = intercept / slope. Two error formulas are published: "line" (Miller and Miller, the default),
 * se = (s / slope) sqrt(1/n + y mean^2 / (slope^2 Sxx)), and "line and signal" with an extra 1 under the root.
 * Throws RangeError below three additions and when the signal does not rise with the additions.
 * Source: Miller and Miller (from memory). Checked: aluminium example, 0.1251 with 1.345e-3 and 1.684e-3.
 * @example standardAddition({ added: [0, 1, 2], signals: [2, 4, 6] }).content // => 1
 */
export function standardAddition(input: {
  readonly added: Values;
  readonly signals: Values;
  readonly confidence?: number;
  readonly errorFormula?: StandardAdditionError;
}): StandardAddition {
  const { confidence = 0.95, errorFormula = "line" } = input;
  const line = calibrationLine({ x: input.added, y: input.signals });
  if (!(line.slope > 0)) throw new RangeError("The signal does not rise with the additions.");
  const content = line.intercept / line.slope;
  const single = errorFormula === "line and signal" ? 1 : 0;
  const distance = line.yMean ** 2 / (line.slope ** 2 * line.sxx);
  const se = (line.residualSd / line.slope) * Math.sqrt(single + 1 / line.n + distance);
  const t = studentTQuantile(1 - (1 - requireProbability(confidence, "confidence")) / 2, line.df);
  return { content, se, halfWidth: t * se, slope: line.slope, intercept: line.intercept, errorFormula };
}
