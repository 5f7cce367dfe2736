import type { DecimalSign, ParsedValue } from "@/modules/imports/model";

/** What one text shows about the file's decimal sign. */
export type DecimalEvidence = DecimalSign | "either" | "ambiguous" | "no-number";

export type ValueResult =
  | { kind: "value"; value: ParsedValue }
  /** Two different numbers, depending on the decimal sign. */
  | { kind: "ambiguous"; asPoint: number; asComma: number }
  /** A number only with the other decimal sign than the file's. */
  | { kind: "wrong-sign" }
  | { kind: "out-of-range" };

const GROUP_SIGNS = /^([+-]?\d{1,3})((?:[ \u00A0\u2009\u202F'’]\d{3})+)(?=$|[.,eE])/;
const AS_POINT = /^[+-]?(?:\d+|[1-9]\d{0,2}(?:,\d{3})+)?(?:\.\d*)?(?:[eE][+-]?\d{1,3})?$/;
const AS_COMMA = /^[+-]?(?:\d+|[1-9]\d{0,2}(?:\.\d{3})+)?(?:,\d*)?(?:[eE][+-]?\d{1,3})?$/;
const HAS_DIGIT = /^[+-]?[.,]?\d/;

/** Grouping by space or apostrophe taken out, minus and plus in ASCII. */
function bare(text: string): string {
  const ascii = text.replace(/^[\u2212\u2013]/, "-").replace(/([eE])\u2212/, "$1-");
  const found = GROUP_SIGNS.exec(ascii);
  return found ? found[1] + (found[2] ?? "").replace(/\D/g, "") + ascii.slice(found[0].length) : ascii;
}

function readings(text: string): { asPoint: number | null; asComma: number | null } {
  const plain = bare(text);
  if (!HAS_DIGIT.test(plain)) return { asPoint: null, asComma: null };
  return {
    asPoint: AS_POINT.test(plain) ? Number(plain.replaceAll(",", "")) : null,
    asComma: AS_COMMA.test(plain) ? Number(plain.replaceAll(".", "").replace(",", ".")) : null,
  };
}

const RELATION = /^(<=|>=|[<>≤≥])\s*/;
/** EPA data qualifiers behind a number: U not detected, J estimated, UJ, R rejected. Others stay text. */
const QUALIFIER = /\s*\b(UJ|U|J|R)$/;
const BELOW =
  /^(?:n\.?\s?d\.?|bdl|bld|<\s*(?:lod|loq|mdl|dl|rl)|not detected|none detected|below detection(?: limit)?)$/i;
const ABOVE = /^(?:tntc|confluent|too numerous to count|>\s*(?:uloq|range)|over ?range)$/i;

type Parts = { relation: "<" | ">" | null; qualifier: string | null; number: string };

function parts(text: string): Parts {
  const sign = RELATION.exec(text)?.[1] ?? null;
  const rest = sign ? text.replace(RELATION, "") : text;
  const letters = QUALIFIER.exec(rest)?.[1] ?? null;
  const isBelow = sign === null ? letters === "U" || letters === "UJ" : /[<≤]/.test(sign);
  const orEqual = sign && sign !== "<" && sign !== ">" ? (isBelow ? "≤" : "≥") : null;
  return {
    relation: isBelow ? "<" : sign ? ">" : null,
    qualifier: letters ?? orEqual,
    number: letters ? rest.replace(QUALIFIER, "") : rest,
  };
}

/** What does this text show about the decimal sign of its file? "8,1" a comma, "8.1" a point, "1.234" neither. */
export function decimalEvidence(text: string): DecimalEvidence {
  const { asPoint, asComma } = readings(parts(text.trim()).number);
  if (asPoint === null) return asComma === null ? "no-number" : "comma";
  if (asComma === null) return "point";
  return asPoint === asComma ? "either" : "ambiguous";
}

/** The two numbers that an ambiguous text can mean. */
export function bothReadings(text: string): { asPoint: number; asComma: number } | null {
  const { asPoint, asComma } = readings(parts(text.trim()).number);
  return asPoint === null || asComma === null ? null : { asPoint, asComma };
}

/**
 * Reads a value as typed: a number with its relation and qualifier, a result below or above what could be
 * measured, or a text. A reported 0 is a number; "ND" never becomes one (formulas: reference on censored data).
 * @param decimal the file's decimal sign; null when the file does not show one
 * @example parseValue("< 0,05", "comma").value.number // => 0.05
 */
export function parseValue(text: string, decimal: DecimalSign | null): ValueResult {
  const trimmed = text.trim();
  if (BELOW.test(trimmed)) return unquantified("<", trimmed);
  if (ABOVE.test(trimmed)) return unquantified(">", trimmed);
  const { relation, qualifier, number } = parts(trimmed);
  const { asPoint, asComma } = readings(number);
  if (asPoint === null && asComma === null) return { kind: "value", value: { kind: "text", text: trimmed } };
  const chosen = decimal === "comma" ? asComma : decimal === "point" ? asPoint : null;
  if (decimal !== null && chosen === null) return { kind: "wrong-sign" };
  if (decimal === null && asPoint !== null && asComma !== null && asPoint !== asComma) {
    return { kind: "ambiguous", asPoint, asComma };
  }
  const value = chosen ?? asPoint ?? asComma ?? Number.NaN;
  if (!Number.isFinite(value)) return { kind: "out-of-range" };
  return { kind: "value", value: { kind: "number", number: value, relation, qualifier } };
}

function unquantified(relation: "<" | ">", qualifier: string): ValueResult {
  return { kind: "value", value: { kind: "unquantified", relation, qualifier } };
}
