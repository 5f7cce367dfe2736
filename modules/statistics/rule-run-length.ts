import { type ControlRule, controlRuleHits, type RuleConventions } from "./control-rules";
import { solveLinearSystem } from "./linear-system";
import { normalCdf } from "./normal";
import { requireFinite } from "./values";

/** The rules whose patterns depend only on zones, so that a finite Markov chain describes them. */
export type ZoneRule = Extract<ControlRule, "WE1" | "WE2" | "WE3" | "WE4" | "N1" | "N2" | "N5" | "N6">;

/** What a chain must remember: who of the last points was beyond 2 and 1 sigma on each side, and the run. */
interface Memory {
  readonly above2: number;
  readonly below2: number;
  readonly above1: number;
  readonly below1: number;
  /** Length of the run on one side, positive above and negative below the centre line. */
  readonly run: number;
}

const START: Memory = { above2: 0, below2: 0, above1: 0, below1: 0, run: 0 };

/** The eight zones between the lines at 3, 2, 1 and 0 sigma: their bounds and a value inside each. */
const ZONES = [
  [Number.NEGATIVE_INFINITY, -3, -4],
  [-3, -2, -2.5],
  [-2, -1, -1.5],
  [-1, 0, -0.5],
  [0, 1, 0.5],
  [1, 2, 1.5],
  [2, 3, 2.5],
  [3, Number.POSITIVE_INFINITY, 4],
] as const;

const bits = (mask: number) => mask.toString(2).replaceAll("0", "").length;

/** Which of the parts of a memory the chosen rules use at all. */
interface Watch {
  readonly three: boolean;
  readonly two: boolean;
  readonly four: boolean;
  readonly side: number;
}

function watchOf(rules: readonly ZoneRule[], conventions: RuleConventions): Watch {
  const has = (...names: ZoneRule[]) => names.some((name) => rules.includes(name));
  const sides = [has("WE4") ? 8 : 0, has("N2") ? (conventions.sidePoints ?? 9) : 0].filter((n) => n > 0);
  return {
    three: has("WE1", "N1"),
    two: has("WE2", "N5"),
    four: has("WE3", "N6"),
    side: sides.length > 0 ? Math.min(...sides) : 0,
  };
}

/** The memory after a point at z, or null when a rule fires. */
function after(memory: Memory, z: number, watch: Watch): Memory | null {
  if (watch.three && Math.abs(z) > 3) return null;
  const push = (mask: number, set: boolean, most: number) => ((mask << 1) | (set ? 1 : 0)) & most;
  const above2 = watch.two ? push(memory.above2, z > 2, 7) : 0;
  const below2 = watch.two ? push(memory.below2, z < -2, 7) : 0;
  if ((z > 2 && bits(above2) >= 2) || (z < -2 && bits(below2) >= 2)) return null;
  const above1 = watch.four ? push(memory.above1, z > 1, 31) : 0;
  const below1 = watch.four ? push(memory.below1, z < -1, 31) : 0;
  if ((z > 1 && bits(above1) >= 4) || (z < -1 && bits(below1) >= 4)) return null;
  const run = z > 0 ? Math.max(memory.run, 0) + 1 : Math.min(memory.run, 0) - 1;
  if (watch.side > 0 && Math.abs(run) >= watch.side) return null;
  return {
    above2: above2 & 3,
    below2: below2 & 3,
    above1: above1 & 15,
    below1: below1 & 15,
    run: watch.side > 0 ? run : 0,
  };
}

/** Every memory that can be reached, and for each where the eight zones lead (-1: a rule fires). */
function reachable(watch: Watch): number[][] {
  const known = new Map<string, number>([[JSON.stringify(START), 0]]);
  const memories = [START];
  const steps: number[][] = [];
  for (let i = 0; i < memories.length; i++) {
    steps.push(
      ZONES.map(([, , z]) => {
        const next = after(memories[i]!, z, watch);
        if (next === null) return -1;
        const key = JSON.stringify(next);
        const found = known.get(key);
        if (found !== undefined) return found;
        known.set(key, memories.length);
        memories.push(next);
        return memories.length - 1;
      }),
    );
  }
  return steps;
}

/**
 * How many points until one of these zone rules fires, on average, when the mean is off by `shift` sigma? Exact for
 * independent normal values, from the absorbing Markov chain of the rules. It says what a set of rules costs in
 * false hits (shift 0) and what it gains.
 *
 * Throws RangeError for an empty set. For trends, alternations and zone-C rules see `simulatedRunLength`.
 * Source: Champ and Woodall 1987, Technometrics 29, 393-399. Checked: its table 1; all four rules 91.75.
 * @example zoneRuleRunLength({ rules: ["WE1", "WE2"], shift: 0 }).toFixed(2) // => "225.44"
 */
export function zoneRuleRunLength(input: {
  readonly rules: readonly ZoneRule[];
  readonly shift: number;
  readonly sidePoints?: number;
}): number {
  if (input.rules.length === 0) throw new RangeError("Choose one rule or more.");
  const shift = requireFinite(input.shift, "shift");
  const chances = ZONES.map(([from, to]) => normalCdf(to - shift) - normalCdf(from - shift));
  const steps = reachable(watchOf(input.rules, input));
  const matrix = steps.map((targets, i) => {
    const row = new Float64Array(steps.length);
    row[i] = 1;
    targets.forEach((target, zone) => {
      if (target >= 0) row[target]! -= chances[zone]!;
    });
    return row;
  });
  return solveLinearSystem(matrix, new Float64Array(steps.length).fill(1))[0]!;
}

/** A generator of uniform numbers from a seed (mulberry32: a Weyl sequence, mixed), for repeatable simulation. */
function uniformFrom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return (((mixed ^ (mixed >>> 14)) >>> 0) + 0.5) / 4294967296;
  };
}

/** Points drawn at first for each simulated run; the series is doubled until a rule fires. */
const CHUNK = 64;

/**
 * The average run length of any set of rules by simulation of independent normal values, with its standard error;
 * the same seed gives the same answer.
 *
 * Throws RangeError for an empty set or fewer than 2 runs.
 * Checked: Western Electric together 91.75 (Champ and Woodall 1987), Nelson 1 to 8 together 73.6 +- 0.1 (numpy).
 */
export function simulatedRunLength(
  input: RuleConventions & {
    readonly rules: readonly ControlRule[];
    readonly shift: number;
    readonly runs: number;
    readonly seed: number;
  },
): { readonly mean: number; readonly standardError: number } {
  const { rules, shift, runs, seed } = input;
  if (rules.length === 0) throw new RangeError("Choose one rule or more.");
  if (!(Number.isInteger(runs) && runs >= 2)) throw new RangeError("At least 2 runs are needed.");
  const uniform = uniformFrom(seed);
  const normal = () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
  let total = 0;
  let squares = 0;
  for (let run = 0; run < runs; run++) {
    let values = Float64Array.from({ length: CHUNK }, () => normal() + shift);
    let first = firstHit(values, input);
    while (first < 0) {
      const longer = new Float64Array(values.length * 2);
      longer.set(values);
      for (let i = values.length; i < longer.length; i++) longer[i] = normal() + shift;
      values = longer;
      first = firstHit(values, input);
    }
    total += first + 1;
    squares += (first + 1) ** 2;
  }
  const mean = total / runs;
  return { mean, standardError: Math.sqrt(Math.max(0, squares / runs - mean * mean) / (runs - 1)) };
}

function firstHit(
  values: Float64Array,
  input: RuleConventions & { readonly rules: readonly ControlRule[] },
): number {
  const hits = controlRuleHits({ ...input, values, centre: 0, sigma: 1, rules: input.rules });
  const firsts = Object.values<number[]>(hits).flatMap((found) => found.slice(0, 1));
  return firsts.length === 0 ? -1 : Math.min(...firsts);
}
