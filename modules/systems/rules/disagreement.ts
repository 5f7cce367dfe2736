import { numberText } from "@/lib/ui/number-text";
import type { Measured } from "../model";

/** Two results further apart than this many standard uncertainties of their difference are pointed out. */
export const DISAGREEMENT_BOUND = 2;

export type Disagreement = {
  /** |V₁ − V₂| / √(u₁² + u₂²); Infinity when both claim to be exact and differ. */
  ratio: number;
  differenceL: number;
  disagrees: boolean;
  /** What a person should read; null when the two agree. */
  sentence: string | null;
};

/**
 * Do two determinations of the same volume contradict each other? Not for volumes of different fill levels.
 *
 * Formula: ratio = |V₁ − V₂| / √(u₁² + u₂²); they disagree when it is greater than 2 (exactly 2 still agrees).
 * Units: litres. Domain: finite volumes, uncertainties ≥ 0; RangeError outside it.
 * Source: the zeta score of ISO 13528 with its warning bound of 2 (the standard's clause on zeta scores).
 * Checked: tests/published/volume-disagreement.test.ts.
 *
 * @example disagreement({ value: 1000, standardUncertainty: 3 }, { value: 1010, standardUncertainty: 4 }).ratio // => 2
 */
export function disagreement(first: Measured, second: Measured): Disagreement {
  for (const { value, standardUncertainty } of [first, second]) {
    if (!Number.isFinite(value)) throw new RangeError("A volume must be a finite number of litres.");
    if (!(Number.isFinite(standardUncertainty) && standardUncertainty >= 0)) {
      throw new RangeError("A standard uncertainty must be a number of 0 or more.");
    }
  }
  const differenceL = Math.abs(first.value - second.value);
  const togetherL = Math.hypot(first.standardUncertainty, second.standardUncertainty);
  const ratio = differenceL === 0 ? 0 : differenceL / togetherL;
  const disagrees = ratio > DISAGREEMENT_BOUND;
  return {
    ratio,
    differenceL,
    disagrees,
    sentence: disagrees ? sentenceOf(differenceL, togetherL, ratio) : null,
  };
}

function sentenceOf(differenceL: number, togetherL: number, ratio: number): string {
  const apart = `The two volumes differ by ${significant(differenceL, 3)} L`;
  const against = Number.isFinite(ratio)
    ? `which is ${significant(ratio, 2)} times the standard uncertainty of their difference (${significant(togetherL, 3)} L)`
    : "although both are given as exact";
  return `${apart}, ${against}: one of them, or its uncertainty, is wrong. Measure again before relying on either.`;
}

/** A positive number with so many significant figures, as the screen writes it. */
function significant(value: number, figures: number): string {
  const rounded = Number(value.toPrecision(figures));
  const decimals = figures - 1 - Math.floor(Math.log10(rounded));
  return numberText(rounded, Math.min(12, Math.max(0, decimals)));
}
