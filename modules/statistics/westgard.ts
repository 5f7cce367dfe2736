import { type MissingConvention, ON_THE_LINE } from "./run-rules";

/** The rules of Westgard, Barry, Hunt and Groth 1981. 1-2s warns; the others reject. */
export type WestgardRule = "1-2s" | "1-3s" | "2-2s" | "R-4s" | "4-1s" | "10-x";

/** Where a rule was met: in one value, within a run, along one material, or along all materials in order. */
export type WestgardScope = "value" | "within run" | "within material" | "across materials";

/** One rule met: the run (0-based) that completes it and the material, or null when it spans materials. */
export interface WestgardHit {
  readonly rule: WestgardRule;
  readonly scope: WestgardScope;
  readonly run: number;
  readonly material: number | null;
}

export type WestgardDecision = "accept" | "warning" | "reject";

/** Control results as distances from their mean in standard deviations: runs[r][m] of material m in run r. */
export interface WestgardInput {
  readonly runs: readonly (readonly (number | null)[])[];
  /** "skip" (default): consecutive measurements. "break": a missing result ends every sequence. */
  readonly missing?: MissingConvention;
  /** "limits" (default): one beyond +2s and one beyond -2s. "difference": two results more than 4s apart. */
  readonly r4s?: "limits" | "difference";
  /** "gate" (default, as published): 1-2s must warn before the others are looked at. "all": every rule always. */
  readonly flow?: "gate" | "all";
}

/** What each rule says. */
export const WESTGARD_RULES: Readonly<
  Record<
    WestgardRule,
    { readonly words: string; readonly kind: "warning" | "random error" | "systematic error" }
  >
> = {
  "1-2s": { words: "one result beyond two standard deviations", kind: "warning" },
  "1-3s": { words: "one result beyond three standard deviations", kind: "random error" },
  "2-2s": {
    words: "two results in succession beyond the same line of two standard deviations",
    kind: "systematic error",
  },
  "R-4s": {
    words: "one result above plus two and one below minus two standard deviations in one run",
    kind: "random error",
  },
  "4-1s": {
    words: "four results in succession beyond the same line of one standard deviation",
    kind: "systematic error",
  },
  "10-x": { words: "ten results in succession on one side of the mean", kind: "systematic error" },
};

/** A result with its place. */
interface Placed {
  readonly z: number | null;
  readonly run: number;
  readonly material: number;
}

/** At which places do `length` results in succession lie beyond the same line? */
function successive(series: readonly Placed[], length: number, line: number, skip: boolean): Placed[] {
  const found: Placed[] = [];
  let above = 0;
  let below = 0;
  for (const place of series) {
    if (place.z === null) {
      if (!skip) {
        above = 0;
        below = 0;
      }
      continue;
    }
    above = place.z > line + ON_THE_LINE ? above + 1 : 0;
    below = place.z < -line - ON_THE_LINE ? below + 1 : 0;
    if (above >= length || below >= length) found.push(place);
  }
  return found;
}

function rangeExceeded(results: readonly (number | null)[], reading: "limits" | "difference"): boolean {
  const known = results.filter((z): z is number => z !== null);
  if (known.length < 2) return false;
  const most = Math.max(...known);
  const least = Math.min(...known);
  if (reading === "difference") return most - least > 4 + ON_THE_LINE;
  return most > 2 + ON_THE_LINE && least < -2 - ON_THE_LINE;
}

/** The hits that are seen inside single runs. */
function hitsWithinRuns(
  runs: readonly (readonly Placed[])[],
  input: WestgardInput,
  skip: boolean,
): WestgardHit[] {
  const hits: WestgardHit[] = [];
  runs.forEach((places, run) => {
    for (const { z, material } of places) {
      const distance = Math.abs(z ?? 0);
      if (distance > 2 + ON_THE_LINE) hits.push({ rule: "1-2s", scope: "value", run, material });
      if (distance > 3 + ON_THE_LINE) hits.push({ rule: "1-3s", scope: "value", run, material });
    }
    if (successive(places, 2, 2, skip).length > 0) {
      hits.push({ rule: "2-2s", scope: "within run", run, material: null });
    }
    const results = places.map(({ z }) => z);
    if (rangeExceeded(results, input.r4s ?? "limits")) {
      hits.push({ rule: "R-4s", scope: "within run", run, material: null });
    }
  });
  return hits;
}

/** The hits that need several runs: along each material, and along all materials in the order of measurement. */
function hitsAcrossRuns(runs: readonly (readonly Placed[])[], skip: boolean): WestgardHit[] {
  const hits: WestgardHit[] = [];
  const materials = Math.max(0, ...runs.map((run) => run.length));
  const sequences = [
    ["2-2s", 2, 2],
    ["4-1s", 4, 1],
    ["10-x", 10, 0],
  ] as const;
  for (let material = 0; material < materials; material++) {
    const along = runs.map((places, run) => places[material] ?? { z: null, run, material });
    for (const [rule, length, line] of sequences) {
      for (const { run } of successive(along, length, line, skip)) {
        hits.push({ rule, scope: "within material", run, material });
      }
    }
  }
  if (materials < 2) return hits;
  for (const [rule, length, line] of sequences.slice(1)) {
    const ended = new Set(successive(runs.flat(), length, line, skip).map(({ run }) => run));
    for (const run of ended) hits.push({ rule, scope: "across materials", run, material: null });
  }
  return hits;
}

/**
 * May the results of this analytical run be used? The Westgard multirule procedure on control samples: which rules
 * are met in which run, and accept, warning or reject for each run.
 *
 * Decided: "beyond" is strict; 2-2s is looked for within a run across materials and across runs within a material;
 * R-4s within one run only; 4-1s and 10-x within a material and along all materials in order of measurement; a result
 * exactly at the mean breaks 10-x; sequences do not begin again after a rejection. Null is a missing result.
 * Throws RangeError for a result that is not a finite number.
 * Source: Westgard, Barry, Hunt and Groth 1981, Clinical Chemistry 27, 493-501. Checked: 18 hand-worked vectors.
 * @example westgard({ runs: [[2.2, 2.3]] }).decisions // => ["reject"]
 */
export function westgard(input: WestgardInput): { hits: WestgardHit[]; decisions: WestgardDecision[] } {
  const skip = (input.missing ?? "skip") === "skip";
  const runs = input.runs.map((results, run) =>
    results.map((z, material): Placed => {
      if (z !== null && !Number.isFinite(z)) {
        throw new RangeError(`Run ${run}, material ${material}: the result is not a finite number.`);
      }
      return { z, run, material };
    }),
  );
  const hits = [...hitsWithinRuns(runs, input, skip), ...hitsAcrossRuns(runs, skip)];
  hits.sort((a, b) => a.run - b.run);
  const decisions = runs.map((_, run): WestgardDecision => {
    const here = hits.filter((hit) => hit.run === run);
    const warned = here.some((hit) => hit.rule === "1-2s");
    const rejected = here.some((hit) => hit.rule !== "1-2s");
    if (rejected && (warned || input.flow === "all")) return "reject";
    return warned ? "warning" : "accept";
  });
  return { hits, decisions };
}
