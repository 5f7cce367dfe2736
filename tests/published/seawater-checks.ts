import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";

/** One published (or independently computed) value, with its provenance. */
export interface Check {
  id: string;
  fn: string;
  in: Record<string, unknown>;
  out: Record<string, unknown>;
  tol: Record<string, number>;
  prov: string;
  src: string;
  note?: string;
  alt?: Record<string, number>;
}

const FILE = new URL("../fixtures/reference/seawater-checks.json", import.meta.url);
const SECTIONS = (JSON.parse(readFileSync(FILE, "utf8")) as { sections: Record<string, { points: Check[] }> })
  .sections;

export const SECTION_NAMES = Object.keys(SECTIONS);

/** Every check of a section; a section that is missing or empty is an error, not silence. */
export function checksOf(section: string): readonly Check[] {
  const points = SECTIONS[section]?.points ?? [];
  if (points.length === 0) throw new Error(`No checks in section ${section}.`);
  return points;
}

/** A number from a check's input. */
export function num(check: Check, key: string): number {
  const value = check.in[key];
  if (typeof value !== "number") throw new Error(`${check.id}: ${key} is not a number.`);
  return value;
}

/** A word from a check's input. */
export function word(check: Check, key: string): string {
  const value = check.in[key];
  if (typeof value !== "string") throw new Error(`${check.id}: ${key} is not a word.`);
  return value;
}

type Solver = (check: Check) => Record<string, number>;

/** Runs every row of a section against its solver; a row whose function has no solver fails. */
export function proveSection(section: string, title: string, solvers: Record<string, Solver>): void {
  describe(title, () => {
    for (const check of checksOf(section)) {
      it(`${check.id} ${check.fn} ${JSON.stringify(check.in)} (${check.prov}: ${check.src})`, () => {
        const solve = solvers[check.fn];
        expect(solve, `no solver for ${check.fn}`).toBeDefined();
        const got = solve!(check);
        for (const [key, wanted] of Object.entries(check.out)) {
          expect(got[key], `${key} is not answered`).toBeTypeOf("number");
          const tolerance = check.tol[key];
          expect(tolerance, `${key} has no tolerance`).toBeTypeOf("number");
          const difference = Math.abs(got[key]! - Number(wanted));
          expect(difference, `${key}: got ${got[key]}, wanted ${String(wanted)}`).toBeLessThanOrEqual(
            tolerance! * (1 + 1e-9),
          );
        }
      });
    }
  });
}

/** A temperature of the 1968 scale, as these functions take it (ITS-90). Saunders 1990: t68 = 1.00024 t90. */
export const onIts90 = (t68C: number) => t68C / 1.00024;
