/** How a typed number was understood. "sentence" says what is wrong and how to mend it. */
export type ParsedNumber =
  | { readonly ok: true; readonly value: number }
  | {
      readonly ok: false;
      readonly code: "not-a-number" | "ambiguous" | "too-large";
      readonly sentence: string;
    };

/** "auto" judges each text alone and refuses "1,234"; a file or a facility may declare its separator. */
export type DecimalSeparator = "auto" | "." | ",";

const BLANKS = /[\s\u00a0\u2007\u2009\u202f]+/g;
const SHAPE = /^([+-]?)([0-9][0-9.,' ]*|[.,][0-9]+)(?:e([+-]?[0-9]{1,3}))?$/i;

/** Makes minus signs and blanks uniform; nothing else is touched. */
export function tidy(text: string): string {
  return text
    .replace(BLANKS, " ")
    .trim()
    .replace(/^[\u2212\u2013\uff0d\ufe63]\s*/, "-")
    .replace(/([<>])\s*[\u2212\u2013\uff0d\ufe63]\s*/, "$1-")
    .replace(/e[\u2212\u2013]/i, "e-")
    .replace(/’/g, "'");
}

/**
 * Which number was typed? Point or comma, a true minus, groups of three set apart by blanks, apostrophes, or by
 * the separator that is not the decimal one. "1,234" can be 1.234 or 1234: it is refused with a question unless
 * the separator is declared. A point alone is always decimal ("1.026" is a specific gravity).
 * @example parseNumber("−1,5") // => { ok: true, value: -1.5 }
 */
export function parseNumber(typed: string, separator: DecimalSeparator = "auto"): ParsedNumber {
  const text = tidy(typed);
  const shape = SHAPE.exec(text);
  if (!shape) return notANumber(typed);
  const [, sign = "", mantissa = "", exponent] = shape;
  const plain = plainMantissa(mantissa.trim(), separator);
  if (plain === "ambiguous") return ambiguous(typed, mantissa, sign);
  if (plain === null) return notANumber(typed);
  const value = Number(`${sign}${plain}${exponent === undefined ? "" : `e${exponent}`}`);
  if (!Number.isFinite(value)) {
    return { ok: false, code: "too-large", sentence: `“${clip(typed)}” is too large to be a value.` };
  }
  return { ok: true, value: value === 0 ? 0 : value };
}

/** The mantissa with a point and without groups; null when it is malformed. */
function plainMantissa(mantissa: string, separator: DecimalSeparator): string | "ambiguous" | null {
  const grouped = /[ ']/.test(mantissa);
  const commas = count(mantissa, ",");
  const points = count(mantissa, ".");
  if (separator !== "auto") return withDecimal(mantissa, separator);
  if (commas > 0 && points > 0) {
    return withDecimal(mantissa, mantissa.lastIndexOf(",") > mantissa.lastIndexOf(".") ? "," : ".");
  }
  if (commas > 1) return withDecimal(mantissa, ".");
  if (points > 1) return withDecimal(mantissa, ",");
  if (commas === 1 && !grouped && /^[1-9][0-9]{0,2},[0-9]{3}$/.test(mantissa)) return "ambiguous";
  return withDecimal(mantissa, commas === 1 ? "," : ".");
}

function withDecimal(mantissa: string, decimal: "." | ","): string | null {
  const other = decimal === "." ? "," : ".";
  const [whole = "", fraction, ...more] = mantissa.split(decimal);
  if (more.length > 0 || (fraction !== undefined && !/^[0-9]*$/.test(fraction))) return null;
  const groups = whole.split(/[ '.,]/);
  const marks = new Set(whole.replace(/[0-9]/g, ""));
  if (marks.size > 1 || (marks.size === 1 && ![" ", "'", other].some((mark) => marks.has(mark)))) return null;
  if (groups.length > 1 && !(/^[0-9]{1,3}$/.test(groups[0] ?? "") && groups.slice(1).every(isThree)))
    return null;
  return `${groups.join("") || "0"}.${fraction || "0"}`;
}

const isThree = (group: string) => /^[0-9]{3}$/.test(group);
const count = (text: string, ch: string) => text.split(ch).length - 1;
const clip = (text: string) => (text.length > 40 ? `${text.slice(0, 40)}…` : text);

function notANumber(typed: string): ParsedNumber {
  return {
    ok: false,
    code: "not-a-number",
    sentence: `“${clip(typed)}” is not a number. Write digits with a point or comma, such as 8.12, <0.05 or ND.`,
  };
}

function ambiguous(typed: string, mantissa: string, sign: string): ParsedNumber {
  const decimal = `${sign}${mantissa.replace(",", ".")}`;
  const whole = `${sign}${mantissa.replace(",", "")}`;
  return {
    ok: false,
    code: "ambiguous",
    sentence: `“${clip(typed)}” can mean ${decimal} or ${whole}. Write ${decimal} with a point, or ${whole} without the comma.`,
  };
}
