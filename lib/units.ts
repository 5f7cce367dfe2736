import { create, unitDependencies } from "mathjs";
import { convertByFactor, findUnit, matchUnit, UnitError } from "./units/factors";

export {
  acceptedUnits,
  convertByFactor,
  type Dimension,
  findUnit,
  getUnit,
  matchUnit,
  type NeededContext,
  normaliseUnitText,
  type UnitDefinition,
  UnitError,
  type UnitErrorCode,
  type UnitMatch,
  unitLabel,
} from "./units/factors";

/*
 * Server side of units. The table in units/factors serves forms and rules in the browser; here a small mathjs instance
 * is added for physical units the table does not list ("ft^3/hour", "kg/m^3"). The instance knows only units: no
 * parser, no functions, and it is not exported, so that nobody can import into it or create units in it.
 */
const onlyUnits = create({ ...unitDependencies }, {});

const LONGEST_EXPRESSION = 40;
const PLAIN_EXPRESSION = /^[A-Za-zµ]+(\^-?[1-3])?([*/ ][A-Za-zµ]+(\^-?[1-3])?)*$/;

/** The mathjs words for a unit of the table or a plain product of units; throws UnitError for anything else. */
function toExpression(text: string): string {
  const listed = findUnit(text);
  if (listed?.expression) return listed.expression;
  const expression = text.trim().replace(/µ/g, "u").replace(/²/g, "^2").replace(/³/g, "^3");
  if (listed || expression.length > LONGEST_EXPRESSION || !PLAIN_EXPRESSION.test(expression)) {
    throw new UnitError(
      "unknown-unit",
      `“${text.slice(0, LONGEST_EXPRESSION)}” is not a unit that is known here.`,
    );
  }
  return expression;
}

function unitOf(value: number, text: string) {
  const expression = toExpression(text);
  try {
    return onlyUnits.unit(value, expression);
  } catch (cause) {
    const error = new UnitError("unknown-unit", `“${text}” is not a unit that is known here.`);
    error.cause = cause;
    throw error;
  }
}

/**
 * What is this value in another unit? Codes of the table go by the table's exact factors; other physical units go
 * through mathjs. Spellings as people type them are first brought to a code with `matchUnit`.
 * Throws UnitError: unknown unit, different kinds of quantity, a unit that needs more than a factor, not a number.
 * Compare the answer with `lib/nearly`, never with `===`: a conversion rounds its last digit.
 * @example convert(100, "US gal", "L") // 378.5411784
 */
export function convert(value: number, fromUnit: string, toUnit: string): number {
  if (!Number.isFinite(value)) throw new UnitError("not-a-number", "Only a finite number can be converted.");
  if (findUnit(fromUnit) && findUnit(toUnit)) return convertByFactor(value, fromUnit, toUnit);
  const from = unitOf(value, fromUnit);
  const to = unitOf(1, toUnit);
  if (!from.equalBase(to)) {
    throw new UnitError("different-kind", `${fromUnit} and ${toUnit} measure different things.`);
  }
  return from.toNumber(toExpression(toUnit));
}

/**
 * A value typed in some unit, brought to the canonical unit of its parameter. `typedUnit` may be any spelling people use,
 * looked up among `accepted` (codes). Throws UnitError when the spelling is unknown, or fits several accepted
 * units and so must be asked about.
 * @example canonicalValue(64.4, "deg F", "°C", ["°C", "°F"]) // ≈ 18
 */
export function canonicalValue(
  value: number,
  typedUnit: string,
  canonicalUnit: string,
  accepted: readonly string[],
): number {
  const match = matchUnit(typedUnit, accepted);
  if (match.state === "one") return convert(value, match.unit.code, canonicalUnit);
  const known = accepted.join(", ");
  if (match.state === "none") {
    throw new UnitError("unknown-unit", `“${typedUnit}” is not accepted here. Use one of: ${known}.`);
  }
  const meant = match.units.map((unit) => unit.code).join(" or ");
  throw new UnitError("unknown-unit", `“${typedUnit}” can mean ${meant}. Write which one.`);
}
