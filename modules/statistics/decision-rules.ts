import { gaussLegendre } from "./gauss-legendre";
import { normalCdf, normalDensity } from "./normal";
import { requireFinite, requirePositive } from "./values";

/** Whether a result must not exceed the limit ("upper") or not fall below it ("lower"). */
export type LimitSide = "upper" | "lower";

/** A tolerance limit and a measured value with its uncertainty. */
export interface DecisionInput {
  readonly value: number;
  readonly limit: number;
  readonly side: LimitSide;
  /** Expanded uncertainty U = k u. */
  readonly expanded: number;
  /** Coverage factor, 2 unless told. */
  readonly k?: number;
  /** Guard band in parts of U: 1 unless told, 0 is simple acceptance. */
  readonly guard?: number;
}

export type NonBinaryDecision = "pass" | "conditional pass" | "conditional fail" | "fail";

/** Decisions by three rules, and the chance that the true value is beyond the limit. */
export interface Decision {
  readonly acceptanceLimit: number;
  readonly simple: "pass" | "fail";
  readonly guarded: "pass" | "fail";
  readonly nonBinary: NonBinaryDecision;
  readonly chanceNonconforming: number;
}

/** a <= b, where values equal within 1e-9 of their size are equal (64.4 degF is 18 degC). */
function atMost(a: number, b: number): boolean {
  return a <= b + 1e-9 * Math.max(Math.abs(a), Math.abs(b));
}

/**
 * The limit for acceptance: the tolerance limit drawn in by the guard band w = guard * U.
 * @example acceptanceLimit({ limit: 10, side: "upper", expanded: 2, guard: 1 }) // => 8
 */
export function acceptanceLimit(input: {
  readonly limit: number;
  readonly side: LimitSide;
  readonly expanded: number;
  readonly guard: number;
}): number {
  if (!(Number.isFinite(input.guard) && input.guard >= 0))
    throw new RangeError("The guard band must be zero or more.");
  const band = input.guard * requirePositive(input.expanded, "expanded");
  const limit = requireFinite(input.limit, "limit");
  return input.side === "upper" ? limit - band : limit + band;
}

/**
 * Does a measured value meet a limit, given its uncertainty? Simple acceptance, guarded acceptance and the four-way
 * statement of ILAC-G8; a value on a limit is within it. The chance of a wrong "pass" uses a flat prior.
 *
 * Units: those of the limit. Throws RangeError for U, k of zero or less, a negative guard band.
 * Source: ILAC-G8:09/2019, 4.2. Checked: upper limit 0.100, U 0.020.
 * @example decide({ value: 0.095, limit: 0.1, side: "upper", expanded: 0.02 }).nonBinary // => "conditional pass"
 */
export function decide(input: DecisionInput): Decision {
  const { limit, side, expanded, k = 2, guard = 1 } = input;
  const value = requireFinite(input.value, "value");
  requireFinite(limit, "limit");
  if (!(guard >= 0)) throw new RangeError("The guard band must be zero or more.");
  const u = requirePositive(expanded, "expanded") / requirePositive(k, "k");
  const sign = side === "upper" ? 1 : -1;
  const within = (edge: number) => atMost(sign * value, sign * edge);
  const accept = acceptanceLimit({ limit, side, expanded, guard });
  const reject = limit + sign * guard * expanded;
  const simple = within(limit) ? "pass" : "fail";
  const guarded = within(accept) ? "pass" : "fail";
  const nonBinary =
    guarded === "pass"
      ? "pass"
      : simple === "pass"
        ? "conditional pass"
        : within(reject)
          ? "conditional fail"
          : "fail";
  const chanceNonconforming = normalCdf((sign * (value - limit)) / u);
  return { acceptanceLimit: accept, simple, guarded, nonBinary, chanceNonconforming };
}

/**
 * The greatest chance of a false "pass" with a guard band of `guard` parts of U: 1 - Phi(guard * k).
 *
 * Source: ILAC-G8:09/2019 table 1. Checked: 50 % without guard band, 2.275 % for w = U with k = 2.
 * @example falseAcceptChance({ guard: 0, k: 2 }) // => 0.5
 */
export function falseAcceptChance(input: { readonly guard: number; readonly k: number }): number {
  if (!(input.guard >= 0)) throw new RangeError("The guard band must be zero or more.");
  return normalCdf(-input.guard * requirePositive(input.k, "k"));
}

/**
 * The chance that the true value lies within its limits, given the measured one and its standard uncertainty (normal,
 * flat prior). Leave out a limit that does not exist.
 *
 * Source: JCGM 106:2012, 7. Checked: its Zener diode example, 0.92 (from memory).
 * @example conformanceProbability({ value: 5, u: 1, upper: 5 }) // => 0.5
 */
export function conformanceProbability(input: {
  readonly value: number;
  readonly u: number;
  readonly lower?: number;
  readonly upper?: number;
}): number {
  const { lower, upper } = input;
  const value = requireFinite(input.value, "value");
  const u = requirePositive(input.u, "u");
  if (lower === undefined && upper === undefined)
    throw new RangeError("A lower or an upper limit is needed.");
  if (lower === undefined) return normalCdf(((upper ?? value) - value) / u);
  if (upper === undefined) return normalCdf((value - lower) / u);
  if (lower >= upper) throw new RangeError("The lower limit must lie below the upper limit.");
  return normalCdf((upper - value) / u) - normalCdf((lower - value) / u);
}

/** Risks of a rule over everything that will be measured. */
export interface GlobalRisks {
  readonly nonconforming: number;
  /** Chance that an item is beyond its limit and is accepted. */
  readonly consumer: number;
  /** Chance that an item is within its limit and is rejected. */
  readonly producer: number;
}

/**
 * What does an acceptance limit cost over all items? Global consumer's and producer's risk for an upper limit and
 * normally distributed true values and measurement errors.
 *
 * Throws RangeError for standard deviations of zero or less.
 * Source: JCGM 106:2012, 9.5. Checked: integrals by scipy, prior 0 +- 1, u 0.25, limit 2.
 */
export function globalRisks(input: {
  readonly priorMean: number;
  readonly priorSd: number;
  readonly u: number;
  readonly limit: number;
  readonly acceptance: number;
}): GlobalRisks {
  const priorMean = requireFinite(input.priorMean, "priorMean");
  const limit = requireFinite(input.limit, "limit");
  const acceptance = requireFinite(input.acceptance, "acceptance");
  const priorSd = requirePositive(input.priorSd, "priorSd");
  const u = requirePositive(input.u, "u");
  const far = 9 * priorSd;
  const integrate = (from: number, to: number, chance: (error: number) => number) => {
    if (to <= from) return 0;
    let total = 0;
    const breaks = [
      from,
      ...[acceptance - 6 * u, acceptance, acceptance + 6 * u].filter((x) => x > from && x < to),
      to,
    ];
    for (let part = 1; part < breaks.length; part++) {
      const { nodes, weights } = gaussLegendre(60, breaks[part - 1]!, breaks[part]!);
      nodes.forEach((x, i) => {
        total +=
          (weights[i]! * normalDensity((x - priorMean) / priorSd) * chance((acceptance - x) / u)) / priorSd;
      });
    }
    return total;
  };
  return {
    nonconforming: normalCdf((priorMean - limit) / priorSd),
    consumer: integrate(limit, Math.max(priorMean, limit) + far, normalCdf),
    producer: integrate(Math.min(priorMean, limit) - far, limit, (z) => normalCdf(-z)),
  };
}
