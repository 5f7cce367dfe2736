import { its90FromIpts68 } from "../temperature-scale";
import { requireWithin, type ValidRange } from "../validity";

/** Where the freezing point formula holds. */
export const FREEZING_RANGE = {
  salinityPsu: { min: 4, max: 40, unit: "psu" },
  pressureDbar: { min: 0, max: 500, unit: "dbar" },
} as const satisfies Record<string, ValidRange>;

/** Millero 1978 (UNESCO 44, freezing point of air-saturated seawater, on IPTS-68). */
export const FREEZING_1978 = { s: -0.0575, s15: 1.710523e-3, s2: -2.154996e-4, p: -7.53e-4 } as const;

/**
 * At which temperature does this water begin to freeze?
 *
 * Units: psu, dbar gauge; answer in °C on ITS-90 (the formula's own scale of 1968 shows 0.0006 °C less at −2.6).
 * Domain: FREEZING_RANGE, else RangeError. Source: Millero 1978; UNESCO 44 (1983).
 * Checked: UNESCO 44 (−2.588567 on IPTS-68 at S 40, 500 dbar).
 * @example freezingPointC({ salinityPsu: 35 }) // => -1.92
 */
export function freezingPointC(input: { salinityPsu: number; pressureDbar?: number }): number {
  const { salinityPsu, pressureDbar = 0 } = input;
  requireWithin("salinityPsu", salinityPsu, FREEZING_RANGE.salinityPsu, "the freezing point formula");
  requireWithin("pressureDbar", pressureDbar, FREEZING_RANGE.pressureDbar, "the freezing point formula");
  const c = FREEZING_1978;
  return its90FromIpts68(
    c.s * salinityPsu + c.s15 * salinityPsu ** 1.5 + c.s2 * salinityPsu ** 2 + c.p * pressureDbar,
  );
}
