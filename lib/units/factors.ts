import { type Dimension, type NeededContext, UNIT_TABLE, type UnitDefinition } from "./unit-table.data";

export type { Dimension, NeededContext, UnitDefinition };

export type UnitErrorCode =
  | "unknown-unit"
  | "different-kind"
  | "needs-context"
  | "not-a-number"
  | "out-of-range";

/** Why a unit could not be used. `code` for machines, `message` is the sentence for people. */
export class UnitError extends RangeError {
  constructor(
    readonly code: UnitErrorCode,
    message: string,
  ) {
    super(message);
    this.name = "UnitError";
  }
}

const SUBSCRIPTS = "₀₁₂₃₄₅₆₇₈₉";
const SUPERSCRIPTS = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/**
 * Brings the spelling of a unit to one form: case, blanks, micro signs, degree signs, sub- and superscripts,
 * "deg" and "degrees", the several minus signs.
 * @example normaliseUnitText(" Deg C ") // "°c"
 */
export function normaliseUnitText(text: string): string {
  let out = text.trim().replace(/℃/g, "°C").replace(/℉/g, "°F");
  out = out.replace(/[₀-₉⁰¹²³⁴-⁹]/g, (ch) =>
    String(Math.max(SUBSCRIPTS.indexOf(ch), SUPERSCRIPTS.indexOf(ch))),
  );
  return out
    .toLowerCase()
    .replace(/μ/g, "µ")
    .replace(/[º˚∘]/g, "°")
    .replace(/[−–⁻]/g, "-")
    .replace(/degrees?\s*|deg\.?\s*/g, "°")
    .replace(/[\s\u00a0\u202f\u2009_·*^]+/g, "");
}

const BY_CODE: ReadonlyMap<string, UnitDefinition> = new Map(UNIT_TABLE.map((unit) => [unit.code, unit]));
const BY_ALIAS: ReadonlyMap<string, readonly UnitDefinition[]> = indexAliases();

function indexAliases(): Map<string, UnitDefinition[]> {
  const index = new Map<string, UnitDefinition[]>();
  for (const unit of UNIT_TABLE) {
    const spellings = new Set([unit.code, ...unit.aliases].map(normaliseUnitText));
    for (const spelling of spellings) index.set(spelling, [...(index.get(spelling) ?? []), unit]);
  }
  return index;
}

/** The unit with this stored code, or null. */
export function findUnit(code: string): UnitDefinition | null {
  return BY_CODE.get(code) ?? null;
}

/** The unit with this stored code; throws UnitError when there is none. */
export function getUnit(code: string): UnitDefinition {
  const unit = BY_CODE.get(code);
  if (!unit) throw new UnitError("unknown-unit", `“${code}” is not a unit that is known here.`);
  return unit;
}

/** What a typed spelling can mean. */
export type UnitMatch =
  | { readonly state: "one"; readonly unit: UnitDefinition }
  | { readonly state: "several"; readonly units: readonly UnitDefinition[] }
  | { readonly state: "none" };

/**
 * Which unit did somebody mean? Looks among `among` (codes) when given, else in the whole table. An exact code wins;
 * a spelling that fits several ("mg/L" where NO3 and NO3-N are both accepted) answers "several", so that the
 * person is asked which basis is meant.
 * @example matchUnit("deg C", ["°C", "°F"]) // { state: "one", unit: °C }
 */
export function matchUnit(text: string, among?: readonly string[]): UnitMatch {
  const exact = BY_CODE.get(text.trim());
  if (exact && (!among || among.includes(exact.code))) return { state: "one", unit: exact };
  const fitting = (BY_ALIAS.get(normaliseUnitText(text)) ?? []).filter(
    (u) => !among || among.includes(u.code),
  );
  const sameSpelling = fitting.filter((u) => normaliseUnitText(u.code) === normaliseUnitText(text));
  const [only] = sameSpelling.length === 1 ? sameSpelling : fitting;
  if (!only) return { state: "none" };
  return fitting.length === 1 || sameSpelling.length === 1
    ? { state: "one", unit: only }
    : { state: "several", units: fitting };
}

/** All units of a dimension, in the table's order (the base first). */
export function acceptedUnits(dimension: Dimension): readonly UnitDefinition[] {
  return UNIT_TABLE.filter((unit) => unit.dimension === dimension);
}

/** The unit as shown beside a number; bare numbers (pH, count) and unknown codes show what fits. */
export function unitLabel(code: string | null): string {
  if (code === null || code === "pH" || code === "count") return "";
  return code.replace(/ \(salinity\)$/, "");
}

/**
 * Converts a value between two units of the table.
 * Formula: base = (value − zeroAt) × multiply / divide, and back. The same unit returns the value untouched.
 * Throws UnitError: an unknown unit, units of different kinds, a unit that needs more than a factor
 * (specific gravity, conductivity as salinity, per-kilogram units), or a value that is not finite.
 * Source: see unit-table.data.ts. Checked: tests/published/unit-conversions.test.ts.
 * @example convertByFactor(2.5, "meq/L", "dKH") // 7.009625
 */
export function convertByFactor(value: number, fromCode: string, toCode: string): number {
  if (!Number.isFinite(value)) throw new UnitError("not-a-number", "Only a finite number can be converted.");
  const from = getUnit(fromCode);
  const to = getUnit(toCode);
  if (from.code === to.code) return value;
  if (from.dimension !== to.dimension) {
    throw new UnitError("different-kind", `${from.code} and ${to.code} measure different things.`);
  }
  for (const unit of [from, to]) {
    if (unit.needs) {
      throw new UnitError(
        "needs-context",
        `${unit.code} cannot be converted by a factor alone: ${needed(unit.needs)}.`,
      );
    }
  }
  const base = ((value - (from.zeroAt ?? 0)) * (from.multiply ?? 1)) / (from.divide ?? 1);
  return (base * (to.divide ?? 1)) / (to.multiply ?? 1) + (to.zeroAt ?? 0);
}

function needed(needs: NeededContext): string {
  if (needs.kind === "specific-gravity")
    return "it rests on the density of seawater at its pair of temperatures";
  if (needs.kind === "conductivity") return "it rests on the temperature of the sample";
  return "it rests on the density of the sample";
}
