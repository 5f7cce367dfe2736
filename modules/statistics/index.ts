export {
  type ChartConstants,
  chartConstants,
  MEDIAN_MOVING_RANGE_PER_SIGMA,
  SUBGROUP_SIZES,
} from "./chart-constants";
export {
  type IndividualsInput,
  type IndividualsLimits,
  individualsLimits,
  movingRanges,
} from "./individuals";
export { lagOneAutocorrelation, mean, standardDeviation, sum, variance } from "./moments";
export { median, type QuantileType, quantile } from "./quantiles";
export type { Values } from "./values";
