import { requireFinite, requireNotNegative, requireShareAboveZero } from "../validity";

/** What the water itself does to a parameter between or during exchanges; both zero unless said. */
export interface Turnover {
  /** concentration gained per day (nitrate from feeding, say) */
  productionPerDay?: number;
  /** share lost per day, first order (uptake, say), 1/day */
  lossPerDay?: number;
}

interface Mixture {
  /** concentration now, any unit; the answers are in the same */
  startConcentration: number;
  /** of the new water */
  incomingConcentration: number;
}

function requireMixture(input: Mixture & Turnover): Required<Turnover> {
  requireFinite("startConcentration", input.startConcentration);
  requireFinite("incomingConcentration", input.incomingConcentration);
  return {
    productionPerDay: requireFinite("productionPerDay", input.productionPerDay ?? 0),
    lossPerDay: requireNotNegative("lossPerDay", input.lossPerDay ?? 0),
  };
}

/** dC/dt = gain − rate C after so many days; (1 − e^(−rate t)) / rate is taken without cancellation. */
function afterDays(start: number, gain: number, rate: number, days: number): number {
  const reach = rate === 0 ? days : -Math.expm1(-rate * days) / rate;
  return start + (gain - rate * start) * reach;
}

/**
 * What is left after one exchange of a share of the water? A 10 % change moves a parameter by a tenth of the difference.
 *
 * Units: any concentration, share above 0 up to 1. Throws RangeError otherwise. Formula: Cin + (C0 − Cin)(1 − f).
 * Source: mass balance of a mixed tank (same density in and out). Checked: computed (36 from 40).
 * @example exchangeOnce({ startConcentration: 40, incomingConcentration: 0, fraction: 0.1 }) // => 36
 */
export function exchangeOnce(input: Mixture & { fraction: number }): number {
  requireMixture(input);
  const fraction = requireShareAboveZero("fraction", input.fraction);
  return input.startConcentration + (input.incomingConcentration - input.startConcentration) * fraction;
}

export interface RepeatedExchange {
  /** just after the last exchange */
  concentration: number;
  /** just before the last exchange, the highest of its interval when the parameter rises */
  beforeLastExchange: number;
  /** where it settles just after an exchange if this goes on for ever */
  settlesAt: number;
}

/**
 * What comes of exchanging a share of the water again and again, while the water goes on making (nitrate keeps rising) or
 * losing some? Each interval passes first, then the exchange.
 *
 * Units: any concentration, share, whole number of exchanges, days between them (0 unless said), per day. Throws RangeError
 * for what is outside. Formula: with no turnover Cin + (C0 − Cin)(1 − f)^n. Source: mass balance.
 * Checked: computed (12.65625 after four of 25 %).
 * @example exchangeRepeatedly({ startConcentration: 40, incomingConcentration: 0, fraction: 0.25, exchanges: 4 }).concentration // => 12.65625
 */
export function exchangeRepeatedly(
  input: Mixture & Turnover & { fraction: number; exchanges: number; intervalDays?: number },
): RepeatedExchange {
  const { startConcentration, incomingConcentration, exchanges, intervalDays = 0 } = input;
  const { productionPerDay, lossPerDay } = requireMixture(input);
  const kept = 1 - requireShareAboveZero("fraction", input.fraction);
  requireNotNegative("intervalDays", intervalDays);
  if (!Number.isInteger(exchanges) || exchanges < 1) {
    throw new RangeError(`exchanges must be a whole number of 1 or more, not ${exchanges}.`);
  }
  // One cycle is straight: C ↦ slope C + rise.
  const survives = Math.exp(-lossPerDay * intervalDays);
  const slope = kept * survives;
  const rise =
    kept * afterDays(0, productionPerDay, lossPerDay, intervalDays) + (1 - kept) * incomingConcentration;
  const settlesAt = rise / (1 - slope);
  const afterN = (n: number) => settlesAt + (startConcentration - settlesAt) * slope ** n;
  return {
    concentration: afterN(exchanges),
    beforeLastExchange: afterDays(afterN(exchanges - 1), productionPerDay, lossPerDay, intervalDays),
    settlesAt,
  };
}

/**
 * What is left after water was exchanged in a steady stream, well mixed, at constant volume?
 *
 * Units: any concentration, exchanged volume over tank volume (0.5 is half the tank). Throws RangeError for a negative one.
 * Formula: Cin + (C0 − Cin) e^(−Vex/V). Source: mass balance of a mixed tank. Checked: computed (24.26122639).
 * @example exchangeContinuously({ startConcentration: 40, incomingConcentration: 0, exchangedOverVolume: 0.5 }) // => 24.26123
 */
export function exchangeContinuously(input: Mixture & { exchangedOverVolume: number }): number {
  const { startConcentration, incomingConcentration } = input;
  requireMixture(input);
  const turns = requireNotNegative("exchangedOverVolume", input.exchangedOverVolume);
  return afterDays(startConcentration, incomingConcentration, 1, turns);
}

/**
 * What does a steady exchange come to after some days, while the water makes or loses some of its own?
 *
 * Units: any concentration, tank volumes exchanged per day, days, per day. Answer: concentration then, and where it settles
 * (absent when nothing takes away what is made). Throws RangeError for negative
 * rates. Formula: dC/dt = P + q Cin − (q + k) C. Source: mass balance. Checked: limits (exchangeContinuously when P = k = 0).
 * @example exchangeWithTurnover({ startConcentration: 40, incomingConcentration: 0, exchangedOverVolumePerDay: 0.1, days: 30, productionPerDay: 1 }).settlesAt // => 10
 */
export function exchangeWithTurnover(
  input: Mixture & Turnover & { exchangedOverVolumePerDay: number; days: number },
): { concentration: number; settlesAt?: number } {
  const { startConcentration, incomingConcentration, exchangedOverVolumePerDay, days } = input;
  const { productionPerDay, lossPerDay } = requireMixture(input);
  requireNotNegative("exchangedOverVolumePerDay", exchangedOverVolumePerDay);
  requireNotNegative("days", days);
  const gain = productionPerDay + exchangedOverVolumePerDay * incomingConcentration;
  const rate = exchangedOverVolumePerDay + lossPerDay;
  const concentration = afterDays(startConcentration, gain, rate, days);
  return rate === 0 ? { concentration } : { concentration, settlesAt: gain / rate };
}

/**
 * How many exchanges, or how much water in a steady stream, bring a concentration to a target?
 *
 * Units: any concentration, share. Answer: exact and whole number of exchanges, and tank volumes for a steady stream. Throws
 * RangeError when the target does not lie between start and incoming water, or is the incoming water itself (never reached),
 * and for a share not between 0 and 1. Formula: n = ln r / ln(1 − f), Vex/V = −ln r, r = (Ct − Cin)/(C0 − Cin).
 * Source: mass balance. Checked: computed (4.818841679, so 5).
 * @example exchangesNeeded({ startConcentration: 40, incomingConcentration: 0, targetConcentration: 10, fraction: 0.25 }).exchanges // => 5
 */
export function exchangesNeeded(input: Mixture & { targetConcentration: number; fraction: number }): {
  exactExchanges: number;
  exchanges: number;
  exchangedOverVolume: number;
} {
  const { startConcentration, incomingConcentration, targetConcentration } = input;
  requireMixture(input);
  const fraction = requireShareAboveZero("fraction", input.fraction);
  const ratio = (targetConcentration - incomingConcentration) / (startConcentration - incomingConcentration);
  if (!(ratio > 0 && ratio <= 1)) {
    throw new RangeError(
      "targetConcentration must lie between the start and the new water, and cannot be the new water's own.",
    );
  }
  const exchangedOverVolume = ratio === 1 ? 0 : -Math.log(ratio);
  const exactExchanges = ratio === 1 ? 0 : fraction === 1 ? 1 : exchangedOverVolume / -Math.log1p(-fraction);
  return { exactExchanges, exchanges: Math.max(0, Math.ceil(exactExchanges - 1e-9)), exchangedOverVolume };
}
