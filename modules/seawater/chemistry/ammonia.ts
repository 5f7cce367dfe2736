import { requireNotNegative, requireWithin, type ValidRange } from "../validity";
import { AMMONIA_FORMULA_SCALES, AMMONIA_RANGE, type AmmoniaFormula, ammoniumPKa } from "./ammonium-pka";
import { ATOMIC_WEIGHTS } from "./atomic-weights.data";
import { molarMassGPerMol } from "./molar-mass";
import { convertPH, type PHScale } from "./ph-scale";

/** Mass of ammonia over the mass of the nitrogen in it, 1.2159. */
const NH3_PER_NITROGEN = molarMassGPerMol({ N: 1, H: 3 }) / ATOMIC_WEIGHTS.N;

/** Whether the concentrations behind pH and pKa are per kilogram of water (as printed) or of seawater. */
export type ConcentrationBasis = "mol/kg-water" | "mol/kg-seawater";

/** Below this salinity an NBS pH is taken with the formula for fresh water unless another is named. */
export const FRESH_WATER_BELOW: ValidRange = { min: 0, max: 1, unit: "psu" };

/**
 * The formula used when none is named: the one written for the scale of the pH at hand. For NBS pH that is Emerson
 * et al. up to 1 psu and the saltwater formula of the US EPA above it, which gives the higher share (the careful side).
 */
export function defaultAmmoniaFormula(input: { pHScale: PHScale; salinityPsu: number }): AmmoniaFormula {
  if (input.pHScale === "seawater") return "yao-millero-1995";
  if (input.pHScale !== "nbs") return "clegg-whitfield-1995";
  return input.salinityPsu <= FRESH_WATER_BELOW.max ? "emerson-1975" : "epa-1989";
}

export interface UnionizedAmmoniaInput {
  /** ammonia and ammonium together, as nitrogen */
  totalAmmoniaMgNPerL: number;
  temperatureC: number;
  salinityPsu: number;
  pH: number;
  pHScale: PHScale;
  formula?: AmmoniaFormula;
  /** for Clegg and Whitfield only; `mol/kg-seawater` lowers the share by 3 % at 35 psu. As printed unless said. */
  concentrationBasis?: ConcentrationBasis;
}

export interface UnionizedAmmonia {
  /** share of the total that is NH3, 0 to 1 */
  fraction: number;
  percent: number;
  unionizedMgNPerL: number;
  unionizedMgNH3PerL: number;
  pKa: number;
  formula: AmmoniaFormula;
  /** of the pH as given */
  pHScale: PHScale;
  /** on which the formula is written, and the pH brought to it */
  formulaPHScale: PHScale;
  formulaPH: number;
  concentrationBasis: ConcentrationBasis;
}

/** The formula's own scale nearest to the given one. NBS and the concentration scales are never mixed. */
function scaleFor(formula: AmmoniaFormula, pHScale: PHScale): PHScale {
  const scales = AMMONIA_FORMULA_SCALES[formula];
  if (scales.includes(pHScale)) return pHScale;
  if (pHScale === "nbs" || scales.includes("nbs")) {
    throw new RangeError(
      `${formula} is written for pH on the ${scales.join(" or ")} scale; a pH on the ${pHScale} scale would be out by up to 30 %.`,
    );
  }
  return scales[0]!;
}

/**
 * How much of the total ammonia is free NH3, the part that harms animals? pH scale and formula move the answer by 20 to
 * 30 %, so both come back with it and belong beside it wherever it is shown.
 *
 * Units: mg/L as N, °C, psu, pH on the named scale. Answer: share, mg/L as N and as NH3, pKa. Throws RangeError outside
 * AMMONIA_RANGE of the formula, and for an NBS pH with a formula of another scale or the reverse (total, free and seawater
 * pH are brought to each other). Formula: 1 / (1 + 10^(pKa − pH)). Source: see ammoniumPKa.
 * Checked: Clegg and Whitfield 1995 (0.0556 at 25 °C, S 35, pH 8.0 total), Bower and Bidwell 1978, Emerson et al. 1975.
 * @example unionizedAmmonia({ totalAmmoniaMgNPerL: 0.1, temperatureC: 25, salinityPsu: 35, pH: 8, pHScale: "total" }).fraction // => 0.0556
 */
export function unionizedAmmonia(input: UnionizedAmmoniaInput): UnionizedAmmonia {
  const { temperatureC, salinityPsu, pH, pHScale, concentrationBasis = "mol/kg-water" } = input;
  const formula = input.formula ?? defaultAmmoniaFormula(input);
  requireNotNegative("totalAmmoniaMgNPerL", input.totalAmmoniaMgNPerL);
  requireWithin("pH", pH, AMMONIA_RANGE[formula].pH, formula);
  const formulaPHScale = scaleFor(formula, pHScale);
  const printed = ammoniumPKa({ formula, pHScale: formulaPHScale, temperatureC, salinityPsu });
  const perSeawater = concentrationBasis === "mol/kg-seawater" && formula === "clegg-whitfield-1995";
  const pKa = perSeawater ? printed - Math.log10(1 - 0.001005 * salinityPsu) : printed;
  const formulaPH = convertPH({ pH, from: pHScale, to: formulaPHScale, temperatureC, salinityPsu });
  const fraction = 1 / (1 + 10 ** (pKa - formulaPH));
  return {
    fraction,
    percent: 100 * fraction,
    ...unionizedFromFraction({ totalAmmoniaMgNPerL: input.totalAmmoniaMgNPerL, fraction }),
    pKa,
    formula,
    pHScale,
    formulaPHScale,
    formulaPH,
    concentrationBasis: formula === "yao-millero-1995" || perSeawater ? "mol/kg-seawater" : "mol/kg-water",
  };
}

/**
 * How much NH3 is a known share of the total, as nitrogen and as NH3? A limit says which of the two it means.
 *
 * Units: mg/L as N, share 0 to 1; answer in mg/L as N and as NH3 (1.2159 times). Throws RangeError outside 0 to 1.
 * Source: atomic weights. Checked: computed (0.0607946 mg/L NH3).
 * @example unionizedFromFraction({ totalAmmoniaMgNPerL: 1, fraction: 0.05 }).unionizedMgNH3PerL // => 0.060795
 */
export function unionizedFromFraction(input: { totalAmmoniaMgNPerL: number; fraction: number }): {
  unionizedMgNPerL: number;
  unionizedMgNH3PerL: number;
} {
  requireNotNegative("totalAmmoniaMgNPerL", input.totalAmmoniaMgNPerL);
  requireWithin("fraction", input.fraction, { min: 0, max: 1, unit: "" }, "a share");
  const unionizedMgNPerL = input.totalAmmoniaMgNPerL * input.fraction;
  return { unionizedMgNPerL, unionizedMgNH3PerL: unionizedMgNPerL * NH3_PER_NITROGEN };
}
