import { polynomial } from "../polynomial";
import { ipts68FromIts90, ZERO_CELSIUS_K } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";

/** Where Garcia and Gordon 1992 holds. */
export const OXYGEN_SOLUBILITY_RANGE = {
  temperatureC: { min: -2, max: 40, unit: "°C" },
  salinityPsu: { min: 0, max: 42, unit: "psu" },
} as const satisfies Record<string, ValidRange>;

/** `benson-krause` fits the data of Benson and Krause alone (the authors' own advice), `combined` all three sets. */
export type OxygenSolubilityFit = "benson-krause" | "combined";
export type OxygenSolubilityUnit = "umol/kg" | "mL/L";

interface Coefficients {
  readonly a: readonly number[];
  readonly b: readonly number[];
  readonly c0: number;
}

/** Garcia and Gordon 1992, Limnol. Oceanogr. 37, 1307-1312, table 1, without the A3 Ts² term struck by the erratum. */
export const GARCIA_GORDON_1992: Record<OxygenSolubilityFit, Record<OxygenSolubilityUnit, Coefficients>> = {
  "benson-krause": {
    "umol/kg": {
      a: [5.80871, 3.20291, 4.17887, 5.10006, -9.86643e-2, 3.80369],
      b: [-7.01577e-3, -7.70028e-3, -1.13864e-2, -9.51519e-3],
      c0: -2.75915e-7,
    },
    "mL/L": {
      a: [2.00907, 3.22014, 4.0501, 4.94457, -0.256847, 3.88767],
      b: [-6.24523e-3, -7.37614e-3, -1.0341e-2, -8.17083e-3],
      c0: -4.88682e-7,
    },
  },
  combined: {
    "umol/kg": {
      a: [5.80818, 3.20684, 4.1189, 4.93845, 1.01567, 1.41575],
      b: [-7.01211e-3, -7.25958e-3, -7.93334e-3, -5.54491e-3],
      c0: -1.32412e-7,
    },
    "mL/L": {
      a: [2.00856, 3.224, 3.99063, 4.80299, 0.978188, 1.71069],
      b: [-6.24097e-3, -6.93498e-3, -6.90358e-3, -4.29155e-3],
      c0: -3.1168e-7,
    },
  },
};

/**
 * Oxygen at saturation per kilogram or as gas volume, for comparison with oceanographic work; at one atmosphere.
 *
 * Units: °C on ITS-90, psu; answer in µmol/kg or mL/L as asked. Domain: OXYGEN_SOLUBILITY_RANGE, else RangeError.
 * Source: Garcia and Gordon 1992 with erratum. Checked: the paper (274.610 µmol/kg at 10 °C on IPTS-68, S 35).
 * @example oxygenSolubility({ temperatureC: 10 / 1.00024, salinityPsu: 35, unit: "umol/kg" }) // => 274.61
 */
export function oxygenSolubility(input: {
  temperatureC: number;
  salinityPsu: number;
  unit: OxygenSolubilityUnit;
  fit?: OxygenSolubilityFit;
}): number {
  const { temperatureC, salinityPsu, unit, fit = "benson-krause" } = input;
  const name = "oxygen solubility (Garcia and Gordon 1992)";
  requireWithin("temperatureC", temperatureC, OXYGEN_SOLUBILITY_RANGE.temperatureC, name);
  requireWithin("salinityPsu", salinityPsu, OXYGEN_SOLUBILITY_RANGE.salinityPsu, name);
  const t68 = ipts68FromIts90(temperatureC);
  const scaled = Math.log((298.15 - t68) / (ZERO_CELSIUS_K + t68));
  const { a, b, c0 } = GARCIA_GORDON_1992[fit][unit];
  return Math.exp(polynomial(scaled, a) + salinityPsu * polynomial(scaled, b) + c0 * salinityPsu ** 2);
}
