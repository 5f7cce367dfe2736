export {
  type CorrectedLimits,
  type CorrectionRule,
  correctedIndividualsLimits,
  meanVarianceInflation,
} from "./autocorrelation";
export {
  type CalibrationLine,
  calibrationLine,
  lineThroughOrigin,
  weightedCalibrationLine,
} from "./calibration";
export { type Capability, capability, cpInterval, cpkInterval, type Interval } from "./capability";
export {
  type ChartConstants,
  chartConstants,
  MEDIAN_MOVING_RANGE_PER_SIGMA,
  SUBGROUP_SIZES,
} from "./chart-constants";
export { chiSquareCdf, chiSquareQuantile } from "./chi-square";
export {
  CONTROL_RULES,
  type ControlRule,
  controlRuleHits,
  NELSON_RULES,
  type NelsonRule,
  pointsOfHit,
  type RuleConventions,
  type RuleInput,
  WESTERN_ELECTRIC_RULES,
  type WesternElectricRule,
} from "./control-rules";
export { type CurrieLimits, currieCountLimits, currieLimits } from "./currie";
export { type CusumChart, type CusumInput, cusumChart } from "./cusum";
export {
  acceptanceLimit,
  conformanceProbability,
  type Decision,
  type DecisionInput,
  decide,
  falseAcceptChance,
  type GlobalRisks,
  globalRisks,
  type LimitSide,
  type NonBinaryDecision,
} from "./decision-rules";
export {
  DIXON_SIZES,
  type DixonRatio,
  type DixonTest,
  dixonCritical,
  dixonRatioFor,
  dixonTest,
} from "./dixon";
export { recoveryPercent, relativePercentDifference } from "./duplicates";
export { type EwmaChart, type EwmaInput, ewmaChart, ewmaHalfWidth } from "./ewma";
export { fisherFQuantile, fisherFUpperTail } from "./fisher-f";
export { type EsdStep, generalisedEsd } from "./generalised-esd";
export { type GrubbsTest, grubbsCritical, grubbsTest, type OutlierSide } from "./grubbs";
export {
  type IndividualsInput,
  type IndividualsLimits,
  individualsLimits,
  movingRanges,
} from "./individuals";
export { type InversePrediction, inversePrediction } from "./inverse-prediction";
export { type KendallResult, kendall, MOST_PAIRED_VALUES } from "./kendall";
export { type LeveyJenningsLimits, leveyJenningsLimits } from "./levey-jennings";
export { type LineDetectionLimits, lineDetectionLimits } from "./line-detection-limit";
export { mannKendall, type SeasonalTrend, seasonalMannKendall } from "./mann-kendall";
export {
  type BlankRule,
  detectionLimitFromBlanks,
  detectionLimitMayStay,
  type MethodDetectionLimit,
  methodDetectionLimit,
} from "./method-detection-limit";
export { lagOneAutocorrelation, mean, standardDeviation, sum, variance } from "./moments";
export { normalCdf, normalDensity, normalQuantile } from "./normal";
export { type EnClass, enClass, enScore, type ZClass, zClass, zetaScore, zScore } from "./proficiency";
export {
  type LinearityTest,
  linearityTest,
  type QuadraticCalibration,
  quadraticCalibration,
} from "./quadratic-calibration";
export { median, type QuantileType, quantile } from "./quantiles";
export {
  type AlgorithmAResult,
  type AlgorithmAStop,
  algorithmA,
  MAD_TO_SIGMA,
  medianAbsoluteDeviation,
} from "./robust";
export { simulatedRunLength, type ZoneRule, zoneRuleRunLength } from "./rule-run-length";
export {
  autocorrelatedRunLength,
  type CusumRunLengthInput,
  cusumRunLength,
  ewmaRunLength,
  oneSidedCusumRunLength,
  shewhartRunLength,
} from "./run-length";
export { type MissingConvention, ON_THE_LINE } from "./run-rules";
export { type StandardAddition, type StandardAdditionError, standardAddition } from "./standard-addition";
export { noncentralTCdf, studentTCdf, studentTQuantile } from "./student-t";
export {
  type ControlLimits,
  meanAndDeviationLimits,
  meanAndRangeLimits,
  pointsBeyond,
  pooledDeviation,
  range,
  type SubgroupLimits,
} from "./subgroups";
export { type TheilSenLine, theilSen } from "./theil-sen";
export {
  type Correlation,
  combineUncertainty,
  expandedUncertainty,
  type PropagatedResult,
  propagate,
  rectangularUncertainty,
  triangularUncertainty,
  type UncertainInput,
  type UncertaintyShare,
} from "./uncertainty";
export type { Values } from "./values";
export {
  WESTGARD_RULES,
  type WestgardDecision,
  type WestgardHit,
  type WestgardInput,
  type WestgardRule,
  type WestgardScope,
  westgard,
} from "./westgard";
