/** A column of numbers. */
export type Column = readonly number[];

/** Columns that keep less than this share of their length beside the others count as dependent on them. */
const DEPENDENT = 1e-10;

const dot = (a: Column, b: Column) => a.reduce((total, value, i) => total + value * b[i]!, 0);
const norm = (a: Column) => Math.sqrt(dot(a, a));
const minus = (a: Column, b: Column, times: number) => a.map((value, i) => value - times * b[i]!);

/**
 * Solves min |A x − b| by orthogonal columns, each cleaned twice; null when the columns depend on one another.
 * Source: Golub and Van Loan, Matrix Computations, modified Gram-Schmidt with reorthogonalisation.
 */
export function leastSquares(columns: readonly Column[], b: Column): number[] | null {
  const q: number[][] = [];
  const r: number[][] = [];
  for (const column of columns) {
    let rest = [...column];
    const above = q.map(() => 0);
    for (let pass = 0; pass < 2; pass++) {
      q.forEach((direction, i) => {
        const share = dot(direction, rest);
        above[i] = above[i]! + share;
        rest = minus(rest, direction, share);
      });
    }
    const length = norm(rest);
    if (!(length > DEPENDENT * norm(column))) return null;
    q.push(rest.map((value) => value / length));
    r.push([...above, length]);
  }
  const x = q.map((direction) => dot(direction, b));
  for (let j = x.length - 1; j >= 0; j--) {
    x[j] = x[j]! / r[j]![j]!;
    for (let i = 0; i < j; i++) x[i] = x[i]! - r[j]![i]! * x[j]!;
  }
  return x;
}

/** What is left of b when A x is taken away. */
export function residual(columns: readonly Column[], b: Column, x: Column): number[] {
  return b.map((value, i) => value - columns.reduce((total, column, j) => total + column[i]! * x[j]!, 0));
}

const MOST_ROUNDS = 500;

/**
 * Solves min |A x − b| with no negative x. The answer meets the Karush-Kuhn-Tucker conditions: no salt that is left out
 * would help. Throws RangeError for columns of unequal length; a programmer's error otherwise never arises.
 * Source: Lawson and Hanson 1974, Solving Least Squares Problems, chapter 23. Checked: SciPy's nnls.
 * @example nonNegativeLeastSquares([[1, 0], [0, 1]], [2, -1]) // => [2, 0]
 */
export function nonNegativeLeastSquares(columns: readonly Column[], b: Column): number[] {
  if (columns.some((column) => column.length !== b.length)) {
    throw new RangeError("Every column must be as long as the target.");
  }
  const scale = norm(b) || 1;
  let x: number[] = columns.map(() => 0);
  const used = new Set<number>();
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const rest = residual(columns, b, x);
    const candidates = columns
      .map((column, j) => ({ j, gain: dot(column, rest) / (norm(column) || 1) }))
      .filter(({ j, gain }) => !used.has(j) && gain > 1e-12 * scale)
      .sort((one, other) => other.gain - one.gain);
    const next = candidates.map(({ j }) => enter(columns, b, x, used, j)).find((tried) => tried !== null);
    if (!next) return x;
    x = next;
  }
  return x;
}

/** Lets one column in and drops those that it drives to zero; null when it cannot come in at all. */
function enter(
  columns: readonly Column[],
  b: Column,
  start: readonly number[],
  used: Set<number>,
  entering: number,
): number[] | null {
  const passive = [...used, entering];
  let solved = leastSquares(
    passive.map((j) => columns[j]!),
    b,
  );
  if (!solved || solved[solved.length - 1]! <= 0) return null;
  const x = [...start];
  while (solved.some((value) => value <= 0)) {
    const target: readonly number[] = solved;
    const step = Math.min(
      ...passive.map((j, i) => (target[i]! <= 0 ? x[j]! / (x[j]! - target[i]!) : Number.POSITIVE_INFINITY)),
    );
    passive.forEach((j, i) => {
      x[j] = x[j]! + step * (target[i]! - x[j]!);
    });
    const leaving = passive.filter(
      (j, i) => target[i]! <= 0 && x[j]! <= 1e-15 * Math.abs(target[i]!) + 1e-300,
    );
    const worst = leaving.length > 0 ? leaving : [smallest(passive, target, x)];
    for (const j of worst) {
      x[j] = 0;
      passive.splice(passive.indexOf(j), 1);
    }
    solved =
      leastSquares(
        passive.map((j) => columns[j]!),
        b,
      ) ?? [];
  }
  used.clear();
  passive.forEach((j, i) => {
    used.add(j);
    x[j] = solved[i]!;
  });
  return x;
}

/** Of the columns driven below zero, the one that came nearest to it. */
function smallest(passive: readonly number[], target: readonly number[], x: readonly number[]): number {
  return passive.filter((_, i) => target[i]! <= 0).reduce((least, j) => (x[j]! < x[least]! ? j : least));
}
