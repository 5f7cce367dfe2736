import { describe, expect, it } from "vitest";
import {
  type ControlRule,
  controlRuleHits,
  type RuleConventions,
  type WestgardHit,
  westgard,
} from "@/modules/statistics";
import { caseOf } from "./statistics-cases";

interface RunVector {
  id: string;
  rule: ControlRule;
  z: (number | null)[];
  fires_at: number[] | null;
  note: string;
  fires_at_missing_breaks_run?: number[];
  fires_at_missing_skipped?: number[];
  other_readings?: Record<string, number[]>;
}

const OTHER_READINGS: Record<string, [ControlRule, RuleConventions]> = {
  WE4: ["WE4", {}],
  N3_seven: ["N3", { trendPoints: 7 }],
  N7_le: ["N7", { atOneSigma: "inside" }],
  N8_any: ["N8", { sides: "any" }],
};

function hits(vector: RunVector, rule: ControlRule, conventions: RuleConventions = {}): number[] {
  return controlRuleHits({ values: vector.z, centre: 0, sigma: 1, rules: [rule], ...conventions })[rule];
}

describe("Western Electric 1956 and Nelson 1984, vectors worked by hand and matched by independent programs", () => {
  const vectors = caseOf("run-rules").vectors as RunVector[];

  it("all 60 vectors are here", () => expect(vectors).toHaveLength(60));

  it.each(vectors.map((vector) => [vector.id, vector.note, vector] as const))(
    "%s: %s",
    (_id, _note, vector) => {
      if (vector.fires_at === null) {
        expect(hits(vector, vector.rule, { missing: "break" })).toEqual(vector.fires_at_missing_breaks_run);
        expect(hits(vector, vector.rule, { missing: "skip" })).toEqual(vector.fires_at_missing_skipped);
      } else {
        expect(hits(vector, vector.rule)).toEqual(vector.fires_at);
        expect(hits(vector, vector.rule, { missing: "skip" })).toEqual(vector.fires_at);
      }
      for (const [reading, expected] of Object.entries(vector.other_readings ?? {})) {
        const [rule, conventions] = OTHER_READINGS[reading] as [ControlRule, RuleConventions];
        expect(hits(vector, rule, conventions), reading).toEqual(expected);
      }
    },
  );
});

interface WestgardVector {
  id: string;
  runs_z: (number | null)[][];
  options: { mode?: "skip" | "break"; r4s?: "limits" | "difference" };
  events: Record<string, unknown[]>;
  decision_with_1_2s_gate: string[];
  decision_all_rules: string[];
  note: string;
}

function eventName({ rule, scope }: WestgardHit): string {
  const name = rule.replace("-", "_");
  if (rule === "2-2s") return scope === "within run" ? "2_2s_within" : "2_2s_across_runs";
  return scope === "within material" || scope === "across materials"
    ? `${name}_${scope.replace(" ", "_")}`
    : name;
}

describe("Westgard, Barry, Hunt and Groth 1981, vectors worked by hand", () => {
  const vectors = caseOf("westgard").vectors as WestgardVector[];

  it("all 18 vectors are here", () => expect(vectors).toHaveLength(18));

  it.each(vectors.map((vector) => [vector.id, vector.note, vector] as const))(
    "%s: %s",
    (_id, _note, vector) => {
      const common = { runs: vector.runs_z, missing: vector.options.mode, r4s: vector.options.r4s };
      const gated = westgard({ ...common, flow: "gate" });
      const events: Record<string, unknown[]> = {};
      for (const hit of gated.hits) {
        const place = hit.material === null ? hit.run : [hit.run, hit.material];
        events[eventName(hit)] = [...(events[eventName(hit)] ?? []), place];
      }
      expect(events).toEqual(vector.events);
      expect(gated.decisions).toEqual(vector.decision_with_1_2s_gate);
      expect(westgard({ ...common, flow: "all" }).decisions).toEqual(vector.decision_all_rules);
    },
  );
});
