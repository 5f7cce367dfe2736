import { readFileSync } from "node:fs";
import { expect } from "vitest";

/** A printed figure with the tolerance of its print. */
interface Printed {
  readonly value: unknown;
  readonly status: string;
  readonly decimals?: number;
  readonly tolerance?: number;
}

/** One reference case: input, values computed by other programs, figures as printed. */
export interface ReferenceCase<Input, Expected> {
  readonly id: string;
  readonly title: string;
  readonly source: string;
  readonly input: Input;
  readonly expected_computed: Expected;
  readonly published?: Readonly<Record<string, Printed>>;
  readonly vectors?: readonly unknown[];
}

const file = new URL("../fixtures/reference/statistics-checks.json", import.meta.url);
const { cases } = JSON.parse(readFileSync(file, "utf8")) as {
  cases: readonly ReferenceCase<unknown, unknown>[];
};

export const caseIds = cases.map(({ id }) => id);

/** The reference case of this name; an unknown name is an error. */
export function caseOf<Input, Expected>(id: string): ReferenceCase<Input, Expected> {
  const found = cases.find((each) => each.id === id);
  if (!found) throw new Error(`No reference case is called ${id}.`);
  return found as ReferenceCase<Input, Expected>;
}

/** The title of a check: what, and after whom. */
export function titleOf(id: string): string {
  const { title, source } = caseOf(id);
  return `${title} [${source}]`;
}

/** Asks for agreement within a relative tolerance (and that much absolutely near zero). */
export function expectNear(actual: number, expected: number, relative = 1e-9): void {
  expect(Math.abs(actual - expected), `${actual} against ${expected}`).toBeLessThanOrEqual(
    relative * Math.max(Math.abs(expected), 1e-3),
  );
}

/** Asks for agreement of every entry; the lengths must be equal. */
export function expectAllNear(actual: ArrayLike<number>, expected: ArrayLike<number>, relative = 1e-9): void {
  expect(actual.length).toBe(expected.length);
  Array.from(expected).forEach((value, index) => expectNear(actual[index] as number, value, relative));
}

/** Asks for agreement with a figure as printed, within its decimals or stated tolerance; null entries are not printed. */
export function expectPrinted(id: string, name: string, actual: number | ArrayLike<number>): void {
  const printed = caseOf(id).published?.[name];
  if (!printed) throw new Error(`Case ${id} prints no ${name}.`);
  const tolerance = printed.tolerance ?? 0.5000001 * 10 ** -(printed.decimals ?? Number.NaN);
  if (Number.isNaN(tolerance)) throw new Error(`Case ${id} prints ${name} without a tolerance.`);
  const want = Array.isArray(printed.value) ? printed.value : [printed.value];
  const got = typeof actual === "number" ? [actual] : Array.from(actual);
  expect(got.length).toBeGreaterThanOrEqual(want.length);
  want.forEach((value: unknown, index) => {
    if (value === null) return;
    const off = Math.abs((got[index] as number) - Number(value));
    expect(off, `${name}[${index}]: ${got[index]} against ${String(value)}`).toBeLessThanOrEqual(tolerance);
  });
}
