import { BOUND_WORDS, type ReadingValue, type Reason } from "../model";
import { formatNumber, formatPair, formatValue } from "./format-value";

/** How the numbers of a sentence are shown. */
export interface Shown {
  readonly reading: ReadingValue;
  readonly decimals: number;
  /** The unit's label; empty for bare numbers. */
  readonly unit: string;
}

/**
 * Why a status was given, in one or a few sentences for people; numbers in the canonical unit, with enough digits
 * that a value and the limit it passes never look the same.
 */
export function sentenceFor(shown: Shown, reasons: readonly Reason[]): string {
  const [first, ...more] = reasons;
  if (!first) return "";
  const main = sentenceOf(shown, first);
  const added = more
    .filter((each) => each.code !== "bound-does-not-decide")
    .map((each) => sentenceOf(shown, each));
  return [main, ...added].join(" ");
}

function sentenceOf(shown: Shown, reason: Reason): string {
  const withUnit = (text: string) => (shown.unit === "" ? text : `${text}\u00a0${shown.unit}`);
  const number = (value: number) => withUnit(formatNumber(value, shown.decimals));
  const asRead = withUnit(formatValue(shown.reading, shown.decimals));
  switch (reason.code) {
    case "below-plausible":
    case "above-plausible": {
      const [value, limit] = passing(shown, reason);
      const edge = reason.code === "below-plausible" ? "below the lowest" : "above the highest";
      return `${withUnit(value)} is ${edge} plausible value (${withUnit(limit)}). Confirm it or measure again.`;
    }
    case "below-tolerance":
    case "above-tolerance":
    case "below-watch":
    case "above-watch": {
      const [value, limit] = passing(shown, reason);
      const name = LIMIT_NAMES[reason.code];
      return `${withUnit(value)} is ${reason.code.startsWith("below") ? "below" : "above"} the ${name} (${withUnit(limit)}).`;
    }
    case "change-too-great": {
      const [change, limit] = formatPair(reason.change, reason.limit, shown.decimals);
      return `${asRead} differs by ${withUnit(change)} from ${number(reason.againstValue)} read in the preceding 24 h; at most ${withUnit(limit)} is allowed.`;
    }
    case "change-not-judged":
      return `The change in 24 h is not judged, because ${asRead} is not a plain number.`;
    case "bound-does-not-decide": {
      const limit = withUnit(formatNumber(reason.limit, decimalsThatShow(reason.limit, shown.decimals)));
      return `${asRead} cannot be judged against the ${BOUND_WORDS[reason.bound]} (${limit}): the true value may lie on either side of it.`;
    }
    case "no-number":
      return "There is no number to judge.";
    case "answer":
      return `The answer is “${reason.answer}”.`;
    case "inside-limits":
      return `${asRead} is within its limits.`;
    case "no-limits":
      return "No limits hold here, so nothing is judged.";
    case "limits-suspended":
      return `The limits are suspended: ${reason.reason.replace(/[.\s]+$/, "")}.`;
  }
}

const LIMIT_NAMES = {
  "below-tolerance": BOUND_WORDS.toleranceLow,
  "above-tolerance": BOUND_WORDS.toleranceHigh,
  "below-watch": BOUND_WORDS.watchLow,
  "above-watch": BOUND_WORDS.watchHigh,
} as const;

/** The value (with its qualifier) and the limit it passes. */
function passing(shown: Shown, reason: { readonly value: number; readonly limit: number }): [string, string] {
  if (shown.reading.qualifier !== "") {
    const digits = decimalsThatShow(reason.limit, shown.decimals);
    return [formatValue(shown.reading, shown.decimals), formatNumber(reason.limit, digits)];
  }
  return formatPair(reason.value, reason.limit, shown.decimals);
}

/** The parameter's decimals, or as many as a small limit needs (0.0075 is not shown as 0.01). */
function decimalsThatShow(limit: number, decimals: number): number | null {
  const full = formatNumber(limit, null);
  const digits = full.includes(".") ? full.length - full.indexOf(".") - 1 : 0;
  return digits > decimals ? null : decimals;
}
