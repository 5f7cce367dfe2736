import { ZERO_CELSIUS_K } from "../temperature-scale";
import { requireNotNegative, requirePositive, requireWithin, type ValidRange } from "../validity";
import { densityKgPerM3 } from "../water/density";
import { alkalinityUmolPerKg } from "./alkalinity-per-kg";
import { ATOMIC_WEIGHTS } from "./atomic-weights.data";
import { lnSeawaterConstant, type SeawaterConstant } from "./dissociation";
import { convertPH, type PHScale } from "./ph-scale";
import {
  type BoronRatio,
  totalBoronMolPerKg,
  totalCalciumMolPerKg,
  totalFluorideMolPerKg,
  totalSulfateMolPerKg,
} from "./total-ions";

/** Where the carbonate system holds: that of Lueker et al. 2000 within EOS-80. */
export const CARBONATE_RANGE = {
  temperatureC: { min: 2, max: 35, unit: "°C" },
  salinityPsu: { min: 19, max: 42, unit: "psu" },
  pH: { min: 6, max: 10, unit: "" },
} as const satisfies Record<string, ValidRange>;

/** Non-ideality of carbon dioxide at one atmosphere (Weiss 1974): virial coefficients in cm³/mol, R in cm³ bar. */
export const CARBON_DIOXIDE_FUGACITY = {
  b: [-1636.75, 12.0408, -0.0327957, 3.16528e-5],
  d: [57.7, -0.118],
  gasConstant: 83.14472,
  pressureBar: 1.01325,
} as const;

export interface CarbonateInput {
  /** per litre of this water at its own temperature */
  alkalinityMeqPerL: number;
  pH: number;
  pHScale: PHScale;
  temperatureC: number;
  salinityPsu: number;
  /** dissolved phosphate as PO4; zero unless said */
  phosphateUmolPerKg?: number;
  /** dissolved silicate; zero unless said */
  silicateUmolPerKg?: number;
  /** measured calcium; in proportion to salinity unless said */
  calciumMgPerL?: number;
  /** Uppström 1974 unless said */
  boron?: BoronRatio;
}

export interface CarbonateSystem {
  alkalinityUmolPerKg: number;
  dicUmolPerKg: number;
  co2UmolPerKg: number;
  bicarbonateUmolPerKg: number;
  carbonateUmolPerKg: number;
  pco2Uatm: number;
  fco2Uatm: number;
  omegaAragonite: number;
  omegaCalcite: number;
  calciumUmolPerKg: number;
  /** on which all of it rests */
  pHTotal: number;
  /** the scale of the pH as given */
  pHScale: PHScale;
  /** true for NBS pH: brought to the total scale only roughly, so every figure here is rough */
  pHApproximate: boolean;
  boron: BoronRatio;
}

type Constants = (constant: SeawaterConstant) => number;

/** Alkalinity of everything but the carbonates, mol/kg. */
function otherAlkalinity(k: Constants, h: number, input: CarbonateInput, boron: BoronRatio): number {
  const { salinityPsu: s, phosphateUmolPerKg = 0, silicateUmolPerKg = 0 } = input;
  const sulfate = totalSulfateMolPerKg(s);
  const free = h / (1 + sulfate / k("KS"));
  const borate = (totalBoronMolPerKg(s, boron) * k("KB")) / (k("KB") + h);
  const bisulfate = sulfate / (1 + k("KS") / free);
  const fluoride = totalFluorideMolPerKg(s) / (1 + k("KF") / h);
  const p1 = k("KP1");
  const p12 = p1 * k("KP2");
  const p123 = p12 * k("KP3");
  const phosphate =
    (phosphateUmolPerKg * 1e-6 * (p12 * h + 2 * p123 - h ** 3)) / (h ** 3 + p1 * h * h + p12 * h + p123);
  const silicate = (silicateUmolPerKg * 1e-6) / (1 + h / k("KSi"));
  return borate + k("KW") / h + phosphate + silicate - free - bisulfate - fluoride;
}

/** Ratio of fugacity to partial pressure of carbon dioxide at one atmosphere. */
function fugacityCoefficient(temperatureC: number): number {
  const { b, d, gasConstant, pressureBar } = CARBON_DIOXIDE_FUGACITY;
  const t = temperatureC + ZERO_CELSIUS_K;
  const virial = b[0] + b[1] * t + b[2] * t * t + b[3] * t ** 3;
  return Math.exp((pressureBar * (virial + 2 * (d[0] + d[1] * t))) / (gasConstant * t));
}

function calciumMolPerKg(input: CarbonateInput, density: number): number {
  if (input.calciumMgPerL === undefined) return totalCalciumMolPerKg(input.salinityPsu);
  return requireNotNegative("calciumMgPerL", input.calciumMgPerL) / ATOMIC_WEIGHTS.Ca / density;
}

function requireCarbonateInput(input: CarbonateInput): void {
  const name = "the carbonate system (Lueker et al. 2000)";
  requireWithin("temperatureC", input.temperatureC, CARBONATE_RANGE.temperatureC, name);
  requireWithin("salinityPsu", input.salinityPsu, CARBONATE_RANGE.salinityPsu, name);
  requireWithin("pH", input.pH, CARBONATE_RANGE.pH, name);
  requirePositive("alkalinityMeqPerL", input.alkalinityMeqPerL);
  requireNotNegative("phosphateUmolPerKg", input.phosphateUmolPerKg ?? 0);
  requireNotNegative("silicateUmolPerKg", input.silicateUmolPerKg ?? 0);
}

/**
 * What do alkalinity and pH say of this water's carbonates: dissolved inorganic carbon, carbon dioxide, and whether
 * aragonite and calcite dissolve (below 1) or grow?
 *
 * Units: meq/L, pH on the named scale at the sample's temperature, °C, psu, µmol/kg, mg/L; answer in µmol/kg, µatm. At one
 * atmosphere. Throws RangeError outside CARBONATE_RANGE and when pH alone would need more alkalinity than is there.
 * Source: Dickson, Sabine and Christian 2007, chapter 5; Lueker et al. 2000; Dickson 1990; Mucci 1983; Weiss 1974.
 * Checked: PyCO2SYS 1.8.3.4 on 16 cases (DIC within 0.13 µmol/kg).
 * @example carbonateSystem({ alkalinityMeqPerL: 2.353685, pH: 8.1, pHScale: "total", temperatureC: 25, salinityPsu: 35 }).omegaAragonite // => 3.722
 */
export function carbonateSystem(input: CarbonateInput): CarbonateSystem {
  requireCarbonateInput(input);
  const { temperatureC, salinityPsu, pH, pHScale, boron = "uppstrom-1974" } = input;
  const pHTotal = convertPH({ pH, from: pHScale, to: "total", temperatureC, salinityPsu });
  const density = densityKgPerM3({ salinityPsu, temperatureC });
  const perKg = alkalinityUmolPerKg({ alkalinityMeqPerL: input.alkalinityMeqPerL, densityKgPerM3: density });
  const k: Constants = (constant) => Math.exp(lnSeawaterConstant({ constant, temperatureC, salinityPsu }));
  const h = 10 ** -pHTotal;
  const carbonateAlkalinity = perKg * 1e-6 - otherAlkalinity(k, h, input, boron);
  if (!(carbonateAlkalinity > 0)) {
    throw new RangeError(
      `alkalinityMeqPerL ${input.alkalinityMeqPerL} is too low for pH ${pH}: no carbonate alkalinity is left.`,
    );
  }
  const bicarbonate = carbonateAlkalinity / (1 + (2 * k("K2")) / h);
  const carbonate = (bicarbonate * k("K2")) / h;
  const co2 = (bicarbonate * h) / k("K1");
  const fco2 = co2 / k("K0");
  const calcium = calciumMolPerKg(input, density);
  return {
    alkalinityUmolPerKg: perKg,
    dicUmolPerKg: (bicarbonate + carbonate + co2) * 1e6,
    co2UmolPerKg: co2 * 1e6,
    bicarbonateUmolPerKg: bicarbonate * 1e6,
    carbonateUmolPerKg: carbonate * 1e6,
    pco2Uatm: (fco2 * 1e6) / fugacityCoefficient(temperatureC),
    fco2Uatm: fco2 * 1e6,
    omegaAragonite: (calcium * carbonate) / k("KspAragonite"),
    omegaCalcite: (calcium * carbonate) / k("KspCalcite"),
    calciumUmolPerKg: calcium * 1e6,
    pHTotal,
    pHScale,
    pHApproximate: pHScale === "nbs",
    boron,
  };
}
