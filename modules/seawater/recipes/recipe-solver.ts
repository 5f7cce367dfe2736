import { requirePositive, requireShareAboveZero } from "../validity";
import { compoundGPerMol, ionsOf } from "./compound-mass";
import type { Compound } from "./compounds.data";
import { IONS, type Ion } from "./ions.data";
import { nonNegativeLeastSquares } from "./least-squares";

/** A salt on the shelf. */
export interface SaltOnHand {
  compound: Compound;
  hydrationWaters?: number;
  purityFraction?: number;
}

/** A target, in mmol per unit of finished water; every ion counts by its relative error times its weight. */
export interface IonTarget {
  ion: Ion;
  mmol: number;
  /** 1 unless said */
  weight?: number;
}

export interface SolvedRecipe {
  /** in the order of the salts given; a salt that does not help has 0 g */
  salts: readonly (SaltOnHand & { massG: number; amountMol: number })[];
  ions: readonly {
    ion: Ion;
    targetMmol: number;
    achievedMmol: number;
    residualMmol: number;
    residualPercent: number;
  }[];
  /** ions that come with the salts although no target was set for them */
  untargeted: readonly { ion: Ion; mmol: number }[];
  /** root of the sum of squared relative residuals, in percent */
  residualNormPercent: number;
  /** charge of the targets; far from zero no recipe of salts can meet them */
  targetChargeMmol: number;
}

function requireInput(salts: readonly SaltOnHand[], targets: readonly IonTarget[]): void {
  if (salts.length === 0) throw new RangeError("salts: at least one is needed.");
  if (targets.length === 0) throw new RangeError("targets: at least one is needed.");
  if (new Set(targets.map(({ ion }) => ion)).size !== targets.length) {
    throw new RangeError("targets: an ion is named twice.");
  }
  for (const { mmol, weight = 1 } of targets) {
    requirePositive("target", mmol);
    requirePositive("weight", weight);
  }
  for (const { purityFraction = 1 } of salts) requireShareAboveZero("purityFraction", purityFraction);
}

/** mmol of each ion that the salts give. */
function achieved(salts: SolvedRecipe["salts"]): Map<Ion, number> {
  const totals = new Map<Ion, number>();
  for (const { compound, amountMol } of salts) {
    for (const [ion, count] of ionsOf(compound)) {
      totals.set(ion, (totals.get(ion) ?? 0) + 1000 * amountMol * count);
    }
  }
  return totals;
}

/**
 * How much of each salt on the shelf comes nearest to the wanted ions? Never a negative mass; what cannot be met
 * is shown as a residual per ion.
 *
 * Units: mmol per litre or kilogram of finished water; answer in grams of the salt as weighed (hydrated, impure) per the
 * same. Weighted by relative error. Throws RangeError without salts or targets, for a target or weight not above
 * zero, and an ion named twice. Source: Lawson and Hanson 1974 (non-negative least squares). Checked: Kester et al.
 * 1967's salts are found again from its ions; SciPy's nnls.
 * @example solveRecipe({ salts: [{ compound: "MgCl2", hydrationWaters: 6 }], targets: [{ ion: "Mg", mmol: 50 }] }).salts[0].massG // => 10.16475
 */
export function solveRecipe(input: {
  salts: readonly SaltOnHand[];
  targets: readonly IonTarget[];
}): SolvedRecipe {
  const { targets } = input;
  requireInput(input.salts, targets);
  const columns = input.salts.map(({ compound }) => {
    const counts = new Map(ionsOf(compound));
    return targets.map(({ ion, mmol, weight = 1 }) => (weight * 1000 * (counts.get(ion) ?? 0)) / mmol);
  });
  const amounts = nonNegativeLeastSquares(
    columns,
    targets.map(({ weight = 1 }) => weight),
  );
  const salts = input.salts.map((salt, j) => {
    const amountMol = amounts[j]!;
    return { ...salt, amountMol, massG: (amountMol * compoundGPerMol(salt)) / (salt.purityFraction ?? 1) };
  });
  const totals = achieved(salts);
  const ions = targets.map(({ ion, mmol }) => {
    const achievedMmol = totals.get(ion) ?? 0;
    const residualMmol = achievedMmol - mmol;
    return {
      ion,
      targetMmol: mmol,
      achievedMmol,
      residualMmol,
      residualPercent: (100 * residualMmol) / mmol,
    };
  });
  const wanted = new Set(targets.map(({ ion }) => ion));
  return {
    salts,
    ions,
    untargeted: [...totals].filter(([ion]) => !wanted.has(ion)).map(([ion, mmol]) => ({ ion, mmol })),
    residualNormPercent: Math.hypot(...ions.map(({ residualPercent }) => residualPercent)),
    targetChargeMmol: targets.reduce((total, { ion, mmol }) => total + mmol * IONS[ion].charge, 0),
  };
}
