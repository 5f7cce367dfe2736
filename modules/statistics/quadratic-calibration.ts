import { calibrationLine } from "./calibration";
import { fisherFQuantile } from "./fisher-f";
import { sum } from "./moments";
import { requirePairs, requireProbability, type Values } from "./values";

/** A parabola y = c0 + c1 x + c2 x^2 with its residual standard deviation on n - 3 degrees of freedom. */
export interface QuadraticCalibration {
  readonly c0: number;
  readonly c1: number;
  readonly c2: number;
  readonly residualSd: number;
  readonly df: number;
}

/**
 * The least-squares parabola through calibration points, by polynomials that are orthogonal on the points, which
 * keeps its digits where the normal equations lose them.
 *
 * Throws RangeError below four pairs or with fewer than three different x.
 * Source: Forsythe 1957, J. SIAM 5, 74-88. Checked: DIN 32645 data, 2535.11666666667, 9119.43939393939, 986.363636.
 * @example quadraticCalibration({ x: [0, 1, 2, 3], y: [1, 2, 5, 10] }).c2.toFixed(9) // => "1.000000000"
 */
export function quadraticCalibration(input: {
  readonly x: Values;
  readonly y: Values;
}): QuadraticCalibration {
  const { x, y } = input;
  const n = requirePairs(x, y, 4);
  const line = calibrationLine(input);
  const u = Float64Array.from(x, (value) => value - line.xMean);
  const skew = sum(u.map((value) => value ** 3)) / line.sxx;
  const level = line.sxx / n;
  const bend = u.map((value) => value * value - skew * value - level);
  const size = sum(bend.map((value) => value * value));
  if (!(size > 1e-20 * line.sxx ** 2)) throw new RangeError("A parabola needs three different x or more.");
  const residual = Float64Array.from(y, (value, i) => value - line.yMean - line.slope * u[i]!);
  const c2 = sum(residual.map((value, i) => value * bend[i]!)) / size;
  const squares = sum(residual.map((value, i) => (value - c2 * bend[i]!) ** 2));
  const shiftedSlope = line.slope - c2 * skew;
  return {
    c0: line.yMean - c2 * level - shiftedSlope * line.xMean + c2 * line.xMean ** 2,
    c1: shiftedSlope - 2 * c2 * line.xMean,
    c2,
    residualSd: Math.sqrt(squares / (n - 3)),
    df: n - 3,
  };
}

/** Whether a parabola fits significantly better than a line. */
export interface LinearityTest {
  readonly lineSd: number;
  readonly quadraticSd: number;
  readonly f: number;
  readonly critical: number;
  readonly linear: boolean;
}

/**
 * Is the calibration a line over this range? Mandel's test as ISO 8466-1 asks for it: F = ((n - 2) s1^2 -
 * (n - 3) s2^2) / s2^2 with 1 and n - 3 degrees of freedom, at 99 % unless told.
 *
 * Throws as `quadraticCalibration`, and when the parabola fits without any residual (F is then undefined).
 * Source: ISO 8466-1:1990. Checked: DIN 32645 data, F 0.0768076233827816 against 12.2463833484351.
 * @example linearityTest({ x: [0, 1, 2, 3, 4], y: [0, 1.1, 1.9, 3.1, 3.9] }).linear // => true
 */
export function linearityTest(input: {
  readonly x: Values;
  readonly y: Values;
  readonly confidence?: number;
}): LinearityTest {
  const line = calibrationLine(input);
  const quadratic = quadraticCalibration(input);
  const lineVariance = line.residualSd ** 2;
  const quadraticVariance = quadratic.residualSd ** 2;
  if (!(quadraticVariance > 1e-28 * line.yMean ** 2)) {
    throw new RangeError("The parabola passes through every point: linearity cannot be tested.");
  }
  const f = Math.max(0, (line.df * lineVariance - quadratic.df * quadraticVariance) / quadraticVariance);
  const critical = fisherFQuantile(
    requireProbability(input.confidence ?? 0.99, "confidence"),
    1,
    quadratic.df,
  );
  return { lineSd: line.residualSd, quadraticSd: quadratic.residualSd, f, critical, linear: f <= critical };
}
