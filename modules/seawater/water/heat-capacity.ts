import { polynomial } from "../polynomial";
import { ipts68FromIts90 } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";

/** Where the heat capacity holds: fitted up to 35 °C, with UNESCO 44's own check value standing at 40 °C. */
export const HEAT_CAPACITY_RANGE = {
  salinityPsu: { min: 0, max: 40, unit: "psu" },
  temperatureC: { min: 0, max: 40, unit: "°C" },
} as const satisfies Record<string, ValidRange>;

/** Millero, Perron and Desnoyers 1973 (UNESCO 44 eq. 26), rising powers of t (IPTS-68). */
export const HEAT_CAPACITY_1973 = {
  water: [4217.4, -3.720283, 0.1412855, -2.654387e-3, 2.093236e-5],
  s: [-7.643575, 0.1072763, -1.38385e-3],
  s15: [0.1770383, -4.07718e-3, 5.148e-5],
} as const;

/**
 * How much heat does a kilogram of this water take up per degree, at one atmosphere?
 *
 * Units: psu, °C on ITS-90; answer in J/(kg K). Domain: HEAT_CAPACITY_RANGE, else RangeError. TEOS-10 is 0.03 to
 * 0.06 % higher. Source: Millero, Perron and Desnoyers 1973; UNESCO 44 (1983) eq. 26.
 * Checked: UNESCO 44 (3980.051 at S 40, 40 °C on IPTS-68).
 * @example specificHeatJPerKgK({ salinityPsu: 35, temperatureC: 25 }) // => 3997.7
 */
export function specificHeatJPerKgK(input: { salinityPsu: number; temperatureC: number }): number {
  const { salinityPsu, temperatureC } = input;
  const name = "the heat capacity of seawater";
  requireWithin("salinityPsu", salinityPsu, HEAT_CAPACITY_RANGE.salinityPsu, name);
  requireWithin("temperatureC", temperatureC, HEAT_CAPACITY_RANGE.temperatureC, name);
  const t68 = ipts68FromIts90(temperatureC);
  const s = Math.max(0, salinityPsu);
  return (
    polynomial(t68, HEAT_CAPACITY_1973.water) +
    s * polynomial(t68, HEAT_CAPACITY_1973.s) +
    s ** 1.5 * polynomial(t68, HEAT_CAPACITY_1973.s15)
  );
}
