/**
 * The accepted units: one row per unit, each with its factor to the base of its dimension.
 *
 *   base = (value − zeroAt) × multiply / divide
 *
 * Sources: exact definitions of the International Yard and Pound agreement, the US gallon (231 in³), the imperial
 * gallon (4.54609 L), the conventional millimetre of mercury and pound-force, BIPM SI Brochure / NIST SP 811.
 * Chemical bases by stoichiometry with CIAAW abridged standard atomic weights 2021: H 1.008, C 12.011, N 14.007,
 * O 15.999, Mg 24.305, P 30.974, Ca 40.078. Checked in tests/published/unit-conversions.test.ts.
 */

export type Dimension =
  | "temperature"
  | "salinity"
  | "conductivity"
  | "alkalinity"
  | "concentration"
  | "oxygen"
  | "nitrate"
  | "nitrite"
  | "ammonia"
  | "phosphate"
  | "silicate"
  | "calcium"
  | "magnesium"
  | "pressure"
  | "flow"
  | "length"
  | "volume"
  | "mass"
  | "time"
  | "potential"
  | "ratio"
  | "ph"
  | "bacteria"
  | "turbidity"
  | "illuminance"
  | "photon-flux"
  | "absorbance"
  | "current"
  | "frequency"
  | "speed"
  | "rotation"
  | "count";

/** What must be known beside the number before a unit without a plain factor can be converted. */
export type NeededContext =
  | {
      readonly kind: "specific-gravity";
      readonly sampleTemperatureC: number;
      readonly referenceTemperatureC: number;
    }
  | { readonly kind: "conductivity"; readonly compensatedToC: number | null }
  | { readonly kind: "density" };

export interface UnitDefinition {
  /** Stored code, unique over the table. */
  readonly code: string;
  readonly dimension: Dimension;
  readonly multiply?: number;
  readonly divide?: number;
  readonly zeroAt?: number;
  /** Spellings people type; compared after `normaliseUnitText`. The code itself always counts. */
  readonly aliases: readonly string[];
  /** The same unit in mathjs's words, where mathjs knows it. */
  readonly expression?: string;
  /** Present where no plain factor exists; `convert` refuses and a function with context is needed. */
  readonly needs?: NeededContext;
  readonly note?: string;
}

const N = 14.007;
const O = 15.999;
const H = 1.008;
const P = 30.974;
const NO3 = N + 3 * O;
const NO2 = N + 2 * O;
const NH3 = N + 3 * H;
const NH4 = N + 4 * H;
const PO4 = P + 4 * O;
const CA = 40.078;
const MG = 24.305;
const CACO3 = CA + 12.011 + 3 * O;
const CAO = CA + O;
const SI = 28.085;
const SIO2 = SI + 2 * O;

/** 60 °F in degrees Celsius, exactly 140/9. */
const T60F = 140 / 9;

const sg = (sampleTemperatureC: number, referenceTemperatureC: number): NeededContext => ({
  kind: "specific-gravity",
  sampleTemperatureC,
  referenceTemperatureC,
});

export const UNIT_TABLE: readonly UnitDefinition[] = [
  // temperature, base °C
  {
    code: "°C",
    dimension: "temperature",
    expression: "degC",
    aliases: ["c", "°", "celsius", "centigrade", "°celsius"],
  },
  {
    code: "°F",
    dimension: "temperature",
    zeroAt: 32,
    multiply: 5,
    divide: 9,
    expression: "degF",
    aliases: ["f", "fahrenheit", "°fahrenheit"],
  },
  { code: "K", dimension: "temperature", zeroAt: 273.15, expression: "K", aliases: ["kelvin", "°k"] },

  // salinity, base psu (practical salinity PSS-78, a bare number)
  {
    code: "psu",
    dimension: "salinity",
    aliases: ["pss", "pss78", "pss-78", "ppt", "‰", "s", "sp", "practicalsalinity"],
    note: "Practical salinity. “ppt” as instruments and people write it is taken as this number.",
  },
  {
    code: "g/kg",
    dimension: "salinity",
    multiply: 35,
    divide: 35.16504,
    aliases: ["gkg-1", "gperkg", "sa", "sr"],
    note: "Reference-composition salinity, 35.16504/35 g/kg per unit of practical salinity (Millero et al. 2008).",
  },
  {
    code: "SG 20/20 °C",
    dimension: "salinity",
    needs: sg(20, 20),
    aliases: ["sg20/20", "sg20", "sg20/20c", "sg@20c", "d20/20"],
  },
  {
    code: "SG 25/25 °C",
    dimension: "salinity",
    needs: sg(25, 25),
    aliases: ["sg25/25", "sg25", "sg25/25c", "sg@25c", "sg77/77f", "d25/25"],
  },
  {
    code: "SG 60/60 °F",
    dimension: "salinity",
    needs: sg(T60F, T60F),
    aliases: ["sg60/60", "sg60", "sg60/60f", "sg@60f", "sg15.6/15.6c", "d60/60"],
  },
  {
    code: "SG 77/60 °F",
    dimension: "salinity",
    needs: sg(25, T60F),
    aliases: ["sg77/60", "sg77/60f", "sg25c/60f"],
    note: "Sample at 25 °C (77 °F) against water at 60 °F.",
  },
  {
    code: "SG 25/4 °C",
    dimension: "salinity",
    needs: sg(25, 4),
    aliases: ["sg25/4", "sg25/4c", "d25/4"],
  },
  {
    code: "mS/cm (salinity)",
    dimension: "salinity",
    needs: { kind: "conductivity", compensatedToC: null },
    aliases: ["ms/cm", "mscm-1"],
    note: "Conductivity at the sample's own temperature, which must be given beside it.",
  },
  {
    code: "mS/cm at 25 °C (salinity)",
    dimension: "salinity",
    needs: { kind: "conductivity", compensatedToC: 25 },
    aliases: ["ms/cm25c", "ms/cm@25c", "ms/cmat25c", "ms/cmat25°c", "ms/cm25°c", "ms/cm@25°c"],
    note: "Conductivity already brought to 25 °C by the instrument.",
  },

  // conductivity, base mS/cm
  { code: "mS/cm", dimension: "conductivity", expression: "mS/cm", aliases: ["mscm-1", "millisiemens/cm"] },
  {
    code: "µS/cm",
    dimension: "conductivity",
    divide: 1000,
    expression: "uS/cm",
    aliases: ["us/cm", "uscm-1", "µscm-1", "microsiemens/cm", "µmho/cm", "umho/cm"],
  },
  { code: "S/m", dimension: "conductivity", multiply: 10, expression: "S/m", aliases: ["sm-1"] },

  // alkalinity, base meq/L
  { code: "meq/L", dimension: "alkalinity", aliases: ["meq", "meql-1", "mval/l", "meq/dm3", "mmol/l(hcl)"] },
  {
    code: "dKH",
    dimension: "alkalinity",
    multiply: 20,
    divide: CAO,
    aliases: ["kh", "°dkh", "°kh", "°dh", "dh"],
    note: "One degree is 10 mg/L CaO.",
  },
  {
    code: "mg/L CaCO3",
    dimension: "alkalinity",
    multiply: 2,
    divide: CACO3,
    aliases: ["mg/l", "ppm", "ppmcaco3", "mg/lascaco3", "mgl", "mgl-1caco3", "mgcaco3/l"],
  },
  {
    code: "°Clark",
    dimension: "alkalinity",
    multiply: (64.79891 / 4.54609) * 2,
    divide: CACO3,
    aliases: ["clark", "°e", "englishdegree"],
  },
  {
    code: "°fH",
    dimension: "alkalinity",
    multiply: 20,
    divide: CACO3,
    aliases: ["fh", "frenchdegree", "°f.h."],
  },
  {
    code: "µmol/kg",
    dimension: "alkalinity",
    needs: { kind: "density" },
    aliases: ["umol/kg", "µmolkg-1", "umolkg-1", "µeq/kg"],
    note: "Per kilogram of seawater; needs salinity and temperature for the density.",
  },

  // concentration, base mg/L
  {
    code: "mg/L",
    dimension: "concentration",
    expression: "mg/L",
    aliases: ["mgl", "mgl-1", "ppm", "g/m3", "mg/litre", "mg/liter"],
    note: "“ppm” is taken as mg/L, as is usual for water tests.",
  },
  {
    code: "µg/L",
    dimension: "concentration",
    divide: 1000,
    expression: "ug/L",
    aliases: ["ug/l", "ugl", "µgl", "µgl-1", "ugl-1", "ppb", "mg/m3", "mcg/l"],
  },
  {
    code: "g/L",
    dimension: "concentration",
    multiply: 1000,
    expression: "g/L",
    aliases: ["gl", "gl-1", "kg/m3"],
  },

  // dissolved oxygen, base mg/L O2; M(O2) = 31.998, 1 mL(STP) = 1.42905 mg (Benson & Krause)
  { code: "mg/L O2", dimension: "oxygen", aliases: ["mg/l", "ppm", "mgl", "mg/lo2", "mgo2/l", "mg/ldo"] },
  {
    code: "mL/L O2",
    dimension: "oxygen",
    multiply: 1.42905,
    aliases: ["ml/l", "mll-1", "mlo2/l"],
    note: "Millilitres of oxygen gas at 0 °C and 1 atm.",
  },
  {
    code: "µmol/L O2",
    dimension: "oxygen",
    multiply: 2 * O,
    divide: 1000,
    aliases: ["µmol/l", "umol/l", "µm", "umol/lo2"],
  },

  // nitrogen and phosphorus, base mg/L of the species
  {
    code: "mg/L NO3",
    dimension: "nitrate",
    aliases: ["mg/l", "ppm", "mgl", "ppmno3", "mgno3/l", "mg/lnitrate", "mg/lasno3", "no3"],
  },
  {
    code: "mg/L NO3-N",
    dimension: "nitrate",
    multiply: NO3,
    divide: N,
    aliases: [
      "mg/l",
      "ppm",
      "mgl",
      "ppmno3-n",
      "mgno3-n/l",
      "mg/lno3n",
      "mg/lasn",
      "mg/ln",
      "no3-n",
      "mgn/l",
    ],
  },
  {
    code: "µmol/L NO3",
    dimension: "nitrate",
    multiply: NO3,
    divide: 1000,
    aliases: ["µmol/l", "umol/l", "µm", "umol/lno3"],
  },
  {
    code: "mg/L NO2",
    dimension: "nitrite",
    aliases: ["mg/l", "ppm", "mgl", "ppmno2", "mgno2/l", "mg/lnitrite", "mg/lasno2", "no2"],
  },
  {
    code: "mg/L NO2-N",
    dimension: "nitrite",
    multiply: NO2,
    divide: N,
    aliases: [
      "mg/l",
      "ppm",
      "mgl",
      "ppmno2-n",
      "mgno2-n/l",
      "mg/lno2n",
      "mg/lasn",
      "mg/ln",
      "no2-n",
      "mgn/l",
    ],
  },
  {
    code: "µmol/L NO2",
    dimension: "nitrite",
    multiply: NO2,
    divide: 1000,
    aliases: ["µmol/l", "umol/l", "µm", "umol/lno2"],
  },
  {
    code: "mg/L NH3-N",
    dimension: "ammonia",
    aliases: [
      "mg/l",
      "ppm",
      "mgl",
      "mg/ltan",
      "tan",
      "mg/lnh3n",
      "mg/lnh4-n",
      "mg/lasn",
      "mg/ln",
      "ppmnh3-n",
      "nh3-n",
      "nh4-n",
      "mgn/l",
    ],
    note: "As nitrogen: the same number for NH3-N, NH4-N and total ammonia nitrogen.",
  },
  {
    code: "mg/L NH3",
    dimension: "ammonia",
    multiply: N,
    divide: NH3,
    aliases: ["mg/l", "ppm", "mgl", "ppmnh3", "mgnh3/l", "mg/lasnh3", "nh3"],
  },
  {
    code: "mg/L NH4",
    dimension: "ammonia",
    multiply: N,
    divide: NH4,
    aliases: ["mg/l", "ppm", "mgl", "ppmnh4", "mgnh4/l", "mg/lasnh4", "nh4"],
  },
  {
    code: "µmol/L N",
    dimension: "ammonia",
    multiply: N,
    divide: 1000,
    aliases: ["µmol/l", "umol/l", "µm", "umol/ln"],
  },
  {
    code: "mg/L PO4",
    dimension: "phosphate",
    aliases: ["mg/l", "ppm", "mgl", "ppmpo4", "mgpo4/l", "mg/laspo4", "po4"],
  },
  {
    code: "mg/L PO4-P",
    dimension: "phosphate",
    multiply: PO4,
    divide: P,
    aliases: [
      "mg/l",
      "ppm",
      "mgl",
      "ppmpo4-p",
      "mgpo4-p/l",
      "mg/lpo4p",
      "mg/lasp",
      "mg/lp",
      "po4-p",
      "mgp/l",
    ],
  },
  {
    code: "µg/L P",
    dimension: "phosphate",
    multiply: PO4,
    divide: P * 1000,
    aliases: ["µg/l", "ug/l", "ppb", "ppbp", "ug/lp", "µg/lpo4-p", "ug/lpo4-p"],
  },
  {
    code: "µmol/L PO4",
    dimension: "phosphate",
    multiply: PO4,
    divide: 1000,
    aliases: ["µmol/l", "umol/l", "µm", "umol/lpo4"],
  },
  { code: "mg/L SiO2", dimension: "silicate", aliases: ["mg/l", "ppm", "mgl", "ppmsio2", "sio2"] },
  {
    code: "mg/L Si",
    dimension: "silicate",
    multiply: SIO2,
    divide: SI,
    aliases: ["mg/l", "ppm", "mgl", "ppmsi", "si", "mg/lsio2-si"],
  },

  // hardness ions, base mg/L of the element
  { code: "mg/L Ca", dimension: "calcium", aliases: ["mg/l", "ppm", "mgl", "ppmca", "ca"] },
  { code: "mmol/L Ca", dimension: "calcium", multiply: CA, aliases: ["mmol/l", "mm", "mmoll-1"] },
  {
    code: "mg/L Ca as CaCO3",
    dimension: "calcium",
    multiply: CA,
    divide: CACO3,
    aliases: ["mg/lcaco3", "ppmcaco3", "mg/lascaco3"],
  },
  { code: "mg/L Mg", dimension: "magnesium", aliases: ["mg/l", "ppm", "mgl", "ppmmg", "mg"] },
  { code: "mmol/L Mg", dimension: "magnesium", multiply: MG, aliases: ["mmol/l", "mm", "mmoll-1"] },

  // pressure, base kPa
  { code: "kPa", dimension: "pressure", expression: "kPa", aliases: ["kilopascal"] },
  { code: "Pa", dimension: "pressure", divide: 1000, expression: "Pa", aliases: ["pascal"] },
  { code: "bar", dimension: "pressure", multiply: 100, expression: "bar", aliases: ["bars", "barg"] },
  {
    code: "mbar",
    dimension: "pressure",
    divide: 10,
    expression: "mbar",
    aliases: ["millibar", "hpa", "mbars"],
  },
  {
    code: "psi",
    dimension: "pressure",
    multiply: 4.4482216152605,
    divide: 0.64516,
    expression: "psi",
    aliases: ["psig", "lbf/in2", "lb/in2"],
  },
  {
    code: "mmHg",
    dimension: "pressure",
    multiply: 133.322387415,
    divide: 1000,
    aliases: ["mm hg"],
    note: "The conventional millimetre, 133.322387415 Pa (mathjs rounds it to 133.322).",
  },
  { code: "inHg", dimension: "pressure", multiply: 3386.388640341, divide: 1000, aliases: ["in hg", '"hg'] },
  { code: "atm", dimension: "pressure", multiply: 101.325, expression: "atm", aliases: ["atmosphere"] },
  {
    code: "mH2O",
    dimension: "pressure",
    multiply: 9.80665,
    aliases: ["mwc", "mws", "metresofwater"],
    note: "Conventional metre of water, 9.80665 kPa.",
  },

  // flow, base m³/h
  { code: "m³/h", dimension: "flow", expression: "m^3/hour", aliases: ["m3/h", "m3/hr", "m3h-1", "cmh"] },
  {
    code: "L/h",
    dimension: "flow",
    divide: 1000,
    expression: "L/hour",
    aliases: ["l/hr", "lph", "lh-1", "litres/hour"],
  },
  {
    code: "L/min",
    dimension: "flow",
    multiply: 60,
    divide: 1000,
    expression: "L/minute",
    aliases: ["lpm", "lmin-1", "l/m", "litres/minute"],
  },
  {
    code: "mL/min",
    dimension: "flow",
    multiply: 60,
    divide: 1e6,
    expression: "mL/minute",
    aliases: ["mlmin-1", "ml/minute"],
  },
  {
    code: "L/s",
    dimension: "flow",
    multiply: 3.6,
    expression: "L/second",
    aliases: ["lps", "ls-1", "l/sec"],
  },
  {
    code: "US gpm",
    dimension: "flow",
    multiply: 3.785411784 * 60,
    divide: 1000,
    expression: "gallon/minute",
    aliases: ["gpm", "usgpm", "usgal/min", "gal/min", "gpm(us)"],
  },
  {
    code: "US gph",
    dimension: "flow",
    multiply: 3.785411784,
    divide: 1000,
    expression: "gallon/hour",
    aliases: ["gph", "usgph", "usgal/h", "gal/h", "gal/hr"],
  },

  // length, base m
  { code: "m", dimension: "length", expression: "m", aliases: ["metre", "meter", "metres", "meters"] },
  { code: "cm", dimension: "length", divide: 100, expression: "cm", aliases: ["centimetre", "centimeter"] },
  { code: "mm", dimension: "length", divide: 1000, expression: "mm", aliases: ["millimetre", "millimeter"] },
  {
    code: "ft",
    dimension: "length",
    multiply: 0.3048,
    expression: "ft",
    aliases: ["foot", "feet", "'"],
  },
  {
    code: "in",
    dimension: "length",
    multiply: 0.0254,
    expression: "inch",
    aliases: ["inch", "inches", '"'],
  },

  // volume, base L
  { code: "L", dimension: "volume", expression: "L", aliases: ["litre", "liter", "litres", "liters", "dm3"] },
  { code: "mL", dimension: "volume", divide: 1000, expression: "mL", aliases: ["cm3", "cc", "millilitre"] },
  {
    code: "m³",
    dimension: "volume",
    multiply: 1000,
    expression: "m^3",
    aliases: ["m3", "cubicmetre", "cubicmeter", "cbm"],
  },
  {
    code: "US gal",
    dimension: "volume",
    multiply: 3.785411784,
    expression: "gallon",
    aliases: ["gal", "usgallon", "usgallons", "gal(us)", "gallon", "gallons"],
    note: "“gal” is taken as the US gallon.",
  },
  {
    code: "imp gal",
    dimension: "volume",
    multiply: 4.54609,
    aliases: ["ukgal", "impgallon", "impgallons", "ukgallon", "gal(imp)", "gal(uk)", "imperialgallon"],
  },
  {
    code: "ft³",
    dimension: "volume",
    multiply: 28.316846592,
    expression: "ft^3",
    aliases: ["ft3", "cuft", "cubicfeet", "cubicfoot"],
  },

  // mass, base kg
  { code: "kg", dimension: "mass", expression: "kg", aliases: ["kilogram", "kilograms", "kilo"] },
  { code: "g", dimension: "mass", divide: 1000, expression: "g", aliases: ["gram", "grams"] },
  { code: "mg", dimension: "mass", divide: 1e6, expression: "mg", aliases: ["milligram"] },
  { code: "t", dimension: "mass", multiply: 1000, expression: "tonne", aliases: ["tonne", "tonnes"] },
  {
    code: "lb",
    dimension: "mass",
    multiply: 0.45359237,
    expression: "lbm",
    aliases: ["lbs", "pound", "pounds"],
  },
  {
    code: "oz",
    dimension: "mass",
    multiply: 0.028349523125,
    expression: "oz",
    aliases: ["ounce", "ounces"],
  },

  // time, base h
  { code: "h", dimension: "time", expression: "hour", aliases: ["hr", "hrs", "hour", "hours"] },
  { code: "min", dimension: "time", divide: 60, expression: "minute", aliases: ["minute", "minutes"] },
  {
    code: "s",
    dimension: "time",
    divide: 3600,
    expression: "second",
    aliases: ["sec", "second", "seconds"],
  },
  { code: "d", dimension: "time", multiply: 24, expression: "day", aliases: ["day", "days"] },

  // electricity, base mV, A, Hz
  { code: "mV", dimension: "potential", expression: "mV", aliases: ["millivolt", "millivolts"] },
  { code: "V", dimension: "potential", multiply: 1000, expression: "V", aliases: ["volt", "volts"] },
  { code: "A", dimension: "current", expression: "A", aliases: ["amp", "amps", "ampere"] },
  { code: "mA", dimension: "current", divide: 1000, expression: "mA", aliases: ["milliamp"] },
  { code: "Hz", dimension: "frequency", expression: "Hz", aliases: ["hertz"] },
  { code: "rpm", dimension: "rotation", aliases: ["1/min", "r/min", "rev/min"] },

  // the rest
  { code: "%", dimension: "ratio", aliases: ["percent", "pct", "%sat", "%saturation"] },
  { code: "fraction", dimension: "ratio", multiply: 100, aliases: ["ratio"] },
  { code: "pH", dimension: "ph", aliases: ["phunits", "s.u.", "-"] },
  {
    code: "CFU/100 mL",
    dimension: "bacteria",
    aliases: ["cfu/100ml", "cfu", "cfu/dl", "colonies/100ml"],
  },
  {
    code: "MPN/100 mL",
    dimension: "bacteria",
    aliases: ["mpn/100ml", "mpn"],
    note: "A most probable number estimates the same density and is compared as the same number.",
  },
  { code: "CFU/mL", dimension: "bacteria", multiply: 100, aliases: ["cfu/ml", "cfuml-1", "colonies/ml"] },
  {
    code: "NTU",
    dimension: "turbidity",
    aliases: ["nephelometricturbidityunits", "ntus"],
  },
  {
    code: "FNU",
    dimension: "turbidity",
    aliases: ["fnus"],
    note: "Both scales are set with formazin; they agree there and may differ on real water.",
  },
  { code: "lx", dimension: "illuminance", aliases: ["lux"] },
  {
    code: "klx",
    dimension: "illuminance",
    multiply: 1000,
    aliases: ["klux", "kilolux"],
  },
  {
    code: "µmol/m²/s",
    dimension: "photon-flux",
    aliases: ["umol/m2/s", "µmolm-2s-1", "umolm-2s-1", "par", "ppfd"],
  },
  { code: "AU", dimension: "absorbance", aliases: ["abs", "absorbance", "a.u."] },
  { code: "cm/s", dimension: "speed", expression: "cm/s", aliases: ["cms-1"] },
  { code: "m/s", dimension: "speed", multiply: 100, expression: "m/s", aliases: ["ms-1"] },
  { code: "count", dimension: "count", aliases: ["n", "pcs", "pieces", "number", "#", "individuals"] },
];
