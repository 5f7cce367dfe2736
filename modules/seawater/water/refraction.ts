import { polynomial } from "../polynomial";
import { whereRisingReaches } from "../root";
import { requirePositive, requireWithin, type ValidRange } from "../validity";

/** `quan-fry-1995` is the default; `millard-seaver-1990` reaches to 43 psu. They agree to 2.5e-5. */
export type RefractionFormula = "quan-fry-1995" | "millard-seaver-1990";

/** Where each formula for the refractive index holds. */
export const REFRACTION_RANGE = {
  "quan-fry-1995": {
    salinityPsu: { min: 0, max: 35, unit: "psu" },
    temperatureC: { min: 0, max: 30, unit: "°C" },
    wavelengthNm: { min: 400, max: 700, unit: "nm" },
  },
  "millard-seaver-1990": {
    salinityPsu: { min: 0, max: 43, unit: "psu" },
    temperatureC: { min: 0, max: 30, unit: "°C" },
    wavelengthNm: { min: 500, max: 700, unit: "nm" },
  },
} as const satisfies Record<RefractionFormula, Record<string, ValidRange>>;

/** The sodium D line, by which refractometers are marked. */
export const SODIUM_D_NM = 589.3;

/** Quan and Fry 1995, Appl. Opt. 34, 3477-3480, eq. 3. */
export const QUAN_FRY_1995 = {
  n0: 1.31405,
  s: [1.779e-4, -1.05e-6, 1.6e-8],
  tt: -2.02e-6,
  overWavelength: { constant: 15.868, s: 0.01155, t: -0.00423 },
  overWavelength2: -4382,
  overWavelength3: 1.1455e6,
} as const;

/**
 * Millard and Seaver 1990, Deep-Sea Res. 37, 1909-1926, table 1, regions I and II, at one atmosphere; wavelength in
 * micrometres. The T³L coefficient is -1.705881e-9: the -1.705881e-10 also met in print gives 1.33196 for pure water
 * at 30 °C instead of 1.33194.
 */
export const MILLARD_SEAVER_1990 = {
  n0: 1.3280657,
  l2: -4.5536802e-3,
  lm2: 2.5471707e-3,
  lm4: 7.501966e-6,
  lm6: 2.802632e-6,
  t: [0, -5.2883907e-6, -3.0738272e-6, 3.0124687e-8, -2.0883178e-10],
  tl: [0, 1.0508621e-5, 2.1282248e-7, -1.705881e-9],
  s: [1.9029121e-4, -7.3960297e-7, 8.9818478e-9, 1.2078804e-10],
  slm2: 2.4239607e-6,
  stl: -3.589495e-7,
} as const;

function quanFry(s: number, t: number, nm: number): number {
  const c = QUAN_FRY_1995;
  const first = c.overWavelength.constant + c.overWavelength.s * s + c.overWavelength.t * t;
  return (
    c.n0 +
    s * polynomial(t, c.s) +
    c.tt * t * t +
    first / nm +
    c.overWavelength2 / nm ** 2 +
    c.overWavelength3 / nm ** 3
  );
}

function millardSeaver(s: number, t: number, nm: number): number {
  const c = MILLARD_SEAVER_1990;
  const l = nm / 1000;
  const pure = c.n0 + c.l2 * l ** 2 + c.lm2 / l ** 2 + c.lm4 / l ** 4 + c.lm6 / l ** 6;
  const warm = polynomial(t, c.t) + l * polynomial(t, c.tl);
  return pure + warm + s * (polynomial(t, c.s) + c.slm2 / l ** 2 + c.stl * t * l);
}

export interface RefractionInput {
  salinityPsu: number;
  temperatureC: number;
  /** 589.3 nm (the sodium D line) unless said */
  wavelengthNm?: number;
  formula?: RefractionFormula;
}

/**
 * How strongly does this water bend light, relative to air?
 *
 * Units: psu, °C, nm; answer dimensionless. Domain: REFRACTION_RANGE of the formula, else RangeError.
 * Source: Quan and Fry 1995 eq. 3 (default); Millard and Seaver 1990 table 1 (for above 35 psu). The older measurements
 * behind both do not resolve the difference between temperature scales, so none is applied.
 * Checked: Quan and Fry (1.3394 at S 35, 20 °C, 589.3 nm).
 * @example refractiveIndex({ salinityPsu: 35, temperatureC: 20 }) // => 1.339406
 */
export function refractiveIndex(input: RefractionInput): number {
  const { salinityPsu, temperatureC, wavelengthNm = SODIUM_D_NM, formula = "quan-fry-1995" } = input;
  const range = REFRACTION_RANGE[formula];
  requireWithin("salinityPsu", salinityPsu, range.salinityPsu, formula);
  requireWithin("temperatureC", temperatureC, range.temperatureC, formula);
  requireWithin("wavelengthNm", wavelengthNm, range.wavelengthNm, formula);
  const index = formula === "quan-fry-1995" ? quanFry : millardSeaver;
  return index(salinityPsu, temperatureC, wavelengthNm);
}

/**
 * How salt is water that bends light so? (Inverse of refractiveIndex.)
 *
 * Units: dimensionless, °C, nm; answer in psu. Throws RangeError outside REFRACTION_RANGE and for an index that no
 * salinity of the formula has at that temperature. Source: as refractiveIndex. Checked: computed with mpmath (32.78065).
 * @example salinityFromRefractiveIndex({ refractiveIndex: 1.339, temperatureC: 20 }) // => 32.7807
 */
export function salinityFromRefractiveIndex(input: {
  refractiveIndex: number;
  temperatureC: number;
  wavelengthNm?: number;
  formula?: RefractionFormula;
}): number {
  const { refractiveIndex: index, formula = "quan-fry-1995", ...rest } = input;
  requirePositive("refractiveIndex", index);
  const { min, max } = REFRACTION_RANGE[formula].salinityPsu;
  const at = (salinityPsu: number) => refractiveIndex({ ...rest, formula, salinityPsu });
  const attainable = { min: at(min), max: at(max), unit: "" };
  requireWithin("refractiveIndex", index, attainable, `for salinity ${min} to ${max}, ${formula}`);
  return whereRisingReaches(index, min, max, at);
}
