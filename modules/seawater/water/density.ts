import { polynomial } from "../polynomial";
import { whereRisingReaches } from "../root";
import { ipts68FromIts90 } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";

/** Where EOS-80 holds. */
export const DENSITY_RANGE = {
  salinityPsu: { min: 0, max: 42, unit: "psu" },
  temperatureC: { min: -2, max: 40, unit: "°C" },
  pressureDbar: { min: 0, max: 10000, unit: "dbar" },
} as const satisfies Record<string, ValidRange>;

/** Coefficients of EOS-80 in rising powers of t (IPTS-68): Millero and Poisson 1981 eq. 6; UNESCO 44 eqs 7-19. */
export const EOS80 = {
  water: [999.842594, 6.793952e-2, -9.09529e-3, 1.001685e-4, -1.120083e-6, 6.536332e-9],
  s: [8.24493e-1, -4.0899e-3, 7.6438e-5, -8.2467e-7, 5.3875e-9],
  s15: [-5.72466e-3, 1.0227e-4, -1.6546e-6],
  s2: [4.8314e-4],
  k: [19652.21, 148.4206, -2.327105, 1.360477e-2, -5.155288e-5],
  kS: [54.6746, -0.603459, 1.09987e-2, -6.167e-5],
  kS15: [7.944e-2, 1.6483e-2, -5.3009e-4],
  a: [3.239908, 1.43713e-3, 1.16092e-4, -5.77905e-7],
  aS: [2.2838e-3, -1.0981e-5, -1.6078e-6],
  aS15: [1.91075e-4],
  b: [8.50935e-5, -6.12293e-6, 5.2787e-8],
  bS: [-9.9348e-7, 2.0816e-8, 9.1697e-10],
} as const;

const NAME = "the equation of state EOS-80";

function atOneAtmosphere(s: number, t68: number): number {
  return (
    polynomial(t68, EOS80.water) +
    s * polynomial(t68, EOS80.s) +
    s ** 1.5 * polynomial(t68, EOS80.s15) +
    s * s * polynomial(t68, EOS80.s2)
  );
}

function secantBulkModulusBar(s: number, t68: number, pressureBar: number): number {
  const k = polynomial(t68, EOS80.k) + s * polynomial(t68, EOS80.kS) + s ** 1.5 * polynomial(t68, EOS80.kS15);
  const a = polynomial(t68, EOS80.a) + s * polynomial(t68, EOS80.aS) + s ** 1.5 * polynomial(t68, EOS80.aS15);
  const b = polynomial(t68, EOS80.b) + s * polynomial(t68, EOS80.bS);
  return k + a * pressureBar + b * pressureBar * pressureBar;
}

/**
 * How heavy is a cubic metre of this water? (Also grams per litre.)
 *
 * Units: psu, °C on ITS-90, dbar gauge (0 unless said); answer in kg/m³, in vacuum. Domain: DENSITY_RANGE, else
 * RangeError. Source: EOS-80, Millero and Poisson 1981, Deep-Sea Res. 28A, 625-629; UNESCO 44 (1983) eqs 7-19.
 * Differs from TEOS-10 by less than 0.009 kg/m³. Checked: UNESCO 44 p. 19 (1023.34306 at S 35, 25 °C on IPTS-68).
 * @example densityKgPerM3({ salinityPsu: 35, temperatureC: 25 }) // => 1023.3412
 */
export function densityKgPerM3(input: {
  salinityPsu: number;
  temperatureC: number;
  pressureDbar?: number;
}): number {
  const { salinityPsu, temperatureC, pressureDbar = 0 } = input;
  requireWithin("salinityPsu", salinityPsu, DENSITY_RANGE.salinityPsu, NAME);
  requireWithin("temperatureC", temperatureC, DENSITY_RANGE.temperatureC, NAME);
  requireWithin("pressureDbar", pressureDbar, DENSITY_RANGE.pressureDbar, NAME);
  const t68 = ipts68FromIts90(temperatureC);
  const s = Math.max(0, salinityPsu);
  const atSurface = atOneAtmosphere(s, t68);
  if (pressureDbar === 0) return atSurface;
  const pressureBar = pressureDbar / 10;
  return atSurface / (1 - pressureBar / secantBulkModulusBar(s, t68, pressureBar));
}

/**
 * How salt is water of this density? (Inverse of densityKgPerM3 at one atmosphere.)
 *
 * Units: kg/m³, °C on ITS-90; answer in psu. Throws RangeError outside DENSITY_RANGE and for a density that no
 * salinity from 0 to 42 has at that temperature. Source: EOS-80. Checked: computed with mpmath (35.0023356).
 * @example salinityFromDensity({ densityKgPerM3: 1023.343, temperatureC: 25 }) // => 35.00234
 */
export function salinityFromDensity(input: { densityKgPerM3: number; temperatureC: number }): number {
  const { densityKgPerM3: density, temperatureC } = input;
  const { min, max } = DENSITY_RANGE.salinityPsu;
  const at = (salinityPsu: number) => densityKgPerM3({ salinityPsu, temperatureC });
  const attainable = { min: at(min), max: at(max), unit: "kg/m³" };
  requireWithin(
    "densityKgPerM3",
    density,
    attainable,
    `for salinity ${min} to ${max} at ${temperatureC} °C, EOS-80`,
  );
  return whereRisingReaches(density, min, max, at);
}
