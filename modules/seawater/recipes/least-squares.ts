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

/** A column helps only when it takes away more than this share of the target. */
const HELPS = 1e-12;

interface Fit {
  readonly x: readonly number[];
  /** columns with something in them */
  readonly used: readonly number[];
}

/**
 * Solves min |A x − b| with no negative x. The answer meets the Karush-Kuhn-Tucker conditions: no column that is left out
 * would help. Throws RangeError for columns of unequal length.
 * Source: Lawson and Hanson 1974, Solving Least Squares Problems, chapter 23. Checked: SciPy 1.17.1 nnls.
 * @example nonNegativeLeastSquares([[1, 0], [0, 1]], [2, -1]) // => [2, 0]
 */
export function nonNegativeLeastSquares(columns: readonly Column[], b: Column): number[] {
  if (columns.some((column) => column.length !== b.length)) {
    throw new RangeError("Every column must be as long as the target.");
  }
  let fit: Fit = { x: columns.map(() => 0), used: [] };
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const better = improved(columns, b, fit);
    if (!better) break;
    fit = better;
  }
  return [...fit.x];
}

/** Lets in the column that helps most; null when none does. */
function improved(columns: readonly Column[], b: Column, fit: Fit): Fit | null {
  const rest = residual(columns, b, fit.x);
  const candidates = columns
    .map((column, j) => ({ j, gain: dot(column, rest) / (norm(column) || 1) }))
    .filter(({ j, gain }) => !fit.used.includes(j) && gain > HELPS * norm(b))
    .sort((one, other) => other.gain - one.gain);
  for (const { j } of candidates) {
    const entered = enter(columns, b, fit, j);
    if (entered) return entered;
  }
  return null;
}

const solveOn = (columns: readonly Column[], b: Column, used: readonly number[]) =>
  leastSquares(
    used.map((j) => columns[j]!),
    b,
  );

/** Share of the way to its goal that a value can go before it is zero. */
function roomFor(value: number, goal: number): number {
  if (goal > 0) return Number.POSITIVE_INFINITY;
  return value === 0 ? 0 : value / (value - goal);
}

/** Lets one column in and drops those that it drives to zero; null when it cannot come in at all. */
function enter(columns: readonly Column[], b: Column, fit: Fit, entering: number): Fit | null {
  const x = [...fit.x];
  let used = [...fit.used, entering];
  let solved = solveOn(columns, b, used);
  if (!solved || solved[solved.length - 1]! <= 0) return null;
  while (solved.some((value) => value <= 0)) {
    const goal: readonly number[] = solved;
    const room = used.map((j, i) => roomFor(x[j]!, goal[i]!));
    const step = Math.min(...room);
    used.forEach((j, i) => {
      x[j] = room[i] === step ? 0 : x[j]! + step * (goal[i]! - x[j]!);
    });
    used = used.filter((_, i) => room[i] !== step);
    solved = solveOn(columns, b, used);
    if (!solved) return null;
  }
  used.forEach((j, i) => {
    x[j] = solved[i]!;
  });
  return { x, used };
}
