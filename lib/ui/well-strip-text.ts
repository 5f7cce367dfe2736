import { numberText } from "./number-text";
import { STATUS_WORDS, type StatusCode } from "./status-word";
import type { WellStripInput } from "./well-strip-scale";

/**
 * What does a strip say in words? The text equivalent of the picture: value, status, limits, target, previous value.
 * @example wellStripText({ name: "pH", value: 8.12, decimals: 2, status: "within", toleranceLow: 7.8, toleranceHigh: 8.4 })
 *   // "pH 8.12, within; tolerance 7.80 to 8.40"
 */
export function wellStripText(
  input: WellStripInput & {
    name?: string | undefined;
    unit?: string | undefined;
    status?: StatusCode | undefined;
  },
): string {
  const decimals = input.decimals ?? 1;
  const number = (x: number) => numberText(x, decimals);
  const unit = input.unit ? ` ${input.unit}` : "";
  const head = [
    input.name,
    input.value === null || input.value === undefined ? "no value" : `${number(input.value)}${unit}`,
  ]
    .filter(Boolean)
    .join(" ");
  const parts = [input.status === undefined ? head : `${head}, ${STATUS_WORDS[input.status]}`];
  const tolerance = range(input.toleranceLow, input.toleranceHigh, number);
  const watch = range(input.watchLow, input.watchHigh, number);
  if (tolerance) parts.push(`tolerance ${tolerance}`);
  if (watch) parts.push(`watch limits ${watch}`);
  if (input.target !== null && input.target !== undefined) parts.push(`target ${number(input.target)}`);
  if (input.previous !== null && input.previous !== undefined) parts.push(`last ${number(input.previous)}`);
  return parts.join("; ");
}

function range(
  low: number | null | undefined,
  high: number | null | undefined,
  number: (x: number) => string,
): string | null {
  const hasLow = low !== null && low !== undefined;
  const hasHigh = high !== null && high !== undefined;
  if (hasLow && hasHigh) return `${number(low)} to ${number(high)}`;
  if (hasLow) return `at least ${number(low)}`;
  if (hasHigh) return `at most ${number(high)}`;
  return null;
}
