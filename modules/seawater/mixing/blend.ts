import { requireNotNegative, requireWithin } from "../validity";
import { DENSITY_RANGE, densityKgPerM3 } from "../water/density";
import { specificHeatJPerKgK } from "../water/heat-capacity";

export interface Stream {
  volumeL: number;
  salinityPsu: number;
  temperatureC: number;
}

export interface Blend {
  temperatureC: number;
  /** the same by volumes alone, for comparison with the usual shortcut */
  volumeWeightedTemperatureC: number;
  salinityPsu: number;
  massKg: number;
  volumeL: number;
}

/**
 * What comes out when waters of different temperature and salinity are mixed?
 *
 * Units: L, psu, °C. Answer: temperature (weighted by heat capacity), salinity (by mass), mass, volume at the blend's
 * own temperature. Throws RangeError for no water at all and outside the ranges of EOS-80 and heat capacity.
 * Formula: Σ ρ V cp t / Σ ρ V cp, no losses and no heat of mixing. Source: energy and mass balance.
 * Checked: computed with mpmath (23.33251738 °C).
 * @example blend({ streams: [{ volumeL: 1000, salinityPsu: 35, temperatureC: 25 }, { volumeL: 200, salinityPsu: 35, temperatureC: 15 }] }).temperatureC // => 23.333
 */
export function blend(input: { streams: readonly Stream[] }): Blend {
  let volume = 0;
  let volumeTimesT = 0;
  let mass = 0;
  let salt = 0;
  let heatCapacity = 0;
  let heat = 0;
  for (const stream of input.streams) {
    requireNotNegative("volumeL", stream.volumeL);
    const kg = (densityKgPerM3(stream) * stream.volumeL) / 1000;
    const capacity = kg * specificHeatJPerKgK(stream);
    volume += stream.volumeL;
    volumeTimesT += stream.volumeL * stream.temperatureC;
    mass += kg;
    salt += kg * stream.salinityPsu;
    heatCapacity += capacity;
    heat += capacity * stream.temperatureC;
  }
  if (!(mass > 0)) throw new RangeError("streams: at least one must hold water.");
  const state = { temperatureC: heat / heatCapacity, salinityPsu: salt / mass };
  requireWithin("salinityPsu", state.salinityPsu, DENSITY_RANGE.salinityPsu, "the blend");
  return {
    ...state,
    volumeWeightedTemperatureC: volumeTimesT / volume,
    massKg: mass,
    volumeL: (1000 * mass) / densityKgPerM3(state),
  };
}
