import { requireFinite, requireNotNegative, requirePositive, requireShareAboveZero } from "../validity";
import { densityKgPerM3 } from "../water/density";
import { specificHeatJPerKgK } from "../water/heat-capacity";

const JOULES_PER_KWH = 3.6e6;

/** Heat taken up by a volume of water per degree, kWh/K. */
function heatCapacityKWhPerK(volumeL: number, salinityPsu: number, temperatureC: number): number {
  const state = { salinityPsu, temperatureC };
  return (densityKgPerM3(state) * (volumeL / 1000) * specificHeatJPerKgK(state)) / JOULES_PER_KWH;
}

export interface HeatingInput {
  volumeL: number;
  salinityPsu: number;
  fromTemperatureC: number;
  toTemperatureC: number;
}

/**
 * How much heat brings this water from one temperature to another? Negative when it is cooled.
 *
 * Units: L (at the mean temperature), psu, °C; answer in kWh, in the water (the heater's loss is not in it).
 * Domain: HEAT_CAPACITY_RANGE, else RangeError. Formula: ρ V cp ΔT, ρ and cp at the mean temperature.
 * Source: EOS-80; Millero et al. 1973. Checked: computed with mpmath (5.683409 kWh).
 * @example heatingEnergyKWh({ volumeL: 1000, salinityPsu: 35, fromTemperatureC: 20, toTemperatureC: 25 }) // => 5.683
 */
export function heatingEnergyKWh(input: HeatingInput): number {
  const { volumeL, salinityPsu, fromTemperatureC, toTemperatureC } = input;
  requirePositive("volumeL", volumeL);
  requireFinite("fromTemperatureC", fromTemperatureC);
  requireFinite("toTemperatureC", toTemperatureC);
  const mean = (fromTemperatureC + toTemperatureC) / 2;
  return heatCapacityKWhPerK(volumeL, salinityPsu, mean) * (toTemperatureC - fromTemperatureC);
}

export interface HeatLoss {
  /** kW lost per °C between water and room, UA: surface × transmittance */
  lossKWPerK: number;
  roomTemperatureC: number;
}

export interface HeatingTime {
  energyKWh: number;
  hours: number;
  /** where the water would settle; absent when no loss was given */
  settlesAtC?: number;
}

/**
 * How long does a heater (or, with a negative power, a chiller) take to bring this water to a temperature?
 *
 * Units: L, psu, °C, kW, share of the power that reaches the water (1 unless said), kW/°C. Answer: kWh into the
 * water without losses, hours with them. Throws RangeError outside HEAT_CAPACITY_RANGE, for no power, and when the
 * power cannot reach the temperature against the losses. Formula: t = E / (P η); with losses C dT/dt = P η − UA (T − Ta).
 * Source: energy balance of a mixed tank. Checked: computed with mpmath (2.841704 h); with losses a numerical integration.
 * @example heatingTime({ volumeL: 1000, salinityPsu: 35, fromTemperatureC: 20, toTemperatureC: 25, powerKW: 2 }).hours // => 2.842
 */
export function heatingTime(
  input: HeatingInput & { powerKW: number; efficiencyFraction?: number; loss?: HeatLoss },
): HeatingTime {
  const { fromTemperatureC, toTemperatureC, efficiencyFraction = 1, loss } = input;
  const energyKWh = heatingEnergyKWh(input);
  const power =
    requireFinite("powerKW", input.powerKW) * requireShareAboveZero("efficiencyFraction", efficiencyFraction);
  if (energyKWh === 0) return { energyKWh, hours: 0 };
  if (power === 0) throw new RangeError("powerKW must not be zero.");
  if (!loss || loss.lossKWPerK === 0) {
    if (energyKWh / power < 0) {
      throw new RangeError("powerKW has the wrong sign: positive heats, negative chills.");
    }
    return { energyKWh, hours: energyKWh / power };
  }
  requireNotNegative("lossKWPerK", loss.lossKWPerK);
  const settlesAtC = requireFinite("roomTemperatureC", loss.roomTemperatureC) + power / loss.lossKWPerK;
  const ratio = (settlesAtC - fromTemperatureC) / (settlesAtC - toTemperatureC);
  if (!(ratio > 1)) {
    throw new RangeError(
      `With these losses the water settles at ${settlesAtC.toFixed(1)} °C and never comes to ${toTemperatureC} °C.`,
    );
  }
  const capacity = energyKWh / (toTemperatureC - fromTemperatureC);
  return { energyKWh, hours: (capacity / loss.lossKWPerK) * Math.log(ratio), settlesAtC };
}
