/**
 * Solves A x = b for a square matrix given row by row, by elimination with the greatest pivot of each column.
 *
 * Throws RangeError when the matrix is singular. The inputs are left as they are.
 * @example Array.from(solveLinearSystem([[2, 0], [0, 4]], [2, 8])) // => [1, 2]
 */
export function solveLinearSystem(
  matrix: readonly ArrayLike<number>[],
  right: ArrayLike<number>,
): Float64Array {
  const n = right.length;
  const rows = matrix.map((row, i) => {
    const copy = new Float64Array(n + 1);
    for (let j = 0; j < n; j++) copy[j] = row[j]!;
    copy[n] = right[i]!;
    return copy;
  });
  for (let column = 0; column < n; column++) {
    let best = column;
    for (let i = column + 1; i < n; i++) {
      if (Math.abs(rows[i]![column]!) > Math.abs(rows[best]![column]!)) best = i;
    }
    const pivot = rows[best]!;
    if (!(Math.abs(pivot[column]!) > 0))
      throw new RangeError("The system of equations has no single solution.");
    rows[best] = rows[column]!;
    rows[column] = pivot;
    for (let i = column + 1; i < n; i++) {
      const row = rows[i]!;
      const factor = row[column]! / pivot[column]!;
      if (factor === 0) continue;
      for (let j = column; j <= n; j++) row[j]! -= factor * pivot[j]!;
    }
  }
  const solution = new Float64Array(n);
  for (let i = n - 1; i >= 0; i--) {
    let value = rows[i]![n]!;
    for (let j = i + 1; j < n; j++) value -= rows[i]![j]! * solution[j]!;
    solution[i] = value / rows[i]![i]!;
  }
  return solution;
}
