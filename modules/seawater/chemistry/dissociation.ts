import { polynomial } from "../polynomial";
import { ZERO_CELSIUS_K } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";

/** Names of the equilibrium constants of the carbonate system in seawater. */
export type SeawaterConstant =
  | "K0"
  | "K1"
  | "K2"
  | "KB"
  | "KW"
  | "KS"
  | "KF"
  | "KP1"
  | "KP2"
  | "KP3"
  | "KSi"
  | "KspAragonite"
  | "KspCalcite";

const span = (salinity: readonly [number, number], temperature: readonly [number, number]) => ({
  salinityPsu: { min: salinity[0], max: salinity[1], unit: "psu" },
  temperatureC: { min: temperature[0], max: temperature[1], unit: "°C" },
});

/** Where each constant is taken to hold; the authors' ranges, with KF and the phosphate ones used below theirs. */
export const CONSTANT_RANGE: Readonly<
  Record<SeawaterConstant, { salinityPsu: ValidRange; temperatureC: ValidRange }>
> = {
  K0: span([0, 45], [-2, 40]),
  K1: span([19, 43], [2, 35]),
  K2: span([19, 43], [2, 35]),
  KB: span([5, 45], [0, 45]),
  KW: span([0, 45], [0, 45]),
  KS: span([0, 45], [0, 45]),
  KF: span([0, 45], [0, 40]),
  KP1: span([0, 45], [0, 45]),
  KP2: span([0, 45], [0, 45]),
  KP3: span([0, 45], [0, 45]),
  KSi: span([0, 45], [0, 45]),
  KspAragonite: span([0, 45], [2, 40]),
  KspCalcite: span([0, 45], [2, 40]),
};

/** The state on which every constant depends, worked out once. */
interface State {
  /** kelvin */
  readonly t: number;
  readonly s: number;
  readonly rootS: number;
  readonly lnT: number;
  /** ionic strength, mol/kg */
  readonly i: number;
}

/** Ionic strength of seawater, mol/kg (Dickson, Sabine and Christian 2007, chapter 5). */
export const IONIC_STRENGTH = { numerator: 19.924, denominator: 1000, perPsu: 1.005 } as const;

const molalToSeawater = (s: number) => Math.log(1 - 0.001005 * s);

/** ln K of each constant; symbols and sources in docs/formulas/seawater-carbonate.md. */
const LN_K: Readonly<Record<SeawaterConstant, (state: State) => number>> = {
  // Weiss 1974, Mar. Chem. 2, 203-215; mol/(kg atm)
  K0: ({ t, s }) =>
    -60.2409 +
    93.4517 * (100 / t) +
    23.3585 * Math.log(t / 100) +
    s * polynomial(t / 100, [0.023517, -0.023656, 0.0047036]),
  // Lueker, Dickson and Keeling 2000, Mar. Chem. 70, 105-119; total scale
  K1: ({ t, s, lnT }) =>
    Math.LN10 * (-3633.86 / t + 61.2172 - 9.6777 * lnT + polynomial(s, [0, 0.011555, -0.0001152])),
  K2: ({ t, s, lnT }) =>
    Math.LN10 * (-471.78 / t - 25.929 + 3.16967 * lnT + polynomial(s, [0, 0.01781, -0.0001122])),
  // Dickson 1990, Deep-Sea Res. 37, 755-766; total scale
  KB: ({ t, s, rootS, lnT }) =>
    polynomial(rootS, [-8966.9, -2890.53, -77.942, 1.728, -0.0996]) / t +
    148.0248 +
    137.1942 * rootS +
    1.62142 * s -
    (24.4344 + 25.085 * rootS + 0.2474 * s) * lnT +
    0.053105 * rootS * t,
  // Millero 1995, Geochim. Cosmochim. Acta 59, 661-677; total scale
  KW: ({ t, s, rootS, lnT }) =>
    -13847.26 / t + 148.9652 - 23.6521 * lnT + (118.67 / t - 5.977 + 1.0495 * lnT) * rootS - 0.01615 * s,
  // Dickson 1990, J. Chem. Thermodyn. 22, 113-127; free scale
  KS: ({ t, s, lnT, i }) =>
    -4276.1 / t +
    141.328 -
    23.093 * lnT +
    (-13856 / t + 324.57 - 47.986 * lnT) * Math.sqrt(i) +
    (35474 / t - 771.54 + 114.723 * lnT) * i -
    (2698 / t) * i ** 1.5 +
    (1776 / t) * i ** 2 +
    molalToSeawater(s),
  // Perez and Fraga 1987, Mar. Chem. 21, 161-168; total scale
  KF: ({ t, rootS }) => 874 / t - 9.68 + 0.111 * rootS,
  // Millero 1995 as given by Dickson, Sabine and Christian 2007; total scale
  KP1: ({ t, s, rootS, lnT }) =>
    -4576.752 / t + 115.525 - 18.453 * lnT + (-106.736 / t + 0.69171) * rootS + (-0.65643 / t - 0.01844) * s,
  KP2: ({ t, s, rootS, lnT }) =>
    -8814.715 / t + 172.0883 - 27.927 * lnT + (-160.34 / t + 1.3566) * rootS + (0.37335 / t - 0.05778) * s,
  KP3: ({ t, s, rootS }) =>
    -3070.75 / t - 18.141 + (17.27039 / t + 2.81197) * rootS + (-44.99486 / t - 0.09984) * s,
  KSi: ({ t, s, lnT, i }) =>
    -8904.2 / t +
    117.385 -
    19.334 * lnT +
    (-458.79 / t + 3.5913) * Math.sqrt(i) +
    (188.74 / t - 1.5998) * i +
    (-12.1652 / t + 0.07871) * i ** 2 +
    molalToSeawater(s),
  // Mucci 1983, Am. J. Sci. 283, 780-799; mol²/kg²
  KspAragonite: ({ t, s, rootS }) =>
    Math.LN10 *
    (-171.945 -
      0.077993 * t +
      2903.293 / t +
      71.595 * Math.log10(t) +
      (-0.068393 + 0.0017276 * t + 88.135 / t) * rootS -
      0.10018 * s +
      0.0059415 * s ** 1.5),
  KspCalcite: ({ t, s, rootS }) =>
    Math.LN10 *
    (-171.9065 -
      0.077993 * t +
      2839.319 / t +
      71.595 * Math.log10(t) +
      (-0.77712 + 0.0028426 * t + 178.34 / t) * rootS -
      0.07711 * s +
      0.0041249 * s ** 1.5),
};

function stateOf(temperatureC: number, salinityPsu: number): State {
  const t = temperatureC + ZERO_CELSIUS_K;
  const { numerator, denominator, perPsu } = IONIC_STRENGTH;
  return {
    t,
    s: salinityPsu,
    rootS: Math.sqrt(salinityPsu),
    lnT: Math.log(t),
    i: (numerator * salinityPsu) / (denominator - perPsu * salinityPsu),
  };
}

/**
 * Natural logarithm of an equilibrium constant of seawater at one atmosphere, mol per kg of seawater, on the total pH
 * scale (KS on the free scale, K0 in mol/(kg atm), the solubility products in mol²/kg²).
 *
 * Units: °C, psu. Domain: CONSTANT_RANGE of the constant, else RangeError.
 * Source: Dickson, Sabine and Christian 2007, PICES Special Publication 3, chapter 5, and the papers it cites; Mucci 1983.
 * Checked: that guide (K1 −13.4636, KB −19.7964 at 25 °C, S 35).
 * @example lnSeawaterConstant({ constant: "K1", temperatureC: 25, salinityPsu: 35 }) // => -13.4636
 */
export function lnSeawaterConstant(input: {
  constant: SeawaterConstant;
  temperatureC: number;
  salinityPsu: number;
}): number {
  const { constant, temperatureC, salinityPsu } = input;
  const range = CONSTANT_RANGE[constant];
  requireWithin("temperatureC", temperatureC, range.temperatureC, constant);
  requireWithin("salinityPsu", salinityPsu, range.salinityPsu, constant);
  return LN_K[constant](stateOf(temperatureC, salinityPsu));
}
