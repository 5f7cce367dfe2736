import { matchUnit, UnitError } from "@/lib/units/factors";
import type { ParameterDefinition } from "../model";
import { type ConversionContext, convertReading } from "./convert-reading";

type Measured = Pick<ParameterDefinition, "unit" | "acceptedUnits" | "name">;

/** The code of the unit in which a value was typed, from any spelling. @throws UnitError */
function unitCode(typedUnit: string, parameter: Measured): string {
  const match = matchUnit(typedUnit, parameter.acceptedUnits);
  if (match.state === "one") return match.unit.code;
  const sentence =
    match.state === "none"
      ? `“${typedUnit}” is not accepted for ${parameter.name}. Use one of: ${parameter.acceptedUnits.join(", ")}.`
      : `“${typedUnit}” can mean ${match.units.map((unit) => unit.code).join(" or ")}. Write which one.`;
  throw new UnitError("unknown-unit", sentence);
}

/**
 * A value typed in one of a parameter's accepted units, in its canonical unit. A parameter without a unit takes none.
 * @throws UnitError (a RangeError) with a sentence where the unit is unknown, not accepted, means several things, or needs
 *   something that is not known (the sample's temperature, say)
 */
export function toCanonical(
  value: number,
  typedUnit: string | null,
  parameter: Measured,
  context: ConversionContext = {},
): number {
  if (parameter.unit === null) {
    if (typedUnit === null || typedUnit === "") return value;
    throw new RangeError(`${parameter.name} has no unit; leave it out.`);
  }
  if (typedUnit === null || typedUnit === "") return value;
  const code = unitCode(typedUnit, parameter);
  if (code === parameter.unit) return value;
  const converted = convertReading(value, code, parameter.unit, context);
  if (!converted.ok) throw new RangeError(converted.sentence);
  return converted.value;
}
