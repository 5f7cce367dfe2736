import { polynomial } from "../polynomial";
import { whereRisingReaches } from "../root";
import { ipts68FromIts90 } from "../temperature-scale";
import { requireNotNegative, requireWithin, type ValidRange } from "../validity";

/** Where practical salinity is defined: PSS-78, below 2 with the extension of Hill et al. 1986. */
export const PRACTICAL_SALINITY_RANGE = {
  salinityPsu: { min: 0, max: 42, unit: "psu" },
  temperatureC: { min: -2, max: 35, unit: "°C" },
  pressureDbar: { min: 0, max: 10000, unit: "dbar" },
} as const satisfies Record<string, ValidRange>;

/** The conductivity ratio forms go up to 40 °C, as far as UNESCO 44 tabulates the scale (p. 14). */
export const CONDUCTIVITY_RATIO_RANGE = {
  ...PRACTICAL_SALINITY_RANGE,
  temperatureC: { min: -2, max: 40, unit: "°C" },
} as const satisfies Record<string, ValidRange>;

/** Coefficients of PSS-78 (UNESCO 44, 1983, eqs 1-6) and of the extension below 2 (Hill, Dauphinee and Woods 1986). */
export const PSS78 = {
  /** C(35, 15 °C on IPTS-68, 0 dbar), mS/cm */
  standardConductivityMsPerCm: 42.914,
  a: [0.008, -0.1692, 25.3851, 14.0941, -7.0261, 2.7081],
  b: [0.0005, -0.0056, -0.0066, -0.0375, 0.0636, -0.0144],
  k: 0.0162,
  c: [0.6766097, 2.00564e-2, 1.104259e-4, -6.9698e-7, 1.0031e-9],
  d: [1, 3.426e-2, 4.464e-4],
  dRatio: [0.4215, -3.107e-3],
  e: [0, 2.07e-5, -6.37e-10, 3.989e-15],
  hillA: 0.008,
  hillB: 0.0005,
  hillBelowPsu: 2,
} as const;

const MOST_RATIO_ROOT = 1.6;
const NAME = "the practical salinity scale";

const temperatureTerm = (t68: number) => (t68 - 15) / (1 + PSS78.k * (t68 - 15));

/** PSS-78 proper, in x = √Rt, without the extension. */
function pss78(x: number, t68: number): number {
  return polynomial(x, PSS78.a) + temperatureTerm(t68) * polynomial(x, PSS78.b);
}

/** PSS-78 with the correction of Hill et al. 1986, in x = √Rt. */
function hill1986(x: number, t68: number): number {
  const big = 400 * x * x;
  const small = 100 * x * x;
  const root = Math.sqrt(small);
  return (
    pss78(x, t68) -
    PSS78.hillA / (1 + 1.5 * big + big * big) -
    (PSS78.hillB * temperatureTerm(t68)) / (1 + root + small + small * root)
  );
}

/** Salinity for a ratio at sample temperature; the extension dips below zero under 2 µS/cm, where pure water is meant. */
function salinityOfRatioRoot(x: number, t68: number): number {
  const salinity = pss78(x, t68);
  return salinity >= PSS78.hillBelowPsu ? salinity : Math.max(0, hill1986(x, t68));
}

/** √Rt for a salinity: the branch below 2 ends where PSS-78 proper reaches 2. */
function ratioRootOfSalinity(salinityPsu: number, t68: number): number {
  if (salinityPsu <= 0) return 0;
  const atTwo = whereRisingReaches(PSS78.hillBelowPsu, 0, MOST_RATIO_ROOT, (x) => pss78(x, t68));
  return salinityPsu < PSS78.hillBelowPsu
    ? whereRisingReaches(salinityPsu, 0, atTwo, (x) => hill1986(x, t68))
    : whereRisingReaches(salinityPsu, atTwo, MOST_RATIO_ROOT, (x) => pss78(x, t68));
}

function pressureTerms(t68: number, pressureDbar: number) {
  return {
    a: polynomial(t68, PSS78.dRatio),
    b: polynomial(t68, PSS78.d),
    c: polynomial(pressureDbar, PSS78.e),
    rt: polynomial(t68, PSS78.c),
  };
}

export interface RatioInput {
  /** R = C / C(35, 15 °C, 0 dbar), dimensionless */
  conductivityRatio: number;
  temperatureC: number;
  /** sea pressure (gauge); 0 at the surface, which is the default */
  pressureDbar?: number;
}

/**
 * Practical salinity from a conductivity ratio. Use it where an instrument gives the ratio; else practicalSalinity.
 *
 * Units: °C on ITS-90, dbar gauge; answer in psu. Below 2 the correction of Hill et al. 1986 as printed (a step of
 * less than 2e-4 at 2 between 10 and 30 °C remains). Domain: CONDUCTIVITY_RATIO_RANGE, else RangeError.
 * Source: UNESCO Tech. Pap. Mar. Sci. 44 (1983) eqs 1-6; Hill, Dauphinee and Woods 1986.
 * Checked: UNESCO 44 p. 9 (37.245628 at R 1.2, 20 °C, 2000 dbar).
 * @example practicalSalinityFromRatio({ conductivityRatio: 1, temperatureC: 15 / 1.00024 }) // => 35.000000
 */
export function practicalSalinityFromRatio(input: RatioInput): number {
  const { conductivityRatio, temperatureC, pressureDbar = 0 } = input;
  requireNotNegative("conductivityRatio", conductivityRatio);
  requireWithin("temperatureC", temperatureC, CONDUCTIVITY_RATIO_RANGE.temperatureC, NAME);
  requireWithin("pressureDbar", pressureDbar, CONDUCTIVITY_RATIO_RANGE.pressureDbar, NAME);
  const t68 = ipts68FromIts90(temperatureC);
  const { a, b, c, rt } = pressureTerms(t68, pressureDbar);
  const ratioAtTemperature = conductivityRatio / (rt * (1 + c / (b + a * conductivityRatio)));
  const salinity = salinityOfRatioRoot(Math.sqrt(ratioAtTemperature), t68);
  return requireWithin("salinityPsu", salinity, CONDUCTIVITY_RATIO_RANGE.salinityPsu, NAME);
}

export interface SalinityInput {
  salinityPsu: number;
  temperatureC: number;
  /** sea pressure (gauge); 0 at the surface, which is the default */
  pressureDbar?: number;
}

/**
 * The conductivity ratio that water of a given salinity shows.
 *
 * Units: psu, °C on ITS-90, dbar gauge. Domain: CONDUCTIVITY_RATIO_RANGE, else RangeError.
 * Source and Checked: UNESCO 44 (1983) p. 14 (1.116493 at S 35, 20 °C).
 * @example conductivityRatio({ salinityPsu: 35, temperatureC: 20 / 1.00024 }) // => 1.11649
 */
export function conductivityRatio(input: SalinityInput): number {
  const { salinityPsu, temperatureC, pressureDbar = 0 } = input;
  requireWithin("salinityPsu", salinityPsu, CONDUCTIVITY_RATIO_RANGE.salinityPsu, NAME);
  requireWithin("temperatureC", temperatureC, CONDUCTIVITY_RATIO_RANGE.temperatureC, NAME);
  requireWithin("pressureDbar", pressureDbar, CONDUCTIVITY_RATIO_RANGE.pressureDbar, NAME);
  const t68 = ipts68FromIts90(temperatureC);
  const { a, b, c, rt } = pressureTerms(t68, pressureDbar);
  const atTemperature = rt * ratioRootOfSalinity(salinityPsu, t68) ** 2;
  const half = b - atTemperature * a;
  return (-half + Math.sqrt(half * half + 4 * a * atTemperature * (b + c))) / (2 * a);
}

export interface ConductivityInput {
  conductivityMsPerCm: number;
  temperatureC: number;
  /** sea pressure (gauge); 0 at the surface, which is the default */
  pressureDbar?: number;
}

/**
 * How salt is this water, by its conductivity? Give the conductivity at the water's own temperature, not one that
 * the meter has already brought to 25 °C.
 *
 * Units: mS/cm, °C on ITS-90, dbar gauge; answer in psu. Domain: PRACTICAL_SALINITY_RANGE, else RangeError.
 * Source: UNESCO 44 (1983) eqs 1-6; Hill et al. 1986 below 2. Checked: gsw 3.6.16 (34.947299).
 * @example practicalSalinity({ conductivityMsPerCm: 53, temperatureC: 25 }) // => 34.9473
 */
export function practicalSalinity(input: ConductivityInput): number {
  requireNotNegative("conductivityMsPerCm", input.conductivityMsPerCm);
  requireWithin("temperatureC", input.temperatureC, PRACTICAL_SALINITY_RANGE.temperatureC, NAME);
  return practicalSalinityFromRatio({
    conductivityRatio: input.conductivityMsPerCm / PSS78.standardConductivityMsPerCm,
    temperatureC: input.temperatureC,
    pressureDbar: input.pressureDbar,
  });
}

/**
 * Which conductivity does water of this salinity show at this temperature? (Inverse of practicalSalinity.)
 *
 * Units: psu, °C on ITS-90, dbar gauge; answer in mS/cm. Domain: PRACTICAL_SALINITY_RANGE, else RangeError.
 * Source: UNESCO 44 (1983); Hill et al. 1986 below 2. Checked: gsw 3.6.16 (53.071032).
 * @example conductivityMsPerCm({ salinityPsu: 35, temperatureC: 25 }) // => 53.07103
 */
export function conductivityMsPerCm(input: SalinityInput): number {
  requireWithin("temperatureC", input.temperatureC, PRACTICAL_SALINITY_RANGE.temperatureC, NAME);
  return conductivityRatio(input) * PSS78.standardConductivityMsPerCm;
}
