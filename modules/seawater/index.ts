export { alkalinityMeqPerL, alkalinityUmolPerKg } from "./chemistry/alkalinity-per-kg";
export {
  type ConcentrationBasis,
  defaultAmmoniaFormula,
  FRESH_WATER_BELOW,
  type UnionizedAmmonia,
  type UnionizedAmmoniaInput,
  unionizedAmmonia,
  unionizedFromFraction,
} from "./chemistry/ammonia";
export {
  AMMONIA_FORMULA_SCALES,
  AMMONIA_RANGE,
  type AmmoniaFormula,
  ammoniumPKa,
} from "./chemistry/ammonium-pka";
export { ATOMIC_WEIGHTS, type Element } from "./chemistry/atomic-weights.data";
export {
  CARBONATE_RANGE,
  type CarbonateInput,
  type CarbonateSystem,
  carbonateSystem,
} from "./chemistry/carbonate";
export {
  CONSTANT_RANGE,
  lnSeawaterConstant,
  type SeawaterConstant,
} from "./chemistry/dissociation";
export {
  type Atoms,
  molarMassGPerMol,
  WATER_G_PER_MOL,
} from "./chemistry/molar-mass";
export {
  convertPH,
  PH_SCALE_RANGE,
  PH_SCALES,
  type PHScale,
} from "./chemistry/ph-scale";
export { type BoronRatio } from "./chemistry/total-ions";
export { PUBLISHED_LIMITS, type PublishedLimit } from "./limits/published-limits.data";
export {
  ADDITIVES,
  type Additive,
  type AlkalinityAdditive,
  alkalinityAdditionG,
  type CalciumAdditive,
  calciumAdditionG,
  type MagnesiumAdditive,
  magnesiumAdditionG,
  type Raised,
} from "./mixing/additions";
export { type Blend, blend, type Stream } from "./mixing/blend";
export {
  DECHLORINATORS,
  type Dechlorination,
  type Dechlorinator,
  dechlorination,
  dechlorinatorGPerG,
} from "./mixing/dechlorination";
export { evaporation, type SalinityChange, saltToRaise, waterToDilute } from "./mixing/dilution";
export {
  exchangeContinuously,
  exchangeOnce,
  exchangeRepeatedly,
  exchangesNeeded,
  exchangeWithTurnover,
  type RepeatedExchange,
  type Turnover,
} from "./mixing/exchange";
export {
  type HeatingInput,
  type HeatingTime,
  type HeatLoss,
  heatingEnergyKWh,
  heatingTime,
} from "./mixing/heating";
export {
  type PurifierInput,
  type PurifierPerformance,
  purifierPerformance,
  timeToFillMin,
} from "./mixing/purifier";
export { type Heel, type SaltCharge, saltCharge, saltForWater } from "./mixing/salt-charge";
export { type SaltMix } from "./mixing/salt-mix";
export { type TracerInput, type TracerVolume, tracerVolume } from "./mixing/tracer-volume";
export {
  bulkDensityForMeasuredMixGPerMl,
  HALF_US_CUP_ML,
  salinityFromMeasuredMix,
  US_GALLON_L,
} from "./mixing/volume-measure";
export { ASTM_D1141 } from "./recipes/astm-d1141.data";
export { compoundGPerMol } from "./recipes/compound-mass";
export { COMPOUNDS, type Compound } from "./recipes/compounds.data";
export { IONS, type Ion } from "./recipes/ions.data";
export { KESTER_1967 } from "./recipes/kester-1967.data";
export { nonNegativeLeastSquares } from "./recipes/least-squares";
export {
  type Ingredient,
  type IonTotal,
  type Recipe,
  type RecipeTotals,
  recipeTotals,
} from "./recipes/recipe";
export { type IonTarget, type SaltOnHand, type SolvedRecipe, solveRecipe } from "./recipes/recipe-solver";
export { REFERENCE_IONS, referenceConstituent } from "./recipes/reference-composition";
export {
  REFERENCE_COMPOSITION,
  REFERENCE_SALT_G_PER_MOL,
  type ReferenceIon,
} from "./recipes/reference-composition.data";
export { IPTS68_PER_ITS90, ipts68FromIts90, its90FromIpts68, ZERO_CELSIUS_K } from "./temperature-scale";
export { type ValidRange } from "./validity";
export {
  BRINE_SCALE_RANGE,
  brineScaleReadingGPerKg,
  salinityFromBrineScale,
  sodiumChlorideRefractiveIndex,
} from "./water/brine-scale";
export {
  CONDUCTIVITY_AT_25_LINEAR_RANGE,
  CONDUCTIVITY_COEFFICIENT_PER_C,
  conductivityAt25MsPerCm,
  freshConductivityAt25MsPerCm,
  totalDissolvedSolidsMgPerL,
} from "./water/conductivity-at-25";
export { DENSITY_RANGE, densityKgPerM3, salinityFromDensity } from "./water/density";
export { FREEZING_RANGE, freezingPointC } from "./water/freezing";
export {
  ALTITUDE_RANGE,
  barometricPressureKPa,
  STANDARD_ATMOSPHERE_KPA,
  totalGasPressurePercent,
} from "./water/gas-pressure";
export { HEAT_CAPACITY_RANGE, specificHeatJPerKgK } from "./water/heat-capacity";
export {
  OXYGEN_RANGE,
  type OxygenConditions,
  oxygenFromSaturationPercentMgPerL,
  oxygenSaturationMgPerL,
  oxygenSaturationPercent,
} from "./water/oxygen";
export {
  OXYGEN_SOLUBILITY_RANGE,
  type OxygenSolubilityFit,
  type OxygenSolubilityUnit,
  oxygenSolubility,
} from "./water/oxygen-solubility";
export {
  REFRACTION_RANGE,
  type RefractionFormula,
  type RefractionInput,
  refractiveIndex,
  SODIUM_D_NM,
  salinityFromRefractiveIndex,
} from "./water/refraction";
export {
  CONDUCTIVITY_RATIO_RANGE,
  type ConductivityInput,
  conductivityMsPerCm,
  conductivityRatio,
  PRACTICAL_SALINITY_RANGE,
  practicalSalinity,
  practicalSalinityFromRatio,
  type RatioInput,
  type SalinityInput,
} from "./water/salinity";
export {
  REFERENCE_SALT_AT_35_G_PER_KG,
  SALT_BASES,
  type SaltBasis,
  salinityFromSaltContent,
  saltContentGPerKg,
} from "./water/salt-content";
export {
  GLASS_EXPANSION_PER_K,
  type HydrometerInput,
  hydrometerSpecificGravity,
  SIXTY_FAHRENHEIT_C,
  salinityFromHydrometer,
  salinityFromSpecificGravity,
  specificGravity,
} from "./water/specific-gravity";
