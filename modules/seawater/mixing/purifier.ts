import { requireNotNegative, requirePositive } from "../validity";

export interface PurifierInput {
  /** conductivity, TDS or any concentration, both in one unit */
  feed: number;
  permeate: number;
  feedFlowLPerMin: number;
  permeateFlowLPerMin: number;
}

export interface PurifierPerformance {
  rejectionPercent: number;
  recoveryPercent: number;
  /** in the unit of feed and permeate, by mass balance */
  concentrate: number;
  concentrateFlowLPerMin: number;
  /** concentrate over permeate */
  wasteRatio: number;
}

/**
 * How well does the membrane hold salt back, how much of the feed becomes permeate, and what goes to waste?
 *
 * Units: any concentration, L/min; answer in %. Throws RangeError for a permeate above the feed, and unless permeate flow is
 * above zero and below the feed flow. Formula: rejection 100 (1 − Cp/Cf), recovery 100 Qp/Qf. Source: mass balance.
 * Checked: computed (98 %, 75 %, 1773).
 * @example purifierPerformance({ feed: 450, permeate: 9, feedFlowLPerMin: 10, permeateFlowLPerMin: 7.5 }).rejectionPercent // => 98
 */
export function purifierPerformance(input: PurifierInput): PurifierPerformance {
  const feed = requirePositive("feed", input.feed);
  const permeate = requireNotNegative("permeate", input.permeate);
  const feedFlow = requirePositive("feedFlowLPerMin", input.feedFlowLPerMin);
  const permeateFlow = requirePositive("permeateFlowLPerMin", input.permeateFlowLPerMin);
  if (permeate > feed) throw new RangeError("permeate must not be above feed: are the two exchanged?");
  if (!(permeateFlow < feedFlow)) {
    throw new RangeError("permeateFlowLPerMin must be below feedFlowLPerMin: are the two exchanged?");
  }
  const concentrateFlowLPerMin = feedFlow - permeateFlow;
  return {
    rejectionPercent: 100 * (1 - permeate / feed),
    recoveryPercent: (100 * permeateFlow) / feedFlow,
    concentrate: (feed * feedFlow - permeate * permeateFlow) / concentrateFlowLPerMin,
    concentrateFlowLPerMin,
    wasteRatio: concentrateFlowLPerMin / permeateFlow,
  };
}

/**
 * How long does it take to fill so much at this flow?
 *
 * Units: L, L/min; answer in minutes (divide by 60 for hours). Throws RangeError for a negative volume or a flow not above
 * zero. Source: V/Q. Checked: computed (444.4444444 min).
 * @example timeToFillMin({ volumeL: 20000, flowLPerMin: 45 }) // => 444.44444
 */
export function timeToFillMin(input: { volumeL: number; flowLPerMin: number }): number {
  return requireNotNegative("volumeL", input.volumeL) / requirePositive("flowLPerMin", input.flowLPerMin);
}
