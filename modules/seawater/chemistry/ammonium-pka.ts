import { polynomial } from "../polynomial";
import { ZERO_CELSIUS_K } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";
import type { PHScale } from "./ph-scale";

/** Formulas for the acidity of ammonium; each belongs to a pH scale. */
export type AmmoniaFormula =
  | "emerson-1975"
  | "bower-bidwell-1978"
  | "clegg-whitfield-1995"
  | "yao-millero-1995"
  | "bell-2008"
  | "epa-1989";

const span = (salinity: readonly [number, number], temperature: readonly [number, number]) => ({
  salinityPsu: { min: salinity[0], max: salinity[1], unit: "psu" },
  temperatureC: { min: temperature[0], max: temperature[1], unit: "°C" },
});

/** Where each formula holds. The table of Bower and Bidwell is for S 34 (taken for 32 to 36) and pH 7.5 to 8.5. */
export const AMMONIA_RANGE: Readonly<
  Record<AmmoniaFormula, { salinityPsu: ValidRange; temperatureC: ValidRange; pH: ValidRange }>
> = {
  "emerson-1975": { ...span([0, 1], [0, 50]), pH: { min: 4, max: 11, unit: "" } },
  "bower-bidwell-1978": { ...span([32, 36], [10, 25]), pH: { min: 7.5, max: 8.5, unit: "" } },
  "clegg-whitfield-1995": { ...span([0, 40], [-2, 40]), pH: { min: 4, max: 11, unit: "" } },
  "yao-millero-1995": { ...span([0, 40], [0, 40]), pH: { min: 4, max: 11, unit: "" } },
  "bell-2008": { ...span([0, 40], [0, 40]), pH: { min: 4, max: 11, unit: "" } },
  "epa-1989": { ...span([0, 40], [0, 40]), pH: { min: 4, max: 11, unit: "" } },
};

/** On which pH scales each formula is written (Clegg and Whitfield give one fit for each of two). */
export const AMMONIA_FORMULA_SCALES: Readonly<Record<AmmoniaFormula, readonly PHScale[]>> = {
  "emerson-1975": ["nbs"],
  "bower-bidwell-1978": ["nbs"],
  "clegg-whitfield-1995": ["total", "free"],
  "yao-millero-1995": ["seawater"],
  "bell-2008": ["nbs"],
  "epa-1989": ["nbs"],
};

/** Emerson, Russo, Lund and Thurston 1975, J. Fish. Res. Board Can. 32, 2379-2383. */
export const EMERSON_1975 = { a: 0.09018, b: 2729.92 } as const;
/** Our line through the table of Bower and Bidwell 1978, J. Fish. Res. Board Can. 35, 1012-1016 (within 0.4 %). */
export const BOWER_BIDWELL_1978 = { at25: 9.35, perC: 0.0324 } as const;
/** Corrigendum (2008) to Bell, Johnson, Jickells and Liss 2007, Environ. Chem. 4, 89; t in °C. */
export const BELL_2008 = { a: 10.0423, t: -0.0315536, s: 0.003071 } as const;
/** US EPA 440/5-88-004 (1989), saltwater ammonia criteria (from memory); one atmosphere. */
export const EPA_1989 = { a: 9.245, i: 0.116, t: 0.0324, p: 0.0415, i1: 19.9273, i2: 1.005109 } as const;
/** Yao and Millero 1995, Aquat. Geochem. 1, 53-88; ln K. */
export const YAO_MILLERO_1995 = {
  water: [-6285.33, -0.25444, 0.0001635],
  s05: [-123.7184, 0.46532],
  s: [3.17556, -0.01992],
} as const;
/** Clegg and Whitfield 1995, Geochim. Cosmochim. Acta 59, 2403-2421, eq. 18 (total) and its free scale companion. */
export const CLEGG_WHITFIELD_1995 = {
  pK25: 9.244605,
  enthalpyK: -2729.33,
  total: {
    s025: [0.04203362, -11.24742],
    s05: [-13.6416, 1.176949, -0.02860785, 545.4834],
    s15: [-0.1462507, 0.0090226468, -0.0001471361, 10.5425],
    s2: [0.004669309, -0.0001691742, -0.5677934],
    s25: [-2.354039e-5, 0.009698623],
  },
  free: {
    s05: [0.0500616, -9.412696, -2.029559e-7],
    s: [-0.0142372, 1.46041e-5, 3.730005],
    s2: [7.1047e-5, -0.0229021],
    s3: [-5.521278e-7, 1.95413e-4],
  },
} as const;

function cleggWhitfieldTotal(t: number, s: number): number {
  const { total: c, pK25, enthalpyK } = CLEGG_WHITFIELD_1995;
  const r = Math.sqrt(t);
  return (
    pK25 +
    enthalpyK * (1 / 298.15 - 1 / t) +
    (c.s025[0] + c.s025[1] / t) * s ** 0.25 +
    (c.s05[0] + c.s05[1] * r + c.s05[2] * t + c.s05[3] / t) * s ** 0.5 +
    (c.s15[0] + c.s15[1] * r + c.s15[2] * t + c.s15[3] / t) * s ** 1.5 +
    (c.s2[0] + c.s2[1] * r + c.s2[2] / t) * s ** 2 +
    (c.s25[0] + c.s25[1] / t) * s ** 2.5
  );
}

function cleggWhitfieldFree(t: number, s: number): number {
  const { free: c, pK25, enthalpyK } = CLEGG_WHITFIELD_1995;
  return (
    pK25 +
    enthalpyK * (1 / 298.15 - 1 / t) +
    (c.s05[0] + c.s05[1] / t + c.s05[2] * t * t) * s ** 0.5 +
    (c.s[0] + c.s[1] * t + c.s[2] / t) * s +
    (c.s2[0] + c.s2[1] / t) * s ** 2 +
    (c.s3[0] + c.s3[1] / t) * s ** 3
  );
}

function yaoMillero(t: number, s: number): number {
  const c = YAO_MILLERO_1995;
  const water = c.water[0] / t + c.water[1] + c.water[2] * t;
  const ln =
    water + polynomial(1 / t, [c.s05[1], c.s05[0]]) * s ** 0.5 + polynomial(1 / t, [c.s[1], c.s[0]]) * s;
  return -ln / Math.LN10;
}

function epa(t: number, s: number): number {
  const ionicStrength = (EPA_1989.i1 * s) / (1000 - EPA_1989.i2 * s);
  return EPA_1989.a + EPA_1989.i * ionicStrength + EPA_1989.t * (298 - t) + EPA_1989.p / t;
}

/**
 * How strong an acid is ammonium in this water? The figure belongs to the pH scale of the formula.
 *
 * Units: °C, psu; `pHScale` picks between the two fits of Clegg and Whitfield. Domain: AMMONIA_RANGE and
 * AMMONIA_FORMULA_SCALES, else RangeError. Clegg and Whitfield on mol per kg of water. Source: at each constant.
 * Checked: Clegg and Whitfield 1995, Emerson et al. 1975, Bower and Bidwell 1978 (published tables).
 * @example ammoniumPKa({ formula: "bell-2008", pHScale: "nbs", temperatureC: 25, salinityPsu: 35 }) // => 9.360945
 */
export function ammoniumPKa(input: {
  formula: AmmoniaFormula;
  pHScale: PHScale;
  temperatureC: number;
  salinityPsu: number;
}): number {
  const { formula, pHScale, temperatureC, salinityPsu: s } = input;
  requireWithin("temperatureC", temperatureC, AMMONIA_RANGE[formula].temperatureC, formula);
  requireWithin("salinityPsu", s, AMMONIA_RANGE[formula].salinityPsu, formula);
  if (!AMMONIA_FORMULA_SCALES[formula].includes(pHScale)) {
    throw new RangeError(
      `${formula} is written for pH on the ${AMMONIA_FORMULA_SCALES[formula].join(" or ")} scale, not ${pHScale}.`,
    );
  }
  const t = temperatureC + ZERO_CELSIUS_K;
  switch (formula) {
    case "emerson-1975":
      return EMERSON_1975.a + EMERSON_1975.b / t;
    case "bower-bidwell-1978":
      return BOWER_BIDWELL_1978.at25 + BOWER_BIDWELL_1978.perC * (25 - temperatureC);
    case "clegg-whitfield-1995":
      return pHScale === "free" ? cleggWhitfieldFree(t, s) : cleggWhitfieldTotal(t, s);
    case "yao-millero-1995":
      return yaoMillero(t, s);
    case "bell-2008":
      return BELL_2008.a + BELL_2008.t * temperatureC + BELL_2008.s * s;
    case "epa-1989":
      return epa(t, s);
  }
}
