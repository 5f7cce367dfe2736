import { studentTQuantile } from "./student-t";
import { requireFinite, requireProbability } from "./values";

/** An input quantity: its value, standard uncertainty and degrees of freedom (infinite when not given). */
export interface UncertainInput {
  readonly value: number;
  readonly u: number;
  readonly df?: number;
}

/** The correlation coefficient r of two inputs, named by their place. */
export interface Correlation {
  readonly between: readonly [number, number];
  readonly r: number;
}

/** What one input adds: its sensitivity coefficient c and its share |c| u. */
export interface UncertaintyShare {
  readonly sensitivity: number;
  readonly contribution: number;
}

/** A result with its combined standard uncertainty and effective degrees of freedom. */
export interface PropagatedResult {
  readonly value: number;
  readonly u: number;
  readonly df: number;
  readonly shares: readonly UncertaintyShare[];
}

/** Derivative by a five-point stencil with steps of a fraction of the uncertainty. */
function sensitivityOf(
  model: (values: readonly number[]) => number,
  inputs: readonly UncertainInput[],
  k: number,
) {
  const at = inputs.map((input) => input.value);
  const { value, u } = inputs[k]!;
  if (u === 0) return 0;
  const step = Math.max(u, 1e-5 * Math.abs(value)) / 4;
  const shifted = (by: number) => model(at.with(k, value + by * step));
  const slope = (8 * (shifted(1) - shifted(-1)) - (shifted(2) - shifted(-2))) / (12 * step);
  return requireFinite(slope, `The sensitivity to input ${k}`);
}

/** Checks the correlations and returns r of every pair of places. */
function correlationMatrix(count: number, correlations: readonly Correlation[]): number[][] {
  const matrix = Array.from({ length: count }, (_, i) => {
    const row = new Array<number>(count).fill(0);
    row[i] = 1;
    return row;
  });
  for (const { between, r } of correlations) {
    const [a, b] = between;
    const known = a !== b && a in matrix && b in matrix;
    if (!known) throw new RangeError(`A correlation between inputs ${a} and ${b} is not possible.`);
    if (!(r >= -1 && r <= 1)) throw new RangeError("A correlation coefficient lies between -1 and 1.");
    matrix[a]![b] = r;
    matrix[b]![a] = r;
  }
  return matrix;
}

/**
 * Combined standard uncertainty of contributions c u with the correlations of their inputs, and effective degrees of
 * freedom by Welch and Satterthwaite (infinite when every input is known that well).
 *
 * Formula: u^2 = sum_ij c_i c_j u_i u_j r_ij; df = u^4 / sum((c_i u_i)^4 / df_i), which GUM gives for independent inputs.
 * Throws RangeError for a negative uncertainty, r outside -1 to 1, correlations that contradict one another.
 * Source: JCGM 100:2008 (GUM), 5.1.2, 5.2.2, G.4.1. Checked: GUM H.1, 31.7 nm and 16.6 degrees of freedom.
 * @example combineUncertainty({ inputs: [{ u: 3 }, { u: 4 }], sensitivities: [1, 1] }).u // => 5
 */
export function combineUncertainty(input: {
  readonly inputs: readonly Pick<UncertainInput, "u" | "df">[];
  readonly sensitivities: readonly number[];
  readonly correlations?: readonly Correlation[];
}): { readonly u: number; readonly df: number } {
  const { inputs, sensitivities, correlations = [] } = input;
  if (inputs.length === 0) throw new RangeError("At least one input is needed.");
  if (inputs.length !== sensitivities.length) throw new RangeError("Every input needs its sensitivity.");
  const parts = inputs.map(({ u, df = Number.POSITIVE_INFINITY }, i) => {
    if (!(Number.isFinite(u) && u >= 0))
      throw new RangeError(`The uncertainty of input ${i} must be zero or more.`);
    if (!(df > 0)) throw new RangeError(`The degrees of freedom of input ${i} must be greater than zero.`);
    return requireFinite(sensitivities[i]!, "A sensitivity") * u;
  });
  const r = correlationMatrix(parts.length, correlations);
  const greatest = Math.max(...parts.map(Math.abs));
  if (greatest === 0) return { u: 0, df: Number.POSITIVE_INFINITY };
  const scaled = parts.map((part) => part / greatest);
  let square = 0;
  scaled.forEach((a, i) => scaled.forEach((b, j) => (square += a * b * r[i]![j]!)));
  if (square < -1e-12)
    throw new RangeError("These correlations contradict one another: the variance is negative.");
  const u = Math.sqrt(Math.max(0, square));
  const below = scaled.reduce(
    (total, part, i) => total + part ** 4 / (inputs[i]!.df ?? Number.POSITIVE_INFINITY),
    0,
  );
  return { u: u * greatest, df: below > 0 ? u ** 4 / below : Number.POSITIVE_INFINITY };
}

/**
 * How sure is a result computed from measured inputs? First-order propagation through any formula; sensitivities are
 * found numerically unless given. Not for formulas that bend strongly within the uncertainties.
 *
 * Units: those of the model's result. Throws RangeError as `combineUncertainty` and when the model gives no number.
 * Source: JCGM 100:2008 (GUM), 5.1 and 5.2. Checked: EURACHEM A1, GUM H.1, GUM H.2 with its correlations.
 * @example propagate({ model: ([a, b]) => a + b, inputs: [{ value: 1, u: 3 }, { value: 2, u: 4 }] }).u.toFixed(9) // => "5.000000000"
 */
export function propagate(input: {
  readonly model: (values: readonly number[]) => number;
  readonly inputs: readonly UncertainInput[];
  readonly correlations?: readonly Correlation[];
  readonly sensitivities?: readonly number[];
}): PropagatedResult {
  const { model, inputs, correlations } = input;
  const value = requireFinite(model(inputs.map((each) => each.value)), "The result of the formula");
  const sensitivities = input.sensitivities ?? inputs.map((_, k) => sensitivityOf(model, inputs, k));
  const { u, df } = combineUncertainty({ inputs, sensitivities, correlations });
  const shares = sensitivities.map((sensitivity, i) => ({
    sensitivity,
    contribution: Math.abs(sensitivity) * inputs[i]!.u,
  }));
  return { value, u, df, shares };
}

/**
 * The expanded uncertainty for a level of confidence: t times u. GUM cuts the degrees of freedom down to a whole
 * number ("truncate", the default); "keep" uses them as they are. Infinite df takes the normal distribution's factor.
 *
 * Throws RangeError for df below 1. Source: JCGM 100:2008, G.4.1. Checked: GUM H.1, k 2.92 and 93 nm at 99 %.
 * @example expandedUncertainty({ u: 1, df: Infinity, confidence: 0.95 }).k.toFixed(3) // => "1.960"
 */
export function expandedUncertainty(input: {
  readonly u: number;
  readonly df: number;
  readonly confidence: number;
  readonly wholeDf?: "truncate" | "keep";
}): { readonly k: number; readonly expanded: number; readonly df: number } {
  const { confidence, wholeDf = "truncate" } = input;
  const u = requireFinite(input.u, "u");
  if (!(input.df >= 1)) throw new RangeError("Degrees of freedom below 1 give no expanded uncertainty.");
  const df = wholeDf === "truncate" && Number.isFinite(input.df) ? Math.floor(input.df) : input.df;
  const p = 1 - (1 - requireProbability(confidence, "confidence")) / 2;
  const k = studentTQuantile(p, df);
  return { k, expanded: k * u, df };
}

function requireHalfWidth(halfWidth: number): number {
  if (!(Number.isFinite(halfWidth) && halfWidth >= 0))
    throw new RangeError("halfWidth must be zero or more.");
  return halfWidth;
}

/** Standard uncertainty of limits +-a within which every value is as likely as another: a / sqrt 3. */
export function rectangularUncertainty(halfWidth: number): number {
  return requireHalfWidth(halfWidth) / Math.sqrt(3);
}

/** Standard uncertainty of limits +-a within which values near the middle are likelier: a / sqrt 6. */
export function triangularUncertainty(halfWidth: number): number {
  return requireHalfWidth(halfWidth) / Math.sqrt(6);
}
