import { atLeast, atMost } from "@/lib/nearly";
import { BOUND_WORDS, type Bounds, type LimitShape, ORDERED_BOUNDS, type OrderedBound } from "../model";
import { formatNumber } from "./format-value";
import { parseMonthDay } from "./limits-at";

export type LimitProblemCode =
  | "not-a-number"
  | "wrong-order"
  | "change-not-positive"
  | "outside-plausible"
  | "no-bounds"
  | "no-knots"
  | "knots-out-of-order"
  | "knots-differ"
  | "bad-month-day";

/** One thing wrong with limits. `fields` name the bounds concerned, `knot` the place in a ramp or season. */
export interface LimitProblem {
  readonly code: LimitProblemCode;
  readonly fields: readonly (keyof Bounds)[];
  readonly knot?: number;
  readonly sentence: string;
}

interface CheckOptions {
  /** Plausible bounds of the parameter; limits beyond them could never be reached. */
  readonly plausible?: { readonly low: number | null; readonly high: number | null };
  readonly decimals?: number;
}

/**
 * Do these limits stand in order? lower tolerance ≤ lower watch ≤ target ≤ upper watch ≤ upper tolerance, any of them
 * left open; the change positive; all inside the plausible bounds. Answers every problem found, none when all is well.
 * @example checkBounds({ watchHigh: 19, toleranceHigh: 18 })[0].code // => "wrong-order"
 */
export function checkBounds(bounds: Bounds, options: CheckOptions = {}): LimitProblem[] {
  const show = (value: number) => formatNumber(value, options.decimals ?? null);
  const problems: LimitProblem[] = [];
  for (const name of [...ORDERED_BOUNDS, "greatestChange24h"] as const) {
    const value = bounds[name];
    if (value !== undefined && !Number.isFinite(value)) {
      const sentence = `The ${BOUND_WORDS[name]} is not a number. Give a number or leave it open.`;
      problems.push({ code: "not-a-number", fields: [name], sentence });
    }
  }
  if (problems.length > 0) return problems;
  problems.push(...checkOrder(bounds, show));
  const change = bounds.greatestChange24h;
  if (change !== undefined && change <= 0) {
    const sentence = `The greatest change in any 24 h is ${show(change)}. It must be above 0; leave it open if any change is fine.`;
    problems.push({ code: "change-not-positive", fields: ["greatestChange24h"], sentence });
  }
  if (options.plausible) problems.push(...checkPlausible(bounds, options.plausible, show));
  return problems;
}

function checkOrder(bounds: Bounds, show: (value: number) => string): LimitProblem[] {
  const problems: LimitProblem[] = [];
  let lower: OrderedBound | null = null;
  for (const name of ORDERED_BOUNDS) {
    const value = bounds[name];
    if (value === undefined) continue;
    const before = lower === null ? undefined : bounds[lower];
    if (lower !== null && before !== undefined && !atMost(before, value)) {
      const sentence = `The ${BOUND_WORDS[lower]} (${show(before)}) is above the ${BOUND_WORDS[name]} (${show(value)}). Lower the first or raise the second.`;
      problems.push({ code: "wrong-order", fields: [lower, name], sentence });
    }
    lower = name;
  }
  return problems;
}

function checkPlausible(
  bounds: Bounds,
  plausible: NonNullable<CheckOptions["plausible"]>,
  show: (value: number) => string,
): LimitProblem[] {
  const problems: LimitProblem[] = [];
  for (const name of ORDERED_BOUNDS) {
    const value = bounds[name];
    if (value === undefined) continue;
    const low = plausible.low !== null && !atLeast(value, plausible.low);
    const high = plausible.high !== null && !atMost(value, plausible.high);
    if (!low && !high) continue;
    const edge = low
      ? `below the lowest plausible value (${show(plausible.low ?? 0)})`
      : `above the highest plausible value (${show(plausible.high ?? 0)})`;
    const sentence = `The ${BOUND_WORDS[name]} (${show(value)}) is ${edge} of this parameter. Change the limit, or the parameter's plausible bounds.`;
    problems.push({ code: "outside-plausible", fields: [name], sentence });
  }
  return problems;
}

/**
 * Is a whole shape of limits in order? Every knot like `checkBounds`; at least one bound; knots of a ramp at rising
 * moments (two or more), days of a season real and different (two or more); every knot naming the same bounds, so
 * that the line between them is defined. Order at the knots keeps order between them, since all lines are straight.
 */
export function checkLimitShape(shape: LimitShape, options: CheckOptions = {}): LimitProblem[] {
  if (shape.kind === "constant") return [...checkAny(shape.bounds), ...checkBounds(shape.bounds, options)];
  const knots: readonly { readonly bounds: Bounds }[] = shape.knots;
  const first = knots[0];
  if (!first || knots.length < 2) {
    const sentence = `A ${shape.kind} needs at least two knots. Add one, or use constant limits.`;
    return [{ code: "no-knots", fields: [], sentence }];
  }
  const problems = [...checkAny(first.bounds), ...checkKnotTimes(shape)];
  knots.forEach((knot, index) => {
    problems.push(...checkBounds(knot.bounds, options).map((problem) => ({ ...problem, knot: index })));
    if (named(knot.bounds) !== named(first.bounds)) {
      const sentence = `Knot ${index + 1} states other limits than the first. State the same ones at every knot.`;
      problems.push({ code: "knots-differ", fields: [], knot: index, sentence });
    }
  });
  return problems;
}

function checkAny(bounds: Bounds): LimitProblem[] {
  if (Object.values(bounds).some((value) => value !== undefined)) return [];
  return [
    {
      code: "no-bounds",
      fields: [],
      sentence: "No limit is given. State at least one, or suspend the limits.",
    },
  ];
}

const named = (bounds: Bounds) =>
  [...ORDERED_BOUNDS, "greatestChange24h" as const].filter((name) => bounds[name] !== undefined).join();

function checkKnotTimes(shape: Exclude<LimitShape, { kind: "constant" }>): LimitProblem[] {
  const problems: LimitProblem[] = [];
  if (shape.kind === "ramp") {
    shape.knots.forEach((knot, index) => {
      const before = shape.knots[index - 1];
      if (Number.isFinite(knot.at) && (!before || before.at < knot.at)) return;
      const sentence = `Knot ${index + 1} of the ramp is not later than the one before it. Put the knots in order of time.`;
      problems.push({ code: "knots-out-of-order", fields: [], knot: index, sentence });
    });
    return problems;
  }
  const seen = new Set<string>();
  shape.knots.forEach(({ monthDay }, index) => {
    const fault = monthDayFault(monthDay);
    if (fault) problems.push({ code: "bad-month-day", fields: [], knot: index, sentence: fault });
    else if (seen.has(monthDay)) {
      const sentence = `The day ${monthDay} stands twice in the season. Give each day once.`;
      problems.push({ code: "knots-out-of-order", fields: [], knot: index, sentence });
    }
    seen.add(monthDay);
  });
  return problems;
}

function monthDayFault(monthDay: string): string | null {
  try {
    parseMonthDay(monthDay);
    return null;
  } catch (error) {
    if (error instanceof RangeError) return error.message;
    throw error;
  }
}
