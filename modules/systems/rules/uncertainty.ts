/** Coverage factor of the expanded uncertainty: about 95 % for a nearly normal result (JCGM 100:2008, 6.2 and 6.3). */
export const COVERAGE_FACTOR = 2;

/** One input's sensitivity coefficient ∂f/∂x (units of the result per unit of the input) and standard uncertainty. */
export type Contribution = { sensitivity: number; standardUncertainty: number };

/**
 * What is the combined standard uncertainty of a result whose inputs are not correlated?
 * Not for inputs measured with the same faulty instrument: see `combineCorrelated`.
 *
 * Formula: u_c² = Σ (∂f/∂x_i)² · u²(x_i), first order. Units: those of the result.
 * Domain: finite sensitivities, uncertainties ≥ 0; RangeError outside it.
 * Source: JCGM 100:2008 (GUM), 5.1.2, equation (10).
 * Checked: the GUM's product case, 5.1.6, in tests/published/volume-uncertainty.test.ts.
 *
 * @example combineUncorrelated([{ sensitivity: 1, standardUncertainty: 3 }, { sensitivity: 2, standardUncertainty: 2 }]) // => 5
 */
export function combineUncorrelated(contributions: readonly Contribution[]): number {
  return Math.hypot(...contributions.map(contributionOf));
}

/**
 * What is the combined standard uncertainty of a sum whose parts all share one correlation coefficient?
 *
 * Formula: u_c² = (1 − r) · Σ u_i² + r · (Σ u_i)², which is 5.2.2 with ∂f/∂x_i = 1 and r(x_i, x_j) = r for i ≠ j.
 * Units: those of the sum. Domain: 0 ≤ r ≤ 1, u_i ≥ 0; RangeError outside it.
 * Source: JCGM 100:2008 (GUM), 5.2.2, equation (16); r = 1 is its note 1.
 * Checked: the GUM's ten resistors in series, 5.2.2 example, in tests/published/volume-uncertainty.test.ts.
 *
 * @example combineCorrelated([3, 4], 1) // => 7
 */
export function combineCorrelated(standardUncertainties: readonly number[], correlation: number): number {
  if (!(correlation >= 0 && correlation <= 1)) {
    throw new RangeError("The correlation between components must lie between 0 and 1.");
  }
  standardUncertainties.forEach((value) => mustBeUncertainty(value));
  const alone = Math.hypot(...standardUncertainties);
  const together = standardUncertainties.reduce((sum, value) => sum + value, 0);
  return Math.sqrt((1 - correlation) * alone ** 2 + correlation * together ** 2);
}

/** |∂f/∂x| · u(x), in units of the result. */
export function contributionOf({ sensitivity, standardUncertainty }: Contribution): number {
  if (!Number.isFinite(sensitivity))
    throw new RangeError("A sensitivity coefficient must be a finite number.");
  mustBeUncertainty(standardUncertainty);
  return Math.abs(sensitivity) * standardUncertainty;
}

function mustBeUncertainty(value: number): void {
  if (!(Number.isFinite(value) && value >= 0)) {
    throw new RangeError("A standard uncertainty must be a number that is 0 or more.");
  }
}
