import { ZERO_CELSIUS_K } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";
import { lnSeawaterConstant } from "./dissociation";
import { totalFluorideMolPerKg, totalSulfateMolPerKg } from "./total-ions";

/**
 * What a pH figure means: `total` (tris in artificial seawater; spectrophotometry), `free`, `seawater` (SWS), or `nbs`
 * (electrode calibrated in dilute buffers such as 7.00 and 10.01).
 */
export type PHScale = "total" | "free" | "seawater" | "nbs";

export const PH_SCALES = ["total", "free", "seawater", "nbs"] as const satisfies readonly PHScale[];

/** Where pH can be brought from one scale to another; `nbs` only between 20 and 40 psu. */
export const PH_SCALE_RANGE = {
  pH: { min: 4, max: 11, unit: "" },
  temperatureC: { min: 0, max: 40, unit: "°C" },
  salinityPsu: { min: 0, max: 45, unit: "psu" },
  nbsSalinityPsu: { min: 20, max: 40, unit: "psu" },
} as const satisfies Record<string, ValidRange>;

/**
 * Apparent activity coefficient of hydrogen ions, fH, by which NBS electrodes are related to the seawater scale:
 * Takahashi et al. 1982, GEOSECS Pacific Expedition 3, p. 80. Uncertain by several hundredths of a pH.
 */
export const APPARENT_ACTIVITY_1982 = { a: 1.2948, t: -0.002036, ss: 0.0004607, sst: -0.000001475 } as const;

/** log10 of [H] on the given scale over [H] on the free scale. */
function logOverFree(scale: PHScale, temperatureC: number, salinityPsu: number): number {
  if (scale === "free") return 0;
  const k = (constant: "KS" | "KF") => Math.exp(lnSeawaterConstant({ constant, temperatureC, salinityPsu }));
  const total = Math.log10(1 + totalSulfateMolPerKg(salinityPsu) / k("KS"));
  if (scale === "total") return total;
  const seawater = total + Math.log10(1 + totalFluorideMolPerKg(salinityPsu) / k("KF"));
  if (scale === "seawater") return seawater;
  const { a, t, ss, sst } = APPARENT_ACTIVITY_1982;
  const kelvin = temperatureC + ZERO_CELSIUS_K;
  return seawater + Math.log10(a + t * kelvin + (ss + sst * kelvin) * salinityPsu ** 2);
}

/**
 * The same acidity on another pH scale. Total, free and seawater scales are related exactly through sulfate and
 * fluoride; `nbs` only roughly (several hundredths), since it holds the electrode's own junction.
 *
 * Units: pH, °C, psu. Domain: PH_SCALE_RANGE, else RangeError.
 * Source: Dickson, Sabine and Christian 2007 (KS of Dickson 1990, KF of Perez and Fraga 1987); Takahashi et al. 1982.
 * Checked: total minus free −0.108 at S 35, 25 °C.
 * @example convertPH({ pH: 8.1, from: "total", to: "free", temperatureC: 25, salinityPsu: 35 }) // => 8.208
 */
export function convertPH(input: {
  pH: number;
  from: PHScale;
  to: PHScale;
  temperatureC: number;
  salinityPsu: number;
}): number {
  const { pH, from, to, temperatureC, salinityPsu } = input;
  const name = "conversion between pH scales";
  requireWithin("pH", pH, PH_SCALE_RANGE.pH, name);
  if (from === to) return pH;
  requireWithin("temperatureC", temperatureC, PH_SCALE_RANGE.temperatureC, name);
  requireWithin("salinityPsu", salinityPsu, PH_SCALE_RANGE.salinityPsu, name);
  if (from === "nbs" || to === "nbs") {
    requireWithin("salinityPsu", salinityPsu, PH_SCALE_RANGE.nbsSalinityPsu, `${name} with NBS`);
  }
  return pH + logOverFree(from, temperatureC, salinityPsu) - logOverFree(to, temperatureC, salinityPsu);
}
