import {
  convertByFactor,
  getUnit,
  type UnitDefinition,
  UnitError,
  type UnitErrorCode,
  unitLabel,
} from "@/lib/units/factors";
import {
  alkalinityMeqPerL,
  alkalinityUmolPerKg,
  conductivityMsPerCm,
  densityKgPerM3,
  practicalSalinity,
  salinityFromSpecificGravity,
  specificGravity,
} from "@/modules/seawater";

/** What was measured beside a value, as far as it is known. */
export interface ConversionContext {
  /** Temperature of the sample, °C (ITS-90). */
  readonly sampleTemperatureC?: number;
  /** Practical salinity of the sample, for densities. */
  readonly salinityPsu?: number;
}

/** A converted value, or what is missing or wrong in one sentence. */
export type ConvertedReading =
  | { readonly ok: true; readonly value: number }
  | {
      readonly ok: false;
      readonly code: UnitErrorCode;
      readonly sentence: string;
    };

/** One base in which units without a plain factor meet: practical salinity, meq/L. */
const MEETING_UNIT = { salinity: "psu", alkalinity: "meq/L" } as const;

/**
 * What is a reading in another unit, where a factor may not be enough?
 *
 * Plain units go by factor. Specific gravity goes through the density of seawater (EOS-80) at its pair of
 * temperatures, as an instrument that compensates, or a reading already corrected, states it. Conductivity as salinity
 * goes through PSS-78 at the sample's temperature, or at 25 °C where the instrument has compensated. Alkalinity
 * per kilogram goes through the density at the sample's salinity and temperature.
 * Never throws for a reading: answers what is missing or outside the formulas' range.
 * Source and Checked: modules/seawater; the pairs in tests/published/reading-conversions.test.ts.
 * @example convertReading(1.026, "SG 25/25 °C", "psu") // => { ok: true, value: 34.508 }
 */
export function convertReading(
  value: number,
  fromUnit: string,
  toUnit: string,
  context: ConversionContext = {},
): ConvertedReading {
  try {
    const from = getUnit(fromUnit);
    const to = getUnit(toUnit);
    if (from.code === to.code || (!from.needs && !to.needs) || from.dimension !== to.dimension) {
      return { ok: true, value: convertByFactor(value, fromUnit, toUnit) };
    }
    if (!Number.isFinite(value))
      throw new UnitError("not-a-number", "Only a finite number can be converted.");
    const meeting = from.dimension === "salinity" ? MEETING_UNIT.salinity : MEETING_UNIT.alkalinity;
    const middle = from.needs ? toMeeting(value, from, context) : convertByFactor(value, from.code, meeting);
    const answer = to.needs ? fromMeeting(middle, to, context) : convertByFactor(middle, meeting, to.code);
    return { ok: true, value: answer };
  } catch (error) {
    if (error instanceof UnitError) return { ok: false, code: error.code, sentence: error.message };
    if (error instanceof RangeError) return outOfRange(value, fromUnit, toUnit, error);
    throw error;
  }
}

function toMeeting(value: number, unit: UnitDefinition, context: ConversionContext): number {
  const { needs } = unit;
  if (needs?.kind === "specific-gravity") {
    const { sampleTemperatureC: temperatureC, referenceTemperatureC } = needs;
    return salinityFromSpecificGravity({ specificGravity: value, temperatureC, referenceTemperatureC });
  }
  if (needs?.kind === "conductivity") {
    const temperatureC = needs.compensatedToC ?? temperatureOf(unit, context);
    return practicalSalinity({ conductivityMsPerCm: value, temperatureC });
  }
  return alkalinityMeqPerL({ alkalinityUmolPerKg: value, densityKgPerM3: densityOf(unit, context) });
}

function fromMeeting(value: number, unit: UnitDefinition, context: ConversionContext): number {
  const { needs } = unit;
  if (needs?.kind === "specific-gravity") {
    const { sampleTemperatureC: temperatureC, referenceTemperatureC } = needs;
    return specificGravity({ salinityPsu: value, temperatureC, referenceTemperatureC });
  }
  if (needs?.kind === "conductivity") {
    const temperatureC = needs.compensatedToC ?? temperatureOf(unit, context);
    return conductivityMsPerCm({ salinityPsu: value, temperatureC });
  }
  return alkalinityUmolPerKg({ alkalinityMeqPerL: value, densityKgPerM3: densityOf(unit, context) });
}

function temperatureOf(unit: UnitDefinition, { sampleTemperatureC }: ConversionContext): number {
  if (sampleTemperatureC !== undefined) return sampleTemperatureC;
  throw new UnitError(
    "needs-context",
    `${unitLabel(unit.code)} needs the temperature of the sample. Give it, or use a reading brought to 25 °C.`,
  );
}

function densityOf(unit: UnitDefinition, { salinityPsu, sampleTemperatureC }: ConversionContext): number {
  if (salinityPsu !== undefined && sampleTemperatureC !== undefined) {
    return densityKgPerM3({ salinityPsu, temperatureC: sampleTemperatureC });
  }
  throw new UnitError(
    "needs-context",
    `${unitLabel(unit.code)} needs the salinity and temperature of the sample. Give both, or use a unit per litre.`,
  );
}

function outOfRange(value: number, from: string, to: string, error: RangeError): ConvertedReading {
  const sentence = `${value} ${unitLabel(from)} lies outside the range in which it can be turned into ${unitLabel(to)} (${error.message.replace(/\.$/, "")}). Check the value and its unit.`;
  return { ok: false, code: "out-of-range", sentence };
}
