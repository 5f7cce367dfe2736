import { requireFinite, requireNotNegative, requirePositive, requireWithin } from "../validity";

export interface TracerInput {
  /** of the tracer itself, as the concentrations count it */
  massG: number;
  beforeMgPerL: number;
  afterMgPerL: number;
  /** standard uncertainties (k = 1) */
  massUncertaintyG: number;
  beforeUncertaintyMgPerL: number;
  afterUncertaintyMgPerL: number;
  /** between the two readings, −1 to 1; both by one meter share its calibration error. 0 unless said */
  readingsCorrelation?: number;
}

export interface TracerVolume {
  volumeL: number;
  standardUncertaintyL: number;
  /** k = 2, about 95 % */
  expandedUncertaintyL: number;
}

/**
 * How much water is in the system, by a tracer weighed in and measured before and after mixing, and how surely?
 *
 * Units: g, mg/L, standard uncertainties in the same; answer in L. Throws RangeError unless the concentration rises, and for
 * negative uncertainties. Formula: V = m / (C1 − C0), u(V)² = V² [(u_m/m)² + (u0² + u1² − 2 r u0 u1)/(C1 − C0)²]. Assumes the
 * tracer is wholly mixed and none is lost. Source: JCGM 100:2008 (GUM) eqs 10 and 16. Checked: computed (256.32 L of 10,000).
 * @example tracerVolume({ massG: 500, beforeMgPerL: 10, afterMgPerL: 60, massUncertaintyG: 0.5, beforeUncertaintyMgPerL: 0.8, afterUncertaintyMgPerL: 1 }).standardUncertaintyL // => 256.32
 */
export function tracerVolume(input: TracerInput): TracerVolume {
  const massG = requirePositive("massG", input.massG);
  const rise =
    requireFinite("afterMgPerL", input.afterMgPerL) - requireFinite("beforeMgPerL", input.beforeMgPerL);
  if (!(rise > 0)) throw new RangeError("afterMgPerL must be above beforeMgPerL: the tracer must show.");
  const um = requireNotNegative("massUncertaintyG", input.massUncertaintyG);
  const u0 = requireNotNegative("beforeUncertaintyMgPerL", input.beforeUncertaintyMgPerL);
  const u1 = requireNotNegative("afterUncertaintyMgPerL", input.afterUncertaintyMgPerL);
  const r = input.readingsCorrelation ?? 0;
  requireWithin("readingsCorrelation", r, { min: -1, max: 1, unit: "" }, "a correlation");
  const volumeL = (1000 * massG) / rise;
  const variance = (um / massG) ** 2 + Math.max(0, u0 * u0 + u1 * u1 - 2 * r * u0 * u1) / rise ** 2;
  const standardUncertaintyL = volumeL * Math.sqrt(variance);
  return { volumeL, standardUncertaintyL, expandedUncertaintyL: 2 * standardUncertaintyL };
}
